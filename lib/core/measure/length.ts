declare const lengthBrand: unique symbol;

/**
 * A length as an integer count of 1/160 mm, so that 1/32 in (127) and 1 mm (160) are both exact.
 * 1/64 in cannot be represented and is not offered.
 */
export type Length = number & { readonly [lengthBrand]: "Length" };

export const PER_THIRTY_SECOND = 127;
export const PER_INCH = 4064;
export const PER_YARD = 146_304;
export const PER_EIGHTH_YARD = 18_288;
export const PER_MILLIMETRE = 160;
export const PER_CENTIMETRE = 1_600;
export const PER_METRE = 160_000;
/** The largest length stored: PostgreSQL's int4, a little over 14 678 yd. */
export const MAX_LENGTH = 2_147_483_647 as Length;
export const ZERO = 0 as Length;

/** Brands an integer count of 1/160 mm. Throws RangeError on anything that is not a safe integer. */
export function length(units: number): Length {
  if (!Number.isSafeInteger(units)) throw new RangeError(`A length is a whole number of 1/160 mm, not ${units}`);
  return (units === 0 ? 0 : units) as Length;
}

/** Inches that fall on 1/32; anything finer throws. */
export function inches(value: number): Length {
  return length(exactly(value * PER_INCH, `${value} in`));
}

/** Yards that fall on 1/32 in. */
export function yards(value: number): Length {
  return length(exactly(value * PER_YARD, `${value} yd`));
}

export function millimetres(value: number): Length {
  return length(exactly(value * PER_MILLIMETRE, `${value} mm`));
}

export function centimetres(value: number): Length {
  return millimetres(value * 10);
}

export function metres(value: number): Length {
  return millimetres(value * 1000);
}

export function sum(lengths: readonly Length[]): Length {
  return length(lengths.reduce((total: number, each) => total + each, 0));
}

export function plus(a: Length, b: Length): Length {
  return length(a + b);
}

export function minus(a: Length, b: Length): Length {
  return length(a - b);
}

export function times(a: Length, count: number): Length {
  return length(a * count);
}

/** The smaller of two lengths. */
export function shorter(a: Length, b: Length): Length {
  return a < b ? a : b;
}

/** The larger of two lengths. */
export function longer(a: Length, b: Length): Length {
  return a > b ? a : b;
}

/** Inches as a float, for drawing and for exact sizes shown; never for storage. */
export function toInches(value: number): number {
  return value / PER_INCH;
}

export function toYards(value: number): number {
  return value / PER_YARD;
}

export function toMetres(value: number): number {
  return value / PER_METRE;
}

/** Float noise of a product of decimals (0.1 * 3) is forgiven; a fraction of a unit is not. */
function exactly(units: number, said: string): number {
  const whole = Math.round(units);
  if (Math.abs(units - whole) > 1e-6) throw new RangeError(`${said} does not fall on 1/32 in or 1/160 mm`);
  return whole;
}
