import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { CountGrid } from "@/lib/core/cutting/bolt-counts";
import { laysOf } from "@/lib/core/cutting/bolt-lay";
import { planBolts, replanBolts } from "@/lib/core/cutting/bolt-plan";
import { checkBoltPlan } from "@/lib/core/cutting/check-bolt-plan";
import { inches, length, yards, ZERO, type Length } from "@/lib/core/measure/length";
import type { BoltPlanInput, PlanBolt } from "@/lib/core/piece/bolt-plan";
import { bruteOptions, bruteTotals } from "./brute-bolts";

const BUDGET = { nodes: 100_000 };

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

describe("against trying everything", () => {
  const flaw = fc.tuple(fc.nat(11), fc.integer({ min: 1, max: 3 })).map(([from, long]) => ({ startsAt: length(from), endsAt: length(from + long) }));
  const tinyBolt = fc.record({
    cutEdge: fc.nat(3).map((each) => each as Length),
    endsAt: fc.integer({ min: 4, max: 12 }).map((each) => each as Length),
    flaws: fc.array(flaw, { maxLength: 2 }),
    reserved: fc.array(fc.record({ length: fc.integer({ min: 1, max: 4 }).map((each) => each as Length), count: fc.constant(1) }), { maxLength: 2 }),
    lot: fc.constantFrom("A", "B"),
  });
  const measures = { straightening: fc.nat(1).map((each) => each as Length), saleableRemnant: fc.integer({ min: 0, max: 4 }).map((each) => each as Length) };

  it("knows all that one bolt can give, with the least scrap", () => {
    fc.assert(
      fc.property(tinyBolt, fc.record(measures), fc.uniqueArray(fc.integer({ min: 1, max: 5 }), { minLength: 1, maxLength: 2 }), (given, rules, wants) => {
        const tiny = bolt({ tag: "B1", ...given });
        const grid = new CountGrid(wants.map(() => 12));
        const lays = laysOf(tiny, { ...rules, lengths: wants.map(length) }, grid);
        const found = Object.fromEntries(lays.map((lay) => [grid.countsOf(lay.index).join(), lay.scrap]));
        expect(found).toEqual(Object.fromEntries([...bruteOptions(tiny, wants, rules)].map(([key, option]) => [key, option.scrap])));
      }),
      { numRuns: 300 },
    );
  });

  it("makes the most kits, then the least scrap, then touches the fewest bolts", async () => {
    await fc.assert(
      fc.asyncProperty(fc.array(tinyBolt, { minLength: 1, maxLength: 3 }), fc.record(measures), fc.integer({ min: 1, max: 4 }), fc.integer({ min: 1, max: 6 }), async (given, rules, want, kits) => {
        const bolts = given.map((each, index) => bolt({ tag: `B${index}`, shelfOrder: index, ...each }));
        const answer = await plan(input({ kits, bolts, ...rules, lengths: [{ fabric: "1", length: length(want), plannedWidth: inches(42) }] }));
        const totals = bruteTotals(bolts.map((each) => bruteOptions(each, [want], rules)), 1);
        const most = Math.max(...[...totals.values()].map(({ counts }) => counts[0] ?? 0));
        expect(answer).toMatchObject({ status: "optimal", kits: Math.min(kits, most), mostKits: most });
        const best = totals.get(String(answer.kits));
        expect({ scrap: answer.scrap, touched: answer.boltsTouched }).toEqual({ scrap: best?.scrap, touched: best?.touched });
      }),
      { numRuns: 300 },
    );
  });

  it("keeps a kit's two lengths of one fabric in one lot, and is still the best", async () => {
    await fc.assert(
      fc.asyncProperty(fc.array(tinyBolt, { minLength: 1, maxLength: 4 }), fc.record(measures), fc.tuple(fc.integer({ min: 1, max: 3 }), fc.integer({ min: 1, max: 4 })), fc.integer({ min: 1, max: 4 }), async (given, rules, pair, kits) => {
        const bolts = given.map((each, index) => bolt({ tag: `B${index}`, shelfOrder: index, ...each }));
        const answer = await plan(input({ kits, bolts, ...rules, lengths: pair.map((each) => ({ fabric: "1", length: length(each), plannedWidth: inches(42) })) }));
        const wants = [...new Set(pair)];
        const perKit = wants.map((want) => pair.filter((each) => each === want).length);
        const byLot = ["A", "B"].map((lot) => bruteTotals(bolts.filter((each) => each.lot === lot).map((each) => bruteOptions(each, wants, rules)), wants.length));
        const key = (count: number) => perKit.map((each) => each * count).join();
        const splits = Array.from({ length: 13 }, (_, a) => Array.from({ length: 13 }, (_, b) => ({ a, b }))).flat();
        const possible = splits.flatMap(({ a, b }) => {
          const [first, second] = [byLot[0]?.get(key(a)), byLot[1]?.get(key(b))];
          return first && second ? [{ kits: a + b, scrap: first.scrap + second.scrap, touched: first.touched + second.touched }] : [];
        });
        const most = Math.max(...possible.map((each) => each.kits));
        expect(answer).toMatchObject({ kits: Math.min(kits, most), mostKits: most, status: "optimal" });
        const [best] = possible.filter((each) => each.kits === answer.kits).sort((x, y) => x.scrap - y.scrap || x.touched - y.touched);
        expect({ scrap: answer.scrap, touched: answer.boltsTouched }).toEqual({ scrap: best?.scrap, touched: best?.touched });
      }),
      { numRuns: 200 },
    );
  });

  it("plans the rest of a run after part of it was cut", async () => {
    await fc.assert(
      fc.asyncProperty(fc.array(tinyBolt, { minLength: 1, maxLength: 3 }), fc.tuple(fc.integer({ min: 1, max: 3 }), fc.integer({ min: 1, max: 3 })), fc.integer({ min: 1, max: 4 }), fc.nat(6), fc.boolean(), async (given, pair, kits, done, isOneFabric) => {
        const bolts = given.map((each, index) => bolt({ tag: `B${index}`, shelfOrder: index, ...each, ...(isOneFabric ? {} : { fabric: String(1 + (index % 2)) }) }));
        const lengths = pair.map((each, index) => ({ fabric: isOneFabric ? "1" : String(index + 1), length: length(each), plannedWidth: inches(42) }));
        const asked = input({ kits, bolts, saleableRemnant: length(2), lengths });
        const first = await plan(asked);
        const tail = new Map(bolts.map((each) => [each.tag, each.cutEdge]));
        const cut = first.cuts.slice(0, done);
        for (const each of cut) tail.set(each.bolt, each.endsAt);
        const already = cut.flatMap((each) => (each.kit === null ? [] : [{ kit: each.kit, fabric: each.fabric, length: length(each.endsAt - each.startsAt), lot: bolts.find((one) => one.tag === each.bolt)?.lot ?? "" }]));
        const later = { ...asked, bolts: bolts.map((each) => ({ ...each, cutEdge: tail.get(each.tag) ?? each.cutEdge })) };
        const answer = await replanBolts(later, already, BUDGET);
        if (!answer.ok) throw new Error(answer.fault.message);
        expect(checkBoltPlan(answer.value, later, already)).toEqual([]);
        expect(answer.value.kits).toBe(first.kits);
      }),
      { numRuns: 300 },
    );
  });
});

