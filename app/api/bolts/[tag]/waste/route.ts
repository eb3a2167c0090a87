import { recordWasteCut } from "@/lib/data/stock/record-waste-cut";
import { wasteInput } from "@/lib/input/stock";
import { route } from "@/lib/server/doors/route";

export const POST = route(wasteInput, "bolt.move", recordWasteCut);
