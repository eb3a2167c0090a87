import { ok } from "@/lib/core/result";
import { takePrintJob } from "@/lib/data/print/queue";
import { takePrintInput } from "@/lib/input/print";
import { route } from "@/lib/server/doors/route";

export const POST = route(takePrintInput, "print.ask", async (_actor, { printer }) => ok(await takePrintJob(printer)));
