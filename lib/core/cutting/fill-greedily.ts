import type { StripFiller } from "./fill-strip";
import { mostOf } from "./fill-strip";
import type { StripGroup } from "./strip-layout";
import type { StripProblem } from "./strip-problem";

/** Strips of the best value for their width, one after the other, each repeated as often as its pieces are wanted. */
export function fillByValue(problem: StripProblem, filler: StripFiller, wanted: readonly number[], values: readonly number[], widestFirst: boolean): StripGroup[] {
  const left = [...wanted];
  const strips: StripGroup[] = [];
  while (left.some((count) => count > 0)) {
    const heights = widestFirst ? tallestWanted(problem, left) : problem.heights.map((_, index) => index);
    let best: { height: number; counts: number[]; ratio: number } | null = null;
    for (const height of heights) {
      const { value, counts } = filler.fill(height, values, left);
      const ratio = value / (problem.heights[height] ?? 1);
      if (value > 0 && (!best || ratio > best.ratio + 1e-12)) best = { height, counts, ratio };
    }
    if (!best) throw new Error("A wanted piece has no value: give every kind a value above zero.");
    const { counts } = best;
    const times = counts.reduce((least, count, kind) => (count > 0 ? Math.min(least, Math.floor((left[kind] ?? 0) / count)) : least), Infinity);
    counts.forEach((count, kind) => (left[kind] = (left[kind] ?? 0) - count * times));
    strips.push({ height: best.height, counts, times });
  }
  return strips;
}

/** The heights at which the piece that needs the widest strip can lie; a strip for it has to be cut in any case. */
function tallestWanted(problem: StripProblem, left: readonly number[]): number[] {
  const needed = problem.kinds.map((kind, index) => ((left[index] ?? 0) > 0 ? Math.min(...kind.ways.map((way) => way.along)) : 0));
  const tallest = Math.max(...needed);
  const kind = needed.indexOf(tallest);
  const ways = problem.kinds[kind]?.ways.map((way) => way.along) ?? [];
  return problem.heights.map((height, index) => (ways.includes(height) && height >= tallest ? index : -1)).filter((index) => index >= 0);
}

/**
 * First-fit decreasing height (Coffman, Garey, Johnson and Tarjan 1980): pieces as drawn, tallest first, each into the
 * first strip with room for it. The plainest plan, kept as the start and as what the others are compared with.
 */
export function firstFitShelves(problem: StripProblem): StripGroup[] {
  const order = problem.kinds.map((kind, index) => ({ index, along: shelfWay(kind.ways).along })).sort((a, b) => b.along - a.along || a.index - b.index);
  const shelves: { height: number; counts: number[]; room: number }[] = [];
  for (const { index, along } of order) {
    const kind = problem.kinds[index];
    if (!kind) continue;
    const { across } = shelfWay(kind.ways);
    let left = kind.demand;
    for (const shelf of shelves) {
      const count = mostOf(across, kind.endWaste, left, shelf.room);
      if (count === 0) continue;
      shelf.counts[index] = count;
      shelf.room -= count * across + kind.endWaste;
      left -= count;
    }
    while (left > 0) {
      const count = mostOf(across, kind.endWaste, left, problem.width);
      const counts = problem.kinds.map((_, other) => (other === index ? count : 0));
      shelves.push({ height: problem.heights.indexOf(along), counts, room: problem.width - count * across - kind.endWaste });
      left -= count;
    }
  }
  return shelves.map((shelf) => ({ height: shelf.height, counts: shelf.counts, times: 1 }));
}

/** A piece that may be turned lies flat on its shelf, as low as it can. */
function shelfWay(ways: readonly { along: number; across: number }[]): { along: number; across: number } {
  return ways.reduce((lowest, way) => (way.along < lowest.along ? way : lowest), ways[0] ?? { along: 0, across: 0 });
}
