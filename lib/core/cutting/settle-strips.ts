import type { StripPattern } from "./fill-strip";
import type { IntegerQuestion } from "./solver";
import type { StripGroup } from "./strip-layout";
import type { Relaxation, StripMaster } from "./strip-master";
import type { StripSearch } from "./strip-search";

/** Strips listed at most; listing more costs more than it brings. */
const MOST_LISTED = 20_000;
/** Strips given to an integer programme that is to find a shorter layout: few, so that its nodes are quick. */
const COLUMNS_TO_FIND = 400;
/** Strips given to the one that is to prove there is none. */
const COLUMNS_TO_PROVE = 3000;
/** How often the gap is halved before the listing is given up. */
const MOST_HALVINGS = 12;
/** Of what is left of the budget, spent on each attempt to find. */
const FIRST_SHARE = 0.6;
/** Up to so many strips the integer programme counts the strips of each width. */
const FEW_STRIPS = 200;
/** Simplex iterations times columns that cost as much as a node of the budget. */
const WORK_OF_A_NODE = 8000;

interface Listed extends StripPattern {
  readonly reducedCost: number;
}

/**
 * The integer finish. A shorter layout can only use strips whose reduced cost is below what still separates the best
 * layout from the relaxation (reduced-cost fixing), so an integer programme over all of those either finds a shorter
 * layout or proves that there is none. First the cheapest are tried for as long as that shortens the layout, which
 * leaves fewer that matter; then more.
 */
export async function settleByInteger(search: StripSearch, master: StripMaster, relaxation: Relaxation): Promise<void> {
  const gapTo = (length: number) => Math.max(0, length - 1 - relaxation.bound);
  let { listed, upTo } = listStrips(search, relaxation, gapTo(search.best.length));
  for (;;) {
    if (search.settled || search.meter.spent) return;
    const gap = gapTo(search.best.length);
    listed = listed.filter((each) => each.reducedCost <= gap + 1e-6);
    if (upTo < gap && listed.length < COLUMNS_TO_FIND / 2) ({ listed, upTo } = listStrips(search, relaxation, gap));
    const before = search.best.length;
    // A plan that uses a strip left out costs at least so much; where none that matters is left out, it is no shorter.
    const without = (count: number) => (listed.length <= count && upTo >= gap ? before : relaxation.bound + (listed[count]?.reducedCost ?? upTo));
    await solveOver(search, master, listed.slice(0, COLUMNS_TO_FIND), without(COLUMNS_TO_FIND), FIRST_SHARE);
    if (search.best.length < before) continue;
    if (search.settled || listed.length <= COLUMNS_TO_FIND || search.meter.spent) return;
    await solveOver(search, master, listed.slice(0, COLUMNS_TO_PROVE), without(COLUMNS_TO_PROVE), 1);
    if (search.best.length === before) return;
  }
}

/** Solves over the strips given. A plan costs no less than what that proves, or it uses another strip and costs no less than `otherwise`. */
async function solveOver(search: StripSearch, master: StripMaster, listed: readonly StripPattern[], otherwise: number, share: number): Promise<void> {
  const { meter } = search;
  const nodes = Math.ceil(meter.nodesLeft * share);
  const patterns = withStart(listed, search.best.groups);
  const question = questionOver(search, master, patterns);
  const answer = await search.solver.solveInteger({
    ...question,
    nodes,
    iterations: Math.ceil((nodes * WORK_OF_A_NODE) / (patterns.length + 100)),
    gap: 0.999,
    stopped: () => meter.stopped,
  });
  meter.nodes += Math.max(answer.nodes, Math.ceil((answer.iterations * (patterns.length + 100)) / WORK_OF_A_NODE));
  meter.programmes += 1;
  const { values } = answer;
  if (values) {
    search.offer(patterns.flatMap((pattern, index): StripGroup[] => {
      const times = Math.round(values[index] ?? 0);
      return times > 0 ? [{ ...pattern, times }] : [];
    }));
  }
  search.raise(Math.min(answer.bound, otherwise));
  await meter.pause();
}

/**
 * The restricted master as an integer programme, the best layout its start. For a short layout the number of strips of
 * each width becomes a whole column of its own, so that the search can branch on it: that closes what single strips
 * leave open. For long ones it only slows the search down.
 */
