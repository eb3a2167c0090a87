import { moveBolt } from "@/lib/data/stock/move-bolt";
import { moveBoltInput } from "@/lib/input/stock";
import { route } from "@/lib/server/doors/route";

export const POST = route(moveBoltInput, "bolt.move", moveBolt);
