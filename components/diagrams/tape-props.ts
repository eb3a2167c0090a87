import type { ClothTile } from "@/components/ui/cloth";
import type { MeasureSystem } from "@/lib/core/measure/format";
import type { Length } from "@/lib/core/measure/length";

/** A stretch of the bolt, from its core. */
export interface TapeBand {
  readonly from: Length;
  readonly to: Length;
}

export interface TapeProps {
  /** The fabric, as the sentence begins with it. */
  readonly name?: string;
  /** The full bolt; what is cut away of it is a dotted ghost. */
  readonly putUp: Length;
  readonly left: Length;
  /** With the initials of the kit, "" where there is no room for words. */
  readonly reserved?: readonly (TapeBand & { readonly label: string })[];
  readonly flaws?: readonly TapeBand[];
  /** Against what can be sold. Leave it to the words where reserved cloth does not end at the cut edge. */
  readonly lowMark?: Length | null;
  /** Dashed and unveiled; the rest is veiled, and an ink notch marks where the knife goes. */
  readonly cutNow?: TapeBand | null;
  /** Dimension lines above the cloth, the upper ones first in `row`. */
  readonly dims?: readonly (TapeBand & { readonly label: string; readonly row?: number; readonly tone?: "ink" | "reserved" | "quiet" })[];
  /** Pixels. */
  readonly width: number;
  /** What fills the width: one for a whole table. */
  readonly max: Length;
  readonly system: MeasureSystem;
  readonly cloth?: ClothTile | null;
  /** The yellow tape with its ticks under the cloth: on the chosen row and where something is measured. */
  readonly full?: boolean;
  /** Figures under the tape. */
  readonly figures?: boolean;
  readonly clothHeight?: number;
  readonly tapeHeight?: number;
  readonly figureSize?: number;
  /** Instead of the sentence that is made of the figures. */
  readonly label?: string;
  /** Where text beside it says the same. */
  readonly hidden?: boolean;
}
