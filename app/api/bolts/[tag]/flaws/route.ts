import { noteFlaw } from "@/lib/data/stock/note-flaw";
import { flawInput } from "@/lib/input/stock";
import { route } from "@/lib/server/doors/route";

export const POST = route(flawInput, "bolt.flaw", noteFlaw);
