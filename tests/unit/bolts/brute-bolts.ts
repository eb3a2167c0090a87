import type { BoltPlanInput, PlanBolt } from "@/lib/core/piece/bolt-plan";

/** What a bolt can give: count of each length, and the least scrap with it. */
export type Options = Map<string, { counts: number[]; scrap: number }>;

/**
 * Every way to cut lengths from a tiny bolt, unit by unit: at each place a length begins, or one unit is let go. What
 * is let go between flaws and lengths is one stretch; it is scrap when it is too short to sell.
 */
export function bruteOptions(bolt: PlanBolt, lengths: readonly number[], { straightening, saleableRemnant }: Pick<BoltPlanInput, "straightening" | "saleableRemnant">): Options {
  const start = bolt.cutEdge === 0 ? Math.min(straightening, bolt.endsAt) : bolt.cutEdge;
  const isFlawed = (at: number) => bolt.flaws.some((flaw) => flaw.startsAt <= at && at < flaw.endsAt);
  const orders = permutations(bolt.reserved.flatMap((each) => new Array<number>(each.count).fill(each.length)));
  const holds = (edge: number) => orders.some((order) => canLay(order, edge));
  const canLay = ([next, ...others]: number[], from: number): boolean => {
    if (next === undefined) return true;
    for (let at = from; at + next <= bolt.endsAt; at += 1) if (isClear(at, at + next) && canLay(others, at + next)) return true;
    return false;
  };
  const isClear = (from: number, to: number) => to <= bolt.endsAt && Array.from({ length: to - from }, (_, index) => from + index).every((at) => !isFlawed(at));
  const small = (stretch: number) => (stretch < saleableRemnant ? stretch : 0);
  const promised = bolt.reserved.filter((each) => each.count > 0);
  const tailScrap = (edge: number) => {
    let tail = 0;
    while (edge + tail < bolt.endsAt && !isFlawed(edge + tail)) tail += 1;
    const left = Array.from({ length: bolt.endsAt - edge }, (_, index) => edge + index).filter((at) => !isFlawed(at)).length;
    const over = left - promised.reduce((sum, each) => sum + each.length * each.count, 0);
    if (promised.length > 0 && over < saleableRemnant) return over;
    return promised.every((each) => each.length > tail) ? small(tail) : 0;
  };
  const options: Options = new Map();
  const offer = (counts: number[], scrap: number) => {
    const known = options.get(counts.join());
    if (!known || scrap < known.scrap) options.set(counts.join(), { counts, scrap });
  };
  const go = (at: number, counts: number[], scrap: number, open: number) => {
    for (const [kind, each] of lengths.entries()) {
      if (!isClear(at, at + each)) continue;
      const now = counts.map((count, other) => count + (other === kind ? 1 : 0));
      const lost = scrap + small(open);
      if (holds(at + each)) offer(now, lost + tailScrap(at + each));
      go(at + each, now, lost, 0);
    }
    if (at >= bolt.endsAt) return;
    if (isFlawed(at)) go(at + 1, counts, scrap + small(open), 0);
    else go(at + 1, counts, scrap, open + 1);
  };
  offer(lengths.map(() => 0), 0);
  go(start, lengths.map(() => 0), 0, 0);
  return options;
}

/** Every choice of an option per bolt: the least (scrap, touched) for each count of lengths. */
export function bruteTotals(options: readonly Options[], kinds: number): Map<string, { counts: number[]; scrap: number; touched: number }> {
  let totals = new Map([[new Array<number>(kinds).fill(0).join(), { counts: new Array<number>(kinds).fill(0), scrap: 0, touched: 0 }]]);
  for (const each of options) {
    const next = new Map<string, { counts: number[]; scrap: number; touched: number }>();
    for (const before of totals.values()) {
      for (const option of each.values()) {
        const counts = before.counts.map((count, kind) => count + (option.counts[kind] ?? 0));
        const total = { counts, scrap: before.scrap + option.scrap, touched: before.touched + (option.counts.some((count) => count > 0) ? 1 : 0) };
        const known = next.get(counts.join());
        if (!known || total.scrap < known.scrap || (total.scrap === known.scrap && total.touched < known.touched)) next.set(counts.join(), total);
      }
    }
    totals = next;
  }
  return totals;
}

function permutations(list: number[]): number[][] {
  return list.length < 2 ? [list] : list.flatMap((each, at) => permutations([...list.slice(0, at), ...list.slice(at + 1)]).map((rest) => [each, ...rest]));
}
