import type { StripProblem } from "./strip-problem";
import type { StripPattern } from "./fill-strip";

/** Strips of one sort: `times` of them with the same pieces. Heights are indices into `problem.heights`. */
export interface StripGroup {
  readonly height: number;
  readonly counts: readonly number[];
  readonly times: number;
}

/** A way to cut everything, as groups of equal strips, and its length in along units. */
export interface Layout {
  readonly groups: readonly StripGroup[];
  readonly length: number;
}

/**
 * Takes off what is cut beyond demand, from the widest strips first, and narrows each strip to its widest piece.
 * Null when the strips do not cover the demand.
 */
export function trimLayout(problem: StripProblem, strips: readonly StripGroup[]): Layout | null {
  const surplus = problem.kinds.map((kind, index) => strips.reduce((total, strip) => total + strip.times * (strip.counts[index] ?? 0), 0) - kind.demand);
  if (surplus.some((count) => count < 0)) return null;
  const single = strips.flatMap((strip) => Array.from({ length: strip.times }, () => ({ height: strip.height, counts: [...strip.counts] })));
  single.sort((a, b) => b.height - a.height);
  dropWhatNarrows(problem, single, surplus);
  for (const strip of single.reverse()) {
    strip.counts.forEach((count, kind) => {
      const dropped = Math.min(count, surplus[kind] ?? 0);
      strip.counts[kind] = count - dropped;
      surplus[kind] = (surplus[kind] ?? 0) - dropped;
    });
    strip.height = narrowest(problem, strip.counts, strip.height);
  }
  return gather(problem, single);
}

/** Where a strip's widest pieces are all surplus, taking them off makes the strip narrower; the largest gains first. */
function dropWhatNarrows(problem: StripProblem, strips: { height: number; counts: number[] }[], surplus: number[]): void {
  for (const strip of strips) {
    for (;;) {
      const height = narrowest(problem, strip.counts, strip.height);
      if (height < 0) break;
      strip.height = height;
      const widest = strip.counts.map((count, kind) => (count > 0 && !lies(problem, kind, strip.counts, height) ? kind : -1)).filter((kind) => kind >= 0);
      if (widest.length === 0 || widest.some((kind) => (strip.counts[kind] ?? 0) > (surplus[kind] ?? 0))) break;
      for (const kind of widest) {
        surplus[kind] = (surplus[kind] ?? 0) - (strip.counts[kind] ?? 0);
        strip.counts[kind] = 0;
      }
    }
  }
}

/** Whether the kind could stay if the strip were one step narrower, the others gone. */
function lies(problem: StripProblem, kind: number, counts: readonly number[], height: number): boolean {
  const across = problem.across[height - 1]?.[kind] ?? 0;
  return across > 0 && (counts[kind] ?? 0) * across + (problem.kinds[kind]?.endWaste ?? 0) <= problem.width;
}

/** The narrowest strip that holds these pieces, or -1 when there are none. */
export function narrowest(problem: StripProblem, counts: readonly number[], from: number): number {
  if (counts.every((count) => count === 0)) return -1;
  let height = from;
  while (height > 0 && holds(problem, height - 1, counts)) height -= 1;
  return height;
}

export function holds(problem: StripProblem, height: number, counts: readonly number[]): boolean {
  return roomTaken(problem, height, counts) <= problem.width;
}

/** Room along the strip, or Infinity where a piece is too long for it. */
export function roomTaken(problem: StripProblem, height: number, counts: readonly number[]): number {
  const widths = problem.across[height] ?? [];
  return counts.reduce((total, count, kind) => {
    if (count === 0) return total;
    const across = widths[kind] ?? 0;
    return across === 0 ? Infinity : total + count * across + (problem.kinds[kind]?.endWaste ?? 0);
  }, 0);
}

/** Equal strips together, widest first; empty strips are dropped. */
export function gather(problem: StripProblem, strips: readonly StripPattern[]): Layout {
  const groups = new Map<string, { height: number; counts: readonly number[]; times: number }>();
  for (const strip of strips) {
    if (strip.height < 0 || strip.counts.every((count) => count === 0)) continue;
    const name = `${strip.height}:${strip.counts.join(",")}`;
    const group = groups.get(name);
    if (group) group.times += 1;
    else groups.set(name, { height: strip.height, counts: strip.counts, times: 1 });
  }
  const sorted = [...groups.values()].sort((a, b) => b.height - a.height || b.times - a.times || compare(b.counts, a.counts));
  return { groups: sorted, length: sorted.reduce((total, group) => total + group.times * (problem.heights[group.height] ?? 0), 0) };
}

function compare(a: readonly number[], b: readonly number[]): number {
  const at = a.findIndex((count, index) => count !== b[index]);
  return at < 0 ? 0 : (a[at] ?? 0) - (b[at] ?? 0);
}
