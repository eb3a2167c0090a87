import loadHighs from "highs";
import { describe, expect, it } from "vitest";
import { checkStripPlan } from "@/lib/core/cutting/check-strip-plan";
import { createHighsSolver } from "@/lib/core/cutting/highs-solver";
import { planStrips, STRIP_BUDGET } from "@/lib/core/cutting/plan-strips";
import { inches, length } from "@/lib/core/measure/length";
import type { Strip, StripPlan, SubCut } from "@/lib/core/piece/strip-plan";
import { buildBlank } from "./build-blank";

const blanks = [
  buildBlank("A", 4.5, 6.5, 9),
  buildBlank("B", 3.5, 3.5, 15),
  buildBlank("T", 3.5, 2, 11, { endWaste: inches(1.5), mark: "slant" }),
];

async function good(): Promise<StripPlan> {
  const result = await planStrips(blanks, inches(40), STRIP_BUDGET, createHighsSolver(() => loadHighs()));
  if (!result.ok) throw new Error(result.fault.message);
  return result.value;
}

/** The plan with one strip changed, and one sub-cut of it where that is what is meant. */
function withStrip(plan: StripPlan, at: number, change: (strip: Strip) => Strip): StripPlan {
  return { ...plan, strips: plan.strips.map((strip, index) => (index === at ? change(strip) : strip)) };
}

function withCut(plan: StripPlan, key: string, change: (cut: SubCut) => SubCut): StripPlan {
  const at = plan.strips.findIndex((strip) => strip.cuts.some((cut) => cut.blank === key));
  return withStrip(plan, at, (strip) => {
    const cutAt = strip.cuts.findIndex((cut) => cut.blank === key);
    return { ...strip, cuts: strip.cuts.map((cut, index) => (index === cutAt ? change(cut) : cut)) };
  });
}

describe("checkStripPlan", () => {
  it("finds nothing wrong with a good plan", async () => {
    expect(checkStripPlan(await good(), blanks)).toEqual([]);
  });

  const wrongs: [string, (plan: StripPlan) => StripPlan, RegExp][] = [
    ["a gap between strips", (plan) => withStrip(plan, 1, (strip) => ({ ...strip, startsAt: length(strip.startsAt + 1) })), /starts at/],
    ["a length that is not the strips'", (plan) => ({ ...plan, length: length(plan.length + 1) }), /the plan says/],
    ["a strip narrower than a piece", (plan) => withStrip(plan, 0, (strip) => ({ ...strip, width: length(strip.width - 1) })), /is narrower than/],
    ["pieces that overlap", (plan) => withCut(plan, "A", (cut) => ({ ...cut, at: length(cut.at + 1) })), /reaches/],
    ["a piece beyond the width", (plan) => withCut(plan, "A", (cut) => ({ ...cut, at: inches(38) })), /usable width/],
    ["a piece before the selvage", (plan) => withCut(plan, "A", (cut) => ({ ...cut, at: length(-1) })), /before the near selvage/],
    ["a turned one-way piece", (plan) => withCut(plan, "A", (cut) => ({ ...cut, turned: true, along: cut.across, across: cut.along })), /may not be turned/],
    ["a piece of another size", (plan) => withCut(plan, "B", (cut) => ({ ...cut, across: length(cut.across - 1) })), /wanted/],
    ["a piece too few", (plan) => withStrip(plan, 0, (strip) => ({ ...strip, cuts: strip.cuts.slice(1) })), /times, wanted/],
    ["an unknown piece", (plan) => withCut(plan, "A", (cut) => ({ ...cut, blank: "Z" })), /not wanted/],
    ["a bound above the length", (plan) => ({ ...plan, bounds: { ...plan.bounds, strips: length(plan.length + 1) } }), /above the length/],
    ["bounds the wrong way round", (plan) => ({ ...plan, bounds: { strips: length(1), anyLayout: length(2) } }), /above that of strips/],
    ["optimal without a bound to show it", (plan) => ({ ...plan, status: "optimal", bounds: { strips: length(plan.length - 1), anyLayout: length(0) } }), /called optimal/],
    ["an empty strip", (plan) => withStrip(plan, 0, (strip) => ({ ...strip, cuts: [] })), /holds nothing/],
  ];
  it.each(wrongs)("finds %s", async (_, spoil, sentence) => {
    expect(checkStripPlan(spoil(await good()), blanks).join(" ")).toMatch(sentence);
  });

  it("finds slanting ends that lie under the next piece", () => {
    const angled = buildBlank("T", 3.5, 2, 1, { endWaste: inches(1), mark: "slant" });
    const square = buildBlank("S", 3.5, 3.5, 1);
    const cut = (blank: string, at: number, across: number): SubCut => ({ blank, at: inches(at), across: inches(across), along: inches(3.5), turned: false });
    const plan = (at: number): StripPlan => ({
      status: "feasible",
      usableWidth: inches(40),
      strips: [{ startsAt: length(0), width: inches(3.5), cuts: [cut("T", 0, 2), cut("S", at, 3.5)] }],
      length: inches(3.5),
      bounds: { strips: inches(3.5), anyLayout: inches(1) },
      work: { patterns: 0, programmes: 0, nodes: 0 },
    });
    expect(checkStripPlan(plan(3), [angled, square])).toEqual([]);
    expect(checkStripPlan(plan(2), [angled, square])).not.toEqual([]);
  });
});
