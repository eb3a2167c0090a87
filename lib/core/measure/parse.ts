import { fail, ok, type Result } from "../result";
import { formatInches, formatLength, formatMillimetres, formatYards } from "./format";
import { length, metres, PER_CENTIMETRE, PER_EIGHTH_YARD, PER_INCH, PER_METRE, PER_MILLIMETRE, PER_THIRTY_SECOND, PER_YARD, yards, type Length } from "./length";

export type LengthFault = "empty" | "not-a-length" | "ambiguous" | "too-long" | "too-short" | "off-the-step";

export interface LengthLimits {
  /** The longest taken; 100 yd or 100 m where nothing is said. */
  readonly most?: Length;
  /** The shortest taken; anything above nothing where nothing is said. */
  readonly least?: Length;
}

type Reading = Result<Length, LengthFault>;

const LONGEST_TEXT = 40;
const MOST_READ = 400;
const YARDS_WANTED = "Wanted: yards and eighths, such as 2 3 or 2 3/8.";
const INCHES_WANTED = "Wanted: inches and a fraction down to 1/32, such as 3 7/8.";
const METRES_WANTED = "Wanted: metres and centimetres, such as 2 40.";
const MILLIMETRES_WANTED = "Wanted: whole or half millimetres, such as 98.";
const VULGAR: Readonly<Record<string, string>> = { "½": "1/2", "¼": "1/4", "¾": "3/4", "⅛": "1/8", "⅜": "3/8", "⅝": "5/8", "⅞": "7/8" };

/**
 * Yards as they are typed at the counter: "2 3" is 2 yards and 3 eighths, "2 3/8" and "3/8" are what they say, and
 * "2 yd 5 1/2 in" is how a length between eighths is written. A decimal point can be read two ways (2.5 as two and a half,
 * or as two and five eighths), so it is `ambiguous`; the readings that fall on an eighth are in `facts.readings` (1/160 mm).
 */
export function parseYards(text: string, limits: LengthLimits = {}): Reading {
  const said = tidy(text);
  if (said === "") return fail("empty", `Nothing is written. ${YARDS_WANTED}`);
  const bare = said.replace(/ ?(?:yds?|yards?)\.?$/i, "");
  const decimal = /^(\d{0,4})[.,](\d{1,4})$/.exec(bare);
  if (decimal) return ambiguousYards(said, decimal);
  const units = eighths(bare) ?? yardsAndInches(said);
  if (units !== null) return within(units, said, limits, { most: yards(100), write: (most) => formatLength(most, "yards") });
  if (/^(?:\d{1,4} )?[12]\/3$/.test(bare)) return fail("not-a-length", `${said} yd is ${thirds(bare)} in, which is between eighths. Write it in inches, such as ${thirds(bare)} in, or in eighths, such as 2 3/8.`);
  return fail("not-a-length", `“${said}” is not a length in yards. ${YARDS_WANTED}`);
}

function eighths(said: string): number | null {
  const plain = /^(\d{1,4})(?: ([0-7]))?$/.exec(said);
  if (plain) return Number(plain[1]) * PER_YARD + Number(plain[2] ?? 0) * PER_EIGHTH_YARD;
  const fraction = readFraction(said, [2, 4, 8]);
  return fraction === null ? null : fraction * PER_YARD;
}

