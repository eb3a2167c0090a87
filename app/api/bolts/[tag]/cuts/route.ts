import { recordCut } from "@/lib/data/stock/record-cut";
import { cutInput } from "@/lib/input/stock";
import { route } from "@/lib/server/doors/route";

export const POST = route(cutInput, "run.cut", recordCut);
