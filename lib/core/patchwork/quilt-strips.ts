import { length, type Length } from "../measure/length";
import { roundNearest, roundUp } from "../measure/rounding";
import type { CutPiece, CuttingRules, CutSize } from "../piece/cut-piece";
import type { RoleId } from "../piece/drawing";
import { rectangle } from "./quilt-piece";

/** What all cut pieces of a quilt's setting have in common. */
export interface PieceHead {
  readonly key: string;
  readonly letter: string;
  readonly name: string;
  readonly role: RoleId;
}

/** A measure that is sewn as cut: both seams on, to the nearest mark. */
export function sewnAsCut(finished: number, { seamAllowance, rulerStep }: CuttingRules): CutSize {
  const exact = finished + 2 * seamAllowance;
  return { exact, ruler: roundNearest(exact, rulerStep) };
}

/**
 * A rectangle or square that is sewn as cut, finished sizes in 1/160 mm: `along` the bolt, `across` from selvage to selvage.
 */
export function cutRectangle(head: PieceHead, finished: { readonly along: number; readonly across: number }, count: number, mayTurn: boolean, rules: CuttingRules): CutPiece {
  const { along, across } = finished;
  const seam = rules.seamAllowance;
  const isSquare = Math.abs(along - across) < 1e-6;
  return {
    ...head,
    count,
    finished: rectangle(0, 0, across, along),
    cut: rectangle(-seam, -seam, across + 2 * seam, along + 2 * seam),
    method: isSquare ? { kind: "square", side: sewnAsCut(along, rules) } : { kind: "rectangle", along: sewnAsCut(along, rules), across: sewnAsCut(across, rules) },
    trimming: "sewn-as-cut",
    mayTurn,
  };
}

/**
 * Half a square with its long side on the grain, four from a square cut twice; `longSide` finished.
 * Exact addition s(2 + 2√2), see trade.md. `oversize` is added to the square and trimmed off after sewing.
 */
export function cutQuarterSquare(head: PieceHead, longSide: number, count: number, mayTurn: boolean, rules: CuttingRules, oversize: Length = length(0)): CutPiece {
  const s = rules.seamAllowance;
  const exact = longSide + s * (2 + 2 * Math.SQRT2) + oversize;
  const high = longSide / 2;
  const beyond = s * (1 + Math.SQRT2);
  return {
    ...head,
    count,
    finished: [[0, high], [high, 0], [longSide, high]],
    cut: [[-beyond, high + s], [high, -s * Math.SQRT2], [longSide + beyond, high + s]],
    method: { kind: "quarter-square", square: { exact, ruler: roundUp(exact, rules.rulerStep) } },
    trimming: "trimmed-after-sewing",
    mayTurn,
  };
}

/** Half a square with its short sides on the grain, two from a square cut once. Exact addition s(2 + √2), see trade.md. */
export function cutHalfSquare(head: PieceHead, shortSide: number, count: number, mayTurn: boolean, rules: CuttingRules, oversize: Length = length(0)): CutPiece {
  const s = rules.seamAllowance;
  const exact = shortSide + s * (2 + Math.SQRT2) + oversize;
  const beyond = s * (1 + Math.SQRT2);
  return {
    ...head,
    count,
    finished: [[0, 0], [shortSide, 0], [0, shortSide]],
    cut: [[-s, -s], [shortSide + beyond, -s], [-s, shortSide + beyond]],
    method: { kind: "half-square", square: { exact, ruler: roundUp(exact, rules.rulerStep) } },
    trimming: "trimmed-after-sewing",
    mayTurn,
  };
}

/**
 * So much length of one width, out of strips across the fabric, joined where it must be.
 *
 * @param needed with the seams of every part in it.
 */
export function cutLongStrip(head: PieceHead, width: CutSize, needed: number, join: "straight" | "bias", rules: CuttingRules): CutPiece {
  const run = roundUp(needed, rules.rulerStep);
  return {
    ...head,
    count: 1,
    finished: rectangle(0, 0, run, width.exact - (join === "straight" ? 2 * rules.seamAllowance : 0)),
    cut: rectangle(0, 0, run, width.exact),
    method: { kind: "long-strip", width, needed: run, join, lostAtJoin: join === "bias" ? width.ruler : length(2 * rules.seamAllowance) },
    trimming: "sewn-as-cut",
    mayTurn: false,
  };
}

/** The length that goes round the quilt: its perimeter and the extra for corners and the last join, in 1/160 mm. */
export function bindingLength({ width, height }: { readonly width: number; readonly height: number }, extra: number): number {
  return 2 * (width + height) + extra;
}
