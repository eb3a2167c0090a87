import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { add, compare, divide, equals, formatExact, isZero, multiply, parseExact, sign, subtract, toNumber, ZERO, type Exact } from "@/lib/core/patchwork/exact";

const part = fc.bigInt({ min: -50n, max: 50n });
const number = fc.record({ a: part, b: part, c: part, d: part, under: fc.bigInt({ min: 1n, max: 40n }) }).map((each): Exact => add(ZERO, each));

/** The sign by 60 figures behind the point, from whole-number square roots. */
function signByFigures({ a, b, c, d }: Exact): number {
  const scale = 10n ** 60n;
  const root = (of: bigint) => squareRoot(of * scale * scale);
  const value = a * scale + b * root(2n) + c * root(3n) + d * root(6n);
  return value > 1000n ? 1 : value < -1000n ? -1 : 0;
}

function squareRoot(of: bigint): bigint {
  let guess = of;
  for (let next = (guess + 1n) / 2n; next < guess; next = (guess + of / guess) / 2n) guess = next;
  return guess;
}

describe("exact numbers", () => {
  it("form a field", () => {
    fc.assert(
      fc.property(number, number, number, (x, y, z) => {
        expect(equals(multiply(x, add(y, z)), add(multiply(x, y), multiply(x, z)))).toBe(true);
        expect(equals(multiply(x, y), multiply(y, x))).toBe(true);
        expect(isZero(subtract(x, x))).toBe(true);
        if (!isZero(y)) expect(equals(multiply(divide(x, y), y), x)).toBe(true);
      }),
    );
    expect(() => divide(ZERO, ZERO)).toThrow(RangeError);
  });

  it("have the sign that sixty figures give them", () => {
    fc.assert(fc.property(number, (x) => void expect(sign(x)).toBe(signByFigures(x))), { numRuns: 2000 });
    // Close calls: 7 − 5√2 is −0.07, 99 − 70√2 is 0.005, 3363 − 2378√2 is 0.0001.
    for (const [a, b] of [[7n, -5n], [99n, -70n], [3363n, -2378n], [-3363n, 2378n], [19601n, -13860n]] as const) {
      const x = { a, b, c: 0n, d: 0n, under: 1n };
      expect(sign(x)).toBe(signByFigures(x));
    }
  });

  it("come near their floats, and are ordered as they are", () => {
    fc.assert(
      fc.property(number, number, (x, y) => {
        expect(toNumber(add(x, y))).toBeCloseTo(toNumber(x) + toNumber(y), 6);
        if (Math.abs(toNumber(x) - toNumber(y)) > 1e-9) expect(compare(x, y)).toBe(toNumber(x) < toNumber(y) ? -1 : 1);
      }),
    );
  });

  it("are read as they are written, each in one way", () => {
    fc.assert(
      fc.property(number, (x) => {
        const text = formatExact(x);
        const read = parseExact(text);
        expect(text.length > 60 || (read.ok && equals(read.value, x))).toBe(true);
      }),
    );
    expect(formatExact(ZERO)).toBe("0");
    const read = parseExact("1/2-1/4r2+r3");
    expect(read.ok && formatExact(read.value)).toBe("1/2-1/4r2+r3");
  });

  it("are refused with a sentence when they are none", () => {
    for (const text of ["", "x", "1/0", "1.5", "--1", "1 2", "r4", "1/2/3", "r2r3", "9".repeat(70), "/2", "+"]) {
      expect(parseExact(text), text).toMatchObject({ ok: false, fault: { code: "bad-number" } });
    }
  });
});
