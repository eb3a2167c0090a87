import { openTill } from "@/lib/data/counter/tills";
import { openTillInput } from "@/lib/input/counter";
import { route } from "@/lib/server/doors/route";

export const POST = route(openTillInput, "till.open", openTill);
