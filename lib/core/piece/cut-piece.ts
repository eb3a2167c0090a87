import type { Length } from "../measure/length";
import type { RoleId } from "./drawing";
import type { Polygon } from "./patch";

/** A cut measure: exact (float, 1/160 mm) and as the shop's ruler cuts it. */
export interface CutSize {
  readonly exact: number;
  readonly ruler: Length;
}

/** How a patch comes out of the cloth. `along` runs along the bolt, `across` from selvage to selvage. */
export type CutMethod =
  | { readonly kind: "square"; readonly side: CutSize }
  | { readonly kind: "rectangle"; readonly along: CutSize; readonly across: CutSize }
  /** A square cut once corner to corner: 2 patches, short sides on the grain. */
  | { readonly kind: "half-square"; readonly square: CutSize }
  /** A square cut twice corner to corner: 4 patches, long side on the grain. */
  | { readonly kind: "quarter-square"; readonly square: CutSize }
  /** A rectangle cut once corner to corner: 2 patches of one hand; reversed ones from a rectangle cut the other way. */
  | { readonly kind: "half-rectangle"; readonly along: CutSize; readonly across: CutSize }
  /** A strip with sub-cuts at an angle, pieces head to tail: triangles, parallelograms, diamonds, trapezoids. */
  | {
      readonly kind: "angled-strip";
      readonly strip: CutSize;
      /** Strip used by each piece, measured along the strip. */
      readonly pitch: CutSize;
      /** Lost once a strip at its slanting ends, measured along the strip. */
      readonly endWaste: CutSize;
      readonly angleDegrees: number;
      /** The outline repeats turned half round (triangles, trapezoids), or not (parallelograms). */
      readonly headToTail: boolean;
    }
  /** Anything else: cut by a template out of the rectangle that holds it. */
  | { readonly kind: "template"; readonly along: CutSize; readonly across: CutSize }
  /** A border, sashing or binding of so much total length out of strips of one width, joined where they must be. */
  | {
      readonly kind: "long-strip";
      readonly width: CutSize;
      readonly needed: Length;
      readonly join: "straight" | "bias";
      /** Cloth lost at each join, measured along the strip. */
      readonly lostAtJoin: Length;
    };

/** One cut line of the list: a shape in one fabric, grain and turn. */
export interface CutPiece {
  /** Unique in its list and stable for the same design: "B/wheel/up". */
  readonly key: string;
  /** "B", "Dr"; for long strips a name such as "Binding". */
  readonly letter: string;
  /** What a person reads: "Half-square triangle, 3 in". */
  readonly name: string;
  readonly role: RoleId;
  /** Patches wanted (for long strips 1). */
  readonly count: number;
  readonly finished: Polygon;
  /** The finished shape offset outwards by the seam allowance, exact. */
  readonly cut: Polygon;
  readonly method: CutMethod;
  /** Trimmed after sewing is rounded up; sewn as cut goes to the nearest mark. */
  readonly trimming: "sewn-as-cut" | "trimmed-after-sewing";
  /** False for one-way prints, and for pieces whose grain is fixed. */
  readonly mayTurn: boolean;
  /** The patch's straight-grain sides lie bias on the outside edge; said on the list. */
  readonly note?: string;
}

/** What the rulers can cut and what a seam takes. */
export interface CuttingRules {
  readonly seamAllowance: Length;
  readonly rulerStep: Length;
}
