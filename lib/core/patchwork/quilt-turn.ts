import type { Drawing, ExactPoint, Grain } from "../piece/drawing";
import type { QuarterTurn } from "../piece/quilt-design";
import type { PlanePoint } from "../piece/patch";
import { fail, ok, type Result } from "../result";
import { ONE, subtract } from "./exact";
import { formatPoint, parsePoint, type Vector } from "./exact-point";

const TURNED_GRAIN: Readonly<Record<Grain, Grain>> = { any: "any", up: "across", across: "up", "down-right": "down-left", "down-left": "down-right" };

/**
 * A drawing turned clockwise by quarters, in exact fractions of the block: what a turned block looks like to somebody
 * who cuts it. Grain turns with it. `bad-drawing` names a coordinate that cannot be read.
 */
export function turnDrawing(drawing: Drawing, turn: QuarterTurn): Result<Drawing, "bad-drawing"> {
  if (turn === 0) return ok(drawing);
  const at = (point: ExactPoint) => turnPoint(point, turn);
  const seams = drawing.seams.map((seam) => ({ seam, from: at(seam.from), to: at(seam.to) }));
  const paints = drawing.paints.map((paint) => ({ paint, at: at(paint.at) }));
  const points = [...seams.flatMap(({ from, to }) => [from, to]), ...paints.map((each) => each.at)];
  if (points.some((point) => point === null)) return fail("bad-drawing", "A point of the block cannot be read as an exact number.");
  const swapped = turn === 90 || turn === 270;
  const { columns, rows } = drawing.grid;
  return ok({
    outline: drawing.outline,
    grid: swapped ? { columns: rows, rows: columns } : { columns, rows },
    seams: seams.map(({ seam, from, to }) => ({ ...seam, from: from ?? seam.from, to: to ?? seam.to })),
    paints: paints.map(({ paint, at: point }) => ({ ...paint, at: point ?? paint.at, ...(paint.grain ? { grain: swapped ? TURNED_GRAIN[paint.grain] : paint.grain } : {}) })),
  });
}

/** A point of the unit square turned clockwise about the square's middle; null where it cannot be read. */
export function turnPoint(point: ExactPoint, turn: QuarterTurn): ExactPoint | null {
  const parsed = parsePoint(point);
  return parsed.ok ? formatPoint(turned(parsed.value, turn)) : null;
}

function turned({ x, y }: Vector, turn: QuarterTurn): Vector {
  if (turn === 90) return { x: subtract(ONE, y), y: x };
  if (turn === 180) return { x: subtract(ONE, x), y: subtract(ONE, y) };
  return turn === 270 ? { x: y, y: subtract(ONE, x) } : { x, y };
}

/** A point of a block of `width` by `height` (1/160 mm) once the block is turned clockwise, from its new top left. */
export function turnInBlock([x, y]: PlanePoint, turn: QuarterTurn, width: number, height: number): PlanePoint {
  if (turn === 90) return [height - y, x];
  if (turn === 180) return [width - x, height - y];
  return turn === 270 ? [y, width - x] : [x, y];
}
