import { length, type Length } from "../measure/length";
import type { PlanBolt, PlannedCut, Segment } from "../piece/bolt-plan";
import type { CountGrid } from "./bolt-counts";
import { fits } from "./fits";
import { segmentLength, segmentsOf } from "./segments";

/** What a bolt is asked for, and what counts as scrap. */
export interface LayRules {
  /** The different lengths wanted of the fabric, each above nothing. */
  readonly lengths: readonly Length[];
  readonly straightening: Length;
  readonly saleableRemnant: Length;
}

/** One bolt with so many of each length on it. */
export interface BoltLay {
  /** Index of the counts in the grid. */
  readonly index: number;
  /** Stretches that nobody can buy any more, made by this lay: before flaws that it passes, and behind its last length. */
  readonly scrap: number;
  /** Where the bolt's cut edge lies afterwards. */
  readonly edge: Length;
  /** Per segment from the cut edge on, the index of what is cut from it. */
  readonly taken: readonly number[];
}

interface Passed {
  readonly scrap: number;
  readonly taken: readonly number[];
}

/**
 * The best lay for every count that a bolt can give, nothing cut first. Cuts go from the cut edge on, so whatever a segment
 * before the last one keeps becomes a piece to sell or scrap; what is promised to others must fit behind the last
 * length. Dynamic programming over the segments, exact: the least scrap, then the nearest edge.
 */
export function laysOf(bolt: PlanBolt, rules: LayRules, grid: CountGrid): BoltLay[] {
  const best = new Map<number, BoltLay>([[0, { index: 0, scrap: 0, edge: bolt.cutEdge, taken: [] }]]);
  let passed = new Map<number, Passed>([[0, { scrap: 0, taken: [] }]]);
  for (const segment of freshSegments(bolt, rules)) {
    const room = segmentLength(segment);
    const ways = waysIn(room, rules.lengths, grid);
    const ends = ways.flatMap((way) => (way.used > 0 ? endAt(bolt, rules, segment, way) : []));
    const next = new Map<number, Passed>();
    for (const [from, before] of passed) {
      for (const end of ends) {
        const index = grid.sum(from, end.index);
        if (index === null) continue;
        const lay = { index, scrap: before.scrap + end.scrap, edge: end.edge, taken: [...before.taken, end.index] };
        if (isBetterLay(lay, best.get(index))) best.set(index, lay);
      }
      for (const way of ways) {
        const index = grid.sum(from, way.index);
        if (index === null) continue;
        const scrap = before.scrap + underRemnant(room - way.used, rules);
        if (scrap < (next.get(index)?.scrap ?? Infinity)) next.set(index, { scrap, taken: [...before.taken, way.index] });
      }
    }
    passed = next;
  }
  return [...best.values()].sort((a, b) => a.index - b.index);
}

function isBetterLay(a: BoltLay, b: BoltLay | undefined): boolean {
  return b === undefined || a.scrap < b.scrap || (a.scrap === b.scrap && a.edge < b.edge);
}

interface Way {
  readonly index: number;
  readonly used: number;
}

/** Everything that one stretch can give, nothing first. */
function waysIn(room: number, lengths: readonly Length[], grid: CountGrid): Way[] {
  let ways: Way[] = [{ index: 0, used: 0 }];
  for (const [kind, each] of lengths.entries()) {
    const most = grid.most[kind] ?? 0;
    const stride = grid.strides[kind] ?? 1;
    ways = ways.flatMap(({ index, used }) => Array.from({ length: Math.min(most, Math.floor((room - used) / each)) + 1 }, (_, count) => ({ index: index + count * stride, used: used + count * each })));
  }
  return ways;
}

/** The lay's last segment, or none when what is promised would no longer fit behind it. */
function endAt(bolt: PlanBolt, rules: LayRules, segment: Segment, { index, used }: Way): { index: number; edge: Length; scrap: number }[] {
  const edge = length(segment.startsAt + used);
  const rest = segmentsOf({ cutEdge: edge, endsAt: bolt.endsAt, flaws: bolt.flaws });
  if (bolt.reserved.length > 0 && !fits(rest, bolt.reserved).fits) return [];
  return [{ index, edge, scrap: scrapBehind(bolt, rules, rest, segment.endsAt - edge) }];
}

/**
 * What the last length leaves useless. Nothing promised: the rest of its stretch when too short to sell. With promises:
 * what all the cloth left has over them when that is too little to sell; or the rest of the stretch when it is too short
 * for any promise as well.
 */
function scrapBehind(bolt: PlanBolt, rules: LayRules, rest: readonly Segment[], tail: number): number {
  const promises = bolt.reserved.filter((each) => each.count > 0);
  if (promises.length === 0) return underRemnant(tail, rules);
  const over = rest.reduce((sum, segment) => sum + segmentLength(segment), 0) - promises.reduce((sum, each) => sum + each.length * each.count, 0);
  if (over < rules.saleableRemnant) return over;
  return promises.every((each) => tail < each.length) ? underRemnant(tail, rules) : 0;
}

function underRemnant(stretch: number, { saleableRemnant }: LayRules): number {
  return stretch < saleableRemnant ? stretch : 0;
}

/** The segments with the straightening off, which is taken once, when a bolt is first cut. */
function freshSegments(bolt: PlanBolt, { straightening }: LayRules): Segment[] {
  const cutEdge = bolt.cutEdge === 0 ? Math.min(straightening, bolt.endsAt) : bolt.cutEdge;
  return segmentsOf({ cutEdge: length(cutEdge), endsAt: bolt.endsAt, flaws: bolt.flaws });
}

/**
 * The cuts of a lay from the cut edge on, without a gap: straightening, lengths, and what lies before and in a flaw. A
 * stretch before a flaw that can be sold is a piece; all else between lengths is waste.
 *
 * @param nextKit the kit that the next length of a kind is for.
 */
export function cutsOf(bolt: PlanBolt, rules: LayRules, lay: BoltLay, grid: CountGrid, nextKit: (kind: number) => number): PlannedCut[] {
  const cuts: PlannedCut[] = [];
  let at: number = bolt.cutEdge;
  const cut = (to: number, purpose: PlannedCut["purpose"], kit: number | null) => {
    if (to > at) cuts.push({ bolt: bolt.tag, startsAt: length(at), endsAt: length(to), kit, fabric: bolt.fabric, purpose });
    at = Math.max(at, to);
  };
  const segments = freshSegments(bolt, rules);
  for (const [place, taken] of lay.taken.entries()) {
    const segment = segments[place];
    if (!segment) throw new Error("A lay has more stretches than its bolt.");
    cut(segment.startsAt, "waste", null);
    for (const [kind, count] of grid.countsOf(taken).entries()) {
      for (let piece = 0; piece < count; piece += 1) cut(at + (rules.lengths[kind] ?? 0), "kit", nextKit(kind));
    }
    const rest = segment.endsAt - at;
    if (place < lay.taken.length - 1 && rest > 0 && rest >= rules.saleableRemnant) cut(segment.endsAt, "piece", null);
  }
  return cuts;
}
