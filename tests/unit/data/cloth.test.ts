import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { inches } from "@/lib/core/measure/length";
import { clothHolds, howManyFit, longestPiece, toSell, type Cloth, type Demand } from "@/lib/data/stock/cloth";

const STRAIGHTENING = 2;

/** Small cloths in units of one, so that trying everything is quick. */
const cloth = fc
  .record({ cutEdge: fc.nat(6), left: fc.nat(24), flaws: fc.array(fc.tuple(fc.nat(30), fc.integer({ min: 1, max: 3 })), { maxLength: 3 }) })
  .map(({ cutEdge, left, flaws }): Cloth => ({ cutEdge, putUp: cutEdge + left, flaws: flaws.map(([startsAt, size]) => ({ startsAt, endsAt: startsAt + size })) }));
const demands = fc.array(fc.record({ length: fc.integer({ min: 1, max: 9 }), count: fc.nat(2) }), { maxLength: 3 });

/** The definition: every piece gets a start of its own so that no two overlap and none touches a flaw. */
function holdsByTrying({ cutEdge, putUp, flaws }: Cloth, wanted: readonly Demand[]): boolean {
  const pieces = wanted.flatMap((demand) => new Array<number>(demand.count).fill(demand.length)).sort((a, b) => b - a);
  const start = cutEdge === 0 && pieces.length > 0 ? STRAIGHTENING : cutEdge;
  const taken = new Set<number>();
  for (let at = 0; at < putUp; at += 1) if (at < start || flaws.some((flaw) => at >= flaw.startsAt && at < flaw.endsAt)) taken.add(at);
  const place = (index: number): boolean => {
    const piece = pieces[index];
    if (piece === undefined) return true;
    for (let from = start; from + piece <= putUp; from += 1) {
      const cells = Array.from({ length: piece }, (_, offset) => from + offset);
      // Pushed to the left against the edge, a flaw or another piece, every layout stays one.
      if (from > start && !taken.has(from - 1)) continue;
      if (cells.some((cell) => taken.has(cell))) continue;
      for (const cell of cells) taken.add(cell);
      if (place(index + 1)) return true;
      for (const cell of cells) taken.delete(cell);
    }
    return false;
  };
  return place(0);
}

describe("cloth between flaws", () => {
  it("holds demands exactly when some layout does", () => {
    fc.assert(fc.property(cloth, demands, (each, wanted) => clothHolds(each, wanted, STRAIGHTENING) === holdsByTrying(each, wanted)), { numRuns: 400 });
  });

  it("has as its longest piece the longest stretch without a flaw", () => {
    fc.assert(
      fc.property(cloth, (each) => {
        let longest = 0;
        let run = 0;
        for (let at = each.cutEdge; at < each.putUp; at += 1) {
          run = each.flaws.some((flaw) => at >= flaw.startsAt && at < flaw.endsAt) ? 0 : run + 1;
          longest = Math.max(longest, run);
        }
        return longestPiece(each) === longest;
      }),
    );
  });

  it("sells the longest piece beside which everything held still fits, and not one thread more", () => {
    fc.assert(
      fc.property(cloth, demands, (each, held) => {
        const promised = held.filter((demand) => demand.count > 0);
        fc.pre(promised.length > 0);
        const sold = toSell(each, held, STRAIGHTENING);
        if (!holdsByTrying(each, promised)) return sold === 0;
        const fitsWith = (length: number) => holdsByTrying(each, [...promised, { length, count: 1 }]);
        return (sold === 0 || fitsWith(sold)) && !fitsWith(sold + 1);
      }),
      { numRuns: 400 },
    );
  });

  it("counts how many of a length fit beside what is held", () => {
    fc.assert(
      fc.property(cloth, demands, fc.record({ length: fc.integer({ min: 1, max: 6 }), count: fc.integer({ min: 1, max: 6 }) }), (each, held, demand) => {
        fc.pre(clothHolds(each, held, STRAIGHTENING));
        let most = 0;
        for (let count = 1; count <= demand.count; count += 1) if (holdsByTrying(each, [...held, { ...demand, count }])) most = count;
        return howManyFit(each, held, demand, STRAIGHTENING) === most;
      }),
    );
  });

  it("sells a bolt with nothing held to its last thread, uncut or not", () => {
    const bolt = { cutEdge: 0, putUp: inches(36), flaws: [] };
    expect(toSell(bolt, [], inches(1))).toBe(inches(36));
    expect(toSell(bolt, [{ length: inches(9), count: 1 }], inches(1))).toBe(inches(26));
    expect(toSell({ ...bolt, cutEdge: inches(4) }, [{ length: inches(9), count: 1 }], inches(1))).toBe(inches(23));
  });
});
