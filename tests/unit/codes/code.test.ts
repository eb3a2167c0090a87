import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { checkCharacter, makeCode, parseCode } from "@/lib/core/codes/code";

describe("the check character", () => {
  // From memory of ISBT 128's published example of ISO/IEC 7064 MOD 37,2: donation number G1234 98 654321 has the check character H.
  it("agrees with a published number", () => {
    expect(checkCharacter("G123498654321")).toBe("H");
  });

  it("finds every single slip and every swap of neighbours", () => {
    fc.assert(
      fc.property(fc.nat(9_999_999), fc.nat(20), fc.nat(9), (number, place, digit) => {
        const code = makeCode("bolt", number);
        const at = 1 + (place % (code.length - 2));
        const slipped = code.slice(0, at) + String(digit) + code.slice(at + 1);
        if (slipped !== code) expect(parseCode(slipped).ok).toBe(false);
        const swapped = code.slice(0, at) + code.charAt(at + 1) + code.charAt(at) + code.slice(at + 2);
        if (swapped !== code) expect(parseCode(swapped).ok).toBe(false);
      }),
    );
  });
});

describe("a code", () => {
  it("is read again as it was made, however it is typed", () => {
    fc.assert(
      fc.property(fc.nat(2_147_483_647), (number) => {
        const code = makeCode("kit", number);
        expect(parseCode(` ${code.slice(0, 3).toLowerCase()} ${code.slice(3)} `)).toEqual({ ok: true, value: { kind: "kit", number, text: code } });
      }),
    );
  });

  it("is found behind a scanner's prefix, in an address, and with letters for figures", () => {
    const code = makeCode("bolt", 101);
    const read = { ok: true, value: { kind: "bolt", number: 101, text: code } };
    expect(parseCode(`]C1${code}`)).toEqual(read);
    expect(parseCode(`https://shop.example/kits/${code}?from=label`)).toEqual(read);
    expect(parseCode(`bOlo1${code.at(-1)}`)).toEqual(parseCode(`B0101${code.at(-1)}`));
    expect(parseCode(`BOIOI${code.at(-1)}`)).toEqual(read);
    expect(parseCode("https://shop.example/")).toMatchObject({ ok: false, fault: { code: "not-a-code" } });
  });

  it("says what is wrong with it", () => {
    expect(parseCode("hello")).toMatchObject({ ok: false, fault: { code: "not-a-code" } });
    expect(parseCode("X00010")).toMatchObject({ ok: false, fault: { code: "unknown-kind" } });
    expect(parseCode("B00170")).toMatchObject({ ok: false, fault: { code: "wrong-check" } });
    expect(() => makeCode("bolt", -1)).toThrow(RangeError);
  });
});
