import type { RoleId } from "../piece/drawing";
import type { PlanePoint, Polygon } from "../piece/patch";
import type { QuiltDesign, Sashing } from "../piece/quilt-design";
import type { SquareSize } from "./quilt-check";
import type { LaidSetting, QuiltPiece, Side, SquarePlace } from "./quilt-piece";

/**
 * Squares turned by an eighth, in exact multiples of √2: the outer ones `columns` across and `rows` down, the inner ones
 * between them. The quilt's edge runs through the corners of the outer squares (with sashing: through the middle of the
 * outer cornerstones), so that side triangles are half squares, corner triangles quarter squares, and the cornerstones
 * at the edge are halved. Without cornerstones the sashing runs through between the diagonal rows.
 */
export function laySetOnPoint({ rows, columns, sashing, settingRole }: QuiltDesign, square: SquareSize): LaidSetting {
  if (settingRole === undefined) throw new Error("A setting on point needs the role of its triangles.");
  const lattice = latticeOf(rows, columns, square.width, sashing?.width ?? 0);
  return {
    width: 2 * columns * lattice.half,
    height: 2 * rows * lattice.half,
    squares: laySquares(lattice),
    pieces: [...layTriangles(lattice, settingRole), ...(sashing ? laySashing(lattice, sashing) : [])],
  };
}

interface Lattice {
  readonly rows: number;
  readonly columns: number;
  readonly side: number;
  readonly gap: number;
  /** Half the distance between two outer squares: outer ones lie at odd multiples of it, inner ones at even. */
  readonly half: number;
}

function latticeOf(rows: number, columns: number, side: number, gap: number): Lattice {
  return { rows, columns, side, gap, half: (side + gap) / Math.SQRT2 };
}

function laySquares({ rows, columns, side, half }: Lattice): SquarePlace[] {
  const place = (cell: number, x: number, y: number): SquarePlace => ({
    cell,
    place: ([u, v]): PlanePoint => [x * half + (u - v) / Math.SQRT2, y * half + (u + v - side) / Math.SQRT2],
  });
  const outer = Array.from({ length: rows * columns }, (_, cell) => place(cell, 2 * (cell % columns) + 1, 2 * Math.floor(cell / columns) + 1));
  const across = columns - 1;
  const inner = Array.from({ length: (rows - 1) * across }, (_, cell) => place(rows * columns + cell, 2 * (cell % across) + 2, 2 * Math.floor(cell / across) + 2));
  return [...outer, ...inner];
}

/** Side triangles clockwise from the top, then the corners clockwise from the top left. */
function layTriangles(lattice: Lattice, role: RoleId): QuiltPiece[] {
  const { side } = lattice;
  const reach = side / Math.SQRT2;
  const triangles = betweenSquares(lattice).map(({ at, side: where }): QuiltPiece => ({ polygon: halfSquare(at, where, reach), role, source: { kind: "setting-triangle", side: where } }));
  const [right, bottom] = [2 * lattice.columns * lattice.half, 2 * lattice.rows * lattice.half];
  const corners: readonly Polygon[] = [
    [[0, 0], [reach, 0], [0, reach]],
    [[right, 0], [right, reach], [right - reach, 0]],
    [[right, bottom], [right - reach, bottom], [right, bottom - reach]],
    [[0, bottom], [0, bottom - reach], [reach, bottom]],
  ];
  return [...triangles, ...corners.map((polygon, corner): QuiltPiece => ({ polygon, role, source: { kind: "corner-triangle", corner: (corner % 4) as 0 | 1 | 2 | 3 } }))];
}

/** The middles of the long sides of the side triangles. */
function betweenSquares({ rows, columns, half }: Lattice): { readonly at: PlanePoint; readonly side: Side }[] {
  const across = Array.from({ length: columns - 1 }, (_, index) => (2 * index + 2) * half);
  const down = Array.from({ length: rows - 1 }, (_, index) => (2 * index + 2) * half);
  return edgeMarks({ across, down, width: 2 * columns * half, height: 2 * rows * half });
}

/** Half a square whose long side, twice `reach`, lies on the quilt's edge about `at`. */
function halfSquare([x, y]: PlanePoint, side: Side, reach: number): Polygon {
  if (side === "top") return [[x - reach, y], [x + reach, y], [x, y + reach]];
  if (side === "right") return [[x, y - reach], [x, y + reach], [x - reach, y]];
  if (side === "bottom") return [[x + reach, y], [x - reach, y], [x, y - reach]];
  return [[x, y + reach], [x, y - reach], [x + reach, y]];
}

