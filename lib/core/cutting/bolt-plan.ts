import { length } from "../measure/length";
import type { BoltPlan, BoltPlanInput, KitLength, PlanOutcome, PlannedCut } from "../piece/bolt-plan";
import type { PlanControl } from "../piece/strip-plan";
import { fail, ok, type Result } from "../result";
import { addCosts, NO_COST } from "./bolt-counts";
import { canServe, serve, stockOf, type CutAlready, type FabricStock } from "./bolt-fabric";

/** More than any shop holds of one run's fabrics; the plan's work grows with kits × bolts × lengths on a bolt. */
export const MOST_KITS = 2_000;
const MOST_BOLTS = 4_000;

export type BoltPlanFault = "no-fabric" | "no-length" | "too-many";

/** Work, never seconds: counts that the tables of one fabric with several lengths may hold, over all its bolts. */
export interface BoltBudget {
  readonly nodes: number;
}

/**
 * Plans a run's lengths onto bolts: first as many kits as were asked for, then the least scrap, then the fewest bolts
 * touched. Fabrics meet only in the number of kits: the fewest that any fabric allows. For each fabric the counts per bolt are
 * chosen by dynamic programming over the segments of a bolt and over the bolts, which is exact. Where a kit takes
 * several lengths of one fabric they come from one lot; then the budget may end the tables early, and the plan is
 * `feasible` with `mostKits` a bound.
 *
 * @param _solver the plan needs none.
 * @returns `no-fabric` when nothing was asked for, `no-length` for a length of nothing, `too-many` with the limits.
 */
export async function planBolts(input: BoltPlanInput, budget: BoltBudget, _solver?: unknown, control?: PlanControl): Promise<Result<BoltPlan, BoltPlanFault>> {
  return replanBolts(input, [], budget, control);
}

/**
 * Plans the rest of a run at once, when a bolt was short, had a flaw or a cut went wrong. What was cut stays with its kit;
 * kits that are furthest along are finished first, their lengths of one fabric still from one lot. `kits` of the input and of
 * the answer count the kits of the whole run; the cuts are only those still to make.
 *
 * @param already every length that was cut for this run and is still good.
 */
export async function replanBolts(input: BoltPlanInput, already: readonly CutAlready[], budget: BoltBudget, control?: PlanControl): Promise<Result<BoltPlan, BoltPlanFault>> {
  const refusal = refuse(input);
  if (refusal) return refusal;
  const wants = byFabric(input.lengths);
  const stocks: FabricStock[] = [];
  for (const [index, each] of wants.entries()) {
    if (await isStopped(control, index, wants.length)) return ok(emptyPlan(wants));
    stocks.push(stockOf(each, input, already, budget.nodes));
  }
  const served = kitsServed(stocks, input.kits);
  const mostKits = Math.max(served.size, Math.min(...stocks.map((stock) => stock.allows)));
  let cost = NO_COST;
  const cuts: PlannedCut[] = [];
  for (const stock of stocks) {
    const choice = serve(stock, served);
    cost = addCosts(cost, choice);
    cuts.push(...choice.cuts);
  }
  const order = new Map(input.bolts.map((bolt) => [bolt.tag, bolt.shelfOrder]));
  cuts.sort((a, b) => (order.get(a.bolt) ?? 0) - (order.get(b.bolt) ?? 0) || (a.bolt < b.bolt ? -1 : a.bolt > b.bolt ? 1 : a.startsAt - b.startsAt));
  const status: PlanOutcome = served.size === Math.min(input.kits, mostKits) ? "optimal" : "feasible";
  return ok({ status, kits: served.size, cuts, scrap: length(cost.scrap), boltsTouched: cost.touched, mostKits, ...limits(stocks, input.kits, served.size, mostKits) });
}

