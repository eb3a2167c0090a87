import { fail, ok, type Result } from "../result";

/**
 * An exact number (a + b√2 + c√3 + d√6) / under, with whole a, b, c, d and a whole `under` above zero, in lowest terms.
 * Drawings on square, on-point, hexagonal and eight-fold grids stay inside this field, so meetings are never missed.
 */
export interface Exact {
  readonly a: bigint;
  readonly b: bigint;
  readonly c: bigint;
  readonly d: bigint;
  readonly under: bigint;
}

const SQRT2 = Math.SQRT2;
const SQRT3 = Math.sqrt(3);
const SQRT6 = Math.sqrt(6);
const LONGEST_TEXT = 60;

export const ZERO: Exact = { a: 0n, b: 0n, c: 0n, d: 0n, under: 1n };
export const ONE: Exact = { a: 1n, b: 0n, c: 0n, d: 0n, under: 1n };

function reduced(a: bigint, b: bigint, c: bigint, d: bigint, under: bigint): Exact {
  if (under < 0n) return reduced(-a, -b, -c, -d, -under);
  let divisor = under;
  for (const part of [a, b, c, d]) {
    if (divisor === 1n) break;
    divisor = gcd(divisor, part < 0n ? -part : part);
  }
  return divisor === 1n ? { a, b, c, d, under } : { a: a / divisor, b: b / divisor, c: c / divisor, d: d / divisor, under: under / divisor };
}

function gcd(a: bigint, b: bigint): bigint {
  let [x, y] = [a, b];
  while (y !== 0n) [x, y] = [y, x % y];
  return x;
}

/** A fraction of whole numbers. Throws RangeError when `under` is zero. */
export function rational(over: bigint | number, under: bigint | number = 1): Exact {
  if (BigInt(under) === 0n) throw new RangeError("Nothing can be divided by zero.");
  return reduced(BigInt(over), 0n, 0n, 0n, BigInt(under));
}

export function add(x: Exact, y: Exact): Exact {
  if (x.under === y.under) return reduced(x.a + y.a, x.b + y.b, x.c + y.c, x.d + y.d, x.under);
  const under = x.under * y.under;
  return reduced(x.a * y.under + y.a * x.under, x.b * y.under + y.b * x.under, x.c * y.under + y.c * x.under, x.d * y.under + y.d * x.under, under);
}

export function negate(x: Exact): Exact {
  return { a: -x.a, b: -x.b, c: -x.c, d: -x.d, under: x.under };
}

export function subtract(x: Exact, y: Exact): Exact {
  return add(x, negate(y));
}

export function multiply(x: Exact, y: Exact): Exact {
  return reduced(
    x.a * y.a + 2n * x.b * y.b + 3n * x.c * y.c + 6n * x.d * y.d,
    x.a * y.b + x.b * y.a + 3n * (x.c * y.d + x.d * y.c),
    x.a * y.c + x.c * y.a + 2n * (x.b * y.d + x.d * y.b),
    x.a * y.d + x.d * y.a + x.b * y.c + x.c * y.b,
    x.under * y.under,
  );
}

/** Throws RangeError on division by zero. */
export function divide(x: Exact, y: Exact): Exact {
  if (isZero(y)) throw new RangeError("Nothing can be divided by zero.");
  // y = p + q√3 with p = a + b√2 and q = c + d√2: first multiply by p − q√3, then the rest lies in Q(√2).
  const conjugate: Exact = { a: y.a, b: y.b, c: -y.c, d: -y.d, under: y.under };
  const norm = multiply(y, conjugate);
  const half: Exact = { a: norm.a, b: -norm.b, c: 0n, d: 0n, under: norm.under };
  const whole = multiply(norm, half);
  const over = multiply(multiply(x, conjugate), half);
  return reduced(over.a * whole.under, over.b * whole.under, over.c * whole.under, over.d * whole.under, over.under * whole.a);
}

export function isZero(x: Exact): boolean {
  return x.a === 0n && x.b === 0n && x.c === 0n && x.d === 0n;
}

