import fc from "fast-check";
import loadHighs from "highs";
import { describe, expect, it } from "vitest";
import { createHighsSolver } from "@/lib/core/cutting/highs-solver";
import { STRIP_BUDGET } from "@/lib/core/cutting/plan-strips";
import { allowWaste, beforeShrinkage, fitsFatQuarter, widthAfterShrinkage } from "@/lib/core/cutting/waste-allowance";
import { centimetres, inches, length, PER_EIGHTH_YARD } from "@/lib/core/measure/length";
import type { AllowanceRules, StripPlan } from "@/lib/core/piece/strip-plan";
import { buildBlank } from "./build-blank";

const solver = createHighsSolver(() => loadHighs());

function buildRules(more: Partial<AllowanceRules> = {}): AllowanceRules {
  return {
    straightening: inches(1),
    misCut: { kind: "percent", basisPoints: 0 },
    shrinkAlong: 0,
    shrinkAcross: 0,
    endOfBolt: length(0),
    sellingStep: length(PER_EIGHTH_YARD),
    leastCut: length(2 * PER_EIGHTH_YARD),
    ...more,
  };
}

function buildPlan(widths: readonly number[]): StripPlan {
  let at = 0;
  const strips = widths.map((width) => {
    const strip = { startsAt: length(at), width: length(width), cuts: [] };
    at += width;
    return strip;
  });
  return { status: "optimal", usableWidth: inches(40), strips, length: length(at), bounds: { strips: length(at), anyLayout: length(0) }, work: { patterns: 0, programmes: 0, nodes: 0 } };
}

describe("allowWaste", () => {
  it("adds straightening and rounds up to eighths of a yard", () => {
    // 12 strips of 3 7/8 in are 46 1/2 in; with 1 in for straightening 47 1/2, so 1 3/8 yd (49 1/2 in).
    const waste = allowWaste(buildPlan(Array.from({ length: 12 }, () => inches(3.875))), buildRules());
    expect(waste).toMatchObject({ net: inches(46.5), straightening: inches(1), misCuts: 0, prewash: 0, rounding: inches(2), cutLength: inches(49.5) });
  });

  it("never sells less than the least cut", () => {
    expect(allowWaste(buildPlan([inches(2)]), buildRules()).cutLength).toBe(inches(9));
  });

  it("keeps a percentage or one spare strip of the commonest width", () => {
    const plan = buildPlan([inches(5), inches(2.5), inches(2.5)]);
    expect(allowWaste(plan, buildRules({ misCut: { kind: "percent", basisPoints: 500 } })).misCuts).toBe(inches(10) / 20);
    expect(allowWaste(plan, buildRules({ misCut: { kind: "spare-strip" } })).misCuts).toBe(inches(2.5));
    expect(allowWaste(buildPlan([inches(5), inches(2.5)]), buildRules({ misCut: { kind: "spare-strip" } })).misCuts).toBe(inches(5));
  });

  it("adds prewash shrinkage before rounding: length / (1 - along)", () => {
    const waste = allowWaste(buildPlan([inches(18), inches(18)]), buildRules({ straightening: length(0), shrinkAlong: 500 }));
    expect(waste.prewash).toBe(Math.ceil((inches(36) * 20) / 19) - inches(36));
    expect(waste.cutLength).toBe(inches(40.5));
  });

  it("lets every line add up to what is cut, on the selling step", async () => {
    const rules = fc.record({ straightening: fc.nat(9000), basisPoints: fc.nat(2000), shrinkAlong: fc.nat(900), endOfBolt: fc.nat(9000), sellingStep: fc.constantFrom(PER_EIGHTH_YARD, 16_000, 8_000), leastCut: fc.nat(60_000) });
    fc.assert(
      fc.property(rules, fc.array(fc.integer({ min: 1, max: 50_000 }), { minLength: 1, maxLength: 9 }), (drawn, widths) => {
        const waste = allowWaste(buildPlan(widths), buildRules({ ...drawn, straightening: length(drawn.straightening), endOfBolt: length(drawn.endOfBolt), sellingStep: length(drawn.sellingStep), leastCut: length(drawn.leastCut), misCut: { kind: "percent", basisPoints: drawn.basisPoints } }));
        const lines = [waste.net, waste.straightening, waste.misCuts, waste.prewash, waste.endOfBolt, waste.rounding];
        expect(lines.every((line) => line >= 0)).toBe(true);
        expect(lines.reduce((total: number, line) => total + line, 0)).toBe(waste.cutLength);
        expect(waste.cutLength % drawn.sellingStep).toBe(0);
        expect(waste.cutLength).toBeGreaterThanOrEqual(drawn.leastCut);
        expect(waste.rounding < drawn.sellingStep || waste.cutLength - drawn.sellingStep < drawn.leastCut).toBe(true);
      }),
    );
  });

  it("adds nothing to an empty plan", () => {
    expect(allowWaste(buildPlan([]), buildRules())).toMatchObject({ net: 0, straightening: 0, cutLength: 0, fits: null });
  });
});

describe("shrinkage", () => {
  it("leaves at least what was wanted after washing", () => {
    fc.assert(
      fc.property(fc.nat(1_000_000), fc.nat(1500), (wanted, shrinkage) => {
        const cut = beforeShrinkage(length(wanted), shrinkage);
        expect(widthAfterShrinkage(cut, { shrinkAcross: shrinkage })).toBeGreaterThanOrEqual(wanted);
      }),
    );
  });

  it("refuses to shrink cloth to nothing", () => {
    expect(() => widthAfterShrinkage(inches(40), { shrinkAcross: 10_000 })).toThrow(RangeError);
  });
});

describe("fitsFatQuarter", () => {
  const fits = (count: number, side: number, more: Partial<AllowanceRules> = {}) =>
    fitsFatQuarter([buildBlank("A", side, side, count)], inches(40), buildRules(more), STRIP_BUDGET, solver);

  it("plans at half the width: 18 x 20 usable where 40 in is usable", async () => {
    expect(await fits(16, 4.5)).toBe("fat-quarter");
    expect(await fits(17, 4.5)).toBeNull();
    expect(await fits(8, 4.5)).toBe("fat-eighth");
    expect(await fits(1, 21)).toBeNull();
  });

  it("uses metric sizes where the shop sells in metric steps", async () => {
    expect(await fits(5, 9.5, { sellingStep: centimetres(10) })).toBeNull();
    expect(await fits(4, 9.5, { sellingStep: centimetres(10) })).toBe("fat-quarter");
    expect(await fits(4, 9.5)).toBeNull();
  });

  it("leaves room for shrinkage", async () => {
    expect(await fits(16, 4.5, { shrinkAlong: 300 })).toBeNull();
  });
});
