import { z } from "zod";
import { stopJob } from "@/lib/data/planning/jobs";
import { route } from "@/lib/server/doors/route";

const input = z.object({ id: z.uuid("A planning job is named by its number.") });

export const POST = route(input, "plan.ask", (actor, { id }) => stopJob(actor, id));