function questionOver(search: StripSearch, master: StripMaster, patterns: readonly StripPattern[]): Pick<IntegerQuestion, "rows" | "columns" | "start"> {
  const { kinds, heights } = search.problem;
  const demand = kinds.map((kind) => kind.demand);
  const rows = [...demand, ...master.required].map((lower) => ({ lower, upper: Infinity }));
  const start = patterns.map((pattern) => search.best.groups.find((group) => nameOf(group) === nameOf(pattern))?.times ?? 0);
  const cost = (height: number) => heights[height] ?? 0;
  const columns = patterns.map((pattern) => ({ cost: cost(pattern.height), ...master.entries(pattern), lower: 0, upper: mostTimes(pattern, demand) }));
  if (search.best.groups.reduce((total, group) => total + group.times, 0) > FEW_STRIPS) return { rows, columns, start };
  const used = [...new Set(patterns.map((pattern) => pattern.height))].sort((a, b) => a - b);
  return {
    rows: [...rows, ...used.map(() => ({ lower: 0, upper: 0 }))],
    columns: [
      ...columns.map((column, index) => ({ ...column, cost: 0, rows: [...column.rows, rows.length + used.indexOf(patterns[index]?.height ?? 0)], values: [...column.values, -1] })),
      ...used.map((height, index) => ({ cost: cost(height), rows: [rows.length + index], values: [1], lower: 0, upper: Infinity })),
    ],
    start: [...start, ...used.map((height) => start.reduce((total, times, index) => (patterns[index]?.height === height ? total + times : total), 0))],
  };
}

/** Strips by reduced cost, cheapest first, complete up to the gap returned: less than asked for where there are too many. */
export function listStrips(search: StripSearch, relaxation: Relaxation, gap: number): { listed: Listed[]; upTo: number } {
  let upTo = gap;
  for (let halved = 0; halved < MOST_HALVINGS; halved++, upTo /= 2) {
    const listed = listUpTo(search, relaxation, upTo);
    if (!listed) continue;
    search.meter.patterns += listed.length;
    return { listed: listed.sort((a, b) => a.reducedCost - b.reducedCost || a.height - b.height), upTo };
  }
  return { listed: [], upTo: 0 };
}

function listUpTo(search: StripSearch, relaxation: Relaxation, gap: number): Listed[] | null {
  const { problem, filler } = search;
  const demand = problem.kinds.map((kind) => kind.demand);
  const listed: Listed[] = [];
  for (let height = 0; height < problem.heights.length; height++) {
    const cost = relaxation.stripCosts[height] ?? 0;
    const found = filler.fillings(height, relaxation.prices, demand, cost - gap - 1e-6, MOST_LISTED - listed.length);
    if (!found) return null;
    for (const counts of found) {
      if (!usesHeight(search, height, counts)) continue;
      const worth = counts.reduce((total, count, kind) => total + count * (relaxation.prices[kind] ?? 0), 0);
      listed.push({ height, counts, reducedCost: cost - worth });
    }
  }
  return listed;
}

/** A strip whose pieces all lie in a narrower one is never needed. */
function usesHeight(search: StripSearch, height: number, counts: readonly number[]): boolean {
  if (height === 0) return true;
  const { across, kinds, width } = search.problem;
  const narrower = across[height - 1] ?? [];
  let taken = 0;
  for (const [kind, count] of counts.entries()) {
    if (count === 0) continue;
    if (!narrower[kind]) return true;
    taken += count * (narrower[kind] ?? 0) + (kinds[kind]?.endWaste ?? 0);
  }
  return taken > width;
}

/** The best layout is the search's start, so its strips must be there. */
function withStart(listed: readonly StripPattern[], best: readonly StripGroup[]): StripPattern[] {
  const known = new Map(listed.map((pattern) => [nameOf(pattern), pattern]));
  for (const group of best) known.set(nameOf(group), { height: group.height, counts: group.counts });
  return [...known.values()];
}

function nameOf(pattern: StripPattern): string {
  return `${pattern.height}:${pattern.counts.join(",")}`;
}

function mostTimes(pattern: StripPattern, demand: readonly number[]): number {
  return pattern.counts.reduce((most, count, kind) => (count > 0 ? Math.max(most, Math.ceil((demand[kind] ?? 0) / count)) : most), 0);
}
