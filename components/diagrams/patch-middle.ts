import type { PlanePoint, Polygon } from "@/lib/core/piece/patch";

export interface PatchMiddle {
  readonly at: PlanePoint;
  /** The distance to the nearest edge. */
  readonly room: number;
}

/**
 * Where a letter stands in a patch: its centre of gravity where that has room enough, else the roomiest of 144 places
 * in its bounds. In the polygon's units.
 */
export function middleOf(polygon: Polygon): PatchMiddle {
  const centre = gravity(polygon);
  const candidates = [centre, ...raster(polygon)].map((at) => ({ at, room: contains(polygon, at) ? distance(polygon, at) : -1 }));
  const best = candidates.reduce((found, each) => (each.room > found.room ? each : found));
  const first = candidates[0] ?? best;
  return first.room >= best.room * 0.6 ? first : best;
}

function gravity(polygon: Polygon): PlanePoint {
  let [area, x, y] = [0, 0, 0];
  polygon.forEach(([a, b], index) => {
    const [c, d] = polygon[(index + 1) % polygon.length] ?? [a, b];
    const part = a * d - c * b;
    area += part;
    x += (a + c) * part;
    y += (b + d) * part;
  });
  return area === 0 ? (polygon[0] ?? [0, 0]) : [x / (3 * area), y / (3 * area)];
}

function raster(polygon: Polygon): PlanePoint[] {
  const [xs, ys] = [polygon.map(([x]) => x), polygon.map(([, y]) => y)];
  const [left, top] = [Math.min(...xs), Math.min(...ys)];
  const [width, height] = [Math.max(...xs) - left, Math.max(...ys) - top];
  return Array.from({ length: 144 }, (_, index): PlanePoint => [left + ((index % 12) + 0.5) * (width / 12), top + (Math.floor(index / 12) + 0.5) * (height / 12)]);
}

function contains(polygon: Polygon, [x, y]: PlanePoint): boolean {
  return polygon.reduce((inside, [a, b], index) => {
    const [c, d] = polygon[(index + 1) % polygon.length] ?? [a, b];
    return b > y !== d > y && x < a + ((y - b) / (d - b)) * (c - a) ? !inside : inside;
  }, false);
}

function distance(polygon: Polygon, [x, y]: PlanePoint): number {
  return Math.min(
    ...polygon.map(([a, b], index) => {
      const [c, d] = polygon[(index + 1) % polygon.length] ?? [a, b];
      const long = (c - a) ** 2 + (d - b) ** 2;
      const part = long === 0 ? 0 : Math.max(0, Math.min(1, ((x - a) * (c - a) + (y - b) * (d - b)) / long));
      return Math.hypot(x - a - part * (c - a), y - b - part * (d - b));
    }),
  );
}
