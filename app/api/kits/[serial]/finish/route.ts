import { finishKit } from "@/lib/data/runs/pack-kit";
import { finishKitInput } from "@/lib/input/runs";
import { route } from "@/lib/server/doors/route";

export const POST = route(finishKitInput, "kit.pack", finishKit);
