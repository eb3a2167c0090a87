import { length, type Length } from "../measure/length";
import type { Segment } from "../piece/bolt-plan";
import { fits, type Demand } from "./fits";
import { longestSegment, segmentLength } from "./segments";

export interface Sellable {
  /** What is left less what is promised; nothing where the promises already ask for more. */
  readonly inAll: Length;
  /** The longest single piece that can go while every promise still fits. */
  readonly longest: Length;
  /** The promises themselves fit between the flaws. */
  readonly promisesFit: boolean;
}

/**
 * What of a bolt is free to sell. A longer piece never leaves more room for the promises, so halving finds the longest; where
 * `fits` runs out of work the answer may be too low, never too high.
 *
 * @param nodes the budget of each question to `fits`; its own when not said.
 */
export function sellable(segments: readonly Segment[], reserved: readonly Demand[], nodes?: number): Sellable {
  const left = segments.reduce((sum, segment) => sum + segmentLength(segment), 0);
  const promised = reserved.reduce((sum, demand) => sum + demand.length * Math.max(0, demand.count), 0);
  const inAll = length(Math.max(0, left - promised));
  const longest = longestSegment(segments);
  if (promised === 0) return { inAll, longest, promisesFit: true };
  if (!fits(segments, reserved, nodes).fits) return { inAll, longest: length(0), promisesFit: false };
  if (segments.length === 1) return { inAll, longest: inAll, promisesFit: true };
  let possible = 0;
  let impossible = Math.min(longest, inAll) + 1;
  while (impossible - possible > 1) {
    const middle = Math.floor((possible + impossible) / 2);
    if (fits(segments, [...reserved, { length: length(middle), count: 1 }], nodes).fits) possible = middle;
    else impossible = middle;
  }
  return { inAll, longest: length(possible), promisesFit: true };
}