function yardsAndInches(said: string): number | null {
  const match = /^(?:(\d{1,4}) ?(?:yds?|yards?)\.?,? ?)?([\d /-]+?) ?(?:in|inch|inches|″|")\.?$/i.exec(said);
  const beyond = fractionOf(match?.[2] ?? "", [2, 4, 8, 16, 32]);
  return match && beyond !== null ? Number(match[1] ?? 0) * PER_YARD + Math.round(beyond * PER_INCH) : null;
}

function thirds(said: string): number {
  const [fraction, whole] = said.split(" ").reverse();
  return Number(whole ?? 0) * 36 + (fraction === "1/3" ? 12 : 24);
}

/** A decimal written to two or three places stands for the eighth that it is rounded or cut off from: 2.37 and 2.38 for 2 3/8. */
function ambiguousYards(said: string, decimal: RegExpExecArray): Reading {
  const whole = Number(decimal[1] || "0");
  const digits = decimal[2] ?? "";
  const asDecimal = (whole + Number(`0.${digits}`)) * 8;
  const nearest = Math.round(asDecimal);
  const readings = new Set<number>();
  if (Math.abs(asDecimal - nearest) < (digits.length === 2 ? 0.041 : 1e-9)) readings.add(nearest * PER_EIGHTH_YARD);
  if (digits.length === 1 && Number(digits) < 8) readings.add(whole * PER_YARD + Number(digits) * PER_EIGHTH_YARD);
  const possible = [...readings].filter((units) => units > 0).sort((a, b) => b - a);
  const [first, second] = possible.map(formatYards);
  const question = second ? `Is ${first} or ${second} meant?` : first ? `Is ${first} meant?` : YARDS_WANTED;
  return fail("ambiguous", `${said} has a decimal point, and yards are counted in eighths. ${question}`, { facts: { readings: possible } });
}

/** Inches with a fraction down to 1/32: "3 7/8", "3 13/16", "12". A decimal counts when it falls on 1/32: "12.5". */
export function parseInches(text: string, limits: LengthLimits = {}): Reading {
  const said = tidy(text).replace(/ ?(?:in|inch|inches|″|")\.?$/i, "");
  if (said === "") return fail("empty", "Nothing is written. Wanted: inches, such as 3 7/8.");
  const decimal = /^(?:\d{1,4}[.,]\d{0,5}|[.,]\d{1,5})$/.test(said) ? decimalOf(said) : null;
  const value = decimal ?? fractionOf(said, [2, 4, 8, 16, 32]);
  if (value === null) return fail("not-a-length", /\/64$/.test(said) ? `${said} in is finer than 1/32, the finest mark that is kept.` : `“${said}” is not a size in inches. ${INCHES_WANTED}`);
  const marks = (value * PER_INCH) / PER_THIRTY_SECOND;
  if (Math.abs(marks - Math.round(marks)) > 1e-6) return fail("off-the-step", offTheMark(said, Math.floor(marks)));
  return within(Math.round(marks) * PER_THIRTY_SECOND, said, limits, { most: yards(100), write: (most) => `${formatInches(most)} in` });
}

function offTheMark(said: string, below: number): string {
  return `${said} in does not fall on a mark: it lies between ${formatInches(below * PER_THIRTY_SECOND)} and ${formatInches((below + 1) * PER_THIRTY_SECOND)}. Wanted: a fraction down to 1/32.`;
}

/**
 * Metres as said at the counter: "2 40", "2 m 40" and "2.40" are two metres forty; "40 cm" and "0.4" are forty
 * centimetres. "2 4" could be 2 m 40 or 2 m 04 and is refused.
 */
export function parseMetres(text: string, limits: LengthLimits = {}): Reading {
  const said = tidy(text).toLowerCase();
  if (said === "") return fail("empty", `Nothing is written. ${METRES_WANTED}`);
  const pair = /^(\d{1,4})(?: ?m ?| )(\d{1,2}(?:[.,]\d)?)( ?cm)?$/.exec(said);
  if (pair && !pair[3] && /^[1-9]$/.test(pair[2] ?? "")) {
    return fail("not-a-length", `${said} could be ${pair[1]} m ${pair[2]}0 or ${pair[1]} m 0${pair[2]}. Wanted: both figures of the centimetres.`);
  }
  const units = pair ? Number(pair[1]) * PER_METRE + decimalOf(pair[2]) * PER_CENTIMETRE : oneMetricFigure(said);
  if (units === null) return fail("not-a-length", `“${said}” is not a length in metres. ${METRES_WANTED}`);
  return within(Math.round(units), said, limits, { most: metres(100), write: (most) => formatLength(most, "metres") });
}

function oneMetricFigure(said: string): number | null {
  const centimetres = /^(\d{1,5}(?:[.,]\d)?) ?cm$/.exec(said);
  if (centimetres) return decimalOf(centimetres[1]) * PER_CENTIMETRE;
  const millimetres = /^(\d{1,6}) ?mm$/.exec(said);
  if (millimetres) return Number(millimetres[1]) * PER_MILLIMETRE;
  const figure = /^(\d{1,4}|\d{0,4}[.,]\d{1,3}) ?m?$/.exec(said);
  return figure ? decimalOf(figure[1]) * PER_METRE : null;
}

/** Whole or half millimetres, for cut sizes in metric shops; "9.8 cm" is 98 of them. */
export function parseMillimetres(text: string, limits: LengthLimits = {}): Reading {
  const said = tidy(text).toLowerCase();
  if (said === "") return fail("empty", "Nothing is written. Wanted: millimetres, such as 98.");
  const match = /^(\d{1,6})(?:[.,](\d{1,2}))? ?(mm|cm)?$/.exec(said);
  const per = match?.[3] === "cm" ? PER_CENTIMETRE : PER_MILLIMETRE;
  const halves = match ? (Number(`${match[1]}.${match[2] ?? "0"}`) * per * 2) / PER_MILLIMETRE : NaN;
  if (!match) return fail("not-a-length", `“${said}” is not a size in millimetres. ${MILLIMETRES_WANTED}`);
  if (Math.abs(halves - Math.round(halves)) > 1e-6) return fail("off-the-step", `${said} is finer than half a millimetre. ${MILLIMETRES_WANTED}`);
  return within((Math.round(halves) * PER_MILLIMETRE) / 2, said, limits, { most: metres(100), write: (most) => `${formatMillimetres(most)} mm` });
}

/** Outer blanks off, inner ones single, one kind of slash. What is too long to be a length becomes one that no rule reads. */
function tidy(text: string): string {
  const said = text
    .slice(0, MOST_READ)
    .replace(/[½¼¾⅛⅜⅝⅞]/g, (fraction) => ` ${VULGAR[fraction] ?? ""}`)
    .replaceAll("\u2044", "/")
    .trim()
    .replace(/\s+/g, " ");
  return said.length > LONGEST_TEXT || text.length > MOST_READ ? `${said.slice(0, LONGEST_TEXT)}…` : said;
}

function decimalOf(text: string | undefined): number {
  return Number((text ?? "0").replace(",", "."));
}

function fractionOf(said: string, denominators: readonly number[]): number | null {
  return /^\d{1,5}$/.test(said) ? Number(said) : readFraction(said, denominators);
}

/** "3/8", "2 3/8" or "2-3/8" as a number; null for anything else, and for a denominator that no ruler has. */
function readFraction(said: string, denominators: readonly number[]): number | null {
  const match = /^(?:(\d{1,5})[ -])?(\d{1,2})\/(\d{1,2})$/.exec(said);
  if (!match) return null;
  const [whole, numerator, denominator] = [Number(match[1] ?? 0), Number(match[2]), Number(match[3])];
  return denominators.includes(denominator) && numerator < denominator ? whole + numerator / denominator : null;
}

interface Bounds {
  readonly most: Length;
  readonly write: (units: Length) => string;
}

function within(units: number, said: string, { most, least = length(1) }: LengthLimits, bounds: Bounds): Reading {
  const longest = most ?? bounds.most;
  if (units > longest) return fail("too-long", `${said} is more than the ${bounds.write(longest)} taken here.`, { facts: { most: longest } });
  if (units <= 0) return fail("too-short", "A length is more than nothing.");
  if (units < least) return fail("too-short", `${said} is less than the ${bounds.write(least)} taken here.`, { facts: { least } });
  return ok(length(units));
}
