import type { Drawing, ExactPoint } from "../piece/drawing";
import { fail, ok, type Result } from "../result";
import { add, compare, divide, isZero, multiply, ONE, rational, sign, toNumber, ZERO, type Exact } from "./exact";
import { alongOrder, cross, formatPoint, keyOf, minus, parsePoint, samePoint, sideOf, type Vector } from "./exact-point";
import { traceFaces } from "./trace-faces";

/** The drawing as a planar subdivision of the unit square, all exact. */
export interface Subdivision {
  /** Corners of each face, clockwise on the screen, straight-through points removed; in reading order. */
  readonly faces: readonly (readonly Vector[])[];
  /** Ends of seams that meet nothing. */
  readonly openEnds: readonly Vector[];
  /** A point of each group of seams that hangs together but does not reach the outside edge. */
  readonly islands: readonly Vector[];
  /** Points where eight or more seams meet. */
  readonly crowded: readonly Vector[];
}

interface Line {
  readonly from: Vector;
  readonly to: Vector;
  /** Float bounds, a little wide: they only sort out pairs that cannot meet. */
  readonly box: readonly [number, number, number, number];
}

const MOST_SEAMS = 2000;
/** Pairs of seams that meet. A thousand patches need far fewer; without the limit a hostile drawing keeps a machine busy for minutes. */
const MOST_MEETINGS = 40_000;
const CROWDED = 8;
const CORNERS: readonly Vector[] = [
  { x: ZERO, y: ZERO },
  { x: ONE, y: ZERO },
  { x: ONE, y: ONE },
  { x: ZERO, y: ONE },
];

/**
 * Cuts the unit square along all seams: crossings, T-joints and overlaps are found exactly, then the faces are walked.
 * O(n²) in the seams for the crossings, with a float test first. Faults: `bad-drawing` (a seam of no length, a point
 * outside the block, a coordinate that cannot be read), `too-large`.
 */
export function subdivide(drawing: Drawing): Result<Subdivision, "bad-drawing" | "too-large"> {
  if (drawing.seams.length > MOST_SEAMS) return fail("too-large", `The drawing has ${drawing.seams.length} seams; a block has at most ${MOST_SEAMS}.`);
  const lines: Line[] = CORNERS.map((corner, index) => lineOf(corner, CORNERS[(index + 1) % 4] ?? corner));
  for (const [index, seam] of drawing.seams.entries()) {
    const [from, to] = [parsePoint(seam.from), parsePoint(seam.to)];
    if (!from.ok) return fail("bad-drawing", `Seam ${index + 1}: ${from.fault.message}`);
    if (!to.ok) return fail("bad-drawing", `Seam ${index + 1}: ${to.fault.message}`);
    if (samePoint(from.value, to.value)) return fail("bad-drawing", `Seam ${index + 1} begins and ends at the same point.`);
    if (![from.value, to.value].every(isInside)) return fail("bad-drawing", `Seam ${index + 1} leaves the block.`);
    lines.push(lineOf(from.value, to.value));
  }
  const edges = edgesOf(lines);
  if (!edges) return fail("too-large", `The seams meet each other more than ${MOST_MEETINGS} times; a block has at most that many meetings.`);
  const traced = traceFaces(edges);
  return ok({
    faces: traced.faces.map(withoutStraightPoints).sort(byReading),
    openEnds: traced.openEnds,
    islands: traced.islands,
    crowded: traced.vertices.filter((vertex) => vertex.degree >= CROWDED && isInterior(vertex.point)).map((vertex) => vertex.point),
  });
}

export function outlineOf(face: readonly Vector[]): ExactPoint[] {
  return face.map(formatPoint);
}

function lineOf(from: Vector, to: Vector): Line {
  const [x1, y1, x2, y2] = [toNumber(from.x), toNumber(from.y), toNumber(to.x), toNumber(to.y)];
  const wide = 1e-9;
  return { from, to, box: [Math.min(x1, x2) - wide, Math.min(y1, y2) - wide, Math.max(x1, x2) + wide, Math.max(y1, y2) + wide] };
}

