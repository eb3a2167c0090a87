import type { ExactPoint } from "../piece/drawing";
import type { PlanePoint } from "../piece/patch";
import { ok, type Result } from "../result";
import { add, compare, equals, formatExact, multiply, parseExact, sign, subtract, toNumber, type Exact } from "./exact";

/** A point or a vector in exact coordinates, y downwards. */
export interface Vector {
  readonly x: Exact;
  readonly y: Exact;
}

export function parsePoint([x, y]: ExactPoint): Result<Vector, "bad-number"> {
  const [across, down] = [parseExact(x), parseExact(y)];
  if (!across.ok) return across;
  return down.ok ? ok({ x: across.value, y: down.value }) : down;
}

export function formatPoint(point: Vector): ExactPoint {
  return [formatExact(point.x), formatExact(point.y)];
}

/** Equal points have equal keys. */
export function keyOf(point: Vector): string {
  return `${formatExact(point.x)},${formatExact(point.y)}`;
}

export function minus(to: Vector, from: Vector): Vector {
  return { x: subtract(to.x, from.x), y: subtract(to.y, from.y) };
}

/** Above zero when v turns clockwise from u, as seen on the screen (y downwards). */
export function cross(u: Vector, v: Vector): Exact {
  return subtract(multiply(u.x, v.y), multiply(u.y, v.x));
}

export function dot(u: Vector, v: Vector): Exact {
  return add(multiply(u.x, v.x), multiply(u.y, v.y));
}

export function samePoint(p: Vector, q: Vector): boolean {
  return equals(p.x, q.x) && equals(p.y, q.y);
}

/** Which side of the line from `from` to `to` a point lies on: 1 to its right on the screen, 0 on it. */
export function sideOf(from: Vector, to: Vector, point: Vector): -1 | 0 | 1 {
  return sign(cross(minus(to, from), minus(point, from)));
}

/** By x, then by y: along a straight seam this is the order from one end to the other. */
export function alongOrder(p: Vector, q: Vector): number {
  return compare(p.x, q.x) || compare(p.y, q.y);
}

export function toPlane(point: Vector, width: number, height: number): PlanePoint {
  return [toNumber(point.x) * width, toNumber(point.y) * height];
}
