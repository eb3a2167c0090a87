import type { ExactPoint, Grain, RoleId } from "./drawing";

/**
 * A point in the plane in 1/160 mm as floats, x to the right and y downwards. Floats are for pictures and for
 * exact sizes that are about to be rounded; what is stored and compared is exact.
 */
export type PlanePoint = readonly [x: number, y: number];

/** Corners in order, clockwise as seen on the screen (y downwards), without the first repeated. */
export type Polygon = readonly PlanePoint[];

/** One face of the drawing. */
export interface Patch {
  /** Index in reading order: by the highest corner, then the leftmost. */
  readonly index: number;
  /** Exact corners as fractions of the block, clockwise on the screen, straight-through points removed. */
  readonly outline: readonly ExactPoint[];
  /** The same corners at the block's size. */
  readonly corners: Polygon;
  /** "A", "D", or "Dr" for D's mirror image. A letter names a shape with its hand, whatever the fabric. */
  readonly letter: string;
  readonly role: RoleId | null;
  readonly grain: Grain;
  /** Clockwise turn in degrees (0 to 360) that lays the letter's model shape over this patch. */
  readonly turn: number;
}

/** A shape that one letter names. */
export interface Shape {
  readonly letter: string;
  /** Finished corners in the model pose: longest straight-grain side level where there is one; clockwise; touching both axes. */
  readonly finished: Polygon;
  /** What a quilter calls it: "Square, 3 in", "Half-square triangle, 3 in", "Parallelogram". */
  readonly name: string;
  /** The shape is its own mirror image, so there is no reversed patch of it. */
  readonly symmetric: boolean;
  readonly count: number;
}
