import { drawPicture, fitPicture } from "../press/picture";
import type { Box } from "../press/hatch";
import type { Press } from "../press/press";
import { INK } from "../press/sheet-frame";
import { drawLine } from "../press/type";
import type { LetteredPicture } from "./sheet-input";

/** Draws a block or unit with its letters in rings, seams dashed and press arrows, all with a paper halo. Returns its box. */
export function drawLettered(press: Press, picture: LetteredPicture, room: Box): Box {
  const box = fitPicture(picture, room);
  const small = box.width < 90;
  // A whole quilt shown as small as a unit keeps its colours only: hatches would run into grey.
  const crowded = picture.polygons.length > 80 && box.width < 160;
  const lineWidth = crowded ? 0.2 : small ? 0.6 : 0.8;
  drawPicture(press, picture, box, { as: "colour", lineWidth, hatchStep: crowded ? 0 : small ? 4 : 5.5, hatchWidth: 0.4, frameWidth: crowded ? 0.8 : 0 });
  const { doc } = press;
  const at = ([x, y]: readonly [number, number]) => [box.x + (x * box.width) / picture.width, box.y + (y * box.height) / picture.height] as const;
  for (const seam of picture.seams) {
    const [fromX, fromY] = at(seam.from);
    const [toX, toY] = at(seam.to);
    doc.moveTo(fromX, fromY).lineTo(toX, toY).lineWidth(2.2).strokeColor("#ffffff").stroke();
    doc.moveTo(fromX, fromY).lineTo(toX, toY).lineWidth(1.1).dash(3, { space: 2.2 }).strokeColor(INK).stroke().undash();
  }
  for (const arrow of picture.press) drawArrow(press, at(arrow.from), at(arrow.to));
  drawLetters(press, picture, at, box);
  return box;
}

function drawLetters(press: Press, picture: LetteredPicture, at: (point: readonly [number, number]) => readonly [number, number], box: Box): void {
  const each = Math.sqrt((box.width * box.height) / Math.max(1, picture.polygons.length));
  const radius = Math.max(3.4, Math.min(7.2, each * 0.2));
  for (const letter of picture.letters) {
    const [x, y] = at([letter.x, letter.y]);
    press.doc.circle(x, y, radius).lineWidth(0.7).fillAndStroke("#ffffff", INK);
    const size = letter.text.length > 1 ? radius * 1.05 : radius * 1.3;
    drawLine(press, letter.text, { face: "bold", size, colour: INK }, x, y + size * 0.36, { align: "centre" });
  }
}

/** An arrow of ink on a paper halo. */
export function drawArrow({ doc }: Press, from: readonly [number, number], to: readonly [number, number]): void {
  const angle = Math.atan2(to[1] - from[1], to[0] - from[0]);
  const wing = (turn: number) => [to[0] - 4.5 * Math.cos(angle + turn), to[1] - 4.5 * Math.sin(angle + turn)] as const;
  for (const [width, colour] of [[3.6, "#ffffff"], [1.3, INK]] as const) {
    doc.moveTo(from[0], from[1]).lineTo(to[0], to[1]);
    for (const turn of [0.6, -0.6]) doc.moveTo(...wing(turn)).lineTo(to[0], to[1]);
    doc.lineWidth(width).strokeColor(colour).stroke();
  }
}
