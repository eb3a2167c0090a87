import { removeFlaw } from "@/lib/data/stock/remove-flaw";
import { removeFlawInput } from "@/lib/input/stock";
import { route } from "@/lib/server/doors/route";

export const POST = route(removeFlawInput, "bolt.flaw", removeFlaw);
