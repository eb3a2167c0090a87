import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { sellable } from "@/lib/core/cutting/sellable";
import { length, yards, ZERO } from "@/lib/core/measure/length";
import type { Segment } from "@/lib/core/piece/bolt-plan";

const segment = (startsAt: number, endsAt: number): Segment => ({ startsAt: length(startsAt), endsAt: length(endsAt) });

/** The longest piece by trying every length and every place of everything. */
function longestByBruteForce(rooms: number[], promised: number[]): number {
  const holds = (rests: number[], pieces: number[]): boolean => {
    const [piece, ...others] = pieces;
    return piece === undefined || rests.some((rest, at) => rest >= piece && holds(rests.map((each, index) => (index === at ? each - piece : each)), others));
  };
  let longest = 0;
  for (let piece = 1; piece <= Math.max(0, ...rooms); piece += 1) {
    if (rooms.some((room, at) => room >= piece && holds(rooms.map((each, index) => (index === at ? each - piece : each)), promised))) longest = piece;
  }
  return longest;
}

describe("what is free to sell", () => {
  it("is the rest of the bolt in all, and the longest stretch on one piece", () => {
    const segments = [segment(0, yards(2)), segment(yards(2.25), yards(5))];
    expect(sellable(segments, [])).toEqual({ inAll: yards(4.75), longest: yards(2.75), promisesFit: true });
    expect(sellable(segments, [{ length: yards(1.5), count: 1 }])).toEqual({ inAll: yards(3.25), longest: yards(2.75), promisesFit: true });
    expect(sellable(segments, [{ length: yards(2.5), count: 1 }])).toEqual({ inAll: yards(2.25), longest: yards(2), promisesFit: true });
    expect(sellable(segments, [{ length: yards(3), count: 1 }])).toEqual({ inAll: yards(1.75), longest: ZERO, promisesFit: false });
    expect(sellable([], [])).toEqual({ inAll: ZERO, longest: ZERO, promisesFit: true });
  });

  it("agrees with trying everything", () => {
    const rooms = fc.array(fc.integer({ min: 1, max: 14 }), { minLength: 1, maxLength: 3 });
    const promises = fc.array(fc.integer({ min: 1, max: 8 }), { maxLength: 4 });
    fc.assert(
      fc.property(rooms, promises, (given, promised) => {
        const segments = given.map((room, index) => segment(index * 100, index * 100 + room));
        const answer = sellable(segments, promised.map((each) => ({ length: length(each), count: 1 })));
        expect(answer.longest).toBe(longestByBruteForce(given, promised));
      }),
      { numRuns: 500 },
    );
  });
});
