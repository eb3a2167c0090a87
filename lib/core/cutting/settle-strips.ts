import type { StripPattern } from "./fill-strip";
import type { StripGroup } from "./strip-layout";
import type { Relaxation, StripMaster } from "./strip-master";
import type { StripSearch } from "./strip-search";

/** Columns given to the integer programme at most: beyond that its nodes become too slow to be worth it. */
const MOST_COLUMNS = 6000;

/**
 * The integer finish. A shorter layout can only use strips whose reduced cost is below what still separates the best
 * layout from the relaxation, so when those can be listed, the integer programme over them either finds a shorter
 * layout or proves that there is none. When there are too many, the cheapest are taken and nothing is proved.
 */
export async function settleByInteger(search: StripSearch, master: StripMaster, relaxation: Relaxation): Promise<void> {
  const { problem, meter } = search;
  const demand = problem.kinds.map((kind) => kind.demand);
  // Every length is whole in along units: what is looked for is shorter by one at least.
  const gap = search.best.length - 1 - relaxation.bound;
  const all = listPatterns(search, relaxation, demand, gap);
  const patterns = merge(master, problem.heights, relaxation, all ?? [], gap, search.best.groups);
  meter.patterns += Math.max(0, patterns.length - master.pool.length);
  const rows = [
    ...demand.map((lower) => ({ lower, upper: Infinity })),
    ...master.required.map((lower) => ({ lower, upper: Infinity })),
  ];
  const columns = patterns.map((pattern) => ({ cost: problem.heights[pattern.height] ?? 0, ...master.entries(pattern), lower: 0, upper: mostTimes(pattern, demand) }));
  const answer = await search.solver.solveInteger({
    rows,
    columns,
    start: patterns.map((pattern) => search.best.groups.find((group) => nameOf(group) === nameOf(pattern))?.times ?? 0),
    nodes: meter.nodesLeft,
    gap: 0.999,
    stopped: () => meter.stopped,
  });
  meter.nodes += answer.nodes;
  meter.programmes += 1;
  const before = search.best.length;
  if (answer.values) {
    const { values } = answer;
    search.offer(patterns.flatMap((pattern, index): StripGroup[] => {
      const times = Math.round(values[index] ?? 0);
      return times > 0 ? [{ ...pattern, times }] : [];
    }));
  }
  if (all) search.raise(Math.min(before, answer.status === "infeasible" ? before : Math.ceil(answer.bound - 1e-6)));
}

/** All strips that a layout shorter by one can use; null when there are too many. */
function listPatterns(search: StripSearch, relaxation: Relaxation, demand: readonly number[], gap: number): StripPattern[] | null {
  const patterns: StripPattern[] = [];
  for (let height = 0; height < search.problem.heights.length; height++) {
    const least = (relaxation.stripCosts[height] ?? 0) - gap - 1e-6;
    const found = search.filler.fillings(height, relaxation.prices, demand, least, MOST_COLUMNS - patterns.length);
    if (!found) return null;
    for (const counts of found) if (usesHeight(search, height, counts)) patterns.push({ height, counts });
  }
  return patterns;
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

/** The pool's own strips of small reduced cost and those of the best layout join the listed ones; each once. */
function merge(master: StripMaster, heights: readonly number[], relaxation: Relaxation, listed: readonly StripPattern[], gap: number, best: readonly StripGroup[]): StripPattern[] {
  const known = new Map<string, StripPattern>();
  for (const pattern of listed) known.set(nameOf(pattern), pattern);
  for (const pattern of master.pool) {
    const worth = pattern.counts.reduce((total, count, kind) => total + count * (relaxation.prices[kind] ?? 0), 0);
    if ((relaxation.stripCosts[pattern.height] ?? 0) - worth <= Math.max(gap, 0.02 * (heights[pattern.height] ?? 0))) known.set(nameOf(pattern), pattern);
  }
  // The best layout is the search's start, so its strips must be there.
  for (const group of best) known.set(nameOf(group), { height: group.height, counts: group.counts });
  return [...known.values()];
}

function nameOf(pattern: StripPattern): string {
  return `${pattern.height}:${pattern.counts.join(",")}`;
}

function mostTimes(pattern: StripPattern, demand: readonly number[]): number {
  return pattern.counts.reduce((most, count, kind) => (count > 0 ? Math.max(most, Math.ceil((demand[kind] ?? 0) / count)) : most), 0);
}
