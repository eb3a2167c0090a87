import { CORE_VERSION } from "@/lib/core/core-version";
import type { Solver } from "@/lib/core/cutting/solver";
import { planKit, type KitPlan, type KitPlanInput } from "@/lib/core/kit/kit-plan";
import { ok, type Result } from "@/lib/core/result";
import { db } from "@/models/database";
import { hashOfPlan, keptPlan } from "./jobs";

/** Plans a kit in this process and keeps the plan under its input's hash, as a job would. For the seed and for tests: a page asks for a job. */
export async function planKitNow(input: KitPlanInput, solver: Solver): Promise<Result<KitPlan>> {
  const inputHash = hashOfPlan("kit", input);
  const kept = await keptPlan(inputHash);
  if (kept !== null) return ok(kept as KitPlan);
  const planned = await planKit(input, solver);
  if (!planned.ok) return planned;
  await db().Plan.findOrCreate({ where: { inputHash, coreVersion: CORE_VERSION }, defaults: { inputHash, coreVersion: CORE_VERSION, kind: "kit", input, result: planned.value } });
  return planned;
}
