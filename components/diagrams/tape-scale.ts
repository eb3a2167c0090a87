import type { MeasureSystem } from "@/lib/core/measure/format";
import { PER_EIGHTH_YARD, PER_METRE, PER_YARD } from "@/lib/core/measure/length";

/** Least distance of two ticks in pixels. */
const TICK_ROOM = 4;
const FIGURE_STEPS = [1, 2, 3, 5, 6, 10, 12, 15, 20, 25, 30, 50, 60, 100, 150, 200, 300, 500, 1000, 2000, 5000];

export interface TapeTick {
  /** Along the tape, in 1/160 mm. */
  readonly at: number;
  /** Of the tape's breadth: a yard or metre runs right across. */
  readonly part: number;
}

/** What a whole unit of the tape is, in 1/160 mm. */
export function unitOf(system: MeasureSystem): number {
  return system === "yards" ? PER_YARD : PER_METRE;
}

/** The finest step whose ticks stand 4 px apart or more: eighths, quarters, halves, yards; or 10 cm, 50 cm, metres. */
export function tickStep(pixelsPerUnit: number, system: MeasureSystem): number {
  const steps = system === "yards" ? [PER_EIGHTH_YARD, 2 * PER_EIGHTH_YARD, 4 * PER_EIGHTH_YARD] : [PER_METRE / 10, PER_METRE / 2];
  return steps.find((step) => step * pixelsPerUnit >= TICK_ROOM) ?? unitOf(system);
}

/** The true ticks of `length` of tape, from nothing on. */
export function tapeTicks(length: number, pixelsPerUnit: number, system: MeasureSystem): TapeTick[] {
  const step = tickStep(pixelsPerUnit, system);
  const part = system === "yards" ? yardPart : metrePart;
  return Array.from({ length: Math.floor(length / step) + 1 }, (_, index) => ({ at: index * step, part: part(index * step) }));
}

function yardPart(at: number): number {
  const eighths = Math.round(at / PER_EIGHTH_YARD);
  if (eighths % 8 === 0) return 1;
  return eighths % 4 === 0 ? 0.62 : eighths % 2 === 0 ? 0.46 : 0.3;
}

function metrePart(at: number): number {
  const tenths = Math.round((at * 10) / PER_METRE);
  if (tenths % 10 === 0) return 1;
  return tenths % 5 === 0 ? 0.62 : 0.36;
}

/** Whole units between two figures, so that they stand `room` pixels apart or more. */
export function figureStep(pixelsPerUnit: number, system: MeasureSystem, room = 26): number {
  const each = pixelsPerUnit * unitOf(system);
  return FIGURE_STEPS.find((step) => step * each >= room) ?? 10_000;
}

/** The step of a table's axis: as few figures as still tell the scale. */
export function axisStep(max: number, pixelsPerUnit: number, system: MeasureSystem): number {
  const units = max / unitOf(system);
  const least = figureStep(pixelsPerUnit, system, 56);
  return FIGURE_STEPS.find((step) => step >= least && Math.abs(units / step - Math.round(units / step)) < 1e-9) ?? least;
}
