import type { Drawing, ExactPoint, Grain, RoleId, Seam } from "../piece/drawing";
import type { Patch, PlanePoint } from "../piece/patch";
import { fail, ok, type Result } from "../result";
import { add, compare, formatExact, ONE, rational, sign } from "./exact";
import { formatPoint, minus, parsePoint, samePoint, type Vector } from "./exact-point";
import { holds, insideOf } from "./locate-exact";

export type EditFault = "no-such-seam" | "bad-point" | "outside" | "no-length" | "seam-there" | "too-many" | "bad-role" | "bad-grid";
type Edit = Result<Drawing, EditFault>;

const MOST_SEAMS = 2000;
const MOST_LINES = 64;

/** Sews one more straight seam. Faults: `bad-point`, `outside`, `no-length`, `seam-there` (the same two ends), `too-many`. */
export function addSeam(drawing: Drawing, from: ExactPoint, to: ExactPoint): Edit {
  if (drawing.seams.length >= MOST_SEAMS) return fail("too-many", `The drawing has ${drawing.seams.length} seams; a block has at most ${MOST_SEAMS}.`);
  return withSeam(drawing, drawing.seams.length, from, to);
}

/** Takes a seam out; its index is its place in the drawing. */
export function removeSeam(drawing: Drawing, index: number): Edit {
  if (!drawing.seams[index]) return noSuchSeam(drawing, index);
  return ok({ ...drawing, seams: drawing.seams.filter((_, each) => each !== index) });
}

/** Moves a whole seam by so much of the block's width and height. */
export function moveSeam(drawing: Drawing, index: number, by: ExactPoint): Edit {
  const seam = drawing.seams[index];
  if (!seam) return noSuchSeam(drawing, index);
  const [from, to, step] = [parsePoint(seam.from), parsePoint(seam.to), parsePoint(by)];
  if (!from.ok || !to.ok || !step.ok) return badPoint();
  const moved = (point: Vector) => formatPoint({ x: add(point.x, step.value.x), y: add(point.y, step.value.y) });
  return withSeam(drawing, index, moved(from.value), moved(to.value));
}

/** Puts one end of a seam somewhere else. */
export function moveSeamEnd(drawing: Drawing, index: number, end: "from" | "to", at: ExactPoint): Edit {
  const seam = drawing.seams[index];
  if (!seam) return noSuchSeam(drawing, index);
  return withSeam(drawing, index, end === "from" ? at : seam.from, end === "to" ? at : seam.to);
}

/**
 * Puts a role on a patch, or takes its fabric away where the role is null. Earlier paints of the patch go, so that the
 * drawing does not grow with every change of mind. Faults: `bad-role`.
 */
export function paintPatch(drawing: Drawing, patch: Pick<Patch, "outline">, role: RoleId | null, grain: Grain = "any"): Edit {
  if (role !== null && !/^[a-z0-9-]{1,40}$/.test(role)) return fail("bad-role", "A role is named in small letters, digits and hyphens, at most 40 of them.");
  const face: Vector[] = [];
  for (const corner of patch.outline) {
    const parsed = parsePoint(corner);
    if (!parsed.ok) return badPoint();
    face.push(parsed.value);
  }
  const others = drawing.paints.filter((paint) => {
    const at = parsePoint(paint.at);
    return at.ok && !holds(face, at.value);
  });
  if (role === null) return ok({ ...drawing, paints: others });
  const paint = { at: insideOf(patch), role, ...(grain === "any" ? {} : { grain }) };
  return ok({ ...drawing, paints: [...others, paint] });
}

/** Another grid under the drawing; the seams stay where they are. */
export function setGrid(drawing: Drawing, columns: number, rows: number): Edit {
  if (![columns, rows].every((lines) => Number.isInteger(lines) && lines >= 1 && lines <= MOST_LINES)) {
    return fail("bad-grid", `A grid has from 1 to ${MOST_LINES} columns and rows, in whole numbers.`);
  }
  return ok({ ...drawing, grid: { columns, rows } });
}

/**
 * The grid's nearest crossing to a point given as fractions of the block, kept inside it. `parts` divides each square of
 * the grid further (2 snaps to half squares).
 */
export function snapToGrid({ columns, rows }: Drawing["grid"], [x, y]: PlanePoint, parts = 1): ExactPoint {
  return [nearestLine(x, columns * parts), nearestLine(y, rows * parts)];
}

function nearestLine(fraction: number, lines: number): string {
  return formatExact(rational(Math.min(lines, Math.max(0, Math.round(fraction * lines))), lines));
}

/** The drawing with the seam at a place in its list, or at the list's end. */
function withSeam(drawing: Drawing, index: number, fromText: ExactPoint, toText: ExactPoint): Edit {
  const [from, to] = [parsePoint(fromText), parsePoint(toText)];
  if (!from.ok || !to.ok) return badPoint();
  if (![from.value, to.value].every(isInside)) return fail("outside", "A seam stays inside the block.");
  if (samePoint(from.value, to.value)) return fail("no-length", "A seam begins and ends at different points.");
  const twin = drawing.seams.findIndex((seam, each) => each !== index && joins(seam, from.value, to.value));
  if (twin >= 0) return fail("seam-there", `Seam ${twin + 1} already joins these points.`, { facts: { seam: twin } });
  const seam: Seam = { kind: "straight", from: formatPoint(from.value), to: formatPoint(to.value) };
  return ok({ ...drawing, seams: [...drawing.seams.slice(0, index), seam, ...drawing.seams.slice(index + 1)] });
}

function isInside(point: Vector): boolean {
  return [point.x, point.y].every((value) => sign(value) >= 0 && compare(value, ONE) <= 0);
}

function joins(seam: Seam, from: Vector, to: Vector): boolean {
  const [first, second] = [parsePoint(seam.from), parsePoint(seam.to)];
  if (!first.ok || !second.ok) return false;
  return (samePoint(first.value, from) && samePoint(second.value, to)) || (samePoint(first.value, to) && samePoint(second.value, from));
}

/** From one point to another, as `moveSeam` takes it. Throws where a point cannot be read. */
export function stepBetween(from: ExactPoint, to: ExactPoint): ExactPoint {
  const [start, end] = [parsePoint(from), parsePoint(to)];
  if (!start.ok || !end.ok) throw new RangeError("A step lies between two points that can be read.");
  return formatPoint(minus(end.value, start.value));
}

function noSuchSeam(drawing: Drawing, index: number): Edit {
  return fail("no-such-seam", `There is no seam ${index + 1}; the drawing has ${drawing.seams.length}.`);
}

function badPoint(): Edit {
  return fail("bad-point", "A point could not be read. Wanted: numbers such as 1/2 or 1/4r2.");
}
