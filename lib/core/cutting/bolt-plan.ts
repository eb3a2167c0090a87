import { length } from "../measure/length";
import type { BoltPlan, BoltPlanInput, KitLength, PlanBolt, PlannedCut } from "../piece/bolt-plan";
import type { PlanControl } from "../piece/strip-plan";
import { fail, ok, type Result } from "../result";
import { cutsOf, laysOf, type BoltLay, type LayRules } from "./bolt-lay";

/** More than any shop holds of one run's fabrics; the plan's work grows with kits × bolts × lengths on a bolt. */
const MOST_KITS = 2_000;
const MOST_BOLTS = 4_000;

/** The bolts that may serve one fabric, with all their lays. */
interface FabricStock {
  readonly want: KitLength;
  readonly rules: LayRules;
  readonly bolts: readonly { readonly bolt: PlanBolt; readonly lays: readonly BoltLay[] }[];
  readonly most: number;
}

/**
 * Plans a run's lengths onto bolts: first as many kits as were asked for, then the least scrap, then the fewest bolts
 * touched. Each kit takes one length of a fabric, so fabrics meet only in the number of kits: the fewest that any fabric
 * allows. For each fabric the counts per bolt are chosen by dynamic programming over the bolts, which is exact; every
 * plan is optimal unless a person stops it.
 *
 * @returns `no-fabric` when nothing was asked for, `several-lengths` when a fabric occurs twice, `too-many` with the limits.
 */
export async function planBolts(input: BoltPlanInput, _budget: { readonly nodes: number }, _solver: null, control?: PlanControl): Promise<Result<BoltPlan, "no-fabric" | "several-lengths" | "too-many">> {
  const refusal = refuse(input);
  if (refusal) return refusal;
  const stocks = input.lengths.map((want) => stockOf(want, input));
  const mostKits = Math.min(...stocks.map((stock) => stock.most));
  const kits = Math.min(input.kits, mostKits);
  const cuts: PlannedCut[] = [];
  let scrap = 0;
  let boltsTouched = 0;
  for (const [index, stock] of stocks.entries()) {
    control?.progress?.({ done: index / stocks.length, sentence: `${index} of ${stocks.length} fabrics laid on their bolts.` });
    const chosen = choose(stock, kits);
    scrap += chosen.scrap;
    boltsTouched += chosen.touched;
    cuts.push(...layCuts(stock, chosen.counts));
  }
  const order = new Map(input.bolts.map((bolt) => [bolt.tag, bolt.shelfOrder]));
  cuts.sort((a, b) => (order.get(a.bolt) ?? 0) - (order.get(b.bolt) ?? 0) || a.startsAt - b.startsAt);
  return ok({ status: "optimal", kits, cuts, scrap: length(scrap), boltsTouched, mostKits, ...limits(stocks, input.kits, mostKits) });
}

function refuse({ kits, lengths, bolts }: BoltPlanInput) {
  if (lengths.length === 0) return fail("no-fabric", "The kit has no fabric to cut.");
  if (!Number.isSafeInteger(kits) || kits < 0 || kits > MOST_KITS || bolts.length > MOST_BOLTS) {
    return fail("too-many", `A plan takes from 0 to ${MOST_KITS} kits and up to ${MOST_BOLTS} bolts; ${kits} kits on ${bolts.length} bolts were asked for.`);
  }
  if (new Set(lengths.map((each) => each.fabric)).size < lengths.length) {
    return fail("several-lengths", "A fabric occurs twice in the kit. Join its lengths into one.");
  }
  return null;
}

function stockOf(want: KitLength, { bolts, straightening, saleableRemnant }: BoltPlanInput): FabricStock {
  const rules: LayRules = { length: want.length, straightening, saleableRemnant };
  const fitting = bolts
    .filter((bolt) => bolt.fabric === want.fabric && bolt.usableWidth >= want.plannedWidth)
    .sort((a, b) => a.shelfOrder - b.shelfOrder)
    .map((bolt) => ({ bolt, lays: laysOf(bolt, rules) }));
  return { want, rules, bolts: fitting, most: fitting.reduce((sum, each) => sum + each.lays.length - 1, 0) };
}

interface Choice {
  readonly scrap: number;
  readonly touched: number;
  readonly counts: readonly number[];
}

/**
 * How many lengths each bolt gives: best[n] is the least (scrap, bolts touched) of the bolts so far with n lengths on
 * them, and the step remembers what the last bolt gave. O(bolts × kits × lengths on a bolt).
 */
function choose({ bolts }: FabricStock, kits: number): Choice {
  let best: ({ scrap: number; touched: number } | null)[] = [{ scrap: 0, touched: 0 }, ...new Array<null>(kits).fill(null)];
  const steps: number[][] = [];
  for (const { lays } of bolts) {
    const next = new Array<{ scrap: number; touched: number } | null>(kits + 1).fill(null);
    const step = new Array<number>(kits + 1).fill(0);
    for (let total = 0; total <= kits; total += 1) {
      for (const lay of lays) {
        if (lay.count > total) break;
        const before = best[total - lay.count];
        if (!before) continue;
        const candidate = { scrap: before.scrap + lay.scrap, touched: before.touched + (lay.count > 0 ? 1 : 0) };
        if (isBetter(candidate, next[total] ?? null)) {
          next[total] = candidate;
          step[total] = lay.count;
        }
      }
    }
    best = next;
    steps.push(step);
  }
  const end = best[kits];
  if (!end) throw new Error("More kits were laid out than the bolts allow.");
  let total = kits;
  const counts = steps.map(() => 0);
  for (let index = steps.length - 1; index >= 0; index -= 1) {
    counts[index] = steps[index]?.[total] ?? 0;
    total -= counts[index] ?? 0;
  }
  return { ...end, counts };
}

function isBetter(a: { scrap: number; touched: number }, b: { scrap: number; touched: number } | null): boolean {
  return b === null || a.scrap < b.scrap || (a.scrap === b.scrap && a.touched < b.touched);
}

function layCuts({ bolts, rules }: FabricStock, counts: readonly number[]): PlannedCut[] {
  let kit = 1;
  return bolts.flatMap(({ bolt }, index) => {
    const count = counts[index] ?? 0;
    const cuts = count > 0 ? cutsOf(bolt, rules, count, kit) : [];
    kit += count;
    return cuts;
  });
}

function limits(stocks: readonly FabricStock[], asked: number, mostKits: number): Pick<BoltPlan, "allows" | "limiting" | "reason"> {
  const allows = stocks.map((stock) => ({ fabric: stock.want.fabric, kits: stock.most }));
  const tightest = stocks.find((stock) => stock.most === mostKits);
  const name = tightest?.want.name ?? tightest?.want.fabric ?? "";
  const limiting = tightest ? tightest.want.fabric : null;
  if (mostKits > asked) return { allows, limiting, reason: `The bolts would allow ${mostKits}; ${name} allows the fewest.` };
  if (tightest && tightest.bolts.length === 0) return { allows, limiting, reason: `No bolt of ${name} on the shelf is wide enough and has cloth left.` };
  return { allows, limiting, reason: `${name} limits the run to ${counted(mostKits)}: none of its bolts has room for one more length between its flaws and what is promised.` };
}

function counted(kits: number): string {
  return kits === 1 ? "1 kit" : `${kits} kits`;
}

