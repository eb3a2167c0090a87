import type { Border } from "../piece/quilt-design";
import { rectangle, type QuiltPiece } from "./quilt-piece";

/**
 * Borders from the inside out. Butted: the sides at the height of what they enclose, then top and bottom over both.
 * With corner squares all four have the length of the edge they lie on.
 *
 * @param width and `height` of the middle, finished.
 * @returns the pieces from the quilt's outer top left; `inset` is where the middle begins, both ways.
 */
export function layBorders(borders: readonly Border[], width: number, height: number) {
  const inset = borders.reduce((total, border) => total + border.width, 0);
  const pieces: QuiltPiece[] = [];
  let edge = inset;
  let [across, down] = [width, height];
  for (const [index, border] of borders.entries()) {
    pieces.push(...layBorder(border, index, { edge, across, down }));
    edge -= border.width;
    across += 2 * border.width;
    down += 2 * border.width;
  }
  return { width: across, height: down, inset, pieces };
}

interface Enclosed {
  /** Where what is enclosed begins, from the outer top left, both ways. */
  readonly edge: number;
  readonly across: number;
  readonly down: number;
}

function layBorder({ width, role, corners }: Border, border: number, { edge, across, down }: Enclosed): QuiltPiece[] {
  const outer = edge - width;
  const far = { x: edge + across, y: edge + down };
  const [left, length] = corners === null ? [outer, across + 2 * width] : [edge, across];
  const sides: QuiltPiece[] = [
    { polygon: rectangle(outer, edge, width, down), role, source: { kind: "border", border, side: "left" } },
    { polygon: rectangle(far.x, edge, width, down), role, source: { kind: "border", border, side: "right" } },
    { polygon: rectangle(left, outer, length, width), role, source: { kind: "border", border, side: "top" } },
    { polygon: rectangle(left, far.y, length, width), role, source: { kind: "border", border, side: "bottom" } },
  ];
  if (corners === null) return sides;
  const places = [[outer, outer], [far.x, outer], [far.x, far.y], [outer, far.y]] as const;
  return [
    ...sides,
    ...places.map(([x, y], corner): QuiltPiece => ({ polygon: rectangle(x, y, width, width), role: corners, source: { kind: "border-corner", border, corner: (corner % 4) as 0 | 1 | 2 | 3 } })),
  ];
}
