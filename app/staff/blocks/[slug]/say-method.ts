import { displayInches, formatExactInches } from "@/lib/core/measure/format";
import type { CutPiece, CutSize } from "@/lib/core/piece/cut-piece";

/** How a piece is cut, in a sentence: the ruler's size, and the exact one where it differs. */
export function sayMethod({ method, trimming }: CutPiece): string {
  const after = trimming === "trimmed-after-sewing" ? ", trimmed after sewing" : ", sewn as cut";
  switch (method.kind) {
    case "square":
      return `Square ${size(method.side)}${after}`;
    case "rectangle":
      return `Rectangle ${size(method.along)} × ${size(method.across)}${after}`;
    case "half-square":
      return `Square ${size(method.square)}, cut once corner to corner for two${after}`;
    case "quarter-square":
      return `Square ${size(method.square)}, cut twice corner to corner for four${after}`;
    case "half-rectangle":
      return `Rectangle ${size(method.along)} × ${size(method.across)}, cut once corner to corner for two${after}`;
    case "angled-strip":
      return `Strip ${size(method.strip)}, sub-cut at ${Math.round(method.angleDegrees)} degrees${method.headToTail ? ", head to tail" : ""}${after}`;
    case "template":
      return `By template, out of ${size(method.along)} × ${size(method.across)}`;
    case "long-strip":
      return `Strips ${size(method.width)}, joined ${method.join === "bias" ? "on the bias" : "straight"}`;
  }
}

function size({ exact, ruler }: CutSize): string {
  const same = Math.abs(exact - ruler) < 4;
  return `${displayInches(ruler)} in${same ? "" : ` (exactly ${formatExactInches(exact)})`}`;
}
