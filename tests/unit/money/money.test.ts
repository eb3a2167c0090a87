import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { metres, yards } from "@/lib/core/measure/length";
import { roundToCash } from "@/lib/core/money/cash-rounding";
import { isCurrency } from "@/lib/core/money/currency";
import { formatFigure, formatMoney, parseMoney } from "@/lib/core/money/money";
import { taxSaleInParts } from "@/lib/core/money/tax-parts";
import { shareOut, taxOf, taxSale } from "@/lib/core/money/tax";
import { settle, stillToPay } from "@/lib/core/money/tenders";
import { countTotal, lineTotal, unitPrice, unitPriceOf } from "@/lib/core/money/unit-price";

describe("a line", () => {
  it("is rounded once, half up", () => {
    // 2 3/8 yd at 14.60 is 34.675.
    expect(lineTotal(unitPrice(146_000), yards(2.375), "yard", "USD")).toBe(3468);
    expect(lineTotal(unitPrice(124_000), yards(1), "yard", "USD")).toBe(1240);
    expect(lineTotal(unitPrice(125_000), metres(0.4), "metre", "EUR")).toBe(500);
    expect(lineTotal(unitPrice(12_400_000), yards(0.125), "yard", "JPY")).toBe(155);
    expect(countTotal(unitPriceOf(650, "USD"), 3, "USD")).toBe(1950);
  });

  it("is never off by more than half a cent", () => {
    fc.assert(
      fc.property(fc.nat(10_000_000), fc.integer({ min: 1, max: 100_000_000 }), (price, length) => {
        const exact = (price * length) / 146_304 / 100;
        expect(Math.abs(lineTotal(price, length, "yard", "USD") - exact)).toBeLessThanOrEqual(0.5 + 1e-6);
      }),
    );
  });
});

describe("tax", () => {
  it("is rounded by line or once by sale", () => {
    const lines = [{ amount: 1050, rate: 65_000 }, { amount: 1050, rate: 65_000 }];
    // 6.5 % of 10.50 is 0.6825: twice rounded 1.36, once 1.365, half up 1.37.
    expect(taxSale(lines, { by: "line", included: false })).toEqual({ lineTaxes: [68, 68], goods: 2100, tax: 136, total: 2236 });
    expect(taxSale(lines, { by: "sale", included: false })).toMatchObject({ tax: 137, total: 2237 });
  });

  it("is found inside prices that hold it", () => {
    expect(taxOf(12_000, 200_000, true)).toBe(2000);
    expect(taxSale([{ amount: 12_000, rate: 200_000 }], { by: "line", included: true })).toMatchObject({ tax: 2000, total: 12_000 });
  });

  it("adds up, however it is shared", () => {
    fc.assert(
      fc.property(fc.array(fc.record({ amount: fc.nat(100_000), rate: fc.constantFrom(0, 50_000, 65_000, 200_000) }), { minLength: 1, maxLength: 12 }), fc.boolean(), (lines, included) => {
        const sale = taxSale(lines, { by: "sale", included });
        expect(sale.lineTaxes.reduce((sum, each) => sum + each, 0)).toBe(sale.tax);
        for (const tax of sale.lineTaxes) expect(tax).toBeGreaterThanOrEqual(0);
      }),
    );
    fc.assert(
      fc.property(fc.nat(10_000), fc.array(fc.nat(1000), { minLength: 1, maxLength: 9 }), (amount, weights) => {
        expect(shareOut(amount, weights).reduce((sum, each) => sum + each, 0)).toBe(amount);
      }),
    );
  });
});

describe("tax on what comes back", () => {
  it("is what was paid on it", () => {
    for (const included of [true, false]) fc.assert(fc.property(fc.nat(1_000_000), fc.constantFrom(0, 65_000, 200_000), (amount, rate) => void expect(taxOf(-amount, rate, included)).toBe(taxOf(amount, rate, included) === 0 ? 0 : -taxOf(amount, rate, included))));
  });

  it("adds up beside goods that are bought", () => {
    const signed = fc.record({ amount: fc.integer({ min: -50_000, max: 100_000 }), rate: fc.constantFrom(0, 65_000, 200_000) });
    fc.assert(
      fc.property(fc.array(signed, { minLength: 1, maxLength: 12 }), fc.boolean(), (lines, included) => {
        const sale = taxSale(lines, { by: "sale", included });
        expect(sale.lineTaxes.reduce((sum, each) => sum + each, 0)).toBe(sale.tax);
      }),
    );
  });
});

