import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { displayInches, displayLength, formatExactInches, formatInches, formatLength, formatMetres, formatYards, isOnThirtySecond, wordsOfInches, wordsOfLength, wordsOfYards } from "@/lib/core/measure/format";
import { inches, length, metres, millimetres, PER_CENTIMETRE, PER_EIGHTH_YARD, PER_MILLIMETRE, PER_THIRTY_SECOND, yards, ZERO } from "@/lib/core/measure/length";
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

  it("say what a point could mean, and nothing that it could not", () => {
    const readings = (text: string) => {
      const read = parseYards(text);
      return read.ok ? null : (read.fault.facts?.readings ?? null);
    };
    expect(readings("2.9")).toEqual([]);
    expect(readings("0.0")).toEqual([]);
    expect(readings("2.75")).toEqual([yards(2.75)]);
    expect(readings("2.38")).toEqual([yards(2.375)]);
    expect(readings("2,5")).toEqual([yards(2.625), yards(2.5)]);
    expect(parseYards("2.5")).toMatchObject({ fault: { message: "2.5 has a decimal point, and yards are counted in eighths. Is 2 5/8 or 2 1/2 meant?" } });
  });

  it("take yards and inches, and the fractions of a phone's keys", () => {
    expect(value(parseYards("2 yd 5 1/2 in"))).toBe(yards(2) + inches(5.5));
    expect(value(parseYards('12"'))).toBe(inches(12));
    expect(value(parseYards("2½"))).toBe(yards(2.5));
    expect(value(parseInches("3⅞"))).toBe(inches(3.875));
    expect(parseYards("1/3")).toMatchObject({ fault: { message: "1/3 yd is 12 in, which is between eighths. Write it in inches, such as 12 in, or in eighths, such as 2 3/8." } });
  });

  it("keep to the limits, and say them in the shop's measure", () => {
    expect(parseYards("3", { most: yards(2.5) })).toMatchObject({ fault: { code: "too-long", message: "3 is more than the 2 1/2 yd taken here.", facts: { most: yards(2.5) } } });
    expect(parseYards("1/8", { least: yards(0.25) })).toMatchObject({ fault: { code: "too-short", message: "1/8 is less than the 1/4 yd taken here." } });
    expect(parseMetres("101")).toMatchObject({ fault: { code: "too-long", message: "101 is more than the 100 m taken here." } });
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
    expect(value(parseMetres("2m40"))).toBe(metres(2.4));
    expect(value(parseMetres("2 m 5 cm"))).toBe(metres(2.05));
    expect(parseMetres("2 4")).toMatchObject({ ok: false, fault: { message: "2 4 could be 2 m 40 or 2 m 04. Wanted: both figures of the centimetres." } });
    expect(value(parseMillimetres("97.5"))).toBe(millimetres(97.5));
    expect(value(parseMillimetres("9.8 cm"))).toBe(millimetres(98));
    expect(parseMillimetres("97.3")).toMatchObject({ ok: false, fault: { code: "off-the-step" } });
  });

  it("are refused with a sentence when they are none", () => {
    for (const text of ["", "two", "-1", "1/3", "9/8", "2 8", "1e9", "0", "101", "<b>2</b>", "2 3/8 3", "2 yd 3", `2 3/8${" ".repeat(500)}7`, `2 3/8${"9".repeat(60)}`]) expect(parseYards(text).ok, text).toBe(false);
    fc.assert(fc.property(fc.string({ maxLength: 60 }), (text) => void [parseYards(text), parseInches(text), parseMetres(text), parseMillimetres(text)]));
  });

  it("are read again as they were written", () => {
    fc.assert(fc.property(fc.integer({ min: 1, max: 800 }), (eighths) => void expect(value(parseYards(formatYards(eighths * PER_EIGHTH_YARD)))).toBe(eighths * PER_EIGHTH_YARD)));
    fc.assert(fc.property(fc.integer({ min: 1, max: 9_000 }), (parts) => void expect(value(parseInches(formatInches(parts * PER_THIRTY_SECOND)))).toBe(parts * PER_THIRTY_SECOND)));
    fc.assert(fc.property(fc.integer({ min: 1, max: 100_000 }), (parts) => void expect(value(parseYards(formatYards(parts * PER_THIRTY_SECOND)))).toBe(parts * PER_THIRTY_SECOND)));
    fc.assert(fc.property(fc.integer({ min: 1, max: 100_000 }), (parts) => void expect(value(parseYards(displayLength(parts * PER_THIRTY_SECOND, "yards")))).toBe(parts * PER_THIRTY_SECOND)));
    fc.assert(fc.property(fc.integer({ min: 1, max: 90_000 }), (count) => void expect(value(parseMetres(formatMetres(count * PER_MILLIMETRE)))).toBe(count * PER_MILLIMETRE)));
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
    expect(formatMetres(metres(2.04))).toBe("2 m 04");
    expect(displayLength(yards(2.375), "yards")).toBe("2 3⁄8 yd");
    expect(displayLength(metres(2.4), "metres")).toBe("2 m 40");
  });

  it("say yards and inches between eighths, and never round a yard away", () => {
    expect(formatLength(length(yards(2) + inches(5.5)), "yards")).toBe("2 yd 5 1/2 in");
    expect(formatLength(inches(5.5), "yards")).toBe("5 1/2 in");
    expect(formatLength(ZERO, "yards")).toBe("0 yd");
    expect(formatLength(length(-inches(5.5)), "yards")).toBe("-5 1/2 in");
    // A metre is 39.37 in, to the nearest mark 39 3/8.
    expect(formatYards(metres(1))).toBe("1 yd 3 3/8 in");
    expect(formatYards(length(yards(2) - 1))).toBe("2 yd");
    expect(isOnThirtySecond(metres(1))).toBe(false);
    expect(isOnThirtySecond(inches(0.03125))).toBe(true);
  });

  it("have words that a person would say", () => {
    expect(wordsOfInches(inches(3.875))).toBe("3 and 7 eighths inches");
    expect(wordsOfInches(inches(0.5))).toBe("half an inch");
    expect(wordsOfInches(inches(0.875))).toBe("7 eighths of an inch");
    expect(wordsOfInches(inches(1))).toBe("1 inch");
    expect(wordsOfYards(yards(0.5))).toBe("half a yard");
    expect(wordsOfYards(yards(1.5))).toBe("1 and a half yards");
    expect(wordsOfYards(length(yards(2) + inches(5.5)))).toBe("2 yards 5 and a half inches");
    expect(wordsOfYards(length(yards(1) - 1))).toBe("1 yard");
    expect(wordsOfLength(metres(1.999), "metres")).toBe("1 metre 99.9");
    expect(wordsOfLength(metres(2.4), "metres")).toBe("2 metres 40");
    expect(wordsOfLength(metres(0.4), "metres")).toBe("40 centimetres");
  });
});
