import type { PlanePoint, Polygon } from "@/lib/core/piece/patch";
import type { Grain } from "@/lib/core/piece/drawing";
import { figureStyle, INK, PAPER, px } from "./ink";
import type { PlaneLine } from "./seam-lines";

/** A sewn line: dashed ink on a halo of paper, so that it is seen on dark cloth. Pixels. */
export function SewnLines({ lines, weight = 1.6 }: { readonly lines: readonly PlaneLine[]; readonly weight?: number }) {
  const path = lines.map(({ from, to }) => `M${from.map(px).join(" ")}L${to.map(px).join(" ")}`).join("");
  return (
    <g data-mark="sewn" fill="none">
      <path d={path} stroke={PAPER} strokeWidth={weight * 2.5} />
      <path d={path} stroke={INK} strokeWidth={weight} strokeDasharray={`${px(weight * 3.75)} ${px(weight * 2.5)}`} />
    </g>
  );
}

/** A shape's letter in its circle. */
export function LetterMark({ at, letter, radius }: { readonly at: PlanePoint; readonly letter: string; readonly radius: number }) {
  const size = radius * (letter.length > 1 ? 1 : 1.2);
  return (
    <g data-mark="letter">
      <circle cx={px(at[0])} cy={px(at[1])} r={px(radius)} fill={PAPER} stroke={INK} strokeWidth="1.1" />
      <text x={px(at[0])} y={px(at[1] + size * 0.36)} textAnchor="middle" style={figureStyle(px(size), 640)}>
        {letter}
      </text>
    </g>
  );
}

const GRAIN_WAY: Readonly<Record<Exclude<Grain, "any">, PlanePoint>> = {
  up: [0, -1],
  across: [1, 0],
  "down-right": [Math.SQRT1_2, Math.SQRT1_2],
  "down-left": [-Math.SQRT1_2, Math.SQRT1_2],
};

interface GrainMarkProps {
  readonly at: PlanePoint;
  readonly grain: Exclude<Grain, "any">;
  /** Half of the arrow's length in pixels. */
  readonly reach: number;
  readonly halo?: boolean;
}

/** Which way the lengthwise grain runs: an arrow with a head at both ends. */
export function GrainMark({ at: [x, y], grain, reach, halo = false }: GrainMarkProps) {
  const [a, b] = GRAIN_WAY[grain];
  const end = (way: 1 | -1) => {
    const [u, v] = [x + way * a * reach, y + way * b * reach];
    const barb = (side: 1 | -1) => `M${px(u)} ${px(v)}L${px(u - way * 5 * a + side * 3.5 * b)} ${px(v - way * 5 * b - side * 3.5 * a)}`;
    return barb(1) + barb(-1);
  };
  const path = `M${px(x - a * reach)} ${px(y - b * reach)}L${px(x + a * reach)} ${px(y + b * reach)}${end(1)}${end(-1)}`;
  return (
    <g data-mark="grain" fill="none">
      {halo ? <path d={path} stroke={PAPER} strokeWidth="4.5" strokeLinecap="round" /> : null}
      <path d={path} stroke={INK} strokeWidth="1.5" strokeLinecap="round" />
    </g>
  );
}

/** Basting crosses about every 32 px along an outline: the mark of what is chosen. Pixels. */
export function BastingCrosses({ polygons }: { readonly polygons: readonly Polygon[] }) {
  const places = crossPlaces(polygons);
  const arm = 4.6;
  const path = places.map(([x, y]) => `M${px(x - arm)} ${px(y - arm)}L${px(x + arm)} ${px(y + arm)}M${px(x + arm)} ${px(y - arm)}L${px(x - arm)} ${px(y + arm)}`).join("");
  return (
    <g data-mark="chosen" fill="none" strokeLinecap="round">
      <path d={path} stroke={PAPER} strokeWidth="5.2" />
      <path d={path} stroke={INK} strokeWidth="1.8" />
    </g>
  );
}

/** Corners and even steps between them, each place once; an edge that two chosen patches share is inside and has none. */
function crossPlaces(polygons: readonly Polygon[]): PlanePoint[] {
  const edges = polygons.flatMap((polygon) => polygon.map((from, index) => [from, polygon[(index + 1) % polygon.length] ?? from] as const));
  const keyOf = (point: PlanePoint) => point.map((part) => Math.round(part)).join();
  const edgeKey = ([from, to]: readonly [PlanePoint, PlanePoint]) => [keyOf(from), keyOf(to)].sort().join(" ");
  const times = new Map<string, number>();
  for (const edge of edges) times.set(edgeKey(edge), (times.get(edgeKey(edge)) ?? 0) + 1);
  const places = new Map<string, PlanePoint>();
  for (const edge of edges.filter((each) => times.get(edgeKey(each)) === 1)) {
    const [from, to] = edge;
    const steps = Math.max(1, Math.round(Math.hypot(to[0] - from[0], to[1] - from[1]) / 32));
    for (let step = 0; step <= steps; step++) {
      const place: PlanePoint = [from[0] + ((to[0] - from[0]) * step) / steps, from[1] + ((to[1] - from[1]) * step) / steps];
      places.set(keyOf(place), place);
    }
  }
  return [...places.values()];
}