function edgeMarks({ across, down, width, height }: { across: readonly number[]; down: readonly number[]; width: number; height: number }) {
  return [
    ...across.map((x) => ({ at: [x, 0] as PlanePoint, side: "top" as const })),
    ...down.map((y) => ({ at: [width, y] as PlanePoint, side: "right" as const })),
    ...across.map((x) => ({ at: [x, height] as PlanePoint, side: "bottom" as const })),
    ...down.map((y) => ({ at: [0, y] as PlanePoint, side: "left" as const })),
  ];
}

function laySashing(lattice: Lattice, { role, cornerstones }: Sashing): QuiltPiece[] {
  const { rows, columns, half } = lattice;
  const pieces: QuiltPiece[] = [];
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      const [x, y] = [2 * column + 1, 2 * row + 1];
      const along = (dx: number, dy: number, lies: "across" | "down") =>
        pieces.push({ polygon: strip(lattice, (x + dx) * half, (y + dy) * half, lies), role, source: { kind: "sashing", lies } });
      along(0.5, -0.5, "down");
      along(-0.5, 0.5, "down");
      if (cornerstones !== null) {
        along(0.5, 0.5, "across");
        along(-0.5, -0.5, "across");
      }
    }
  }
  return [...pieces, ...(cornerstones === null ? layLongRows(lattice, role) : layCornerstones(lattice, cornerstones))];
}

/** A short strip about its middle: "across" runs up to the right, "down" runs down to the right. */
function strip({ side, gap }: Lattice, x: number, y: number, lies: "across" | "down"): Polygon {
  const [long, short] = [side / 2 / Math.SQRT2, gap / 2 / Math.SQRT2];
  const [a, b] = [long + short, long - short];
  return lies === "down" ? [[x - b, y - a], [x + a, y + b], [x + b, y + a], [x - a, y - b]] : [[x + b, y - a], [x + a, y - b], [x - b, y + a], [x - a, y + b]];
}

function layCornerstones({ rows, columns, gap, half }: Lattice, role: RoleId): QuiltPiece[] {
  const reach = gap / Math.SQRT2;
  const whole: QuiltPiece[] = [];
  for (let y = 1; y < 2 * rows; y++) {
    for (let x = 1; x < 2 * columns; x++) {
      if ((x + y) % 2 === 0) continue;
      const [u, v] = [x * half, y * half];
      whole.push({ polygon: [[u, v - reach], [u + reach, v], [u, v + reach], [u - reach, v]], role, source: { kind: "cornerstone" } });
    }
  }
  const across = Array.from({ length: columns }, (_, index) => (2 * index + 1) * half);
  const down = Array.from({ length: rows }, (_, index) => (2 * index + 1) * half);
  const halves = edgeMarks({ across, down, width: 2 * columns * half, height: 2 * rows * half });
  return [...whole, ...halves.map(({ at, side }): QuiltPiece => ({ polygon: halfSquare(at, side, reach), role, source: { kind: "half-cornerstone", side } }))];
}

/** Strips up to the right between the diagonal rows, both ends cut by the quilt's edge at half a right angle. */
function layLongRows({ rows, columns, gap, half }: Lattice, role: RoleId): QuiltPiece[] {
  const [width, height, reach] = [2 * columns * half, 2 * rows * half, gap / Math.SQRT2];
  return Array.from({ length: rows + columns }, (_, index) => {
    const middle = (2 * index + 1) * half;
    const [upper, lower] = [middle - reach, middle + reach];
    return { polygon: [lowEnd(upper, height), highEnd(upper, width), highEnd(lower, width), lowEnd(lower, height)], role, source: { kind: "sashing-row", lies: "across" } };
  });
}

/** Where the line x + y = sum leaves the quilt at the left or the bottom. */
function lowEnd(sum: number, height: number): PlanePoint {
  return sum <= height ? [0, sum] : [sum - height, height];
}

/** Where it leaves at the top or the right. */
function highEnd(sum: number, width: number): PlanePoint {
  return sum <= width ? [sum, 0] : [width, sum - width];
}
