import { length, type Length } from "../measure/length";
import type { PlanBolt, PlannedCut, Segment } from "../piece/bolt-plan";
import { fits } from "./fits";
import { segmentLength, segmentsOf } from "./segments";

/** What a bolt is asked for, and what counts as scrap. */
export interface LayRules {
  readonly length: Length;
  readonly straightening: Length;
  readonly saleableRemnant: Length;
}

/** One bolt with so many lengths on it. */
export interface BoltLay {
  readonly count: number;
  /** Stretches that nobody can buy any more, left behind or left over. */
  readonly scrap: number;
  /** Where the bolt's cut edge lies afterwards. */
  readonly edge: Length;
}

/**
 * All the ways that equal lengths can be laid on one bolt: none of them, one, two … up to the most. Cuts go from the cut
 * edge on, so each segment takes as many as it can before the next begins; what is promised to others must still fit
 * behind the last of them. The array's index is the count.
 */
export function laysOf(bolt: PlanBolt, rules: LayRules): BoltLay[] {
  const lays: BoltLay[] = [{ count: 0, scrap: 0, edge: bolt.cutEdge }];
  const segments = freshSegments(bolt, rules);
  let passed = 0;
  let count = 0;
  for (const segment of segments) {
    const room = Math.floor(segmentLength(segment) / rules.length);
    for (let taken = 1; taken <= room; taken += 1) {
      count += 1;
      const edge = length(segment.startsAt + taken * rules.length);
      const rest = segmentsOf({ cutEdge: edge, endsAt: bolt.endsAt, flaws: bolt.flaws });
      if (!fits(rest, bolt.reserved).fits) return lays;
      lays.push({ count, scrap: passed + scrapLeft(rest, bolt, rules), edge });
    }
    const behind = segmentLength(segment) - room * rules.length;
    if (behind < rules.saleableRemnant) passed += behind;
  }
  return lays;
}

/** The cuts of a lay, from the cut edge on and without a gap: straightening, lengths, and what lies before and in a flaw. */
export function cutsOf(bolt: PlanBolt, rules: LayRules, count: number, firstKit: number): PlannedCut[] {
  const cuts: PlannedCut[] = [];
  let at: number = bolt.cutEdge;
  let left = count;
  const cut = (to: number, purpose: PlannedCut["purpose"], kit: number | null) => {
    if (to > at) cuts.push({ bolt: bolt.tag, startsAt: length(at), endsAt: length(to), kit, fabric: bolt.fabric, purpose });
    at = Math.max(at, to);
  };
  for (const segment of freshSegments(bolt, rules)) {
    if (left === 0) break;
    const rest = segment.startsAt - at;
    // The stretch before a flaw is worth keeping when it can be sold; the flaw itself never is.
    const flawStart = bolt.flaws.reduce((first, flaw) => (flaw.endsAt > at && flaw.startsAt < first ? flaw.startsAt : first), segment.startsAt as number);
    if (rest > 0 && flawStart - at >= rules.saleableRemnant) cut(flawStart, "piece", null);
    cut(segment.startsAt, "waste", null);
    for (let room = Math.floor(segmentLength(segment) / rules.length); room > 0 && left > 0; room -= 1, left -= 1) {
      cut(at + rules.length, "kit", firstKit + count - left);
    }
  }
  return cuts;
}

/** The segments with the straightening off the first, which is taken once, when a bolt is first cut. */
function freshSegments(bolt: PlanBolt, { straightening }: LayRules): Segment[] {
  const cutEdge = bolt.cutEdge === 0 ? Math.min(straightening, bolt.endsAt) : bolt.cutEdge;
  return segmentsOf({ cutEdge: length(cutEdge), endsAt: bolt.endsAt, flaws: bolt.flaws });
}

/** Stretches left on the bolt that are too short to sell; with promises on it, what is over beside them counts as one stretch. */
function scrapLeft(rest: readonly Segment[], bolt: PlanBolt, { saleableRemnant }: LayRules): number {
  const promised = bolt.reserved.reduce((sum, each) => sum + each.length * each.count, 0);
  if (promised > 0) {
    const over = rest.reduce((sum, segment) => sum + segmentLength(segment), 0) - promised;
    return over < saleableRemnant ? over : 0;
  }
  return rest.reduce((sum, segment) => sum + (segmentLength(segment) < saleableRemnant ? segmentLength(segment) : 0), 0);
}
