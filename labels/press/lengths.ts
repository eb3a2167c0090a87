import { displayInches, displayYards, formatCentimetres, formatExactInches, formatMetres, type MeasureSystem } from "@/lib/core/measure/format";
import { PER_CENTIMETRE, PER_EIGHTH_YARD, PER_YARD, type Length } from "@/lib/core/measure/length";

/** A figure is never parted from its unit at the end of a line. */
const NO_BREAK = "\u00a0";

/** As cloth is sold: eighths of a yard, or metres. What falls between eighths is said in yards and inches. */
export function soldLength(value: Length, system: MeasureSystem): string {
  const { figure, unit } = soldFigure(value, system);
  const yards = Math.floor(value / PER_YARD);
  if (unit === "in" && yards > 0) return `${yards}${NO_BREAK}yd ${displayInches(value - yards * PER_YARD)}${NO_BREAK}in`;
  return unit ? `${figure}${NO_BREAK}${unit}` : figure;
}

/** One figure and its unit, for columns that stand under each other; the unit is empty where the figure says it ("2 m 40"). */
export function soldFigure(value: Length, system: MeasureSystem): { readonly figure: string; readonly unit: string } {
  if (system === "metres") return { figure: formatMetres(value).replace(/ /g, NO_BREAK), unit: "" };
  if (value % PER_EIGHTH_YARD === 0) return { figure: displayYards(value), unit: "yd" };
  return { figure: displayInches(value), unit: "in" };
}

/** As a ruler reads it: inches in fractions, or centimetres to the millimetre. */
export function rulerFigure(value: Length, system: MeasureSystem): string {
  return system === "metres" ? formatCentimetres(value) : displayInches(value);
}

export function rulerUnit(system: MeasureSystem): string {
  return system === "metres" ? "cm" : "in";
}

export function rulerLength(value: Length, system: MeasureSystem): string {
  return `${rulerFigure(value, system)}${NO_BREAK}${rulerUnit(system)}`;
}

/** An exact size to the thousandth, for beside the ruler's: "3.854 in". */
export function exactLength(exact: number, system: MeasureSystem): string {
  const figure = system === "metres" ? String(Number((exact / PER_CENTIMETRE).toFixed(3))) : formatExactInches(exact);
  return `${figure}${NO_BREAK}${rulerUnit(system)}`;
}
