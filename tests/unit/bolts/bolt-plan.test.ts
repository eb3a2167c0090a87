import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { laysOf } from "@/lib/core/cutting/bolt-lay";
import { planBolts } from "@/lib/core/cutting/bolt-plan";
import { checkBoltPlan } from "@/lib/core/cutting/check-bolt-plan";
import { inches, length, yards, ZERO, type Length } from "@/lib/core/measure/length";
import type { BoltPlanInput, PlanBolt } from "@/lib/core/piece/bolt-plan";

const BUDGET = { nodes: 1000 };

function bolt(given: Partial<PlanBolt> & { tag: string }): PlanBolt {
  return { fabric: "1", lot: "A", usableWidth: inches(42), cutEdge: ZERO, endsAt: yards(10), flaws: [], reserved: [], shelfOrder: 0, ...given };
}

function input(given: Partial<BoltPlanInput>): BoltPlanInput {
  return { kits: 1, lengths: [{ fabric: "1", name: "Heron", length: yards(2), plannedWidth: inches(42) }], bolts: [], straightening: ZERO, saleableRemnant: inches(18), ...given };
}

async function plan(given: BoltPlanInput) {
  const result = await planBolts(given, BUDGET, null);
  if (!result.ok) throw new Error(result.fault.message);
  expect(checkBoltPlan(result.value, given)).toEqual([]);
  return result.value;
}

describe("a bolt plan", () => {
  it("stops before a flaw and says which fabric limits the run", async () => {
    const flawed = bolt({ tag: "B1", endsAt: yards(9.375), flaws: [{ startsAt: yards(7.625), endsAt: yards(7.875) }] });
    const answer = await plan(input({ kits: 4, bolts: [flawed] }));
    expect(answer).toMatchObject({ kits: 3, mostKits: 3, limiting: "1", boltsTouched: 1 });
    expect(answer.reason).toContain("Heron limits the run to 3 kits");
  });

  it("leaves alone a bolt that is too narrow, and what is promised to others", async () => {
    const narrow = bolt({ tag: "B1", usableWidth: inches(40) });
    const promised = bolt({ tag: "B2", endsAt: yards(10), reserved: [{ length: yards(3), count: 2 }], shelfOrder: 1 });
    expect(await plan(input({ kits: 9, bolts: [narrow, promised] }))).toMatchObject({ kits: 2, allows: [{ fabric: "1", kits: 2 }] });
  });

  it("straightens each bolt once, and an opened one not again", async () => {
    const straightening = inches(1);
    expect((await plan(input({ kits: 9, straightening, bolts: [bolt({ tag: "B1", endsAt: yards(4) })] }))).kits).toBe(1);
    expect((await plan(input({ kits: 9, straightening, bolts: [bolt({ tag: "B1", cutEdge: yards(1), endsAt: yards(5) })] }))).kits).toBe(2);
  });

  it("prefers no scrap, then few bolts", async () => {
    // B1 would leave 9 in of scrap, B2 comes out even.
    const answer = await plan(input({ kits: 2, bolts: [bolt({ tag: "B1", endsAt: yards(4.25) }), bolt({ tag: "B2", endsAt: yards(4), shelfOrder: 1 })] }));
    expect(answer).toMatchObject({ scrap: 0, boltsTouched: 1 });
    expect(new Set(answer.cuts.map((cut) => cut.bolt))).toEqual(new Set(["B2"]));
  });

  it("keeps a saleable stretch before a flaw as a piece", async () => {
    const flawed = bolt({ tag: "B1", endsAt: yards(6), flaws: [{ startsAt: yards(1), endsAt: yards(1.25) }] });
    const answer = await plan(input({ kits: 2, bolts: [flawed] }));
    expect(answer.cuts.map((cut) => cut.purpose)).toEqual(["piece", "waste", "kit", "kit"]);
  });

  it("takes the fewest kits that any fabric allows", async () => {
    const lengths = [
      { fabric: "1", length: yards(2), plannedWidth: inches(42) },
      { fabric: "2", length: yards(1), plannedWidth: inches(42) },
    ];
    const answer = await plan(input({ kits: 10, lengths, bolts: [bolt({ tag: "B1" }), bolt({ tag: "B2", fabric: "2", endsAt: yards(3), shelfOrder: 1 })] }));
    expect(answer).toMatchObject({ kits: 3, limiting: "2", allows: [{ fabric: "1", kits: 5 }, { fabric: "2", kits: 3 }] });
  });

  it("is zero kits, not a fault, when there is no bolt", async () => {
    expect(await plan(input({ kits: 3 }))).toMatchObject({ kits: 0, mostKits: 0, cuts: [] });
    expect(await planBolts(input({ lengths: [] }), BUDGET, null)).toMatchObject({ ok: false, fault: { code: "no-fabric" } });
  });
});

