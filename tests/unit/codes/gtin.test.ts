import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { gs1CheckDigit, makeInStoreGtin, parseGtin } from "@/lib/core/codes/gtin";

const useOf = (text: string) => {
  const read = parseGtin(text);
  return read.ok ? read.value.use : read.fault.code;
};
const withCheck = (body: string) => `${body}${gs1CheckDigit(body)}`;

describe("a GTIN", () => {
  it("is read in each of its lengths and kept in one", () => {
    // From the collection of published values: 6291041500213 and 40987650000223.
    expect(parseGtin(" 6291 0415 0021 3 ")).toEqual({ ok: true, value: { digits: "6291041500213", key: "06291041500213", use: "global" } });
    expect(parseGtin("]E06291041500213")).toMatchObject({ ok: true, value: { key: "06291041500213" } });
    expect(parseGtin("40987650000223")).toMatchObject({ ok: true, value: { digits: "40987650000223" } });
    expect(parseGtin(withCheck("9638507"))).toMatchObject({ ok: true, value: { use: "global" } });
  });

  it("says what is wrong with it", () => {
    expect(useOf("")).toBe("empty");
    expect(useOf("B0017K")).toBe("not-a-gtin");
    expect(parseGtin("12345")).toMatchObject({ fault: { code: "not-a-gtin", facts: { length: 5 } } });
    expect(useOf("6291041500214")).toBe("wrong-check");
  });

  it("tells numbers that mean something only in one shop", () => {
    expect(useOf(makeInStoreGtin(17))).toBe("in-store");
    expect(useOf(withCheck("02123456789"))).toBe("global");
    expect(useOf(withCheck("21234567890"))).toBe("in-store");
    expect(useOf(withCheck("0212345"))).toBe("in-store");
    expect(useOf(withCheck("412345678901"))).toBe("global");
    expect(useOf(withCheck("978012345678"))).toBe("book");
    expect(useOf(withCheck("990123456789"))).toBe("coupon");
    expect(() => makeInStoreGtin(10_000_000_000)).toThrow(RangeError);
  });

  it("with one wrong figure is found out", () => {
    fc.assert(
      fc.property(fc.nat(9_999_999_999), fc.nat(12), fc.integer({ min: 1, max: 9 }), (number, at, by) => {
        const good = makeInStoreGtin(number);
        const slipped = good.slice(0, at) + String((Number(good.charAt(at)) + by) % 10) + good.slice(at + 1);
        expect(useOf(slipped)).toBe("wrong-check");
      }),
    );
  });
});
