import type { PlanePoint } from "../piece/patch";
import type { QuiltDesign, Sashing } from "../piece/quilt-design";
import type { SquareSize } from "./quilt-check";
import { rectangle, type LaidSetting, type QuiltPiece } from "./quilt-piece";

/**
 * Squares in level rows. Between columns short strips of a square's height; between rows either short strips with
 * cornerstones where they meet, or, without cornerstones, one strip that runs through. All round adds the same outside.
 */
export function laySetStraight({ rows, columns, sashing }: QuiltDesign, square: SquareSize): LaidSetting {
  const gap = sashing?.width ?? 0;
  const outside = sashing?.allRound ? gap : 0;
  const at = (index: number, size: number) => outside + index * (size + gap);
  const width = columns * square.width + (columns - 1) * gap + 2 * outside;
  const height = rows * square.height + (rows - 1) * gap + 2 * outside;
  const squares = Array.from({ length: rows * columns }, (_, cell) => {
    const [x, y] = [at(cell % columns, square.width), at(Math.floor(cell / columns), square.height)];
    return { cell, place: ([u, v]: PlanePoint): PlanePoint => [x + u, y + v] };
  });
  return { width, height, squares, pieces: sashing ? laySashing(sashing, { rows, columns, square, width, at }) : [] };
}

interface Rows {
  readonly rows: number;
  readonly columns: number;
  readonly square: SquareSize;
  readonly width: number;
  /** Where a column or row begins, by its number and the size of a square. */
  readonly at: (index: number, size: number) => number;
}

function laySashing({ width: gap, role, cornerstones, allRound }: Sashing, { rows, columns, square, width, at }: Rows): QuiltPiece[] {
  const pieces: QuiltPiece[] = [];
  const betweenColumns = linesBetween(columns, allRound).map((column) => at(column, square.width) - gap);
  const betweenRows = linesBetween(rows, allRound).map((row) => at(row, square.height) - gap);
  for (let row = 0; row < rows; row++) {
    for (const x of betweenColumns) {
      pieces.push({ polygon: rectangle(x, at(row, square.height), gap, square.height), role, source: { kind: "sashing", lies: "down" } });
    }
  }
  for (const y of betweenRows) {
    if (cornerstones === null) {
      pieces.push({ polygon: rectangle(0, y, width, gap), role, source: { kind: "sashing-row", lies: "across" } });
      continue;
    }
    for (let column = 0; column < columns; column++) {
      pieces.push({ polygon: rectangle(at(column, square.width), y, square.width, gap), role, source: { kind: "sashing", lies: "across" } });
    }
    for (const x of betweenColumns) pieces.push({ polygon: rectangle(x, y, gap, gap), role: cornerstones, source: { kind: "cornerstone" } });
  }
  return pieces;
}

/** A line of sashing lies before each of these rows or columns. */
function linesBetween(count: number, allRound: boolean): number[] {
  return allRound ? Array.from({ length: count + 1 }, (_, index) => index) : Array.from({ length: count - 1 }, (_, index) => index + 1);
}
