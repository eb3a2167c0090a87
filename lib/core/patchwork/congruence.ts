import { formatExact, multiply, type Exact } from "./exact";
import { cross, dot, minus, type Vector } from "./exact-point";

/** A shape's own description, the same wherever it lies and however it is turned; its mirror image has another. */
export interface Signature {
  readonly text: string;
  readonly mirrored: string;
  /** The corner at which the description of this polygon begins. */
  readonly start: number;
}

/**
 * Describes a polygon (clockwise on the screen) up to turning and moving: for each corner the squared length of the side
 * that leaves it and the cross and dot product with the next side, all exact, read from the corner that makes the list
 * smallest. Two polygons are congruent by turning exactly when their texts are equal, and mirror images of each other
 * when one's text is the other's `mirrored`. O(n²) in the corners.
 */
export function signatureOf(corners: readonly Vector[]): Signature {
  const own = smallest(describe(corners));
  const reflected = [...corners].reverse().map((corner) => ({ x: multiply(corner.x, MINUS_ONE), y: corner.y }));
  return { text: own.text, mirrored: smallest(describe(reflected)).text, start: own.start };
}

const MINUS_ONE: Exact = { a: -1n, b: 0n, c: 0n, d: 0n, under: 1n };

function describe(corners: readonly Vector[]): string[] {
  const sides = corners.map((corner, index) => minus(corners[(index + 1) % corners.length] ?? corner, corner));
  return sides.map((side, index) => {
    const next = sides[(index + 1) % sides.length] ?? side;
    return [dot(side, side), cross(side, next), dot(side, next)].map(formatExact).join(",");
  });
}

function smallest(parts: readonly string[]): { text: string; start: number } {
  let best = { text: "", start: 0 };
  for (let start = 0; start < parts.length; start += 1) {
    const text = [...parts.slice(start), ...parts.slice(0, start)].join(";");
    if (start === 0 || text < best.text) best = { text, start };
  }
  return best;
}
