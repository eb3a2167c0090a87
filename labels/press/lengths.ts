import { PER_CENTIMETRE, PER_EIGHTH_YARD, PER_INCH, PER_METRE, PER_YARD, type Length } from "../../lib/core/measure/length";

/** Which units the shop sells and cuts in. */
export type Measure = "yards" | "metres";

const SOLIDUS = "\u2044";
const NO_BREAK = "\u00a0";

/** A whole number and a fraction in lowest terms: "3 7⁄8"; set as a mixed number by `drawLine`. */
function mixed(parts: number, perWhole: number): string {
  const whole = Math.floor(parts / perWhole);
  let over = parts - whole * perWhole;
  let under = perWhole;
  while (over > 0 && over % 2 === 0 && under % 2 === 0) {
    over /= 2;
    under /= 2;
  }
  if (over === 0) return String(whole);
  return `${whole > 0 ? `${whole} ` : ""}${over}${SOLIDUS}${under}`;
}

/** As cloth is sold: eighths of a yard, or metres to the millimetre. What falls between eighths is said in yards and inches. */
export function soldLength(value: Length, measure: Measure): string {
  const { figure, unit } = soldFigure(value, measure);
  const yards = Math.floor(value / PER_YARD);
  if (unit === "in" && yards > 0) {
    return `${yards}${NO_BREAK}yd ${mixed(Math.round(((value - yards * PER_YARD) / PER_INCH) * 32), 32)}${NO_BREAK}in`;
  }
  return `${figure}${NO_BREAK}${unit}`;
}

/** One figure and its unit, for columns that stand under each other. */
export function soldFigure(value: Length, measure: Measure): { readonly figure: string; readonly unit: string } {
  if (measure === "metres") return { figure: trimmed(value / PER_METRE, 3), unit: "m" };
  if (value % PER_EIGHTH_YARD === 0) return { figure: mixed(value / PER_EIGHTH_YARD, 8), unit: "yd" };
  return { figure: mixed(Math.round((value / PER_INCH) * 32), 32), unit: "in" };
}

/** As a ruler reads it: inches in fractions, or centimetres to the millimetre. */
export function rulerFigure(value: Length, measure: Measure): string {
  if (measure === "metres") return trimmed(value / PER_CENTIMETRE, 2);
  return mixed(Math.round((value / PER_INCH) * 32), 32);
}

export function rulerUnit(measure: Measure): string {
  return measure === "metres" ? "cm" : "in";
}

export function rulerLength(value: Length, measure: Measure): string {
  return `${rulerFigure(value, measure)}${NO_BREAK}${rulerUnit(measure)}`;
}

/** An exact size to the thousandth, for beside the ruler's: "3.854 in". */
export function exactLength(exact: number, measure: Measure): string {
  const value = measure === "metres" ? exact / PER_CENTIMETRE : exact / PER_INCH;
  return `${trimmed(value, 3)}${NO_BREAK}${rulerUnit(measure)}`;
}

function trimmed(value: number, places: number): string {
  const said = value.toFixed(places);
  return said.includes(".") ? said.replace(/\.?0+$/, "") : said;
}
