import { settlePrintJob } from "@/lib/data/print/queue";
import { settlePrintInput } from "@/lib/input/print";
import { route } from "@/lib/server/doors/route";

export const POST = route(settlePrintInput, "print.ask", settlePrintJob);
