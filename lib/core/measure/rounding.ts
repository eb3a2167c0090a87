import { length, type Length } from "./length";

/**
 * Exact sizes come out of floats; one that lies within this of a mark (in 1/160 mm) is on the mark.
 * 1e-4 is 0.6 nanometres: far above float noise at 14 000 yd, far below any cloth.
 */
export const ON_THE_MARK = 1e-4;

/** Up to the next multiple of `step`; a size on a mark stays. For what is trimmed after sewing. */
export function roundUp(exact: number, step: Length): Length {
  return length(Math.ceil((exact - ON_THE_MARK) / step) * step);
}

/** To the nearest multiple of `step`, halves up. For what is sewn as cut. */
export function roundNearest(exact: number, step: Length): Length {
  return length(Math.floor((exact + ON_THE_MARK) / step + 0.5) * step);
}

/** Down to a multiple of `step`. For what can be sold of a remnant. */
export function roundDown(exact: number, step: Length): Length {
  return length(Math.floor((exact + ON_THE_MARK) / step) * step);
}
