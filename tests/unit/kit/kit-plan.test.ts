import loadHighs from "highs";
import { describe, expect, it } from "vitest";
import { checkStripPlan } from "@/lib/core/cutting/check-strip-plan";
import { createHighsSolver } from "@/lib/core/cutting/highs-solver";
import { STRIP_BUDGET } from "@/lib/core/cutting/plan-strips";
import { fabricsOf } from "@/lib/core/kit/kit-fabrics";
import { kitLengths } from "@/lib/core/kit/kit-lengths";
import { planKit, type KitPlanInput } from "@/lib/core/kit/kit-plan";
import { kitsAllowed } from "@/lib/core/kit/kits-allowed";
import { inches, length, PER_EIGHTH_YARD, yards, ZERO } from "@/lib/core/measure/length";
import type { PlanBolt } from "@/lib/core/piece/bolt-plan";
import type { CutPiece } from "@/lib/core/piece/cut-piece";
import type { AllowanceRules, PlanProgress } from "@/lib/core/piece/strip-plan";

const solver = createHighsSolver(() => loadHighs());
const rules: AllowanceRules = { straightening: inches(1), misCut: { kind: "percent", basisPoints: 0 }, shrinkAlong: 0, shrinkAcross: 0, endOfBolt: ZERO, sellingStep: length(PER_EIGHTH_YARD), leastCut: yards(0.25) };
const choices = [
  { fabric: "11", name: "Heron", usableWidth: inches(40) },
  { fabric: "12", name: "Reed", usableWidth: inches(42) },
];

function square(key: string, role: string, side: number, count: number): CutPiece {
  const size = inches(side);
  return { key, letter: key, name: `Square, ${side - 0.5} in`, role, count, finished: [], cut: [], method: { kind: "square", side: { exact: size, ruler: size } }, trimming: "sewn-as-cut", mayTurn: true };
}

const pieces = [square("A", "sky", 5, 16), square("B", "water", 5, 8), square("C", "reeds", 10, 4)];

function inputOf(fabricOf: Record<string, string>, list: readonly CutPiece[] = pieces): KitPlanInput {
  const fabrics = fabricsOf(list, fabricOf, choices);
  if (!fabrics.ok) throw new Error(fabrics.fault.message);
  return { fabrics: fabrics.value, allowance: rules, budget: STRIP_BUDGET, system: "yards" };
}

describe("the fabrics of a kit", () => {
  it("hold the pieces of every role that is put to them", () => {
    const fabrics = fabricsOf(pieces, { sky: "11", water: "11", reeds: "12" }, choices);
    expect(fabrics).toMatchObject({ ok: true, value: [{ fabric: "11", roles: ["sky", "water"], pieces: [{ key: "A" }, { key: "B" }] }, { fabric: "12", roles: ["reeds"], pieces: [{ key: "C" }] }] });
  });

  it("must be chosen for every role", () => {
    expect(fabricsOf(pieces, { sky: "11" }, choices)).toMatchObject({ fault: { code: "role-without-fabric", message: "No fabric is put to water and reeds. Choose one for each role.", facts: { roles: ["water", "reeds"] } } });
    expect(fabricsOf(pieces, { sky: "11", water: "11", reeds: "99" }, choices)).toMatchObject({ fault: { code: "unknown-fabric", facts: { fabric: "99" } } });
    expect(fabricsOf([square("A", "constructor", 5, 1)], {}, choices)).toMatchObject({ fault: { code: "role-without-fabric" } });
  });
});

describe("a kit's plan", () => {
  it("lays two roles of one fabric on the same strips, and comes to lengths", async () => {
    const planned = await planKit(inputOf({ sky: "11", water: "11", reeds: "12" }), solver);
    if (!planned.ok) throw new Error(planned.fault.message);
    const [heron, reed] = planned.value.fabrics;
    // 24 squares of 5 in, 8 across 40 in: 3 strips, 15 in; with 1 in of straightening 16 in, rounded up to 18.
    expect(heron).toMatchObject({ roles: ["sky", "water"], plan: { status: "optimal", length: inches(15) }, allowance: { cutLength: yards(0.5) } });
    expect(reed).toMatchObject({ plan: { length: inches(10) }, allowance: { cutLength: yards(0.375) } });
    for (const each of planned.value.fabrics) expect(checkStripPlan(each.plan, each.blanks)).toEqual([]);
    expect(kitLengths(planned.value.fabrics)).toEqual([
      { fabric: "11", name: "Heron", length: yards(0.5), plannedWidth: inches(40) },
      { fabric: "12", name: "Reed", length: yards(0.375), plannedWidth: inches(42) },
    ]);
  });

  it("is the same for the same input, and tells how far it is", async () => {
    const said: PlanProgress[] = [];
    const input = inputOf({ sky: "11", water: "12", reeds: "12" });
    const first = await planKit(input, solver, { progress: (progress) => said.push(progress) });
    expect(await planKit(input, solver)).toEqual(first);
    expect(said.every(({ done }, at) => done >= (said[at - 1]?.done ?? 0) && done <= 1)).toBe(true);
  });

  it("names the fabric that cannot be planned, with both widths", async () => {
    const planned = await planKit(inputOf({ wide: "11" }, [{ ...square("A", "wide", 5, 1), method: { kind: "square", side: { exact: inches(41), ruler: inches(41) } } }]), solver);
    expect(planned).toMatchObject({ ok: false, fault: { code: "piece-too-wide" } });
    if (!planned.ok) expect(planned.fault.message).toMatch(/^Heron: .*41 in.*40 in/);
  });
});

describe("the kits that the bolts allow", () => {
  const bolt = (given: Partial<PlanBolt> & { tag: string }): PlanBolt => ({ fabric: "11", lot: "A", usableWidth: inches(42), cutEdge: ZERO, endsAt: yards(3), flaws: [], reserved: [], shelfOrder: 0, ...given });
  const lengths = [
    { fabric: "11", name: "Heron", length: yards(0.5), plannedWidth: inches(40) },
    { fabric: "12", name: "Reed", length: yards(0.375), plannedWidth: inches(42) },
  ];

  it("are those of the fabric that allows the fewest", async () => {
    const bolts = [bolt({ tag: "B1" }), bolt({ tag: "B2", fabric: "12", endsAt: yards(1.5), reserved: [{ length: yards(0.5), count: 1 }], shelfOrder: 1 })];
    expect(await kitsAllowed({ lengths, bolts, straightening: ZERO, saleableRemnant: inches(18) }, { nodes: 10_000 })).toMatchObject({
      ok: true,
      value: { kits: 2, atMost: 2, limiting: "12", allows: [{ fabric: "11", kits: 6 }, { fabric: "12", kits: 2 }] },
    });
  });

  it("are none where no bolt is there or none is wide enough, with the reason", async () => {
    const none = await kitsAllowed({ lengths, bolts: [bolt({ tag: "B1" })], straightening: ZERO, saleableRemnant: ZERO }, { nodes: 10_000 });
    expect(none).toMatchObject({ ok: true, value: { kits: 0, reason: "No bolt of Reed is on the shelf." } });
    const narrow = await kitsAllowed({ lengths, bolts: [bolt({ tag: "B1" }), bolt({ tag: "B2", fabric: "12", usableWidth: inches(41) })], straightening: ZERO, saleableRemnant: ZERO }, { nodes: 10_000 });
    expect(narrow).toMatchObject({ ok: true, value: { kits: 0 } });
    if (narrow.ok) expect(narrow.value.reason).toContain("Plan the kit anew on the width there is.");
  });
});
