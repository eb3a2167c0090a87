import { describe, expect, it } from "vitest";
import { roundToCash } from "@/lib/core/money/cash-rounding";
import { taxOf, taxSale, WHOLE } from "@/lib/core/money/tax";
import { figure, readRows, type PublishedRow } from "./published-rows";

/** Published examples of cash rounding and sales tax, each with its source. Cash to the nearest coin, halves up, on the total with tax. */
type Kind = "cash" | "sale" | "third-decimal" | "given";
type Row = PublishedRow<Kind, unknown>;

const rows = readRows<Kind, unknown>("published-money");
const CENTS = 100;

const cents = (amount: number) => Math.round(amount * CENTS);

function check(row: Row): void {
  if (row.kind === "cash") {
    // Quebec's rows leave the coin unsaid: it is Canada's 5 cents.
    const coin = typeof row.inputs.unit === "number" ? cents(row.inputs.unit) : 5;
    expect(roundToCash(cents(figure(row, "cash_total")), coin)).toBe(cents(Number(row.expected)));
    return;
  }
  if (row.kind !== "sale" || !Array.isArray(row.inputs.items)) throw new Error(`Nothing follows from ${row.id}.`);
  const sale = taxSale(row.inputs.items.map((item) => ({ amount: cents(Number(item)), rate: figure(row, "tax") * WHOLE })), { by: "sale", included: false });
  expect(row.expected).toEqual({ total: sale.total / CENTS, cash: roundToCash(sale.total, 5) / CENTS });
}

describe("published money", () => {
  const agreed = rows.filter((row) => row.recomputed === true);
  const others = rows.filter((row) => row.recomputed !== true);

  it("is all there", () => {
    expect(rows).toHaveLength(14);
    expect(agreed).toHaveLength(11);
  });

  it.each(agreed.map((row) => [row.id, row] as const))("%s", (_, row) => check(row));

  it.each(others.filter((row) => row.kind === "given").map((row) => [row.id, row.reason ?? ""] as const))("%s is not recomputed: %s", (_, reason) => {
    expect(reason).not.toBe("");
  });

  it("H-SST-rule: the third decimal above 4 rounds up", () => {
    // 6.5 % of 1.00 is 0.065, of 0.99 is 0.06435, of 1.30 is 0.0845: the third decimals are 5, 4 and 4.
    expect(others.some((row) => row.kind === "third-decimal")).toBe(true);
    expect([100, 99, 130].map((amount) => taxOf(amount, 65_000, false))).toEqual([7, 6, 8]);
  });
});
