import type { MeasureSystem } from "@/lib/core/measure/format";
import type { Length } from "@/lib/core/measure/length";
import type { CutPiece } from "@/lib/core/piece/cut-piece";
import type { Blank, StripPlan } from "@/lib/core/piece/strip-plan";
import type { Hatch } from "../press/hatch";
import type { Picture } from "../press/picture";
import type { SheetPaper } from "../press/sheet-frame";

/** A picture with patch letters and the lines that are sewn; places in the picture's own unit. */
export interface LetteredPicture extends Picture {
  readonly letters: readonly { readonly text: string; readonly x: number; readonly y: number }[];
  /** Drawn dashed. */
  readonly seams: readonly { readonly from: readonly [number, number]; readonly to: readonly [number, number] }[];
  /** Drawn as an arrow: the way a seam is pressed. */
  readonly press: readonly { readonly from: readonly [number, number]; readonly to: readonly [number, number] }[];
}

export interface SheetFabric {
  readonly name: string;
  /** What it is for in this quilt: "wheel", "background"; may be empty. */
  readonly role: string;
  /** The ground, as #rrggbb. */
  readonly colour: string;
  readonly hatch: Hatch;
  /** What the kit holds, as the shop sells it. */
  readonly length: Length;
  readonly fits: "fat-quarter" | "fat-eighth" | null;
  readonly pieces: readonly CutPiece[];
  /** The strips and the rectangles laid on them; null where the kit comes cut, or nothing is cut from it. */
  readonly layout: { readonly plan: StripPlan; readonly blanks: readonly Blank[] } | null;
  /** Whole sentences, such as what to keep for the binding. */
  readonly remarks: readonly string[];
}

/** One act of sewing: what lies before it, what it makes. */
export interface SheetStep {
  readonly title: string;
  /** "make 160"; may be empty. */
  readonly note: string;
  readonly text: string;
  readonly before: readonly LetteredPicture[];
  readonly after: LetteredPicture | null;
}

export interface SheetBlock {
  readonly name: string;
  readonly make: number;
  readonly finished: { readonly width: Length; readonly height: Length };
  readonly picture: LetteredPicture;
  readonly steps: readonly SheetStep[];
}

/** The sheet that lies in the kit. */
export interface InstructionSheetInput {
  readonly kitName: string;
  readonly colourway: string;
  readonly shopName: string;
  /** "Drafted by Pru Castellane"; may be empty. */
  readonly credit: string;
  /** "Version 3, 24 November" */
  readonly version: string;
  readonly finished: { readonly width: Length; readonly height: Length };
  readonly quilt: Picture;
  readonly kind: "lengths" | "fat-quarters" | "pre-cut";
  readonly fabrics: readonly SheetFabric[];
  readonly notions: readonly { readonly name: string; readonly amount: string }[];
  /** What the buyer must have besides: backing, batting, thread. */
  readonly alsoNeeded: readonly string[];
  readonly seamAllowance: Length;
  readonly usableWidth: Length;
  readonly prewash: boolean;
  readonly smallParts: boolean;
  readonly blocks: readonly SheetBlock[];
  /** Rows, borders, quilting, binding. */
  readonly assembly: readonly SheetStep[];
  readonly measure: MeasureSystem;
  readonly paper: SheetPaper;
  /** BCP 47. */
  readonly language: string;
}
