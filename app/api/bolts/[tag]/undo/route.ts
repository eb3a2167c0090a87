import { undoLastCut } from "@/lib/data/stock/undo-last-cut";
import { undoInput } from "@/lib/input/stock";
import { route } from "@/lib/server/doors/route";

export const POST = route(undoInput, "bolt.move", undoLastCut);