/** −1, 0 or 1, exactly: floats decide what is clear, nested squaring the rest. */
export function sign(x: Exact): -1 | 0 | 1 {
  if (isZero(x)) return 0;
  if (x.b === 0n && x.c === 0n && x.d === 0n) return x.a > 0n ? 1 : -1;
  const parts = [Number(x.a), Number(x.b) * SQRT2, Number(x.c) * SQRT3, Number(x.d) * SQRT6];
  const value = parts.reduce((sum, part) => sum + part, 0);
  const noise = parts.reduce((sum, part) => sum + Math.abs(part), 0) * 1e-14;
  if (Number.isFinite(noise) && Math.abs(value) > noise) return value > 0 ? 1 : -1;
  // p + q√3: where the signs differ, the larger of p² and 3q² decides.
  const p = signOfRoot2(x.a, x.b);
  const q = signOfRoot2(x.c, x.d);
  if (q === 0 || p === q) return p;
  if (p === 0) return q;
  const larger = signOfRoot2(x.a * x.a + 2n * x.b * x.b - 3n * (x.c * x.c + 2n * x.d * x.d), 2n * x.a * x.b - 6n * x.c * x.d);
  return larger > 0 ? p : larger < 0 ? q : 0;
}

/** The sign of u + v√2. */
function signOfRoot2(u: bigint, v: bigint): -1 | 0 | 1 {
  const su = u > 0n ? 1 : u < 0n ? -1 : 0;
  const sv = v > 0n ? 1 : v < 0n ? -1 : 0;
  if (sv === 0 || su === sv) return su;
  if (su === 0) return sv;
  const larger = u * u - 2n * v * v;
  return larger > 0n ? su : sv;
}

export function compare(x: Exact, y: Exact): -1 | 0 | 1 {
  return sign(subtract(x, y));
}

export function equals(x: Exact, y: Exact): boolean {
  return x.a === y.a && x.b === y.b && x.c === y.c && x.d === y.d && x.under === y.under;
}

/** The nearest float, for pictures and for sizes that are about to be rounded. */
export function toNumber(x: Exact): number {
  return (Number(x.a) + Number(x.b) * SQRT2 + Number(x.c) * SQRT3 + Number(x.d) * SQRT6) / Number(x.under);
}

/** The text of `lib/core/piece/drawing`: "1/2", "-1/4r2+1". Equal numbers have equal text. */
export function formatExact(x: Exact): string {
  const terms: string[] = [];
  for (const [part, root] of [[x.a, ""], [x.b, "r2"], [x.c, "r3"], [x.d, "r6"]] as const) {
    if (part === 0n) continue;
    const divisor = gcd(x.under, part < 0n ? -part : part);
    const [over, under] = [part / divisor, x.under / divisor];
    const figure = root && under === 1n && (over === 1n || over === -1n) ? (over < 0n ? "-" : "") : `${over}${under === 1n ? "" : `/${under}`}`;
    terms.push(`${terms.length && over > 0n ? "+" : ""}${figure}${root}`);
  }
  return terms.join("") || "0";
}

/** Reads a coordinate. Faults: `bad-number` with what was found and wanted. */
export function parseExact(text: string): Result<Exact, "bad-number"> {
  const wrong = () => fail("bad-number", `“${text.slice(0, 30)}” is not a coordinate. Wanted: a fraction such as 1/4, or a sum with r2, r3, r6 such as 1/2+1/4r2.`);
  if (text.length === 0 || text.length > LONGEST_TEXT) return wrong();
  const term = /([+-]?)(\d{1,12})?(?:\/(\d{1,12}))?(r2|r3|r6)?/y;
  let sum = ZERO;
  let at = 0;
  while (at < text.length) {
    term.lastIndex = at;
    const match = term.exec(text);
    const [whole = "", signText = "", over, under, root] = match ?? [];
    if (whole === "" || (over === undefined && (root === undefined || under !== undefined)) || (at > 0 && signText === "") || BigInt(under ?? 1) === 0n) return wrong();
    const value = (signText === "-" ? -1n : 1n) * BigInt(over ?? 1);
    const parts = { "": [value, 0n, 0n, 0n], r2: [0n, value, 0n, 0n], r3: [0n, 0n, value, 0n], r6: [0n, 0n, 0n, value] }[root ?? ""] ?? [0n, 0n, 0n, 0n];
    sum = add(sum, reduced(parts[0] ?? 0n, parts[1] ?? 0n, parts[2] ?? 0n, parts[3] ?? 0n, BigInt(under ?? 1)));
    at = term.lastIndex;
  }
  return ok(sum);
}
