import type { ExactPoint } from "../piece/drawing";
import type { Patch } from "../piece/patch";
import { add, compare, multiply, rational, sign } from "./exact";
import { formatPoint, minus, cross, parsePoint, sideOf, type Vector } from "./exact-point";

/** Whether a point lies strictly inside a face, exactly: an odd number of sides passes to its right, and none through it. */
export function holds(face: readonly Vector[], point: Vector): boolean {
  let inside = false;
  for (const [index, from] of face.entries()) {
    const to = face[(index + 1) % face.length] ?? from;
    if (isOn(from, to, point)) return false;
    const below = compare(from.y, point.y) > 0;
    if (below === compare(to.y, point.y) > 0) continue;
    const turn = sign(cross(minus(to, from), minus(point, from)));
    if (below ? turn > 0 : turn < 0) inside = !inside;
  }
  return inside;
}

function isOn(from: Vector, to: Vector, point: Vector): boolean {
  if (sideOf(from, to, point) !== 0) return false;
  const between = (a: Vector["x"], b: Vector["x"], value: Vector["x"]) => compare(a, value) * compare(value, b) >= 0;
  return between(from.x, to.x, point.x) && between(from.y, to.y, point.y);
}

/**
 * An exact point strictly inside a patch: the mean of its corners where that lies inside, else the middle of a triangle of
 * three neighbouring corners that is empty of the others.
 */
export function insideOf({ outline }: Pick<Patch, "outline">): ExactPoint {
  const face = outline.map((point) => {
    const parsed = parsePoint(point);
    if (!parsed.ok) throw new RangeError(parsed.fault.message);
    return parsed.value;
  });
  const mean = meanOf(face);
  if (holds(face, mean)) return formatPoint(mean);
  for (const [index, corner] of face.entries()) {
    const ear = [face[(index + face.length - 1) % face.length] ?? corner, corner, face[(index + 1) % face.length] ?? corner];
    const middle = meanOf(ear);
    const clear = !face.some((other) => !ear.includes(other) && holds(ear, other));
    if (clear && holds(face, middle)) return formatPoint(middle);
  }
  throw new RangeError("A face without an inside.");
}

function meanOf(points: readonly Vector[]): Vector {
  const share = rational(1, points.length);
  const sum = points.reduce((total, point) => ({ x: add(total.x, point.x), y: add(total.y, point.y) }));
  return { x: multiply(sum.x, share), y: multiply(sum.y, share) };
}
