import type { PlanePoint, Polygon } from "../piece/patch";

/** Floats for sizes that are about to be rounded; lengths in 1/160 mm, angles in degrees. */
export function sidesOf(polygon: Polygon): PlanePoint[] {
  return polygon.map(([x, y], index) => {
    const [nextX, nextY] = polygon[(index + 1) % polygon.length] ?? [x, y];
    return [nextX - x, nextY - y];
  });
}

export function sideLength([x, y]: PlanePoint): number {
  return Math.hypot(x, y);
}

/** Above zero for a polygon that runs clockwise on the screen. */
export function areaOf(polygon: Polygon): number {
  return polygon.reduce((sum, [x, y], index) => {
    const [nextX, nextY] = polygon[(index + 1) % polygon.length] ?? [x, y];
    return sum + (x * nextY - nextX * y) / 2;
  }, 0);
}

/** Turned clockwise on the screen about the origin. */
export function turned(polygon: Polygon, degrees: number): Polygon {
  const angle = (degrees * Math.PI) / 180;
  const [cos, sin] = [Math.cos(angle), Math.sin(angle)];
  return polygon.map(([x, y]) => [x * cos - y * sin, x * sin + y * cos]);
}

export interface Bounds {
  readonly left: number;
  readonly top: number;
  readonly width: number;
  readonly height: number;
}

export function boundsOf(polygon: Polygon): Bounds {
  const xs = polygon.map(([x]) => x);
  const ys = polygon.map(([, y]) => y);
  const [left, top] = [Math.min(...xs), Math.min(...ys)];
  return { left, top, width: Math.max(...xs) - left, height: Math.max(...ys) - top };
}

/** Moved so that it touches both axes. */
export function toOrigin(polygon: Polygon): Polygon {
  const { left, top } = boundsOf(polygon);
  return polygon.map(([x, y]) => [x - left, y - top]);
}

/** The direction of a vector, clockwise from due right on the screen, from 0 up to 360. */
export function directionOf([x, y]: PlanePoint): number {
  return normalTurn((Math.atan2(y, x) * 180) / Math.PI);
}

/** A turn from 0 up to 360, with float noise taken out. */
export function normalTurn(degrees: number): number {
  const turn = ((degrees % 360) + 360) % 360;
  const tidy = Math.round(turn * 1e6) / 1e6;
  return tidy === 360 ? 0 : tidy;
}

/** How far a polygon reaches across its narrowest way: the least of its reaches square to its sides. Exact for convex shapes. */
export function narrowestWidth(polygon: Polygon): number {
  return Math.min(
    ...sidesOf(polygon).map((side, index) => {
      const [x, y] = polygon[index] ?? [0, 0];
      const long = sideLength(side);
      return Math.max(...polygon.map(([px, py]) => Math.abs(side[0] * (py - y) - side[1] * (px - x)) / long));
    }),
  );
}
