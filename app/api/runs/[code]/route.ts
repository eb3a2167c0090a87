import { fail, ok } from "@/lib/core/result";
import { getRun } from "@/lib/data/runs/runs";
import { runCode } from "@/lib/input/runs";
import { route } from "@/lib/server/doors/route";

export const GET = route(runCode, "run.see", async (_actor, { code }) => {
  const run = await getRun(code);
  return run ? ok(run) : fail("unknown-run", `No run has the code ${code}. Scan the run's list or choose it from the runs.`);
});
