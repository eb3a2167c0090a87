import { readFileSync } from "node:fs";
import path from "node:path";
import loadHighs from "highs";
import { describe, expect, it } from "vitest";
import { checkStripPlan } from "@/lib/core/cutting/check-strip-plan";
import { createHighsSolver } from "@/lib/core/cutting/highs-solver";
import { planStrips, STRIP_BUDGET } from "@/lib/core/cutting/plan-strips";
import { allowWaste } from "@/lib/core/cutting/waste-allowance";
import { inches, length, PER_EIGHTH_YARD, toYards } from "@/lib/core/measure/length";
import type { Blank, StripPlan } from "@/lib/core/piece/strip-plan";

/**
 * Published tables of how many squares or strips a length of a stated width gives, each row with its source. The rule
 * is that of the tables: floor(width / square) x floor((length - allowance) / square), the allowance as each row says.
 */
interface Row {
  readonly id: string;
  readonly kind: "squares" | "strips" | "squares-per-strip" | "yards-for-strips";
  readonly expected: number;
  readonly square?: number;
  readonly strip?: number;
  readonly strips?: number;
  readonly width?: number;
  readonly alsoWidth?: number;
  readonly length?: number;
  readonly allowance?: number;
  readonly recomputed: boolean;
  readonly reason?: string;
}

const file = path.join(import.meta.dirname, "../fixtures/published-pieces.json");
const rows = (JSON.parse(readFileSync(file, "utf8")) as { rows: Row[] }).rows;
const solver = createHighsSolver(() => loadHighs());

async function plan(blank: Partial<Blank> & Pick<Blank, "along" | "across" | "count">, width: number): Promise<StripPlan> {
  const whole: Blank = { key: "A", pieceKey: "A", label: "A", gives: 1, mayTurn: false, endWaste: length(0), mark: "plain", ...blank };
  const result = await planStrips([whole], inches(width), STRIP_BUDGET, solver);
  if (!result.ok) throw new Error(result.fault.message);
  expect(checkStripPlan(result.value, [whole])).toEqual([]);
  return result.value;
}

/** The most squares whose plan is no longer than the length: as many rows as there are, as many in each as fit. */
async function mostSquares(square: number, width: number, available: number): Promise<number> {
  const side = inches(square);
  let least = 0;
  let most = Math.ceil((width * Math.max(0, available)) / square / square) + 1;
  while (most - least > 1) {
    const tried = Math.floor((least + most) / 2);
    const fits = (await plan({ along: side, across: side, count: tried }, width)).length <= inches(available);
    if (fits) least = tried;
    else most = tried;
  }
  return least;
}

function need(value: number | undefined): number {
  if (value === undefined) throw new Error("The row lacks a figure.");
  return value;
}

async function recompute(row: Row): Promise<number> {
  const available = (row.length ?? 0) - (row.allowance ?? 0);
  switch (row.kind) {
    case "squares":
      return mostSquares(need(row.square), need(row.width), available);
    case "strips": {
      const strip = inches(need(row.strip));
      return Math.floor(inches(available) / (await plan({ along: strip, across: inches(40), count: 1 }, 40)).length);
    }
    case "squares-per-strip":
      return mostSquares(need(row.square), need(row.width), need(row.square));
    case "yards-for-strips": {
      const strips = await plan({ along: inches(need(row.strip)), across: inches(40), count: need(row.strips) }, 40);
      const none = length(0);
      return toYards(allowWaste(strips, { straightening: none, misCut: { kind: "percent", basisPoints: 0 }, shrinkAlong: 0, shrinkAcross: 0, endOfBolt: none, sellingStep: length(PER_EIGHTH_YARD), leastCut: none }).cutLength);
    }
  }
}

describe("published counts from a length", () => {
  const agreed = rows.filter((row) => row.recomputed);
  const others = rows.filter((row) => !row.recomputed);

  it("has every row of the collection", () => {
    expect(rows).toHaveLength(171);
    expect(agreed.length).toBeGreaterThan(150);
  });

  it.each(agreed.map((row) => [row.id, row] as const))("%s", async (_, row) => {
    expect(await recompute(row)).toBe(row.expected);
    if (row.alsoWidth) expect(await recompute({ ...row, width: row.alsoWidth })).toBe(row.expected);
  });

  it.each(others.map((row) => [row.id, row.reason ?? "", row] as const))("%s differs: %s", async (_, reason, row) => {
    expect(reason).not.toBe("");
    expect(await recompute(row)).not.toBe(row.expected);
  });
});