describe("a run in the middle of its cutting", () => {
  const lengths = [
    { fabric: "1", length: yards(2), plannedWidth: inches(42) },
    { fabric: "2", length: yards(1), plannedWidth: inches(42) },
  ];

  it("finishes the kits that are furthest along when a bolt was short", async () => {
    // Kits 1 to 3 were planned; kits 2 and 3 have fabric 1. One yard of fabric 2 is left.
    const already = [2, 3].map((kit) => ({ kit, fabric: "1", length: yards(2), lot: "A" }));
    const asked = input({ kits: 3, lengths, bolts: [bolt({ tag: "B1", cutEdge: yards(4), endsAt: yards(6) }), bolt({ tag: "B2", fabric: "2", endsAt: yards(1), shelfOrder: 1 })] });
    const answer = await replanBolts(asked, already, BUDGET);
    expect(answer).toMatchObject({ ok: true, value: { kits: 1, mostKits: 1, limiting: "2" } });
    if (answer.ok) expect(answer.value.cuts.map((cut) => [cut.bolt, cut.kit])).toEqual([["B2", 2]]);
  });

  it("does not finish a kit from another lot", async () => {
    const twice = [yards(2), yards(1)].map((each) => ({ fabric: "1", length: each, plannedWidth: inches(42) }));
    const already = [{ kit: 1, fabric: "1", length: yards(2), lot: "A" }];
    const asked = input({ kits: 1, lengths: twice, bolts: [bolt({ tag: "B1", lot: "B", endsAt: yards(10) })] });
    expect(await replanBolts(asked, already, BUDGET)).toMatchObject({ ok: true, value: { kits: 0, cuts: [] } });
    const withLot = { ...asked, bolts: [...asked.bolts, bolt({ tag: "B2", lot: "A", endsAt: yards(1), shelfOrder: 1 })] };
    const answer = await replanBolts(withLot, already, BUDGET);
    expect(answer).toMatchObject({ ok: true, value: { kits: 1, boltsTouched: 1 } });
    if (answer.ok) expect(checkBoltPlan(answer.value, withLot, already)).toEqual([]);
  });
});

