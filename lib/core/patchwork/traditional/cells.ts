import type { Drawing, ExactPoint, Paint, Seam } from "../../piece/drawing";
import { formatExact, rational } from "../exact";

/**
 * A terse way to draw a block on a grid of squares. A cell is "a" (a square of role a), "a\b" (cut from top left to bottom
 * right: a above, b below), "a/b" (cut the other way: a above, b below) or "xabcd" (cut both ways: a on top, then
 * clockwise). Roles are single letters, named by `roles`.
 */
export interface CellDrawing {
  readonly rows: readonly string[];
  readonly roles: Readonly<Record<string, string>>;
  /** Squares joined into one rectangle, painted as their first cell: column, row, width, height. */
  readonly joined?: readonly (readonly [number, number, number, number])[];
  /** Further seams, in twelfths of a cell where needed: x1, y1, x2, y2 in cells. */
  readonly seams?: readonly (readonly [number, number, number, number])[];
  /** Further paints: x, y in cells, role letter. They win over the cells' own. */
  readonly paints?: readonly (readonly [number, number, string])[];
}

/** Places are held in whole 240ths of a cell, so that thirds, quarters and fifths of one are exact. */
const FINE = 240;

export function drawCells({ rows, roles, joined = [], seams = [], paints = [] }: CellDrawing): Drawing {
  const cells = rows.map((row) => row.trim().split(/\s+/));
  const [down, across] = [cells.length, cells[0]?.length ?? 0];
  const at = (x: number, y: number): ExactPoint => [formatExact(rational(Math.round(x * FINE), FINE * across)), formatExact(rational(Math.round(y * FINE), FINE * down))];
  const seam = (x1: number, y1: number, x2: number, y2: number): Seam => ({ kind: "straight", from: at(x1, y1), to: at(x2, y2) });
  const paint = (x: number, y: number, letter: string): Paint => ({ at: at(x, y), role: roles[letter] ?? letter });
  const hidden = (x: number, y: number) => joined.find(([column, row, width, height]) => x >= column && x < column + width && y >= row && y < row + height);
  const drawn: Seam[] = [...gridSeams(across, down, hidden).map((each) => seam(...each)), ...seams.map((each) => seam(...each))];
  const laid: Paint[] = [];
  for (const [y, row] of cells.entries()) {
    for (const [x, cell] of row.entries()) {
      const whole = hidden(x, y);
      if (whole) {
        if (whole[0] === x && whole[1] === y) laid.push(paint(x + whole[2] / 2, y + whole[3] / 2, cell));
        continue;
      }
      if (cell.length === 1) laid.push(paint(x + 0.5, y + 0.5, cell));
      else if (cell.startsWith("x")) {
        drawn.push(seam(x, y, x + 1, y + 1), seam(x, y + 1, x + 1, y));
        const [, top = "", right = "", bottom = "", left = ""] = cell;
        laid.push(paint(x + 0.5, y + 0.25, top), paint(x + 0.75, y + 0.5, right), paint(x + 0.5, y + 0.75, bottom), paint(x + 0.25, y + 0.5, left));
      } else {
        const [above = "", way = "", below = ""] = cell;
        const falls = way === "\\";
        drawn.push(falls ? seam(x, y, x + 1, y + 1) : seam(x + 1, y, x, y + 1));
        laid.push(paint(x + (falls ? 0.75 : 0.25), y + 0.25, above), paint(x + (falls ? 0.25 : 0.75), y + 0.75, below));
      }
    }
  }
  return { outline: "rectangle", grid: { columns: across, rows: down }, seams: drawn, paints: [...laid, ...paints.map(([x, y, letter]) => paint(x, y, letter))] };
}

/** The lines between cells, run together where they go on, left out inside joined cells. */
function gridSeams(across: number, down: number, hidden: (x: number, y: number) => unknown): [number, number, number, number][] {
  const lines: [number, number, number, number][] = [];
  for (let x = 1; x < across; x += 1) {
    for (const [from, to] of runs(down, (y) => hidden(x - 1, y) === undefined || hidden(x - 1, y) !== hidden(x, y))) lines.push([x, from, x, to]);
  }
  for (let y = 1; y < down; y += 1) {
    for (const [from, to] of runs(across, (x) => hidden(x, y - 1) === undefined || hidden(x, y - 1) !== hidden(x, y))) lines.push([from, y, to, y]);
  }
  return lines;
}

function runs(length: number, sewn: (index: number) => boolean): [number, number][] {
  const found: [number, number][] = [];
  for (let index = 0; index < length; index += 1) {
    if (!sewn(index)) continue;
    const last = found.at(-1);
    if (last && last[1] === index) last[1] = index + 1;
    else found.push([index, index + 1]);
  }
  return found;
}
