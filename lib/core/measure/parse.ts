import { fail, ok, type Result } from "../result";
import { length, PER_CENTIMETRE, PER_EIGHTH_YARD, PER_INCH, PER_METRE, PER_MILLIMETRE, PER_THIRTY_SECOND, PER_YARD, type Length } from "./length";

export type LengthFault = "empty" | "not-a-length" | "ambiguous" | "too-long" | "too-short" | "off-the-step";

export interface LengthLimits {
  /** The longest taken; 100 yd where nothing is said. */
  readonly most?: Length;
  /** The shortest taken; anything above nothing where nothing is said. */
  readonly least?: Length;
}

const MOST = length(100 * PER_YARD);
const LONGEST_TEXT = 40;

/**
 * Yards as they are typed at the counter: "2 3" is 2 yards and 3 eighths, "2 3/8" and "3/8" are what they say. A decimal
 * point can be read two ways (2.3 as two and three tenths, or as two and three eighths), so it is `ambiguous` and both
 * readings are in `facts.readings` (1/160 mm), each that falls on 1/8 yd.
 */
export function parseYards(text: string, limits: LengthLimits = {}): Result<Length, LengthFault> {
  const said = tidy(text);
  if (said === "") return fail("empty", "Nothing is written. Wanted: yards and eighths, such as 2 3 or 2 3/8.");
  const decimal = /^(\d{0,3})[.,](\d{1,3})$/.exec(said);
  if (decimal) return ambiguousYards(said, decimal);
  const plain = /^(\d{1,4})(?: ([0-7]))?$/.exec(said);
  if (plain) return within(length(Number(plain[1]) * PER_YARD + Number(plain[2] ?? 0) * PER_EIGHTH_YARD), said, limits, "yards");
  const fraction = readFraction(said, [2, 4, 8]);
  if (fraction === null) return fail("not-a-length", `“${said}” is not a length in yards. Wanted: yards and eighths, such as 2 3 or 2 3/8.`);
  return within(length(fraction * PER_YARD), said, limits, "yards");
}

function ambiguousYards(said: string, decimal: RegExpExecArray): Result<Length, LengthFault> {
  const whole = Number(decimal[1] || "0");
  const digits = decimal[2] ?? "";
  const asDecimal = (whole + Number(`0.${digits}`)) * 8;
  const readings = new Set<number>();
  if (Math.abs(asDecimal - Math.round(asDecimal)) < 1e-9) readings.add(Math.round(asDecimal) * PER_EIGHTH_YARD);
  if (digits.length === 1 && Number(digits) < 8) readings.add(whole * PER_YARD + Number(digits) * PER_EIGHTH_YARD);
  return fail("ambiguous", `${said} can be read more than one way. Which is meant?`, { facts: { readings: [...readings].sort((a, b) => b - a) } });
}

/** Inches with a fraction down to 1/32: "3 7/8", "3 13/16", "12". A decimal counts when it falls on 1/32: "12.5". */
export function parseInches(text: string, limits: LengthLimits = {}): Result<Length, LengthFault> {
  const said = tidy(text).replace(/ ?(?:in|″|")$/, "");
  if (said === "") return fail("empty", "Nothing is written. Wanted: inches, such as 3 7/8.");
  const decimal = /^\d{0,4}[.,]\d{1,5}$/.test(said) ? Number(said.replace(",", ".")) * PER_INCH : null;
  const units = decimal ?? fractionOf(said, [2, 4, 8, 16, 32], PER_INCH);
  if (units === null) return fail("not-a-length", `“${said}” is not a size in inches. Wanted: inches and a fraction down to 1/32, such as 3 7/8.`);
  if (Math.abs(units / PER_THIRTY_SECOND - Math.round(units / PER_THIRTY_SECOND)) > 1e-6) return fail("off-the-step", `${said} in does not fall on a mark. Wanted: a fraction down to 1/32.`);
  return within(length(Math.round(units)), said, limits, "inches");
}

/** Metres as said at the counter: "2 40", "2 m 40" and "2.40" are two metres forty; "40 cm" and "0.4" are forty centimetres. */
export function parseMetres(text: string, limits: LengthLimits = {}): Result<Length, LengthFault> {
  const said = tidy(text);
  if (said === "") return fail("empty", "Nothing is written. Wanted: metres and centimetres, such as 2 40.");
  const pair = /^(\d{1,4}) ?(?:m ?)?(?: (\d{1,2}(?:[.,]\d)?))?(?: ?cm)?$/.exec(said);
  const centimetres = /^(\d{1,5}(?:[.,]\d)?) ?cm$/.exec(said);
  const decimal = /^(\d{0,4}[.,]\d{1,3}) ?m?$/.exec(said);
  const units = centimetres
    ? decimalOf(centimetres[1]) * PER_CENTIMETRE
    : decimal
      ? decimalOf(decimal[1]) * PER_METRE
      : pair
        ? Number(pair[1]) * PER_METRE + decimalOf(pair[2] ?? "0") * PER_CENTIMETRE
        : null;
  if (units === null) return fail("not-a-length", `“${said}” is not a length in metres. Wanted: metres and centimetres, such as 2 40.`);
  return within(length(Math.round(units)), said, limits, "metres");
}

/** Whole or half millimetres, for cut sizes in metric shops. */
export function parseMillimetres(text: string, limits: LengthLimits = {}): Result<Length, LengthFault> {
  const said = tidy(text).replace(/ ?mm$/, "");
  if (said === "") return fail("empty", "Nothing is written. Wanted: millimetres, such as 98.");
  if (!/^\d{1,6}(?:[.,]5)?$/.test(said)) return fail("not-a-length", `“${said}” is not a size in millimetres. Wanted: whole or half millimetres, such as 98.`);
  return within(length(Math.round(decimalOf(said) * PER_MILLIMETRE)), said, limits, "millimetres");
}

function tidy(text: string): string {
  return text.slice(0, LONGEST_TEXT).replaceAll("\u2044", "/").replace(/ ?yds?\.?$/i, "").trim().replace(/\s+/g, " ");
}

function decimalOf(text: string | undefined): number {
  return Number((text ?? "0").replace(",", "."));
}

function fractionOf(said: string, denominators: readonly number[], per: number): number | null {
  const value = /^\d{1,5}$/.test(said) ? Number(said) : readFraction(said, denominators);
  return value === null ? null : value * per;
}

/** "3/8" or "2 3/8" as a number; null for anything else, and for a denominator that no ruler has. */
function readFraction(said: string, denominators: readonly number[]): number | null {
  const match = /^(?:(\d{1,5})[ -])?(\d{1,2})\/(\d{1,2})$/.exec(said);
  if (!match) return null;
  const [whole, numerator, denominator] = [Number(match[1] ?? 0), Number(match[2]), Number(match[3])];
  return denominators.includes(denominator) && numerator < denominator ? whole + numerator / denominator : null;
}

const PER = { yards: PER_YARD, inches: PER_INCH, metres: PER_METRE, millimetres: PER_MILLIMETRE } as const;

function within(value: Length, said: string, { most = MOST, least = length(1) }: LengthLimits, unit: keyof typeof PER): Result<Length, LengthFault> {
  if (value > most) return fail("too-long", `${said} is more than the ${Number((most / PER[unit]).toFixed(3))} ${unit} taken here.`);
  if (value < least) return value <= 0 ? fail("too-short", "A length is more than nothing.") : fail("too-short", `${said} is less than the ${Number((least / PER[unit]).toFixed(3))} ${unit} taken here.`);
  return ok(value);
}
