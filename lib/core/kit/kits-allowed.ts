import { MOST_KITS, planBolts, type BoltBudget, type BoltPlanFault } from "../cutting/bolt-plan";
import type { BoltPlanInput } from "../piece/bolt-plan";
import { ok, type Result } from "../result";

export interface KitsAllowed {
  /** Kits that can be cut from the bolts as they are, with every promise kept. */
  readonly kits: number;
  /** No plan makes more; equal to `kits` unless the work ran out. */
  readonly atMost: number;
  /** The fabric that allows the fewest. */
  readonly limiting: string | null;
  /** In the order of the kit's fabrics. */
  readonly allows: readonly { readonly fabric: string; readonly kits: number }[];
  /** Why not one more kit. */
  readonly reason: string;
}

/** How many kits the bolts allow, and which fabric holds them to that. Faults are those of the bolt plan. */
export async function kitsAllowed(input: Omit<BoltPlanInput, "kits">, budget: BoltBudget): Promise<Result<KitsAllowed, BoltPlanFault>> {
  const planned = await planBolts({ ...input, kits: MOST_KITS }, budget);
  if (!planned.ok) return planned;
  const { kits, mostKits, limiting, allows, reason } = planned.value;
  return ok({ kits, atMost: mostKits, limiting, allows, reason });
}
