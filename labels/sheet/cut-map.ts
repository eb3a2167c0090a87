import type { CutPiece } from "@/lib/core/piece/cut-piece";
import type { MeasureSystem } from "@/lib/core/measure/format";
import type { Length } from "@/lib/core/measure/length";
import type { Blank, StripPlan, SubCut } from "@/lib/core/piece/strip-plan";
import { drawHatch } from "../press/hatch";
import { rulerLength, soldLength } from "../press/lengths";
import type { Press } from "../press/press";
import { INK, QUIET } from "../press/sheet-frame";
import { drawLine, textWidth, type Style } from "../press/type";

interface MapRoom {
  readonly x: number;
  readonly y: number;
  readonly width: number;
}

/** Tallest drawing in points; a fabric cut into many shapes needs room for its letters. */
const TALL = { few: 120, many: 180 };
const MANY_SHAPES = 4;

/** Points to the unit of length: both directions at one scale. */
function cutMapScale(plan: StripPlan, cutLength: Length, width: number): number {
  const along = Math.max(1, cutLength, plan.length);
  const shapes = new Set(plan.strips.flatMap((strip) => strip.cuts.map((cut) => cut.blank))).size;
  return Math.min((width - 34) / along, (shapes > MANY_SHAPES ? TALL.many : TALL.few) / Math.max(1, plan.usableWidth));
}

export function cutMapHeight(plan: StripPlan, cutLength: Length, width: number): number {
  return plan.usableWidth * cutMapScale(plan, cutLength, width) + 30;
}

/** Width of the drawing with the words at its left. */
export function cutMapWidth(plan: StripPlan, cutLength: Length, width: number): number {
  return Math.max(cutLength, plan.length) * cutMapScale(plan, cutLength, width) + 34;
}

/**
 * Draws where each strip and sub-cut lies: along the cloth to the right, selvages at the top and the foot, strips
 * numbered below. Returns the foot of the drawing.
 */
export function drawCutMap(press: Press, plan: StripPlan, blanks: readonly Blank[], pieces: ReadonlyMap<string, CutPiece>, cutLength: Length, measure: MeasureSystem, room: MapRoom): number {
  const { doc } = press;
  const scale = cutMapScale(plan, cutLength, room.width);
  const left = room.x + 22;
  const height = plan.usableWidth * scale;
  const cloth = { x: left, y: room.y, width: Math.max(cutLength, plan.length) * scale, height };
  doc.save();
  doc.rect(cloth.x, cloth.y, cloth.width, cloth.height).clip();
  drawHatch(press, "diagonal", cloth, { colour: "#bbbbbb", lineWidth: 0.4, step: 5 });
  doc.restore();
  const marks = new Map(blanks.map((blank) => [blank.key, blank]));
  plan.strips.forEach((strip, index) => {
    const x = left + strip.startsAt * scale;
    doc.rect(x, cloth.y, strip.width * scale, height).fill("#ffffff");
    drawRest(press, x, cloth.y, strip.width * scale, height);
    for (const cut of strip.cuts) {
      const blank = marks.get(cut.blank);
      if (blank) drawSubCut(press, cut, blank, pieces.get(blank.pieceKey), x, cloth.y, scale);
    }
    doc.rect(x, cloth.y, strip.width * scale, height).lineWidth(0.9).strokeColor(INK).stroke();
    drawStripNumber(press, String(index + 1), x, strip.width * scale, cloth.y + height);
  });
  doc.rect(cloth.x, cloth.y, cloth.width, cloth.height).lineWidth(0.9).strokeColor(INK).stroke();
  drawMeasures(press, plan, cutLength, measure, cloth);
  return cloth.y + height + 26;
}

/** What is left of a strip is hatched faintly under its sub-cuts. */
function drawRest(press: Press, x: number, y: number, width: number, height: number): void {
  press.doc.save();
  press.doc.rect(x, y, width, height).clip();
  drawHatch(press, "diagonal", { x, y, width, height }, { colour: "#bbbbbb", lineWidth: 0.4, step: 5 });
  press.doc.restore();
}

