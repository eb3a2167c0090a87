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

/** The square for four flying geese at once, one for their large triangles: a quarter-square on the goose's long side. */
export function flyingGeeseLargeSquare(finishedLongSide: number, seam: number): number {
  return quarterSquareCut(finishedLongSide, seam);
}

/** The four squares for the small triangles of four flying geese at once: half-squares on half the goose's long side. */
export function flyingGeeseSmallSquare(finishedLongSide: number, seam: number): number {
  return halfSquareCut(finishedLongSide / 2, seam);
}

/** The square, two of a kind sewn face to face, that gives eight half-square units: two of the half-square's own squares wide. */
export function eightHalfSquares(finished: number, seam: number): number {
  return 2 * halfSquareCut(finished, seam);
}

/** The square cut once for the corners round a square set on point: half-squares whose long side is the square's side. */
export function squareInSquareCorner(finishedCentre: number, seam: number): number {
  return halfSquareCut(finishedCentre / Math.SQRT2, seam);
}

/** The short sides of the triangles at the corners of a regular octagon in a square, and the part of an eight-pointed star: side / (2 + √2). */
export function octagonCorner(square: number): number {
  return square / (2 + Math.SQRT2);
}

/** The side of a regular octagon that fills a square: side / (1 + √2). */
export function octagonSide(square: number): number {
  return square / (1 + Math.SQRT2);
}

/** The inner part of a ring of eight round an octagon (Castle Wall): side / (3 + 2√2), the octagon's corner taken of its side once more. */
export function octagonInnerPart(square: number): number {
  return square / (3 + 2 * Math.SQRT2);
}
