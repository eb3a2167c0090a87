import loadHighs from "highs";
import { describe, expect, it } from "vitest";
import { createHighsSolver } from "@/lib/core/cutting/highs-solver";
import { planStrips, STRIP_BUDGET } from "@/lib/core/cutting/plan-strips";
import { readAloud } from "@/lib/core/cutting/steps";
import { formatMeasure } from "@/lib/core/measure/format";
import { inches, type Length } from "@/lib/core/measure/length";
import type { Blank } from "@/lib/core/piece/strip-plan";
import { buildBlank } from "./build-blank";

const solver = createHighsSolver(() => loadHighs());
const say = (value: Length) => formatMeasure(value, "yards");

async function aloud(blanks: readonly Blank[]): Promise<string[]> {
  const plan = await planStrips(blanks, inches(40), STRIP_BUDGET, solver);
  if (!plan.ok) throw new Error(plan.fault.message);
  return readAloud(plan.value, blanks, say);
}

describe("readAloud", () => {
  it("says equal strips once, and what is cut from the squares", async () => {
    expect(await aloud([buildBlank("B", 3.875, 3.875, 120, { gives: 2, mark: "diagonal" })])).toEqual([
      "Cut 12 strips 3 7/8 in wide. Sub-cut each into 10 squares. Cut each once corner to corner: 240 B.",
    ]);
  });

  it("says the rest of a strip and what is trimmed", async () => {
    expect(await aloud([buildBlank("A", 6.5, 6.5, 5), buildBlank("C", 2, 2, 3)])).toEqual([
      "Cut 1 strip 6 1/2 in wide. Sub-cut it from the near selvage into 5 A: squares 6 1/2 in; then 3 C: squares 2 in, trimmed to 2 in.",
    ]);
  });

  it("says whole strips and strips at an angle", async () => {
    expect(await aloud([buildBlank("Binding", 2.5, 40, 6, { mark: "long" })])).toEqual(["Cut 6 strips 2 1/2 in wide. Keep each 40 in long. This gives 6 Binding."]);
    expect(await aloud([buildBlank("T", 3.5, 4, 18, { endWaste: inches(3), mark: "slant" })])).toEqual([
      "Cut 2 strips 3 1/2 in wide. Sub-cut each at an angle into 9, 4 in apart along the strip. This gives 18 T.",
    ]);
  });
});
