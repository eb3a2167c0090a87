import { mostOf, type StripPattern } from "./fill-strip";
import type { SolverColumn } from "./solver";
import { trimLayout, type Layout, type StripGroup } from "./strip-layout";
import { listStrips } from "./settle-strips";
import type { Relaxation } from "./strip-master";
import type { StripSearch } from "./strip-search";
import { effortOf, WIDTH_WEIGHT } from "./tidy-layout";

/** Longer plans are left to the tidying that follows: the programme below would cost more than the planning. */
const FEW_STRIPS = 40;
/** Strips looked at, the least costly first. */
const MOST_COLUMNS = 150;
const NODES = 40;
const ITERATIONS = 1500;

/** Whether there is anything to simplify, in a plan short enough for it. */
export function canSimplify(search: StripSearch): boolean {
  const strips = search.best.groups.reduce((total, group) => total + group.times, 0);
  return strips > 1 && strips <= FEW_STRIPS && search.problem.kinds.length > 1;
}

/**
 * Among plans of the length found, looks for one with fewer strip widths and fewer settings of the ruler: an integer
 * programme over strips that a plan of that length can use, the length held. The layout it finds is taken only when
 * it is no longer and less effort to cut.
 */
export async function simplifyLayout(search: StripSearch, relaxation: Relaxation): Promise<void> {
  const { problem, meter, best } = search;
  const strips = best.groups.reduce((total, group) => total + group.times, 0);
  if (meter.stopped) return;
  const patterns = patternsFor(search, relaxation);
  const demand = problem.kinds.map((kind) => kind.demand);
  const heights = [...new Set(patterns.map((pattern) => pattern.height))].sort((a, b) => a - b);
  const lengthRow = demand.length;
  const widthRow = (height: number) => lengthRow + 1 + heights.indexOf(height);
  const columns: SolverColumn[] = patterns.map((pattern) => {
    const kinds = pattern.counts.flatMap((count, kind) => (count > 0 ? [kind] : []));
    return {
      cost: 1 + kinds.length + kinds.filter((kind) => isTrimmed(search, pattern.height, kind)).length,
      rows: [...kinds, lengthRow, widthRow(pattern.height)],
      values: [...kinds.map((kind) => pattern.counts[kind] ?? 0), problem.heights[pattern.height] ?? 0, -1],
      lower: 0,
      upper: strips,
    };
  });
  const answer = await search.solver.solveInteger({
    rows: [...demand.map((lower) => ({ lower, upper: Infinity })), { lower: 0, upper: best.length }, ...heights.map(() => ({ lower: 0, upper: Infinity }))],
    columns: [...columns, ...heights.map((height) => ({ cost: WIDTH_WEIGHT, rows: [widthRow(height)], values: [strips], lower: 0, upper: 1 }))],
    nodes: NODES,
    iterations: ITERATIONS,
    gap: 0.999,
    stopped: () => meter.stopped,
  });
  meter.programmes += 1;
  if (!answer.values) return;
  const { values } = answer;
  const found = trimLayout(problem, patterns.flatMap((pattern, index): StripGroup[] => {
    const times = Math.round(values[index] ?? 0);
    return times > 0 ? [{ ...pattern, times }] : [];
  }));
  if (found && isBetter(search, found, best)) search.best = found;
}

function isBetter(search: StripSearch, found: Layout, best: Layout): boolean {
  if (found.length !== best.length) return found.length < best.length;
  return effortOf(search.problem, found) < effortOf(search.problem, best);
}

/** Strips of one size first, then the mixed ones of least reduced cost. */
function patternsFor(search: StripSearch, relaxation: Relaxation): StripPattern[] {
  const { problem, best } = search;
  const gap = Math.max(0, best.length - relaxation.bound) + 1e-6;
  const reducedCost = (pattern: StripPattern) => (relaxation.stripCosts[pattern.height] ?? 0) - pattern.counts.reduce((total, count, kind) => total + count * (relaxation.prices[kind] ?? 0), 0);
  const patterns = new Map<string, StripPattern>();
  const add = (pattern: StripPattern) => patterns.set(`${pattern.height}:${pattern.counts.join(",")}`, pattern);
  problem.heights.forEach((_, height) => {
    problem.kinds.forEach((kind, index) => {
      const full = mostOf(problem.across[height]?.[index] ?? 0, kind.endWaste, kind.demand, problem.width);
      const pattern = { height, counts: problem.kinds.map((_each, other) => (other === index ? full : 0)) };
      if (full > 0 && reducedCost(pattern) <= gap) add(pattern);
    });
  });
  for (const group of best.groups) add({ height: group.height, counts: group.counts });
  for (const pattern of listStrips(search, relaxation, gap).listed) {
    if (patterns.size >= MOST_COLUMNS) break;
    add(pattern);
  }
  return [...patterns.values()];
}

function isTrimmed(search: StripSearch, height: number, kind: number): boolean {
  const across = search.problem.across[height]?.[kind] ?? 0;
  const along = search.problem.kinds[kind]?.ways.find((way) => way.across === across)?.along ?? 0;
  return along < (search.problem.heights[height] ?? 0);
}
