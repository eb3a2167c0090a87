import { closeTill } from "@/lib/data/counter/tills";
import { closeTillInput } from "@/lib/input/counter";
import { route } from "@/lib/server/doors/route";

export const POST = route(closeTillInput, "till.open", closeTill);
