/** A figure as people write it on cloth: a whole number and a fraction in its lowest terms. */
export interface MixedNumber {
  readonly whole: number;
  readonly numerator: number;
  readonly denominator: number;
  readonly negative: boolean;
}

/** Splits a count of units to the nearest 1/finest of the unit `per`. Finest is a power of two. */
export function mixedNumber(value: number, per: number, finest: number): MixedNumber {
  const parts = Math.round((Math.abs(value) * finest) / per);
  let numerator = parts % finest;
  let denominator = finest;
  while (numerator > 0 && numerator % 2 === 0) {
    numerator /= 2;
    denominator /= 2;
  }
  return { whole: Math.floor(parts / finest), numerator, denominator: numerator === 0 ? 1 : denominator, negative: value < 0 && parts > 0 };
}

/** Written with the fraction slash (U+2044), which the family's `frac` feature sets as one mixed number. */
export function writeMixedNumber(figure: MixedNumber): string {
  const whole = figure.whole.toLocaleString("en-US");
  const fraction = figure.numerator === 0 ? "" : `${figure.numerator}\u2044${figure.denominator}`;
  const sign = figure.negative ? "\u2212" : "";
  if (fraction === "") return sign + whole;
  return figure.whole === 0 ? sign + fraction : `${sign}${whole} ${fraction}`;
}

const PARTS: Readonly<Record<number, readonly [one: string, many: string]>> = {
  2: ["half", "halves"],
  4: ["quarter", "quarters"],
  8: ["eighth", "eighths"],
  16: ["sixteenth", "sixteenths"],
  32: ["thirty-second", "thirty-seconds"],
  64: ["sixty-fourth", "sixty-fourths"],
};

/** Said aloud: "3 and 7 eighths", "1 half", "minus 2". */
export function sayMixedNumber(figure: MixedNumber): string {
  const sign = figure.negative ? "minus " : "";
  const name = PARTS[figure.denominator] ?? [`part of ${figure.denominator}`, `parts of ${figure.denominator}`];
  const fraction = figure.numerator === 0 ? "" : `${figure.numerator} ${figure.numerator === 1 ? name[0] : name[1]}`;
  if (fraction === "") return `${sign}${figure.whole}`;
  return figure.whole === 0 ? sign + fraction : `${sign}${figure.whole} and ${fraction}`;
}

/** Whether a figure takes the unit's plural: everything above one does. */
export function isMany(figure: MixedNumber): boolean {
  return figure.whole > 1 || (figure.whole === 1 && figure.numerator > 0) || (figure.whole === 0 && figure.numerator === 0);
}
