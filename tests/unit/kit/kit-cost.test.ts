import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { priceKit, roundUpTo, type KitCostInput, type PriceEnding } from "@/lib/core/kit/kit-cost";
import { length, yards } from "@/lib/core/measure/length";

const kit: KitCostInput = {
  currency: "USD",
  per: "yard",
  fabrics: [
    { fabric: "1", cutLength: yards(2.375), unitPrice: 146_000, unitCost: 70_000 },
    { fabric: "2", cutLength: yards(0.5), unitPrice: 124_000, unitCost: 62_000 },
  ],
  notions: [{ name: "Thread", count: 2, price: 450, cost: 210 }],
  sheetCost: 120,
  labourMinutes: 20,
  labourRate: 1800,
  ending: "half",
};

describe("a kit's price", () => {
  it("is fabrics at retail, notions, sheet and labour, rounded up", () => {
    // 34.68 + 6.20 + 9.00 + 1.20 + 6.00 is 57.08; what it costs is 16.63 + 3.10 + 4.20 + 1.20 + 6.00.
    const answer = priceKit(kit);
    expect(answer).toMatchObject({ sum: 5708, suggested: 5750, roundedUp: 42, soldAt: 5750, cost: 3113, margin: 2637, marginBasisPoints: 4586 });
    expect(answer.lines.map((line) => [line.kind, line.price, line.cost])).toEqual([
      ["fabric", 3468, 1663],
      ["fabric", 620, 310],
      ["notion", 900, 420],
      ["sheet", 120, 120],
      ["labour", 600, 600],
    ]);
  });

  it("may be set by the shop, at a loss too", () => {
    expect(priceKit({ ...kit, setPrice: 3000 })).toMatchObject({ suggested: 5750, soldAt: 3000, margin: -113, marginBasisPoints: -377 });
    expect(priceKit({ ...kit, setPrice: 0 })).toMatchObject({ margin: -3113, marginBasisPoints: null });
  });

  it("keeps the tax inside it out of the margin", () => {
    // 20 % inside 60.00 is 10.00.
    expect(priceKit({ ...kit, setPrice: 6000, includedTax: 200_000 })).toMatchObject({ soldAt: 6000, margin: 5000 - 3113 });
  });

  it("refuses amounts that cannot be", () => {
    expect(() => priceKit({ ...kit, sheetCost: -1 })).toThrow(RangeError);
    expect(() => priceKit({ ...kit, labourMinutes: Number.NaN })).toThrow(RangeError);
    expect(() => priceKit({ ...kit, fabrics: [{ fabric: "1", cutLength: length(-1), unitPrice: 1, unitCost: 1 }] })).toThrow(RangeError);
  });
});

describe("rounding a price up", () => {
  it("ends as the shop wants it", () => {
    expect(roundUpTo(5708, "none", "USD")).toBe(5708);
    expect(roundUpTo(5708, "whole", "USD")).toBe(5800);
    expect(roundUpTo(5708, "half", "USD")).toBe(5750);
    expect(roundUpTo(5700, "half", "USD")).toBe(5700);
    expect(roundUpTo(5708, "ninety-nine", "USD")).toBe(5799);
    expect(roundUpTo(5799, "ninety-nine", "USD")).toBe(5799);
    expect(roundUpTo(5800, "ninety-nine", "USD")).toBe(5899);
    expect(roundUpTo(1240, "whole", "JPY")).toBe(1300);
    expect(roundUpTo(0, "ninety-nine", "USD")).toBe(0);
  });

  it("never goes down, nor further than it must", () => {
    fc.assert(
      fc.property(fc.nat(1_000_000), fc.constantFrom<PriceEnding>("none", "whole", "half", "ninety-nine"), (amount, ending) => {
        const price = roundUpTo(amount, ending, "USD");
        expect(price).toBeGreaterThanOrEqual(amount);
        expect(price - amount).toBeLessThan(100);
        expect(roundUpTo(price, ending, "USD")).toBe(price);
      }),
    );
  });
});
