/**
 * Exact cut sizes of the usual shapes, for a finished size and a seam allowance in any one unit. Each is the finished
 * shape moved out by the seam on every side (elementary geometry); the rules of thumb of the trade round them up.
 */

/** A square or a side of a rectangle: + 2 s (1/2 in). */
export function squareCut(finished: number, seam: number): number {
  return finished + 2 * seam;
}

/** The square that is cut once corner to corner for two half-square triangles: + s (2 + √2), which is 7/8 in rounded up. */
export function halfSquareCut(finished: number, seam: number): number {
  return finished + seam * (2 + Math.SQRT2);
}

/** The square that is cut twice for four quarter-square triangles of a long side: + s (2 + 2√2), which is 1 1/4 in rounded up. */
export function quarterSquareCut(finishedLongSide: number, seam: number): number {
  return finishedLongSide + seam * (2 + 2 * Math.SQRT2);
}

/** The square for four side setting triangles of blocks set on point: a quarter-square on the block's diagonal. */
export function sideSettingSquare(block: number, seam: number): number {
  return quarterSquareCut(block * Math.SQRT2, seam);
}

/** The square for two corner setting triangles: a half-square whose long side is the block's side. */
export function cornerSettingSquare(block: number, seam: number): number {
  return halfSquareCut(block / Math.SQRT2, seam);
}

/** The strip for equilateral triangles of a finished height, tips sharp: + 3 s. */
export function equilateralStrip(finishedHeight: number, seam: number): number {
  return finishedHeight + 3 * seam;
}

/** The strip for diamonds and parallelograms: + 2 s; they are sub-cut at the same measure square to the cut. */
export function diamondStrip(finishedHeight: number, seam: number): number {
  return finishedHeight + 2 * seam;
}

/** The side of a regular octagon that fills a square, and of the triangles at its corners: side / (2 + √2). */
export function octagonCorner(square: number): number {
  return square / (2 + Math.SQRT2);
}
