import type { PlanProgress } from "@/lib/core/piece/strip-plan";
import type { Result } from "@/lib/core/result";

/** What the server asks of the planner's worker. The flag is shared memory: 1 asks it to stop. */
export interface ToWorker {
  readonly id: string;
  readonly kind: "kit" | "bolts";
  readonly input: object;
  readonly stopFlag: Int32Array;
}

export type FromWorker =
  | { readonly kind: "progress"; readonly id: string; readonly progress: PlanProgress }
  | { readonly kind: "answer"; readonly id: string; readonly result: Result<unknown> };
