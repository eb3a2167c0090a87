import type { Length } from "../measure/length";

/**
 * An exact number a + b√2 + c√3 + d√6 with rational a, b, c, d, written as a sum of terms:
 * "1/2", "-3", "1/4r2", "1-1/2r3", "2r6". No spaces. `lib/core/patchwork/exact` reads and writes it.
 */
export type ExactText = string;

/** x to the right, y downwards, each a fraction of the block's width and height: (0,0) top left, (1,1) bottom right. */
export type ExactPoint = readonly [x: ExactText, y: ExactText];

/** A role a fabric is later put to: "sky", "wheel". Lower-case letters, digits and hyphens. */
export type RoleId = string;

/** A straight sewn line. Arcs will be another kind. */
export interface Seam {
  readonly kind: "straight";
  readonly from: ExactPoint;
  readonly to: ExactPoint;
}

/** Which way the lengthwise grain runs over a patch, as drawn in the block. */
export type Grain = "any" | "up" | "across" | "down-right" | "down-left";

/** Painted on whichever patch holds the point strictly inside; the last paint of a patch wins. */
export interface Paint {
  readonly at: ExactPoint;
  readonly role: RoleId;
  readonly grain?: Grain;
}

/** What a designer draws: the seams inside a rectangular block. The outside edge is implied. */
export interface Drawing {
  readonly outline: "rectangle";
  /** Only a help to the eye and the keys; seams may lie anywhere. */
  readonly grid: { readonly columns: number; readonly rows: number };
  readonly seams: readonly Seam[];
  readonly paints: readonly Paint[];
}

/** Finished size, as seen in the quilt. */
export interface BlockSize {
  readonly width: Length;
  readonly height: Length;
}

/** A named role of a block with the value it reads best in. */
export interface Role {
  readonly id: RoleId;
  readonly name: string;
  readonly value: "light" | "medium" | "dark";
}
