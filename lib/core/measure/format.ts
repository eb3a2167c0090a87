import { PER_CENTIMETRE, PER_INCH, PER_METRE, PER_MILLIMETRE, PER_THIRTY_SECOND, PER_YARD } from "./length";

/** How the shop measures what it sells. */
export type MeasureSystem = "yards" | "metres";

/** A whole number and a fraction in lowest terms; numerator 0 when there is none. */
export interface MixedNumber {
  readonly negative: boolean;
  readonly whole: number;
  readonly numerator: number;
  readonly denominator: number;
}

const CENTIMETRES_IN_METRE = PER_METRE / PER_CENTIMETRE;
const FRACTION_SLASH = "\u2044";
const PARTS: Readonly<Record<number, string>> = { 2: "half", 4: "quarter", 8: "eighth", 16: "sixteenth", 32: "thirty-second" };

/** `value` as a mixed number of at most `denominator`ths (a power of two), to the nearest. */
export function mixedNumber(value: number, denominator: number): MixedNumber {
  const parts = Math.round(Math.abs(value) * denominator);
  let numerator = parts % denominator;
  let under = denominator;
  while (numerator > 0 && numerator % 2 === 0) {
    numerator /= 2;
    under /= 2;
  }
  return { negative: value < 0 && parts > 0, whole: Math.floor(parts / denominator), numerator, denominator: numerator === 0 ? 1 : under };
}

function write({ negative, whole, numerator, denominator }: MixedNumber, slash: string): string {
  const sign = negative ? "-" : "";
  if (numerator === 0) return `${sign}${whole}`;
  return `${sign}${whole === 0 ? "" : `${whole} `}${numerator}${slash}${denominator}`;
}

/** Inches to the nearest 1/32, as typed: "3 7/8". No unit. */
export function formatInches(units: number): string {
  return write(mixedNumber(units / PER_INCH, 32), "/");
}

/** The same with the fraction slash, which the fonts set as a mixed number: "3 7⁄8". */
export function displayInches(units: number): string {
  return write(mixedNumber(units / PER_INCH, 32), FRACTION_SLASH);
}

/** An exact size that may lie between the marks: "4.243". At most three decimals, none that say nothing. */
export function formatExactInches(units: number): string {
  return String(Number((units / PER_INCH).toFixed(3)));
}

/** True when a length falls on 1/32 in and its mixed number says it exactly. */
export function isOnThirtySecond(units: number): boolean {
  return Number.isInteger(units) && units % PER_THIRTY_SECOND === 0;
}

/**
 * Yards in eighths where the length falls on them, as typed and without a unit: "2 3/8". What lies between eighths is
 * said in yards and inches to the nearest 1/32, with its units: "2 yd 5 1/2 in", "5 1/2 in".
 */
export function formatYards(units: number): string {
  return writeYards(units, "/").text;
}

export function displayYards(units: number): string {
  return writeYards(units, FRACTION_SLASH).text;
}

function writeYards(units: number, slash: string): { readonly text: string; readonly hasUnit: boolean } {
  if (isOnEighthYard(units)) return { text: write(mixedNumber(units / PER_YARD, 8), slash), hasUnit: false };
  const { negative, yards, beyond } = yardsAndInches(units);
  const parts = [yards > 0 ? `${yards} yd` : "", isSomething(beyond) || yards === 0 ? `${write(beyond, slash)} in` : ""];
  return { text: (negative ? "-" : "") + parts.filter(Boolean).join(" "), hasUnit: true };
}

/** True when a length is a whole number of eighths of a yard. */
export function isOnEighthYard(units: number): boolean {
  return Number.isInteger((units * 8) / PER_YARD);
}

function yardsAndInches(units: number): { readonly negative: boolean; readonly yards: number; readonly beyond: MixedNumber } {
  const marks = Math.round(Math.abs(units) / PER_THIRTY_SECOND);
  const perYard = PER_YARD / PER_THIRTY_SECOND;
  return { negative: units < 0 && marks > 0, yards: Math.floor(marks / perYard), beyond: mixedNumber((marks % perYard) / 32, 32) };
}

function isSomething({ whole, numerator }: MixedNumber): boolean {
  return whole > 0 || numerator > 0;
}

/** Metres and centimetres as said at the counter: "2 m 40", "40 cm", "3 m"; millimetres as a decimal of the centimetre. */
export function formatMetres(units: number): string {
  const centimetres = Number((Math.abs(units) / PER_CENTIMETRE).toFixed(1));
  const sign = units < 0 && centimetres > 0 ? "-" : "";
  const metres = Math.floor(centimetres / CENTIMETRES_IN_METRE);
  const rest = Number((centimetres - metres * CENTIMETRES_IN_METRE).toFixed(1));
  if (metres === 0) return `${sign}${rest} cm`;
  return rest === 0 ? `${sign}${metres} m` : `${sign}${metres} m ${rest < 10 ? `0${rest}` : rest}`;
}

