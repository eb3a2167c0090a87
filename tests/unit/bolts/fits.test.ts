import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { fits } from "@/lib/core/cutting/fits";
import { longestSegment, segmentsOf } from "@/lib/core/cutting/segments";
import { length, yards, type Length } from "@/lib/core/measure/length";
import type { Segment } from "@/lib/core/piece/bolt-plan";

const segment = (startsAt: number, endsAt: number): Segment => ({ startsAt: length(startsAt), endsAt: length(endsAt) });

/** Tries every way to put every piece on every segment. */
function fitsByBruteForce(rests: number[], pieces: number[]): boolean {
  const [piece, ...others] = pieces;
  if (piece === undefined) return true;
  return rests.some((rest, at) => rest >= piece && fitsByBruteForce(rests.map((each, index) => (index === at ? each - piece : each)), others));
}

describe("the stretches of a bolt", () => {
  it("lie between the cut edge, the flaws and the core", () => {
    expect(segmentsOf({ cutEdge: length(10), endsAt: length(100), flaws: [segment(50, 60)] })).toEqual([segment(10, 50), segment(60, 100)]);
    expect(segmentsOf({ cutEdge: length(55), endsAt: length(100), flaws: [segment(50, 60)] })).toEqual([segment(60, 100)]);
    expect(segmentsOf({ cutEdge: length(0), endsAt: length(100), flaws: [segment(70, 120), segment(0, 20), segment(10, 30)] })).toEqual([segment(30, 70)]);
    expect(segmentsOf({ cutEdge: length(100), endsAt: length(100), flaws: [] })).toEqual([]);
    expect(longestSegment([segment(0, 5), segment(7, 20)])).toBe(13);
  });

  it("hold each place that no flaw touches, and no other", () => {
    const flaw = fc.tuple(fc.nat(40), fc.integer({ min: 1, max: 9 })).map(([from, long]) => segment(from, from + long));
    fc.assert(
      fc.property(fc.nat(40), fc.array(flaw, { maxLength: 5 }), (cutEdge, flaws) => {
        const segments = segmentsOf({ cutEdge: length(cutEdge), endsAt: length(40), flaws });
        for (let at = 0; at < 40; at += 1) {
          const free = at >= cutEdge && !flaws.some((each) => each.startsAt <= at && at < each.endsAt);
          expect(segments.some((each) => each.startsAt <= at && at < each.endsAt)).toBe(free);
        }
      }),
    );
  });
});

describe("fits", () => {
  it("never lays a length across a flaw", () => {
    const segments = [segment(0, yards(1.5)), segment(yards(2), yards(3.5))];
    expect(fits(segments, [{ length: yards(2), count: 1 }]).fits).toBe(false);
    expect(fits(segments, [{ length: yards(0.75), count: 4 }]).fits).toBe(true);
    expect(fits(segments, [{ length: yards(0.75), count: 5 }]).fits).toBe(false);
    expect(fits([], []).fits).toBe(true);
  });

  it("finds what best fit misses", () => {
    // Best fit puts 5 and 4 into the 9 and then has no room for 3 + 3 + 3 beside them.
    const segments = [segment(0, 10), segment(20, 29)];
    const demands = [5, 5, 3, 3, 3].map((each) => ({ length: each as Length, count: 1 }));
    expect(fits(segments, demands).fits).toBe(true);
  });

  it("agrees with trying everything, and lays out what it promises", () => {
    const rests = fc.array(fc.integer({ min: 1, max: 30 }), { minLength: 1, maxLength: 4 });
    const pieces = fc.array(fc.integer({ min: 1, max: 15 }), { maxLength: 7 });
    fc.assert(
      fc.property(rests, pieces, (rooms, wanted) => {
        const segments = rooms.map((room, index) => segment(index * 100, index * 100 + room));
        const answer = fits(segments, wanted.map((each) => ({ length: length(each), count: 1 })));
        expect(answer.undecided).toBe(false);
        expect(answer.fits).toBe(fitsByBruteForce(rooms, [...wanted].sort((a, b) => b - a)));
        if (!answer.fits) return;
        expect(answer.layout.map((each) => each.length).sort((a, b) => a - b)).toEqual([...wanted].sort((a, b) => a - b));
        for (const [index, room] of rooms.entries()) {
          expect(answer.layout.filter((each) => each.segment === index).reduce((sum, each) => sum + each.length, 0)).toBeLessThanOrEqual(room);
        }
      }),
      { numRuns: 2000 },
    );
  });

  it("says when it could not tell", () => {
    const segments = [segment(0, 10), segment(20, 29)];
    const demands = [5, 5, 3, 3, 3].map((each) => ({ length: length(each), count: 1 }));
    expect(fits(segments, demands, 1)).toEqual({ fits: false, layout: [], undecided: true });
  });
});
