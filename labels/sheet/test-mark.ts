import type { Press } from "../press/press";
import { INK, type SheetPaper } from "../press/sheet-frame";
import { drawLine, drawParagraph } from "../press/type";

const INCH = 72;
const CENTIMETRE = 72 / 2.54;

/** Height of the mark with its words. */
export const TEST_MARK_HEIGHT = 34;

/** One inch on letter; on A4 one inch and 25 mm beneath it. A ruler laid on it tells whether the sheet was scaled. */
export function drawTestMark(press: Press, paper: SheetPaper, x: number, y: number, width: number): void {
  drawRuler(press, x, y, INCH, 8, 4, "1 in");
  if (paper === "a4") drawRuler(press, x + INCH + 22, y, 2.5 * CENTIMETRE, 25, 5, "25 mm");
  const textX = x + (paper === "a4" ? 2 * INCH + 40 : INCH + 16);
  const said = paper === "a4" ? "Lay a ruler on both. If they are not 1 in and 25 mm, print again at full size, without scaling." : "Lay a ruler on it. If it is not 1 in, print again at full size, without scaling.";
  const text = [{ text: "Test mark. ", face: "bold" }, { text: said, face: "text" }] as const;
  drawParagraph(press, text, { face: "text", size: 9, colour: INK }, textX, y - 1, { width: width - (textX - x), leading: 1.3, maxLines: 2 });
}

function drawRuler(press: Press, x: number, y: number, long: number, parts: number, middle: number, label: string): void {
  const { doc } = press;
  doc.moveTo(x, y).lineTo(x + long, y);
  for (let i = 0; i <= parts; i += 1) {
    const tick = i === 0 || i === parts ? 18 : i % middle === 0 ? 11 : 6;
    doc.moveTo(x + (long * i) / parts, y).lineTo(x + (long * i) / parts, y + tick);
  }
  doc.lineWidth(0.9).strokeColor(INK).stroke();
  drawLine(press, label, { face: "strong", size: 8.5, colour: INK }, x + long / 2, y + 27, { align: "centre" });
}
