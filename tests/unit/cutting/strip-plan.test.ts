import fc from "fast-check";
import loadHighs from "highs";
import { describe, expect, it } from "vitest";
import { checkStripPlan } from "@/lib/core/cutting/check-strip-plan";
import { createHighsSolver } from "@/lib/core/cutting/highs-solver";
import { planStrips, STRIP_BUDGET } from "@/lib/core/cutting/plan-strips";
import type { Solver } from "@/lib/core/cutting/solver";
import { SolverBroken } from "@/lib/core/cutting/solver";
import { inches, length } from "@/lib/core/measure/length";
import type { Blank, PlanControl, StripPlan } from "@/lib/core/piece/strip-plan";
import { bruteStrips } from "./brute-strips";
import { buildBlank } from "./build-blank";

const solver = createHighsSolver(() => loadHighs());
const WIDTH = inches(40);

async function plan(blanks: readonly Blank[], width = WIDTH, by: Solver = solver, control?: PlanControl): Promise<StripPlan> {
  const result = await planStrips(blanks, width, STRIP_BUDGET, by, control);
  if (!result.ok) throw new Error(result.fault.message);
  expect(checkStripPlan(result.value, blanks)).toEqual([]);
  return result.value;
}

describe("planStrips", () => {
  it("cuts 96 squares of 3 7/8 in from ten strips of ten", async () => {
    const made = await plan([buildBlank("B", 3.875, 3.875, 96)]);
    expect(made.status).toBe("optimal");
    expect(made.length).toBe(10 * inches(3.875));
    expect(made.strips.filter((strip) => strip.cuts.length === 10)).toHaveLength(9);
  });

  it("cuts small pieces from the rest of a wider strip", async () => {
    const made = await plan([buildBlank("A", 6.5, 6.5, 5), buildBlank("C", 2, 2, 3)]);
    expect(made.length).toBe(inches(6.5));
    expect(made.status).toBe("optimal");
  });

  it("takes the plan with the fewest widths and mixed strips among those of the least length", async () => {
    const blanks = [buildBlank("A", 4.5, 4.5, 12), buildBlank("B", 3.875, 3.875, 48), buildBlank("C", 2.5, 4.5, 48, { mayTurn: true }), buildBlank("Binding", 2.5, 40, 6, { mark: "long" })];
    const made = await plan(blanks);
    expect(made.length).toBe(inches(54.875));
    expect(made.status).toBe("optimal");
    expect(new Set(made.strips.map((strip) => strip.width)).size).toBe(3);
    expect(made.strips.filter((strip) => new Set(strip.cuts.map((cut) => cut.blank)).size > 1)).toHaveLength(1);
    expect(made.strips.every((strip) => strip.cuts.every((cut) => cut.along === strip.width))).toBe(true);
  });

  it("turns a piece only where it may be turned", async () => {
    const kept = await plan([buildBlank("R", 20, 4, 2)]);
    const turned = await plan([buildBlank("R", 20, 4, 2, { mayTurn: true })]);
    expect(kept.length).toBe(inches(20));
    expect(turned.length).toBe(inches(4));
    expect(turned.strips[0]?.cuts.every((cut) => cut.turned)).toBe(true);
  });

  it("loses the slanting ends once a strip", async () => {
    const angled = buildBlank("T", 3.5, 4, 20, { endWaste: inches(3), mark: "slant" });
    const made = await plan([angled]);
    // (40 - 3) / 4 is 9 a strip.
    expect(made.length).toBe(3 * inches(3.5));
  });

  it("answers an empty list with no cloth", async () => {
    expect(await plan([])).toMatchObject({ status: "optimal", length: 0, strips: [] });
    expect(await plan([buildBlank("A", 2, 2, 0)])).toMatchObject({ status: "optimal", length: 0 });
  });

  it("names the piece that is too wide and says whether turning would help", async () => {
    const kept = await planStrips([buildBlank("Border", 4, 60, 2)], WIDTH, STRIP_BUDGET, solver);
    expect(kept).toMatchObject({ ok: false, fault: { code: "piece-too-wide", facts: { blank: "Border", turnedAcross: inches(4) } } });
    const never = await planStrips([buildBlank("Back", 50, 60, 1, { mayTurn: true })], WIDTH, STRIP_BUDGET, solver);
    expect(never).toMatchObject({ ok: false, fault: { code: "piece-too-wide", facts: { turnedAcross: null } } });
  });

  it("refuses more pieces than a plan holds", async () => {
    const result = await planStrips([buildBlank("A", 1, 1, 200_000)], WIDTH, STRIP_BUDGET, solver);
    expect(result).toMatchObject({ ok: false, fault: { code: "too-many-pieces" } });
  });

  it("gives the same plan for the same question", async () => {
    const blanks = [buildBlank("A", 4.5, 6.5, 31, { mayTurn: true }), buildBlank("B", 3.875, 3.875, 47), buildBlank("C", 2.5, 8.5, 29)];
    const first = await plan(blanks);
    expect(await plan(blanks)).toEqual(first);
    expect(await plan(blanks, WIDTH, createHighsSolver(() => loadHighs()))).toEqual(first);
  });

  it("costs inches and millimetres the same", async () => {
    const metric = await plan([buildBlank("A", 1, 1, 40, { along: length(16_000), across: length(8_800) }), buildBlank("B", 1, 1, 25, { along: length(10_400), across: length(10_400) })], length(1_000 * 160));
    expect(metric.status).toBe("optimal");
  });

  it("keeps the best layout when stopped, and tells progress", async () => {
    const blanks = [buildBlank("A", 4.5, 6.5, 31), buildBlank("B", 3.875, 3.875, 47), buildBlank("C", 2.5, 8.5, 29), buildBlank("D", 5, 11, 17)];
    const said: number[] = [];
    const made = await plan(blanks, WIDTH, solver, { stopped: () => true, progress: ({ done }) => said.push(done) });
    expect(["stopped", "optimal"]).toContain(made.status);
    expect(said.length).toBeGreaterThan(0);
    expect([...said].sort((a, b) => a - b)).toEqual(said);
  });

  it("falls back on shelves when the solver breaks", async () => {
    const broken: Solver = {
      openProgramme: () => Promise.reject(new SolverBroken("gone")),
      solveInteger: () => Promise.reject(new SolverBroken("gone")),
    };
    const made = await plan([buildBlank("A", 4.5, 6.5, 31), buildBlank("B", 3.875, 3.875, 47), buildBlank("D", 5, 11, 17)], WIDTH, broken);
    expect(made.bounds.anyLayout).toBeGreaterThan(0);
  });

  it("agrees with brute force on a handful of pieces", async () => {
    const side = fc.integer({ min: 1, max: 9 });
    const blank = fc.record({ along: side, across: side, count: fc.integer({ min: 1, max: 3 }), mayTurn: fc.boolean(), slant: fc.integer({ min: 0, max: 4 }) });
    await fc.assert(
      fc.asyncProperty(fc.array(blank, { minLength: 1, maxLength: 4 }), fc.integer({ min: 9, max: 16 }), async (drawn, width) => {
        const blanks = drawn.map((each, index) => {
          const endWaste = each.slant === 4 && each.across + 2 <= width ? inches(2) : length(0);
          return buildBlank(`p${index}`, each.along, each.across, each.count, { mayTurn: each.mayTurn && endWaste === 0, endWaste });
        });
        const made = await plan(blanks, inches(width));
        expect(made.length).toBe(bruteStrips(blanks, inches(width)));
        expect(made.status).toBe("optimal");
      }),
      { numRuns: 150, seed: 7 },
    );
  });

  it("never promises a bound that another plan undercuts", async () => {
    const side = fc.integer({ min: 12, max: 100 });
    const blank = fc.record({ along: side, across: side, count: fc.integer({ min: 1, max: 30 }), mayTurn: fc.boolean() });
    await fc.assert(
      fc.asyncProperty(fc.array(blank, { minLength: 1, maxLength: 6 }), async (drawn) => {
        const blanks = drawn.map((each, index) => buildBlank(`p${index}`, each.along / 8, each.across / 8, each.count, { mayTurn: each.mayTurn }));
        const made = await plan(blanks);
        const rough = await planStrips(blanks, WIDTH, { patterns: 5, nodes: 1 }, solver);
        expect(rough.ok && rough.value.bounds.strips <= made.length).toBe(true);
        expect(rough.ok && checkStripPlan(rough.value, blanks)).toEqual([]);
        expect(made.length).toBeLessThanOrEqual(rough.ok ? rough.value.length : 0);
      }),
      { numRuns: 15, seed: 11 },
    );
  });
});