function isInside(point: Vector): boolean {
  return [point.x, point.y].every((value) => sign(value) >= 0 && compare(value, ONE) <= 0);
}

function isInterior(point: Vector): boolean {
  return [point.x, point.y].every((value) => sign(value) > 0 && compare(value, ONE) < 0);
}

/** Every line cut at every point where another meets it: pieces that meet only at their ends, each once. Null past the limit. */
function edgesOf(lines: readonly Line[]): [Vector, Vector][] | null {
  const stops = lines.map((line) => [line.from, line.to]);
  let met = 0;
  for (let i = 0; i < lines.length; i += 1) {
    for (let j = i + 1; j < lines.length; j += 1) {
      const [first, second] = [lines[i], lines[j]];
      if (!first || !second || !boxesMeet(first, second)) continue;
      const points = meetings(first, second);
      if (points.length > 0) met += 1;
      if (met > MOST_MEETINGS) return null;
      for (const point of points) {
        stops[i]?.push(point);
        stops[j]?.push(point);
      }
    }
  }
  const edges = new Map<string, [Vector, Vector]>();
  for (const points of stops) {
    points.sort(alongOrder);
    for (let index = 1; index < points.length; index += 1) {
      const [from, to] = [points[index - 1], points[index]];
      if (from && to && !samePoint(from, to)) edges.set(`${keyOf(from)} ${keyOf(to)}`, [from, to]);
    }
  }
  return [...edges.values()];
}

function boxesMeet({ box: a }: Line, { box: b }: Line): boolean {
  return a[0] <= b[2] && b[0] <= a[2] && a[1] <= b[3] && b[1] <= a[3];
}

/** The points that two lines share: one where they cross or touch, the inner ends where they overlap. */
function meetings(first: Line, second: Line): Vector[] {
  const u = minus(first.to, first.from);
  const v = minus(second.to, second.from);
  const turn = cross(u, v);
  if (isZero(turn)) {
    if (sideOf(first.from, first.to, second.from) !== 0) return [];
    return [...[second.from, second.to].filter((point) => isBetween(point, first)), ...[first.from, first.to].filter((point) => isBetween(point, second))];
  }
  const t = divide(cross(minus(second.from, first.from), v), turn);
  const s = divide(cross(minus(second.from, first.from), u), turn);
  if ([t, s].some((value) => sign(value) < 0 || compare(value, ONE) > 0)) return [];
  return [{ x: add(first.from.x, multiply(u.x, t)), y: add(first.from.y, multiply(u.y, t)) }];
}

/** For a point on the line's own straight. */
function isBetween(point: Vector, { from, to }: Line): boolean {
  const [low, high] = alongOrder(from, to) <= 0 ? [from, to] : [to, from];
  return alongOrder(low, point) <= 0 && alongOrder(point, high) <= 0;
}

function withoutStraightPoints(face: readonly Vector[]): Vector[] {
  return face.filter((point, index) => {
    const before = face[(index + face.length - 1) % face.length] ?? point;
    const after = face[(index + 1) % face.length] ?? point;
    return sideOf(before, after, point) !== 0;
  });
}

/** As a page is read: by the highest corner, then the leftmost, then the middle (the mean of the corners). */
function byReading(a: readonly Vector[], b: readonly Vector[]): number {
  const [p, q] = [middleOf(a), middleOf(b)];
  return (
    compare(least(a, "y"), least(b, "y")) || compare(least(a, "x"), least(b, "x")) || compare(p.y, q.y) || compare(p.x, q.x)
  );
}

function least(face: readonly Vector[], axis: "x" | "y"): Exact {
  return face.map((point) => point[axis]).reduce((low, value) => (compare(value, low) < 0 ? value : low));
}

function middleOf(face: readonly Vector[]): Vector {
  const share = rational(1, face.length);
  const sum = face.reduce<Vector>((total, point) => ({ x: add(total.x, point.x), y: add(total.y, point.y) }), { x: ZERO, y: ZERO });
  return { x: multiply(sum.x, share), y: multiply(sum.y, share) };
}
