import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { displayInches, formatExactInches, formatInches, formatMetres, formatYards, wordsOfInches, wordsOfYards } from "@/lib/core/measure/format";
import { inches, length, metres, millimetres, PER_CENTIMETRE, PER_EIGHTH_YARD, PER_THIRTY_SECOND, yards } from "@/lib/core/measure/length";
import { parseInches, parseMetres, parseMillimetres, parseYards } from "@/lib/core/measure/parse";
import { roundNearest, roundUp } from "@/lib/core/measure/rounding";

const value = <T>(result: { ok: true; value: T } | { ok: false }) => (result.ok ? result.value : null);

describe("lengths", () => {
  it("are exact in both systems", () => {
    expect(inches(1)).toBe(millimetres(25.4));
    expect(inches(1 / 32)).toBe(127);
    expect(millimetres(1)).toBe(160);
    expect(yards(0.125)).toBe(18_288);
    expect(metres(1)).toBe(160_000);
    expect(() => inches(1 / 64)).toThrow(RangeError);
    expect(() => length(0.5)).toThrow(RangeError);
  });
});

describe("rounding", () => {
  // Common practice: a 3 in half-square triangle is cut from a 3 7/8 in square (exactly 3.8536 in).
  it("goes up to the next mark, and leaves what is on one", () => {
    const eighth = inches(1 / 8);
    expect(roundUp(3.8536 * 4064, eighth)).toBe(inches(3.875));
    expect(roundUp(inches(3.5), eighth)).toBe(inches(3.5));
    expect(roundUp(inches(3.5) + 1e-7, eighth)).toBe(inches(3.5));
    expect(roundNearest(4.743 * 4064, eighth)).toBe(inches(4.75));
    expect(roundNearest(inches(3.0625), eighth)).toBe(inches(3.125));
  });
});

describe("typed lengths", () => {
  it("are yards and eighths at the counter", () => {
    expect(value(parseYards("2 3"))).toBe(yards(2.375));
    expect(value(parseYards("2 3/8"))).toBe(yards(2.375));
    expect(value(parseYards("3/8"))).toBe(yards(0.375));
    expect(value(parseYards(" 2  yd"))).toBe(yards(2));
  });

  it("ask which is meant when a decimal point is typed", () => {
    expect(parseYards("2.5")).toMatchObject({ ok: false, fault: { code: "ambiguous", facts: { readings: [yards(2.625), yards(2.5)] } } });
    expect(parseYards("2.3")).toMatchObject({ ok: false, fault: { code: "ambiguous", facts: { readings: [yards(2.375)] } } });
  });

  it("are inches to the thirty-second", () => {
    expect(value(parseInches("3 7/8"))).toBe(inches(3.875));
    expect(value(parseInches("3 13/16"))).toBe(inches(3.8125));
    expect(value(parseInches("12.5 in"))).toBe(inches(12.5));
    expect(parseInches("3.3")).toMatchObject({ ok: false, fault: { code: "off-the-step" } });
  });

  it("are metres and centimetres in a metric shop", () => {
    expect(value(parseMetres("2 40"))).toBe(metres(2.4));
    expect(value(parseMetres("2 m 40"))).toBe(metres(2.4));
    expect(value(parseMetres("2.4"))).toBe(metres(2.4));
    expect(value(parseMetres("40 cm"))).toBe(metres(0.4));
    expect(value(parseMillimetres("97.5"))).toBe(millimetres(97.5));
  });

  it("are refused with a sentence when they are none", () => {
    for (const text of ["", "two", "-1", "1/3", "9/8", "2 8", "1e9", "0", "101", "½", "<b>2</b>", "2 3/8 3"]) expect(parseYards(text).ok, text).toBe(false);
    fc.assert(fc.property(fc.string({ maxLength: 60 }), (text) => void [parseYards(text), parseInches(text), parseMetres(text), parseMillimetres(text)]));
  });

  it("are read again as they were written", () => {
    fc.assert(fc.property(fc.integer({ min: 1, max: 800 }), (eighths) => void expect(value(parseYards(formatYards(eighths * PER_EIGHTH_YARD)))).toBe(eighths * PER_EIGHTH_YARD)));
    fc.assert(fc.property(fc.integer({ min: 1, max: 9_000 }), (parts) => void expect(value(parseInches(formatInches(parts * PER_THIRTY_SECOND)))).toBe(parts * PER_THIRTY_SECOND)));
    fc.assert(fc.property(fc.integer({ min: 1, max: 9_000 }), (count) => void expect(value(parseMetres(formatMetres(count * PER_CENTIMETRE)))).toBe(count * PER_CENTIMETRE)));
  });
});

describe("written lengths", () => {
  it("are mixed numbers, and words for a screen reader", () => {
    expect(formatInches(inches(12.875))).toBe("12 7/8");
    expect(displayInches(inches(0.375))).toBe("3⁄8");
    expect(formatYards(yards(2.375))).toBe("2 3/8");
    expect(formatMetres(metres(2.4))).toBe("2 m 40");
    expect(formatExactInches(3 * Math.SQRT2 * 4064)).toBe("4.243");
    expect(wordsOfInches(inches(3.875))).toBe("3 and 7 eighths inches");
    expect(wordsOfYards(yards(0.5))).toBe("half yards");
  });
});
