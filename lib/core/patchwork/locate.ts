import type { Patch, PlanePoint } from "../piece/patch";

/**
 * The patch that a pointer is over, in 1/160 mm of the block; null outside the block. On a seam it is the patch in whose
 * outline the point lies by the usual rule (a point is above or below a seam's end, never both), so that every point of
 * the block has one patch. O(corners).
 */
export function patchAt<Each extends Pick<Patch, "corners">>(patches: readonly Each[], [x, y]: PlanePoint): Each | null {
  return patches.find(({ corners }) => surrounds(corners, x, y)) ?? null;
}

/** Odd number of sides passed on the way to the right. */
function surrounds(corners: Patch["corners"], x: number, y: number): boolean {
  let inside = false;
  for (const [index, [fromX, fromY]] of corners.entries()) {
    const [toX, toY] = corners[(index + 1) % corners.length] ?? [fromX, fromY];
    if (fromY > y === toY > y) continue;
    // Both patches at a seam reckon its crossing from the same end, so that float noise falls the same way for both.
    const [topX, topY, lowX, lowY] = fromY < toY ? [fromX, fromY, toX, toY] : [toX, toY, fromX, fromY];
    if (x < topX + ((y - topY) * (lowX - topX)) / (lowY - topY)) inside = !inside;
  }
  return inside;
}