function drawSubCut(press: Press, cut: SubCut, blank: Blank, piece: CutPiece | undefined, stripX: number, top: number, scale: number): void {
  const { doc } = press;
  const box = { x: stripX, y: top + cut.at * scale, width: cut.along * scale, height: cut.across * scale };
  doc.rect(box.x, box.y, box.width, box.height).fillAndStroke("#ffffff", INK);
  doc.lineWidth(0.5).strokeColor(INK);
  const rises = blank.mark === "both-diagonals" || (blank.mark === "diagonal" && diagonalRises(piece, cut.turned));
  const falls = blank.mark === "both-diagonals" || (blank.mark === "diagonal" && !rises);
  if (rises) doc.moveTo(box.x, box.y + box.height).lineTo(box.x + box.width, box.y);
  if (falls) doc.moveTo(box.x, box.y).lineTo(box.x + box.width, box.y + box.height);
  if (blank.mark === "slant") doc.moveTo(box.x, box.y + box.height * 0.35).lineTo(box.x + box.width, box.y + box.height * 0.65);
  doc.stroke();
  const letter = piece?.letter ?? blank.label;
  const size = Math.min(8, box.height * 0.62, (box.width * 0.8) / Math.max(1, letter.length * 0.62));
  if (size < 3.5) return;
  const style: Style = { face: "strong", size, colour: INK };
  const width = textWidth(press, letter, style);
  if (blank.mark !== "plain" && blank.mark !== "long") {
    doc.rect(box.x + box.width / 2 - width / 2 - 0.8, box.y + box.height / 2 - size / 2, width + 1.6, size).fill("#ffffff");
  }
  drawLine(press, letter, style, box.x + box.width / 2, box.y + box.height / 2 + size * 0.35, { align: "centre" });
}

/**
 * Which diagonal of its rectangle a half-rectangle is cut along, with the right side of the cloth up: the patch is
 * turned, never mirrored, from its own pose to the way it lies on the map. For squares both give the same patches.
 */
function diagonalRises(piece: CutPiece | undefined, turned: boolean): boolean {
  if (piece?.method.kind !== "half-rectangle") return true;
  const corners = piece.finished;
  let [longest, risesInPose] = [0, true];
  corners.forEach(([x, y], index) => {
    const [nextX, nextY] = corners[(index + 1) % corners.length] ?? [x, y];
    const side = Math.hypot(nextX - x, nextY - y);
    if (side > longest) [longest, risesInPose] = [side, (nextX - x) * (nextY - y) < 0];
  });
  const span = (axis: 0 | 1) => Math.max(...corners.map((corner) => corner[axis])) - Math.min(...corners.map((corner) => corner[axis]));
  const quarterTurn = span(1) >= span(0) === piece.method.along.exact >= piece.method.across.exact;
  return risesInPose !== (quarterTurn !== turned);
}

function drawStripNumber(press: Press, number: string, x: number, width: number, foot: number): void {
  const natural = textWidth(press, number, { face: "mid", size: 7 });
  const size = Math.min(7, (7 * (width - 1)) / natural);
  if (size < 4) return;
  const style: Style = { face: "mid", size, colour: INK };
  drawLine(press, number, style, x + width / 2, foot + 8, { align: "centre" });
}

function drawMeasures(press: Press, plan: StripPlan, cutLength: Length, measure: MeasureSystem, cloth: { x: number; y: number; width: number; height: number }): void {
  const { doc } = press;
  const style: Style = { face: "text", size: 8, colour: QUIET };
  const foot = cloth.y + cloth.height;
  const said = `strips take ${rulerLength(plan.length, measure)} of ${soldLength(cutLength, measure)}; hatched cloth is over`;
  drawLine(press, said, style, cloth.x, foot + 18, { width: Math.max(cloth.width, 260) });
  doc.save();
  doc.rotate(-90, { origin: [cloth.x - 8, cloth.y + cloth.height / 2] });
  drawLine(press, `${rulerLength(plan.usableWidth, measure)} usable`, style, cloth.x - 8, cloth.y + cloth.height / 2, { align: "centre" });
  doc.restore();
}
