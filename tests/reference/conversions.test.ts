import { describe, expect, it } from "vitest";
import { formatInches, formatYards } from "@/lib/core/measure/format";
import { centimetres, inches, length, metres, PER_CENTIMETRE, PER_INCH, PER_YARD, toInches, toMetres, toYards, type Length } from "@/lib/core/measure/length";
import { parseInches, parseYards } from "@/lib/core/measure/parse";
import { roundNearest } from "@/lib/core/measure/rounding";
import { figure, readRows, type PublishedRow } from "./published-rows";

/**
 * Published conversions between yards, inches and metres, each with its source. Rules: lengths are exact; decimal yards to three places;
 * the nearest inch with halves up; editors' metric lists are whole steps within one step of the exact length.
 */
type Kind = "inches" | "decimal-yard" | "sixteenths" | "metres-by-10-cm" | "centimetres-by-5" | "fat-quarters-in-metres" | "nearest-inch";
type Row = PublishedRow<Kind, number>;

const rows = readRows<Kind, number>("published-conversions");

/** Yards of a row, thirds and sixths too. */
function yardsOf(row: Row): Length {
  const [whole, numerator = 0, denominator = 1] = String(row.inputs.yards).includes("/") ? mixed(String(row.inputs.yards)) : [Number(row.inputs.yards)];
  return length((((whole ?? 0) * denominator + numerator) * PER_YARD) / denominator);
}

function mixed(text: string): number[] {
  const [fraction = "", whole = "0"] = text.split(" ").reverse();
  return [Number(whole), ...fraction.split("/").map(Number)];
}

function recompute(row: Row): number {
  switch (row.kind) {
    case "inches":
      return toInches(yardsOf(row));
    case "decimal-yard":
      return Number(toYards(yardsOf(row)).toFixed(3));
    case "sixteenths":
      return toInches(inches(figure(row, "sixteenths") / 16));
    case "metres-by-10-cm":
      return toMetres(yardsOf(row));
    case "centimetres-by-5":
      return inches(figure(row, "inches")) / PER_CENTIMETRE;
    case "fat-quarters-in-metres":
      return Number(toMetres(length(figure(row, "fat_quarters") * inches(9))).toFixed(2));
    case "nearest-inch":
      return roundNearest(yardsOf(row), inches(1)) / PER_INCH;
  }
}

describe("published conversions", () => {
  const agreed = rows.filter((row) => row.recomputed === true);
  const others = rows.filter((row) => row.recomputed !== true);

  it("are all there", () => {
    expect(rows).toHaveLength(40);
    expect(agreed).toHaveLength(36);
  });

  it.each(agreed.map((row) => [row.id, row] as const))("%s", (_, row) => {
    expect(Math.abs(recompute(row) - row.expected)).toBeLessThanOrEqual(row.tolerance);
    const step = row.kind === "metres-by-10-cm" ? centimetres(10) : row.kind === "centimetres-by-5" ? centimetres(5) : null;
    if (step === null) return;
    const printed = row.kind === "metres-by-10-cm" ? metres(row.expected) : centimetres(row.expected);
    const exact = row.kind === "metres-by-10-cm" ? yardsOf(row) : inches(figure(row, "inches"));
    expect(printed % step).toBe(0);
    expect(Math.abs(printed - exact)).toBeLessThan(step);
  });

  it.each(others.map((row) => [row.id, row.reason ?? "", row] as const))("%s differs: %s", (_, reason, row) => {
    expect(reason).not.toBe("");
    expect(recompute(row)).not.toBe(row.expected);
  });

  it("are read as they are printed, and written again", () => {
    for (const row of rows.filter((each) => each.kind === "inches" && each.recomputed === true)) {
      const text = String(row.inputs.yards);
      const isThird = /\/3$/.test(text);
      // A third of a yard is no eighth: it is typed in inches.
      expect(parseYards(isThird ? `${row.expected} in` : text), row.id).toEqual({ ok: true, value: yardsOf(row) });
      if (!isThird) expect(formatYards(yardsOf(row))).toBe(text);
      expect(parseInches(String(row.expected))).toEqual({ ok: true, value: yardsOf(row) });
    }
    for (const row of rows.filter((each) => each.kind === "sixteenths")) {
      expect(parseInches(`${figure(row, "sixteenths")}/16`)).toEqual(parseInches(formatInches(inches(row.expected))));
    }
  });
});
