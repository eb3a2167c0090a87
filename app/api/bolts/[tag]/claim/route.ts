import { claimBolt } from "@/lib/data/stock/claim-bolt";
import { claimInput } from "@/lib/input/stock";
import { route } from "@/lib/server/doors/route";

export const POST = route(claimInput, "bolt.move", claimBolt);
