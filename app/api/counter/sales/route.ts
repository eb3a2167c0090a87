import { recordSale } from "@/lib/data/counter/record-sale";
import { saleInput } from "@/lib/input/counter";
import { route } from "@/lib/server/doors/route";

export const POST = route(saleInput, "till.sell", recordSale);
