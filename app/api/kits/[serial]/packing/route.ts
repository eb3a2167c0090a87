import { fail, ok } from "@/lib/core/result";
import { getPacking, packScan } from "@/lib/data/runs/pack-kit";
import { packScanInput, serialOnly } from "@/lib/input/runs";
import { route } from "@/lib/server/doors/route";

export const GET = route(serialOnly, "run.see", async (_actor, { serial }) => {
  const packing = await getPacking(serial);
  return packing ? ok(packing) : fail("unknown-kit", `No kit has the serial ${serial}. Scan the tag on the bag.`);
});

export const POST = route(packScanInput, "kit.pack", packScan);
