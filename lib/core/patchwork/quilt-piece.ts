import type { RoleId } from "../piece/drawing";
import type { PlanePoint, Polygon } from "../piece/patch";
import type { QuarterTurn } from "../piece/quilt-design";

/** What a piece of a quilt is, and which one. Cells count as the design's list does. */
export type PieceSource =
  | { readonly kind: "block"; readonly block: number; readonly patch: number; readonly letter: string; readonly cell: number; readonly turn: QuarterTurn }
  | { readonly kind: "plain"; readonly cell: number }
  /** A short strip between two squares; `lies` says whether it runs across the quilt or down it (on point: up to the right, or down to the right). */
  | { readonly kind: "sashing"; readonly lies: "across" | "down" }
  /** Runs through between two rows. */
  | { readonly kind: "sashing-row"; readonly lies: "across" | "down" }
  | { readonly kind: "cornerstone" }
  /** On point: a cornerstone that the quilt's edge halves. */
  | { readonly kind: "half-cornerstone"; readonly side: Side }
  | { readonly kind: "setting-triangle"; readonly side: Side }
  | { readonly kind: "corner-triangle"; readonly corner: 0 | 1 | 2 | 3 }
  | { readonly kind: "border"; readonly border: number; readonly side: Side }
  /** Corners count clockwise from the top left. */
  | { readonly kind: "border-corner"; readonly border: number; readonly corner: 0 | 1 | 2 | 3 };

export type Side = "top" | "right" | "bottom" | "left";

/** A finished piece where it lies in the quilt: 1/160 mm as floats, y down, clockwise on the screen. */
export interface QuiltPiece {
  readonly polygon: Polygon;
  readonly role: RoleId;
  readonly source: PieceSource;
}

/** A square of the setting: takes a point of a block as it lies (1/160 mm from its top left) to the quilt. */
export interface SquarePlace {
  readonly cell: number;
  readonly place: (point: PlanePoint) => PlanePoint;
}

/** The middle of a quilt without its borders, from its top left. */
export interface LaidSetting {
  readonly width: number;
  readonly height: number;
  readonly squares: readonly SquarePlace[];
  readonly pieces: readonly QuiltPiece[];
}

/** A rectangle as a polygon. */
export function rectangle(x: number, y: number, width: number, height: number): Polygon {
  return [
    [x, y],
    [x + width, y],
    [x + width, y + height],
    [x, y + height],
  ];
}