function refuse({ kits, lengths, bolts }: BoltPlanInput) {
  if (lengths.length === 0) return fail("no-fabric", "The kit has no fabric to cut.");
  const empty = lengths.find((each) => each.length <= 0);
  if (empty) return fail("no-length", `The kit wants a length of nothing of ${empty.name ?? empty.fabric}. Plan its pieces first.`);
  if (!Number.isSafeInteger(kits) || kits < 0 || kits > MOST_KITS || bolts.length > MOST_BOLTS) {
    return fail("too-many", `A plan takes from 0 to ${MOST_KITS} kits and up to ${MOST_BOLTS} bolts; ${kits} kits on ${bolts.length} bolts were asked for.`);
  }
  return null;
}

function byFabric(lengths: readonly KitLength[]): KitLength[][] {
  return [...new Set(lengths.map((each) => each.fabric))].map((fabric) => lengths.filter((each) => each.fabric === fabric));
}

async function isStopped(control: PlanControl | undefined, done: number, count: number): Promise<boolean> {
  if (!control) return false;
  control.progress?.({ done: done / count, sentence: `${done} of ${count} fabrics laid on their bolts.` });
  await new Promise<void>((resolve) => setTimeout(resolve, 0));
  return control.stopped?.() ?? false;
}

/** What is left of a plan that a person stopped before it had a count for every fabric. */
function emptyPlan(wants: readonly (readonly KitLength[])[]): BoltPlan {
  const allows = wants.map(([want]) => ({ fabric: want?.fabric ?? "", kits: 0 }));
  return { status: "stopped", kits: 0, cuts: [], scrap: length(0), boltsTouched: 0, mostKits: MOST_KITS, allows, limiting: null, reason: "The planning was stopped before the bolts were counted." };
}

/**
 * Which kits are made: those with most of their lengths cut first, then by number, each as long as every fabric can still
 * serve all taken so far.
 */
function kitsServed(stocks: readonly FabricStock[], asked: number): Set<number> {
  const progress = new Map<number, number>();
  for (const stock of stocks) {
    for (const kit of stock.begun.keys()) progress.set(kit, (progress.get(kit) ?? 0) + 1);
  }
  const served = new Set<number>();
  const tryKit = (kit: number) => {
    served.add(kit);
    return stocks.every((stock) => canServe(stock, served)) || !served.delete(kit);
  };
  const begun = [...progress.keys()].sort((a, b) => (progress.get(b) ?? 0) - (progress.get(a) ?? 0) || a - b);
  begun.forEach(tryKit);
  const fresh = Array.from({ length: asked }, (_, index) => index + 1).filter((kit) => !progress.has(kit));
  // Kits that have nothing yet are all alike: after the first that fails none can go.
  fresh.every(tryKit);
  return served;
}

function limits(stocks: readonly FabricStock[], asked: number, made: number, mostKits: number): Pick<BoltPlan, "allows" | "limiting" | "reason"> {
  const allows = stocks.map((stock) => ({ fabric: stock.fabric, kits: stock.allows }));
  const tightest = stocks.reduce((least, stock) => (stock.allows < least.allows ? stock : least));
  const answer = (reason: string) => ({ allows, limiting: tightest.fabric, reason });
  const { name } = tightest;
  if (made === asked && mostKits > asked) return answer(`The bolts would allow ${tightest.isBound ? "up to " : ""}${mostKits}; ${name} allows the fewest.`);
  if (tightest.bolts === 0) return answer(`No bolt of ${name} is on the shelf.`);
  if (tightest.wideEnough === 0) return answer(`No bolt of ${name} on the shelf is as wide as its pieces were planned on. Plan the kit anew on the width there is.`);
  if (made < mostKits) return answer(`${counted(made)} can be made; whether the bolts allow more, up to ${mostKits}, was not proven.`);
  const room = tightest.groups.length > 1 || tightest.groups[0]?.lot ? "no lot of it has room for one more kit's lengths" : "none of its bolts has room for one more length";
  return answer(`${name} limits the run to ${counted(mostKits)}: ${room} between the flaws and beside what is promised.`);
}

function counted(kits: number): string {
  return kits === 1 ? "1 kit" : `${kits} kits`;
}