describe("several taxes at once", () => {
  const federal = { name: "Federal", rate: 50_000 };
  const provincial = { name: "Provincial", rate: 99_750 };

  it("are each rounded for themselves", () => {
    // 5 % and 9.975 % of 10.50 are 0.525 and 1.0473…: 0.53 and 1.05.
    expect(taxSaleInParts([{ amount: 1050, rates: [federal, provincial] }], { by: "line", included: false })).toEqual({
      parts: [
        { ...federal, on: 1050, tax: 53 },
        { ...provincial, on: 1050, tax: 105 },
      ],
      goods: 1050,
      tax: 158,
      total: 1208,
    });
  });

  it("lie only on the goods that they are for", () => {
    const sale = taxSaleInParts([{ amount: 1000, rates: [federal] }, { amount: 500, rates: [federal, provincial] }, { amount: 300, rates: [] }], { by: "sale", included: false });
    expect(sale.parts.map((part) => [part.name, part.on, part.tax])).toEqual([["Federal", 1500, 75], ["Provincial", 500, 50]]);
    expect(sale).toMatchObject({ goods: 1800, tax: 125, total: 1925 });
  });

  it("agree with the tax of one rate", () => {
    const line = fc.record({ amount: fc.nat(100_000), rate: fc.constantFrom(50_000, 99_750, 200_000) });
    fc.assert(
      fc.property(fc.array(line, { minLength: 1, maxLength: 8 }), fc.boolean(), fc.constantFrom("line", "sale"), (lines, included, by) => {
        const parts = taxSaleInParts(lines.map(({ amount, rate }) => ({ amount, rates: [{ name: "Tax", rate }] })), { by, included });
        expect(parts).toMatchObject({ tax: taxSale(lines, { by, included }).tax, total: taxSale(lines, { by, included }).total });
      }),
    );
  });
});

describe("paying", () => {
  it("gives change for cash alone", () => {
    expect(settle(3468, [{ kind: "cash", given: 4000 }])).toMatchObject({ ok: true, value: { change: 532, rounding: 0 } });
    expect(settle(3468, [{ kind: "card", given: 4000 }])).toMatchObject({ ok: false, fault: { code: "too-much" } });
    expect(settle(3468, [{ kind: "cash", given: 3000 }])).toMatchObject({ ok: false, fault: { code: "not-enough", facts: { missing: 468 } } });
    expect(settle(3468, [{ kind: "card", given: 3000 }, { kind: "cash", given: 500 }])).toMatchObject({ ok: true, value: { change: 32 } });
    expect(stillToPay(3468, [{ kind: "card", given: 3000 }])).toBe(468);
  });

  it("rounds what is paid in cash to what coins there are", () => {
    expect(roundToCash(1002, 5)).toBe(1000);
    expect(roundToCash(1003, 5)).toBe(1005);
    expect(roundToCash(-1003, 5)).toBe(-1005);
    expect(() => roundToCash(1003, 0)).toThrow(RangeError);
    expect(settle(1003, [{ kind: "cash", given: 1010 }], 5)).toMatchObject({ ok: true, value: { rounding: 2, change: 5 } });
    expect(settle(1003, [{ kind: "card", given: 1003 }], 5)).toMatchObject({ ok: true, value: { rounding: 0, change: 0 } });
  });
});

describe("amounts", () => {
  it("are read again as they were written", () => {
    fc.assert(
      fc.property(fc.nat(100_000_000), fc.constantFrom(["USD", "en-US"], ["EUR", "de-DE"], ["CHF", "de-CH"], ["JPY", "ja-JP"], ["SEK", "sv-SE"]), (units, [currency = "", locale]) => {
        expect(parseMoney(formatFigure(units, currency, locale), currency)).toEqual({ ok: true, value: units });
        expect(parseMoney(formatMoney(units, currency, locale), currency)).toEqual({ ok: true, value: units });
      }),
    );
  });


  it("are written and typed in the currency's own figures", () => {
    expect(formatMoney(9400, "USD")).toBe("$94.00");
    expect(formatFigure(123_450, "USD")).toBe("1,234.50");
    expect(parseMoney("94", "USD")).toEqual({ ok: true, value: 9400 });
    expect(parseMoney("12,4", "EUR")).toEqual({ ok: true, value: 1240 });
    expect(parseMoney("1.240", "USD")).toMatchObject({ ok: false, fault: { code: "too-fine" } });
    expect(parseMoney("1240", "JPY")).toEqual({ ok: true, value: 1240 });
    expect(parseMoney("1,234.50", "USD")).toEqual({ ok: true, value: 123_450 });
    expect(parseMoney("1.234,50 €", "EUR")).toEqual({ ok: true, value: 123_450 });
    expect(parseMoney("CHF 234'567.05", "CHF")).toEqual({ ok: true, value: 23_456_705 });
    expect(parseMoney("1,240", "JPY")).toEqual({ ok: true, value: 1240 });
    expect(parseMoney("12.4", "JPY")).toMatchObject({ ok: false, fault: { code: "too-fine" } });
    expect(parseMoney("2000000", "USD", 100_000)).toMatchObject({ ok: false, fault: { code: "too-much", facts: { most: 100_000 } } });
    expect(isCurrency("toString")).toBe(false);
    for (const text of ["1,23,456.00", "1.2,3.4", "", "-1", "ten", "1.2.3", "NaN"]) expect(parseMoney(text, "USD").ok, text).toBe(false);
  });
});