/** The most lengths of a tiny bolt by trying, at each place, to cut a length or to let one unit go. */
function mostByBruteForce(given: PlanBolt, want: number, straightening: number): number {
  const clear = (from: number, to: number) => to <= given.endsAt && !given.flaws.some((flaw) => flaw.startsAt < to && from < flaw.endsAt);
  const holds = (from: number, promised: number[]): boolean => {
    const [next, ...others] = promised;
    if (next === undefined) return true;
    const spots = Array.from({ length: Math.max(0, given.endsAt - from) }, (_, index) => from + index);
    return spots.some((spot) => clear(spot, spot + next) && holds(spot + next, others));
  };
  const orders = permutations(given.reserved.flatMap((each) => Array.from({ length: each.count }, () => each.length as number)));
  const best = (at: number, count: number): number => {
    let most = count === 0 || orders.some((order) => holds(at, order)) ? count : -1;
    if (at >= given.endsAt) return most;
    if (clear(at, at + want)) most = Math.max(most, best(at + want, count + 1));
    return Math.max(most, best(at + 1, count));
  };
  return best(given.cutEdge === 0 ? straightening : given.cutEdge, 0);
}

function permutations(list: number[]): number[][] {
  return list.length < 2 ? [list] : list.flatMap((each, at) => permutations([...list.slice(0, at), ...list.slice(at + 1)]).map((rest) => [each, ...rest]));
}

describe("against trying everything", () => {
  const flaw = fc.tuple(fc.nat(13), fc.integer({ min: 1, max: 3 })).map(([from, long]) => ({ startsAt: length(from), endsAt: length(from + long) }));
  const tinyBolt = fc.record({
    cutEdge: fc.nat(3).map((each) => each as Length),
    endsAt: fc.integer({ min: 4, max: 14 }).map((each) => each as Length),
    flaws: fc.array(flaw, { maxLength: 2 }),
    reserved: fc.array(fc.record({ length: fc.integer({ min: 1, max: 4 }).map((each) => each as Length), count: fc.constant(1) }), { maxLength: 2 }),
  });

  it("finds as many lengths on one bolt", () => {
    fc.assert(
      fc.property(tinyBolt, fc.integer({ min: 1, max: 5 }), fc.nat(1), (given, want, straightening) => {
        const tiny = bolt({ tag: "B1", ...given });
        const lays = laysOf(tiny, { length: want as Length, straightening: straightening as Length, saleableRemnant: length(3) });
        expect(lays.length - 1).toBe(mostByBruteForce(tiny, want, straightening));
      }),
      { numRuns: 400 },
    );
  });

  it("chooses the counts with the least scrap, then the fewest bolts", async () => {
    await fc.assert(
      fc.asyncProperty(fc.array(tinyBolt, { minLength: 1, maxLength: 3 }), fc.integer({ min: 1, max: 4 }), fc.integer({ min: 1, max: 6 }), async (given, want, kits) => {
        const bolts = given.map((each, index) => bolt({ tag: `B${index}`, shelfOrder: index, ...each }));
        const asked = input({ kits, bolts, saleableRemnant: length(3), lengths: [{ fabric: "1", length: want as Length, plannedWidth: inches(42) }] });
        const answer = await plan(asked);
        const options = bolts.map((each) => laysOf(each, { length: want as Length, straightening: ZERO, saleableRemnant: length(3) }));
        const combinations = options.reduce<{ count: number; scrap: number; touched: number }[]>(
          (sums, lays) => sums.flatMap((sum) => lays.map((lay) => ({ count: sum.count + lay.count, scrap: sum.scrap + lay.scrap, touched: sum.touched + (lay.count ? 1 : 0) }))),
          [{ count: 0, scrap: 0, touched: 0 }],
        );
        const best = combinations.filter((each) => each.count === answer.kits).sort((a, b) => a.scrap - b.scrap || a.touched - b.touched)[0];
        expect({ scrap: answer.scrap, touched: answer.boltsTouched }).toEqual({ scrap: best?.scrap, touched: best?.touched });
        expect(answer.mostKits).toBe(Math.max(...combinations.map((each) => each.count)));
      }),
      { numRuns: 300 },
    );
  });
});
