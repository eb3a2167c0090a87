import { fits, segmentsOf } from "@/lib/core/cutting/fits";
import { length } from "@/lib/core/measure/length";
import type { Segment } from "@/lib/core/piece/bolt-plan";

/** The cloth of a bolt from its first free end; all in 1/160 mm. */
export interface Cloth {
  readonly cutEdge: number;
  readonly putUp: number;
  readonly flaws: readonly { readonly startsAt: number; readonly endsAt: number }[];
}

export interface Demand {
  readonly length: number;
  readonly count: number;
}

/** For a figure that is only shown, so that a page of bolts with many flaws is never slow: it may then be too low, never too high. */
const NODES_TO_SHOW = 2_000;

/**
 * Whether all demands fit between the flaws at once. A bolt that was never cut is straightened first, once.
 *
 * @param nodes the search's budget; the core's own when not said.
 */
export function clothHolds(cloth: Cloth, demands: readonly Demand[], straightening: number, nodes?: number): boolean {
  const wanted = demands.filter((demand) => demand.count > 0);
  if (wanted.length === 0) return true;
  const segments = segmentsLeft(cloth, cloth.cutEdge === 0 ? straightening : 0);
  return fits(segments, wanted.map((demand) => ({ length: length(demand.length), count: demand.count })), nodes).fits;
}

/** How many of the demand fit beside those that are held already; 0 to its count. Adding one never makes the others fit again, so halving finds it. */
export function howManyFit(cloth: Cloth, held: readonly Demand[], demand: Demand, straightening: number): number {
  if (clothHolds(cloth, [...held, demand], straightening)) return demand.count;
  let fit = 0;
  let not = demand.count;
  while (not - fit > 1) {
    const middle = (fit + not) >> 1;
    if (clothHolds(cloth, [...held, { length: demand.length, count: middle }], straightening)) fit = middle;
    else not = middle;
  }
  return clothHolds(cloth, [...held, { length: demand.length, count: fit }], straightening) ? fit : 0;
}

/** The longest stretch without a flaw. */
export function longestPiece(cloth: Cloth): number {
  return segmentsLeft(cloth, 0).reduce((longest, segment) => Math.max(longest, segment.endsAt - segment.startsAt), 0);
}

/**
 * The longest single piece that can go while everything held still fits. With nothing held the bolt may go to its last
 * thread; with something held, an uncut bolt keeps what straightening takes.
 */
export function toSell(cloth: Cloth, held: readonly Demand[], straightening: number): number {
  const promised = held.filter((demand) => demand.count > 0);
  const longest = longestPiece(cloth);
  if (promised.length === 0) return longest;
  if (!clothHolds(cloth, promised, straightening, NODES_TO_SHOW)) return 0;
  if (cloth.flaws.every((flaw) => flaw.endsAt <= cloth.cutEdge || flaw.startsAt >= cloth.putUp)) {
    const start = cloth.cutEdge === 0 ? straightening : cloth.cutEdge;
    return cloth.putUp - start - promised.reduce((sum, demand) => sum + demand.length * demand.count, 0);
  }
  let fit = 0;
  let not = longest + 1;
  while (not - fit > 1) {
    const middle = Math.floor((fit + not) / 2);
    if (clothHolds(cloth, [...promised, { length: middle, count: 1 }], straightening, NODES_TO_SHOW)) fit = middle;
    else not = middle;
  }
  return fit;
}

function segmentsLeft({ cutEdge, putUp, flaws }: Cloth, straightening: number): readonly Segment[] {
  const startsAt = cutEdge + straightening;
  if (startsAt >= putUp) return [];
  return segmentsOf({
    cutEdge: length(startsAt),
    endsAt: length(putUp),
    flaws: flaws.map((flaw) => ({ startsAt: length(flaw.startsAt), endsAt: length(flaw.endsAt) })),
  });
}
