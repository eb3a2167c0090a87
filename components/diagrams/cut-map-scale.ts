import type { MeasureSystem } from "@/lib/core/measure/format";
import { PER_CENTIMETRE, PER_INCH, PER_YARD } from "@/lib/core/measure/length";
import type { StripPlan, WasteAllowance } from "@/lib/core/piece/strip-plan";
import { px } from "./ink";

/** Room around the cloth: strip numbers and the tape above, the tape beside, dimension lines below. */
export const MAP_LEFT = 34;
export const MAP_TOP = 40;
export const MAP_FOOT = 28;
const MAP_RIGHT = 4;

export interface MapScale {
  /** Pixels a 1/160 mm, both ways. */
  readonly scale: number;
  readonly width: number;
  readonly height: number;
  /** Of the cloth. */
  readonly across: number;
  readonly along: number;
  /** Where the straightened end lies, in 1/160 mm from the cut edge. */
  readonly start: number;
  readonly cutLength: number;
  readonly x: (along: number) => number;
  readonly y: (across: number) => number;
}

/** Both directions at one scale, inside `width` and `mostHeight` pixels. */
export function mapScale(plan: StripPlan, allowance: WasteAllowance | undefined, width: number, mostHeight: number): MapScale {
  const cutLength = Math.max(allowance?.cutLength ?? 0, plan.length, 1);
  const start = allowance?.straightening ?? 0;
  const scale = Math.min((width - MAP_LEFT - MAP_RIGHT) / cutLength, (mostHeight - MAP_TOP - MAP_FOOT) / plan.usableWidth);
  const [along, across] = [cutLength * scale, plan.usableWidth * scale];
  return {
    scale,
    along,
    across,
    start,
    cutLength,
    width: Math.max(px(MAP_LEFT + along + MAP_RIGHT), 120),
    height: px(MAP_TOP + across + MAP_FOOT),
    x: (units) => MAP_LEFT + (start + units) * scale,
    y: (units) => MAP_TOP + units * scale,
  };
}

export interface MapTick {
  readonly at: number;
  /** Pixels. */
  readonly reach: number;
  readonly figure: string | null;
}

const QUARTERS = ["", "1\u20444", "1\u20442", "3\u20444"];

/** Along the bolt: inches with quarter yards named, or centimetres with each tenth of a metre. */
export function alongTicks(length: number, scale: number, system: MeasureSystem): MapTick[] {
  if (system === "metres") return plainTicks(length, scale, [1, 5, 10, 50].map((each) => each * PER_CENTIMETRE), 10 * PER_CENTIMETRE, PER_CENTIMETRE, 34);
  const inch = PER_INCH * scale >= 3 ? 1 : 9;
  const room = PER_YARD * scale;
  const named = room / 4 >= 40 ? 9 : room / 2 >= 40 ? 18 : 36 * Math.max(1, Math.ceil(40 / room));
  return Array.from({ length: Math.floor(length / PER_INCH / inch + 1e-9) + 1 }, (_, index) => {
    const inches = index * inch;
    const yards = Math.floor(inches / 36);
    const quarter = QUARTERS[(inches % 36) / 9] ?? "";
    return {
      at: inches * PER_INCH,
      reach: inches % 36 === 0 ? 18 : inches % 9 === 0 ? 13 : 5,
      figure: inches > 0 && inches % named === 0 ? [yards > 0 ? String(yards) : "", quarter].filter(Boolean).join(" ") : null,
    };
  });
}

/** From selvage to selvage: inches with every sixth named, or centimetres with every tenth. */
export function acrossTicks(width: number, scale: number, system: MeasureSystem): MapTick[] {
  if (system === "metres") return plainTicks(width, scale, [1, 5, 10].map((each) => each * PER_CENTIMETRE), 10 * PER_CENTIMETRE, PER_CENTIMETRE, 18);
  return plainTicks(width, scale, [1, 3, 6, 12].map((each) => each * PER_INCH), 6 * PER_INCH, PER_INCH, 18);
}

/** The finest of `steps` that leaves 3 px; figures at multiples of `named` that leave `room`. */
function plainTicks(length: number, scale: number, steps: readonly number[], named: number, unit: number, room: number): MapTick[] {
  const step = steps.find((each) => each * scale >= 3) ?? named;
  const figures = named * Math.max(1, Math.ceil(room / (named * scale)));
  return Array.from({ length: Math.floor(length / step + 1e-9) + 1 }, (_, index) => {
    const at = index * step;
    return { at, reach: at % named === 0 ? 11 : at % (named / 2) === 0 ? 7 : 4, figure: at > 0 && at % figures === 0 ? String(at / unit) : null };
  });
}
