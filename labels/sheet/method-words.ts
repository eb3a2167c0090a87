import type { MeasureSystem } from "@/lib/core/measure/format";
import type { Length } from "@/lib/core/measure/length";
import type { Blank } from "@/lib/core/piece/strip-plan";
import type { CutMethod, CutPiece, CutSize } from "@/lib/core/piece/cut-piece";
import { exactLength, rulerFigure, rulerLength, soldLength } from "../press/lengths";

/** "12 squares, 3 1/2 in": so many of the rectangles that a piece comes out of. */
export function blankWords(piece: CutPiece, blank: Blank, count: number, usableWidth: Length, measure: MeasureSystem): string {
  const { method } = piece;
  const many = count === 1 ? "" : "s";
  switch (method.kind) {
    case "square":
      return `${count} square${many}, ${rulerLength(method.side.ruler, measure)}`;
    case "half-square":
    case "quarter-square":
      return `${count} square${many}, ${rulerLength(method.square.ruler, measure)}`;
    case "rectangle":
    case "half-rectangle":
      return `${count} rectangle${many}, ${pairWords(method.along, method.across, measure)}`;
    case "template":
      return `${count} template${many}, out of ${pairWords(method.along, method.across, measure)}`;
    case "angled-strip":
      return `${count} ${count === 1 ? "piece" : "pieces"}, ${rulerLength(method.pitch.ruler, measure)} apart at ${degrees(method.angleDegrees)}`;
    case "long-strip":
      return count === 1 && blank.across >= usableWidth ? "the whole strip" : `${count} length${many}, ${rulerLength(blank.across, measure)}`;
  }
}

/** What is done to each rectangle after it is cut; empty where nothing is. */
export function afterCutting(piece: CutPiece): string {
  switch (piece.method.kind) {
    case "half-square":
      return "cut once, corner to corner";
    case "quarter-square":
      return "cut twice, corner to corner";
    case "half-rectangle":
      return piece.letter.endsWith("r") ? "cut once, corner to corner, the other way" : "cut once, corner to corner";
    default:
      return "";
  }
}

/** The piece in one sentence, ruler size first: "square 3 7/8 in, cut once, corner to corner". */
export function methodSentence(piece: CutPiece, measure: MeasureSystem): string {
  const { method } = piece;
  const after = afterCutting(piece);
  const tail = after ? `, ${after}` : "";
  switch (method.kind) {
    case "square":
      return `Square ${rulerLength(method.side.ruler, measure)}`;
    case "half-square":
    case "quarter-square":
      return `Square ${rulerLength(method.square.ruler, measure)}${tail}`;
    case "rectangle":
    case "half-rectangle":
      return `Rectangle ${pairWords(method.along, method.across, measure)}${tail}`;
    case "template":
      return `By the template, out of ${pairWords(method.along, method.across, measure)}`;
    case "angled-strip":
      return `Strip ${rulerLength(method.strip.ruler, measure)}, cut at ${degrees(method.angleDegrees)} every ${rulerLength(method.pitch.ruler, measure)}`;
    case "long-strip":
      return `Strips ${rulerLength(method.width.ruler, measure)} wide, ${soldLength(method.needed, measure)} in all, joined ${method.join === "bias" ? "on the bias" : "straight"}`;
  }
}

/** "exact 3.854 in", or empty where the ruler's size is the exact one. */
export function exactWords(piece: CutPiece, measure: MeasureSystem): string {
  const off = sizesOf(piece.method).filter((size) => Math.abs(size.exact - size.ruler) > 0.5);
  if (!off.length) return "";
  return `exact ${off.map((size) => exactLength(size.exact, measure)).join(" and ")}`;
}

function sizesOf(method: CutMethod): readonly CutSize[] {
  switch (method.kind) {
    case "square":
      return [method.side];
    case "half-square":
    case "quarter-square":
      return [method.square];
    case "rectangle":
    case "half-rectangle":
    case "template":
      return [method.along, method.across];
    case "angled-strip":
      return [method.strip, method.pitch];
    case "long-strip":
      return [method.width];
  }
}

function pairWords(along: CutSize, across: CutSize, measure: MeasureSystem): string {
  return `${rulerFigure(along.ruler, measure)} \u00d7 ${rulerLength(across.ruler, measure)}`;
}

function degrees(angle: number): string {
  return `${Number(angle.toFixed(2))} degrees`;
}