describe("the work of a bolt plan", () => {
  it("stays within its budget, with a proven bound", async () => {
    const twice = [yards(0.5), yards(0.25)].map((each) => ({ fabric: "1", length: each, plannedWidth: inches(42) }));
    const bolts = Array.from({ length: 10 }, (_, index) => bolt({ tag: `B${index}`, shelfOrder: index, endsAt: yards(9) }));
    const asked = input({ kits: 100, lengths: twice, bolts });
    const result = await planBolts(asked, { nodes: 4000 });
    if (!result.ok) throw new Error(result.fault.message);
    expect(checkBoltPlan(result.value, asked)).toEqual([]);
    expect(result.value).toMatchObject({ status: "feasible", mostKits: 120 });
    expect(result.value.kits).toBeGreaterThan(10);
    expect((await planBolts(asked, { nodes: 200_000 })).ok && result.ok).toBe(true);
  });

  it("can be stopped", async () => {
    expect(await planBolts(input({ bolts: [bolt({ tag: "B1" })] }), BUDGET, null, { stopped: () => true })).toMatchObject({ ok: true, value: { status: "stopped", kits: 0 } });
  });

  it("is little for a large run of single lengths", async () => {
    const bolts = Array.from({ length: 60 }, (_, index) => bolt({ tag: `B${index}`, shelfOrder: index, endsAt: length(yards(10) + index * 127), flaws: [{ startsAt: yards(3), endsAt: yards(3.25) }] }));
    const asked = input({ kits: 500, bolts, lengths: [{ fabric: "1", length: yards(0.875), plannedWidth: inches(42) }] });
    const began = performance.now();
    expect((await plan(asked)).kits).toBe(500);
    expect(performance.now() - began).toBeLessThan(3000);
  });
});

describe("the checker", () => {
  it("finds what is wrong", async () => {
    const asked = input({ kits: 2, bolts: [bolt({ tag: "B1", endsAt: yards(6), flaws: [{ startsAt: yards(1), endsAt: yards(1.25) }], reserved: [{ length: inches(9), count: 1 }] })] });
    const good = await plan(asked);
    const [piece, waste, first, second] = good.cuts;
    if (!piece || !waste || !first || !second) throw new Error("Four cuts were expected.");
    const faulty = (change: Partial<typeof good>) => checkBoltPlan({ ...good, ...change }, asked);
    expect(faulty({ cuts: [piece, first, second] })).not.toEqual([]);
    expect(faulty({ cuts: [piece, waste, first] })).not.toEqual([]);
    expect(faulty({ cuts: [{ ...piece, purpose: "waste" }, waste, first, second] })).not.toEqual([]);
    expect(faulty({ cuts: [piece, waste, first, { ...second, kit: 1 }] })).not.toEqual([]);
    expect(faulty({ scrap: length(good.scrap + 1) })).not.toEqual([]);
    expect(faulty({ boltsTouched: 2 })).not.toEqual([]);
    expect(faulty({ kits: 3 })).not.toEqual([]);
    expect(checkBoltPlan(good, { ...asked, bolts: asked.bolts.map((each) => ({ ...each, reserved: [{ length: yards(1), count: 1 }] })) })).not.toEqual([]);
    expect(checkBoltPlan(good, { ...asked, straightening: inches(1) })).not.toEqual([]);
    expect(checkBoltPlan(good, { ...asked, bolts: asked.bolts.map((each) => ({ ...each, usableWidth: inches(40) })) })).not.toEqual([]);
  });
});
