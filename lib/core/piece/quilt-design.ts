import type { Length } from "../measure/length";
import type { BlockSize, Drawing, Role, RoleId } from "./drawing";

/** A block as a quilt uses it: an immutable version, with its roles put to the quilt's roles. */
export interface QuiltBlock {
  readonly name: string;
  readonly drawing: Drawing;
  readonly size: BlockSize;
  /** Block role to quilt role. */
  readonly roles: Readonly<Record<RoleId, RoleId>>;
}

export type QuarterTurn = 0 | 90 | 180 | 270;

/** A place in the setting: one of the blocks turned clockwise, or an alternate plain square. */
export type QuiltCell =
  | { readonly kind: "block"; readonly block: number; readonly turn: QuarterTurn }
  | { readonly kind: "plain"; readonly role: RoleId };

export interface Sashing {
  readonly width: Length;
  readonly role: RoleId;
  /** Squares where sashing meets; without them the sashing runs through between rows. */
  readonly cornerstones: RoleId | null;
  /** Also around the outside. */
  readonly allRound: boolean;
}

export interface Border {
  readonly width: Length;
  readonly role: RoleId;
  /** Butted: sides first, then top and bottom. Corner squares: all four at the quilt's own length. */
  readonly corners: RoleId | null;
}

export interface Binding {
  /** Cut width of the strip, 2 1/2 in by default. */
  readonly stripWidth: Length;
  readonly role: RoleId;
  /** Added to the perimeter for corners and the join, 10 to 12 in. */
  readonly extra: Length;
}

export interface Backing {
  readonly role: RoleId;
  /** On every side. */
  readonly overhang: Length;
}

export interface QuiltDesign {
  readonly setting: "straight" | "on-point";
  readonly rows: number;
  readonly columns: number;
  readonly blocks: readonly QuiltBlock[];
  /**
   * Row by row, rows × columns of them. On point these are the outer squares, and the inner ones that lie between
   * them, (rows - 1) × (columns - 1), follow in the same list.
   */
  readonly cells: readonly QuiltCell[];
  /** On point: what the side and corner triangles are cut from. */
  readonly settingRole?: RoleId;
  readonly sashing: Sashing | null;
  readonly borders: readonly Border[];
  readonly binding: Binding | null;
  readonly backing: Backing | null;
  readonly roles: readonly Role[];
}
