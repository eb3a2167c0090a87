import type { MeasureSystem } from "@/lib/core/measure/format";
import { PER_CENTIMETRE, PER_EIGHTH_YARD, PER_METRE, PER_YARD } from "@/lib/core/measure/length";

/** What Up and Down step, and what one key of the rule is worth: an eighth of a yard, or 10 cm. */
export function stepOf(system: MeasureSystem): number {
  return system === "metres" ? 10 * PER_CENTIMETRE : PER_EIGHTH_YARD;
}

interface WholeAndPart {
  /** The whole yards or metres, in 1/160 mm. */
  readonly whole: number;
  /** What lies beyond them. */
  readonly part: number;
}

export function yardAndPart(units: number): WholeAndPart {
  return { whole: units - (units % PER_YARD), part: units % PER_YARD };
}

export function metreAndPart(units: number): WholeAndPart {
  return { whole: units - (units % PER_METRE), part: units % PER_METRE };
}

export interface LengthKey {
  readonly label: string;
  readonly said: string;
  readonly part: number;
  /** The tick stands as tall as it would on the tape, in pixels. */
  readonly tick: number;
}

const EIGHTHS = ["0", "1\u20448", "1\u20444", "3\u20448", "1\u20442", "5\u20448", "3\u20444", "7\u20448"];
const SAID = ["no eighths", "1 eighth", "1 quarter", "3 eighths", "1 half", "5 eighths", "3 quarters", "7 eighths"];

export function keysOf(system: MeasureSystem): readonly LengthKey[] {
  if (system === "metres")
    return Array.from({ length: 10 }, (_, index) => ({ label: String(index * 10), said: `${index * 10} centimetres`, part: index * 10 * PER_CENTIMETRE, tick: index === 5 ? 17 : 9 }));
  return EIGHTHS.map((label, index) => ({ label, said: SAID[index] ?? label, part: index * PER_EIGHTH_YARD, tick: index === 4 ? 19 : index % 2 === 0 ? 14 : 9 }));
}
