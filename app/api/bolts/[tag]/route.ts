import { getBolt } from "@/lib/data/stock/get-bolt";
import { tagOnly } from "@/lib/input/stock";
import { route } from "@/lib/server/doors/route";

export const GET = route(tagOnly, "bolt.see", getBolt);
