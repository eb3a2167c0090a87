import { length, type Length } from "../measure/length";
import type { Segment } from "../piece/bolt-plan";
import { segmentLength } from "./segments";

export { segmentsOf } from "./segments";

export interface Demand {
  readonly length: Length;
  readonly count: number;
}

export interface Fit {
  readonly fits: boolean;
  /** Where each piece lies; empty when it does not fit. */
  readonly layout: readonly { readonly segment: number; readonly length: Length }[];
  /** The search ran out of work before it could tell; `fits` is then false, so that nothing is promised unproven. */
  readonly undecided: boolean;
}

/** Bolts have few flaws and few kinds of length: a handful of nodes as a rule, and this many at the worst. */
const NODES = 200_000;

/**
 * Whether all lengths can be laid on the segments, none across two: bin packing with bins of their own sizes, decided
 * exactly. Sums and best fit decreasing (Johnson 1973) settle nearly all questions; the rest is a depth-first search over
 * the pieces from the longest, in which segments of equal rest count as one and a state is never entered twice.
 */
export function fits(segments: readonly Segment[], demands: readonly Demand[], nodes = NODES): Fit {
  const rests = segments.map((segment): number => segmentLength(segment));
  const pieces = demands.flatMap((demand) => Array.from({ length: Math.max(0, demand.count) }, (): number => demand.length)).sort((a, b) => b - a);
  if (pieces.length === 0) return { fits: true, layout: [], undecided: false };
  if (cannotFit(rests, pieces)) return { fits: false, layout: [], undecided: false };
  const placed = bestFit(rests, pieces) ?? search(rests, pieces, nodes);
  if (placed === "undecided") return { fits: false, layout: [], undecided: true };
  if (placed === null) return { fits: false, layout: [], undecided: false };
  return { fits: true, layout: placed.map((segment, index) => ({ segment, length: length(pieces[index] ?? 0) })), undecided: false };
}

/** Three proofs that there is no room: the sums, the longest piece, and the count of pieces over each length. */
function cannotFit(rests: readonly number[], pieces: readonly number[]): boolean {
  const room = rests.reduce((sum, rest) => sum + rest, 0);
  if (pieces.reduce((sum, piece) => sum + piece, 0) > room) return true;
  for (const [index, piece] of pieces.entries()) {
    // The first index + 1 pieces are all at least this long.
    if (rests.reduce((sum, rest) => sum + Math.floor(rest / piece), 0) < index + 1) return true;
  }
  return false;
}

function bestFit(rests: readonly number[], pieces: readonly number[]): number[] | null {
  const left = [...rests];
  const placed: number[] = [];
  for (const piece of pieces) {
    let best = -1;
    for (const [index, rest] of left.entries()) {
      if (rest >= piece && (best < 0 || rest < (left[best] ?? 0))) best = index;
    }
    if (best < 0) return null;
    left[best] = (left[best] ?? 0) - piece;
    placed.push(best);
  }
  return placed;
}

function search(rests: readonly number[], pieces: readonly number[], nodes: number): number[] | null | "undecided" {
  const left = [...rests];
  const placed: number[] = [];
  const seen = new Set<string>();
  const suffix = new Array<number>(pieces.length + 1).fill(0);
  for (let index = pieces.length - 1; index >= 0; index -= 1) suffix[index] = (suffix[index + 1] ?? 0) + (pieces[index] ?? 0);
  const shortest = pieces.at(-1) ?? 1;
  let visited = 0;
  const place = (index: number): boolean => {
    const piece = pieces[index];
    if (piece === undefined) return true;
    if ((visited += 1) > nodes) return false;
    const useful = left.reduce((sum, rest) => sum + (rest >= shortest ? rest : 0), 0);
    if (useful < (suffix[index] ?? 0)) return false;
    const state = `${index}:${[...left].sort((a, b) => a - b).join(",")}`;
    if (seen.has(state)) return false;
    seen.add(state);
    const tried = new Set<number>();
    for (const [segment, rest] of left.entries()) {
      if (rest < piece || tried.has(rest)) continue;
      tried.add(rest);
      left[segment] = rest - piece;
      placed[index] = segment;
      if (place(index + 1)) return true;
      left[segment] = rest;
    }
    return false;
  };
  if (place(0)) return placed.slice(0, pieces.length);
  return visited > nodes ? "undecided" : null;
}
