import { z } from "zod";
import { fail, ok } from "@/lib/core/result";
import { getJob } from "@/lib/data/planning/jobs";
import { route } from "@/lib/server/doors/route";

const input = z.object({ id: z.uuid("A planning job is named by its number.") });

export const GET = route(input, "kit.see", async (_actor, { id }) => {
  const job = await getJob(id);
  return job ? ok(job) : fail("unknown-job", "There is no such planning job; it may have been cleared away.");
});
