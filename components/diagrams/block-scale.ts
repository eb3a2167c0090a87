import type { BlockSize } from "@/lib/core/piece/drawing";
import type { PlanePoint } from "@/lib/core/piece/patch";

/** Room that the yellow rulers take. */
export const RULER_TOP = 24;
export const RULER_LEFT = 28;
/** Half of the cut edge lies outside the block. */
const MARGIN = 3;

/** How a block lies on its picture. */
export interface BlockScale {
  /** Pixels of the picture. */
  readonly width: number;
  readonly height: number;
  /** Of the block's top left corner. */
  readonly left: number;
  readonly top: number;
  /** Pixels a 1/160 mm. */
  readonly scale: number;
  /** From 1/160 mm on the block to pixels on the picture. */
  readonly place: (point: PlanePoint) => PlanePoint;
  /** From pixels on the picture, as it is laid out, to fractions of the block; outside of 0 to 1 is off the block. */
  readonly fraction: (point: PlanePoint) => PlanePoint;
}

/**
 * Where a block of `size` lies on a picture whose longer side of the block is `side` pixels. Whoever lays something over the
 * picture, or asks where a pointer is, uses the same scale.
 */
export function blockScale(size: BlockSize, side: number, rulers: boolean): BlockScale {
  const scale = side / Math.max(size.width, size.height);
  const [left, top] = rulers ? [RULER_LEFT, RULER_TOP] : [MARGIN, MARGIN];
  const [across, down] = [size.width * scale, size.height * scale];
  return {
    width: left + across + MARGIN,
    height: top + down + MARGIN,
    left,
    top,
    scale,
    place: ([x, y]) => [left + x * scale, top + y * scale],
    fraction: ([x, y]) => [(x - left) / across, (y - top) / down],
  };
}