/** Centimetres with at most one decimal. No unit. */
export function formatCentimetres(units: number): string {
  return String(Number((units / PER_CENTIMETRE).toFixed(1)));
}

/** Whole millimetres, to the nearest. No unit. */
export function formatMillimetres(units: number): string {
  return String(Math.round(units / PER_MILLIMETRE));
}

/** A length as the shop sells it, with its unit: "2 3/8 yd", "2 yd 5 1/2 in", "2 m 40". */
export function formatLength(units: number, system: MeasureSystem): string {
  return system === "yards" ? withYards(writeYards(units, "/")) : formatMetres(units);
}

/** The same with the fraction slash. */
export function displayLength(units: number, system: MeasureSystem): string {
  return system === "yards" ? withYards(writeYards(units, FRACTION_SLASH)) : formatMetres(units);
}

function withYards({ text, hasUnit }: { readonly text: string; readonly hasUnit: boolean }): string {
  return hasUnit ? text : `${text} yd`;
}

/** A small measure as the shop's rulers have it, with its unit: "3 7/8 in", "9.8 cm". */
export function formatMeasure(units: number, system: MeasureSystem): string {
  return system === "yards" ? `${formatInches(units)} in` : `${formatCentimetres(units)} cm`;
}

export function displayMeasure(units: number, system: MeasureSystem): string {
  return system === "yards" ? `${displayInches(units)} in` : `${formatCentimetres(units)} cm`;
}

/** A mixed number in words, for screen readers: "3 and 7 eighths", "half", "2". */
export function wordsOfNumber(number: MixedNumber): string {
  const { negative, whole, numerator, denominator } = number;
  const sign = negative ? "minus " : "";
  if (numerator === 0) return `${sign}${whole}`;
  const part = PARTS[denominator] ?? `${denominator}th`;
  const fraction = denominator === 2 ? (whole === 0 ? "half" : "a half") : `${numerator} ${part}${numerator > 1 ? "s" : ""}`;
  return `${sign}${whole === 0 ? fraction : `${whole} and ${fraction}`}`;
}

/** "3 and 7 eighths inches", "1 inch", "7 eighths of an inch", "half an inch". */
export function wordsOfInches(units: number): string {
  return wordsWithUnit(mixedNumber(units / PER_INCH, 32), "inch", "inches", "an");
}

/** "2 and 3 eighths yards", "half a yard"; between eighths "2 yards 5 and a half inches". */
export function wordsOfYards(units: number): string {
  if (isOnEighthYard(units)) return wordsWithUnit(mixedNumber(units / PER_YARD, 8), "yard", "yards", "a");
  const { negative, yards, beyond } = yardsAndInches(units);
  const parts = [yards > 0 ? counted(yards, "yard", "yards") : "", isSomething(beyond) || yards === 0 ? wordsWithUnit(beyond, "inch", "inches", "an") : ""];
  return (negative ? "minus " : "") + parts.filter(Boolean).join(" ");
}

/** "2 metres 40", "1 metre", "40 centimetres". */
export function wordsOfMetres(units: number): string {
  const centimetres = Number((Math.abs(units) / PER_CENTIMETRE).toFixed(1));
  const sign = units < 0 && centimetres > 0 ? "minus " : "";
  const metres = Math.floor(centimetres / CENTIMETRES_IN_METRE);
  const rest = Number((centimetres - metres * CENTIMETRES_IN_METRE).toFixed(1));
  if (metres === 0) return sign + counted(rest, "centimetre", "centimetres");
  return sign + counted(metres, "metre", "metres") + (rest === 0 ? "" : ` ${rest}`);
}

export function wordsOfLength(units: number, system: MeasureSystem): string {
  return system === "yards" ? wordsOfYards(units) : wordsOfMetres(units);
}

function wordsWithUnit(number: MixedNumber, one: string, many: string, article: string): string {
  const words = wordsOfNumber(number);
  if (number.numerator === 0) return `${words} ${number.whole === 1 ? one : many}`;
  if (number.whole > 0) return `${words} ${many}`;
  return `${words} ${number.denominator === 2 ? "" : "of "}${article} ${one}`;
}

function counted(count: number, one: string, many: string): string {
  return `${count} ${count === 1 ? one : many}`;
}
