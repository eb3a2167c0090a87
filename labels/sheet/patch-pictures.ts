import type { MeasureSystem } from "@/lib/core/measure/format";
import type { CutPiece } from "@/lib/core/piece/cut-piece";
import type { Polygon } from "@/lib/core/piece/patch";
import { INK } from "../press/sheet-frame";
import type { Press } from "../press/press";
import { drawLine, drawParagraph } from "../press/type";
import { exactWords, methodSentence } from "./method-words";

/** Height of one row of patch pictures with their words. */
export const PATCH_ROW = 76;
const PICTURE = 58;
const CELL = 176;

export function patchesPerRow(width: number): number {
  return Math.max(1, Math.floor(width / CELL));
}

/** Draws pieces side by side, all pieces of the fabric to one scale: cut line solid, seam dashed, letter in a ring. Returns the foot. */
export function drawPatchRow(press: Press, row: readonly CutPiece[], all: readonly CutPiece[], measure: MeasureSystem, room: PatchRoom): number {
  const scale = PICTURE / Math.max(1, ...all.map((piece) => Math.max(...extent(piece.cut))));
  const cell = room.width / patchesPerRow(room.width);
  row.forEach((piece, index) => {
    const x = room.x + index * cell;
    drawPatch(press, piece, x + 1, room.y + 8, scale);
    drawWords(press, piece, x + PICTURE + 10, room.y + 6, cell - PICTURE - 18, measure);
  });
  return room.y + PATCH_ROW;
}

export interface PatchRoom {
  readonly x: number;
  readonly y: number;
  readonly width: number;
}

function drawPatch(press: Press, piece: CutPiece, x: number, y: number, scale: number): void {
  const { doc } = press;
  const [left, top] = corner(piece.cut);
  const place = (polygon: Polygon) => polygon.map(([px, py]) => [x + (px - left) * scale, y + (py - top) * scale] as const);
  const [width, height] = extent(piece.cut);
  // The seam allowance is tinted, so that cut and sewn size are told apart at a glance.
  trace(press, place(piece.cut));
  doc.fill("#ebebeb");
  trace(press, place(piece.finished));
  doc.fill("#ffffff");
  trace(press, place(piece.cut));
  doc.lineWidth(1.1).lineJoin("miter").strokeColor(INK).stroke();
  trace(press, place(piece.finished));
  doc.lineWidth(0.7).dash(2.4, { space: 1.8 }).strokeColor(INK).stroke().undash();
  const middle = place([centroid(piece.finished)])[0];
  if (!middle) return;
  const radius = Math.max(2.6, Math.min(7.5, Math.min(width, height) * scale * 0.17));
  doc.circle(middle[0], middle[1], radius).lineWidth(0.7).fillAndStroke("#ffffff", INK);
  const size = radius * (piece.letter.length > 1 ? 1.05 : 1.3);
  drawLine(press, piece.letter, { face: "bold", size, colour: INK }, middle[0], middle[1] + size * 0.36, { align: "centre" });
}

function drawWords(press: Press, piece: CutPiece, x: number, top: number, width: number, measure: MeasureSystem): void {
  const head = `${piece.letter}, ${piece.count} ${piece.count === 1 ? "patch" : "patches"}`;
  drawLine(press, head, { face: "bold", size: 9.5, colour: INK }, x, top + 9, { width });
  const exact = exactWords(piece, measure);
  const said = [methodSentence(piece, measure), exact, piece.note ?? ""].filter(Boolean).join("; ");
  drawParagraph(press, `${said}.`, { face: "text", size: 8.8, colour: INK }, x, top + 12, { width, leading: 1.28, maxLines: 5 });
}

function trace({ doc }: Press, points: readonly (readonly [number, number])[]): void {
  points.forEach(([x, y], index) => (index === 0 ? doc.moveTo(x, y) : doc.lineTo(x, y)));
  doc.closePath();
}

function corner(polygon: Polygon): readonly [number, number] {
  return [Math.min(...polygon.map(([x]) => x)), Math.min(...polygon.map(([, y]) => y))];
}

function extent(polygon: Polygon): readonly [number, number] {
  const [left, top] = corner(polygon);
  return [Math.max(...polygon.map(([x]) => x)) - left, Math.max(...polygon.map(([, y]) => y)) - top];
}

/** Centre of area (shoelace); the mean of the corners where the area vanishes. */
function centroid(polygon: Polygon): readonly [number, number] {
  let area = 0;
  let x = 0;
  let y = 0;
  polygon.forEach(([ax, ay], index) => {
    const [bx, by] = polygon[(index + 1) % polygon.length] ?? [ax, ay];
    const cross = ax * by - bx * ay;
    area += cross;
    x += (ax + bx) * cross;
    y += (ay + by) * cross;
  });
  if (Math.abs(area) < 1e-9) return [polygon.reduce((sum, [px]) => sum + px, 0) / polygon.length, polygon.reduce((sum, [, py]) => sum + py, 0) / polygon.length];
  return [x / (3 * area), y / (3 * area)];
}
