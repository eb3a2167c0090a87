import bwip from "bwip-js/node";
import { describe, expect, it } from "vitest";
import { gs1CheckDigit, parseGtin } from "@/lib/core/codes/gtin";
import { inches, millimetres, PER_MILLIMETRE } from "@/lib/core/measure/length";
import { figure, readRows, type PublishedRow } from "./published-rows";

/** Published check digits, sizes and addresses of barcodes, each with its source. */
type Kind = "check-digit" | "code-128-check" | "digital-link" | "longest-symbol" | "height-by-module" | "module-by-magnification" | "given";
type Row = PublishedRow<Kind, unknown>;

const rows = readRows<Kind, unknown>("published-barcodes");
/** Nominal EAN module and height in mm, and the magnifications that are allowed: 80, 100 and 200 %. */
const NOMINAL = { module: 0.33, height: 22.85, magnifications: [0.8, 1, 2] };
const WIDTHS_IN_SYMBOL = 6;
const WIDTHS_IN_STOP = 7;

/** `raw` takes Code 128 values as they are; the encoder knows the option, its types do not. */
function widthsOf(text: string): number[] {
  const options = { bcid: "code128", text, raw: true };
  const [symbol] = bwip.raw(options);
  if (!symbol || !("sbs" in symbol)) throw new Error("Code 128 came without its bars");
  return [...symbol.sbs];
}

/** Bar widths of the check symbol that the labels' own encoder sets behind these Code 128 values. */
function checkSymbol(start: number, values: readonly number[]): number[] {
  const text = [start, ...values].map((value) => `^${String(value).padStart(3, "0")}`).join("");
  return widthsOf(text).slice(-WIDTHS_IN_SYMBOL - WIDTHS_IN_STOP, -WIDTHS_IN_STOP);
}

/** Bar widths of one Code 128 value, as it is set first behind the start. */
function symbolOf(start: number, value: number): number[] {
  return widthsOf(`^${start}^${String(value).padStart(3, "0")}`).slice(WIDTHS_IN_SYMBOL, 2 * WIDTHS_IN_SYMBOL);
}

function numbers(value: unknown): number[] {
  if (!Array.isArray(value)) throw new Error("A row of numbers was expected.");
  return value.map(Number);
}

function check(row: Row): void {
  switch (row.kind) {
    case "check-digit":
      expect(gs1CheckDigit(String(row.inputs.body))).toBe(row.expected);
      return;
    case "code-128-check":
      expect(checkSymbol(figure(row, "start"), numbers(row.inputs.values))).toEqual(symbolOf(figure(row, "start"), Number(row.expected)));
      return;
    case "digital-link": {
      const key = /\/01\/(\d{14})/.exec(String(row.expected))?.[1] ?? "";
      expect(parseGtin(key.replace(/^0/, ""))).toMatchObject({ ok: true, value: { key, use: "global" } });
      return;
    }
    case "longest-symbol":
      expect(inches(6.5) / PER_MILLIMETRE).toBe(165.1);
      expect(row.expected).toMatchObject({ inch: 6.5, mm: 165.1 });
      expect(millimetres(165.1)).toBe(inches(6.5));
      return;
    case "height-by-module":
      numbers(row.expected).forEach((height, at) => expect(Math.abs(height - (NOMINAL.height * ([0.495, 0.66, 0.66][at] ?? 0)) / NOMINAL.module)).toBeLessThanOrEqual(row.tolerance));
      return;
    case "module-by-magnification":
      numbers(row.expected).forEach((module, at) => expect(module).toBeCloseTo(NOMINAL.module * (NOMINAL.magnifications[at] ?? 0), 9));
      return;
    case "given":
      throw new Error(`Nothing follows from ${row.id}.`);
  }
}

describe("published barcodes", () => {
  const agreed = rows.filter((row) => row.recomputed === true);
  const others = rows.filter((row) => row.recomputed !== true);

  it("are all there", () => {
    expect(rows).toHaveLength(22);
    expect(agreed).toHaveLength(17);
  });

  it.each(agreed.map((row) => [row.id, row] as const))("%s", (_, row) => check(row));

  it.each(others.map((row) => [row.id, row.reason ?? "", row] as const))("%s is not recomputed: %s", (_, reason, row) => {
    expect(reason).not.toBe("");
    expect(row.kind).toBe("given");
  });
});
