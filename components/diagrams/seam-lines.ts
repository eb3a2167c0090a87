import type { PlanePoint, Polygon } from "@/lib/core/piece/patch";

/** Keeps the drawing's round figures away from where a rounded offset would tip over. */
const OFF_CENTRE = 0.317;

/** A straight line on a drawing, in the drawing's own units. */
export interface PlaneLine {
  readonly from: PlanePoint;
  readonly to: PlanePoint;
}

/**
 * The lines between patches, each once and as long as it runs: edges on one line that touch or overlap are joined, so that
 * dashes run through and a T-joint is not drawn twice. Edges on the outside of `width` by `height` are left out.
 *
 * @param tolerance what is one place, in the drawing's units.
 */
export function seamLines(polygons: readonly Polygon[], width: number, height: number, tolerance = 1): PlaneLine[] {
  const lines = new Map<string, { readonly direction: PlanePoint; readonly offset: number; readonly spans: [number, number][] }>();
  for (const polygon of polygons) {
    polygon.forEach((from, index) => {
      const to = polygon[(index + 1) % polygon.length] ?? from;
      if (isOutside(from, to, width, height, tolerance)) return;
      const direction = directionOf(from, to);
      const offset = direction[0] * from[1] - direction[1] * from[0];
      const key = `${direction.map((part) => part.toFixed(4)).join()},${Math.round(offset / (4 * tolerance) + OFF_CENTRE)}`;
      const along = [from, to].map((point) => direction[0] * point[0] + direction[1] * point[1]);
      const span: [number, number] = [Math.min(...along), Math.max(...along)];
      const line = lines.get(key);
      if (line) line.spans.push(span);
      else lines.set(key, { direction, offset, spans: [span] });
    });
  }
  return [...lines.values()].flatMap(({ direction, offset, spans }) => joined(spans, tolerance).map(([start, end]) => ({ from: pointAt(direction, offset, start), to: pointAt(direction, offset, end) })));
}

function isOutside([x, y]: PlanePoint, [u, v]: PlanePoint, width: number, height: number, tolerance: number): boolean {
  const both = (a: number, b: number, at: number) => Math.abs(a - at) < tolerance && Math.abs(b - at) < tolerance;
  return both(x, u, 0) || both(x, u, width) || both(y, v, 0) || both(y, v, height);
}

/** Of length one, pointing right, or down where it is upright. */
function directionOf([x, y]: PlanePoint, [u, v]: PlanePoint): PlanePoint {
  const long = Math.hypot(u - x, v - y) || 1;
  const [a, b] = [(u - x) / long, (v - y) / long];
  const flip = a < -1e-6 || (Math.abs(a) <= 1e-6 && b < 0) ? -1 : 1;
  return [clean(a * flip), clean(b * flip)];
}

function clean(value: number): number {
  return Math.abs(value) < 1e-9 ? 0 : value;
}

function joined(spans: readonly [number, number][], tolerance: number): [number, number][] {
  const runs: [number, number][] = [];
  for (const [start, end] of [...spans].sort((a, b) => a[0] - b[0])) {
    const last = runs[runs.length - 1];
    if (last && start <= last[1] + tolerance) last[1] = Math.max(last[1], end);
    else runs.push([start, end]);
  }
  return runs;
}

function pointAt([a, b]: PlanePoint, offset: number, along: number): PlanePoint {
  return [a * along - b * offset, b * along + a * offset];
}
