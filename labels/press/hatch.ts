import type { Press } from "./press";

/** How a fabric is told from the others without colour. */
export type Hatch = "blank" | "solid" | "diagonal" | "dots" | "bars" | "grid" | "reverse" | "uprights" | "cross" | "dashes";

const IN_ORDER: readonly Hatch[] = ["solid", "blank", "diagonal", "dots", "bars", "grid", "reverse", "uprights", "cross", "dashes"];

/** The hatch of the n-th fabric (from 0); after ten they begin again, and the letters beside them tell. */
export function hatchOf(index: number): Hatch {
  return IN_ORDER[index % IN_ORDER.length] ?? "blank";
}

export interface Box {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

interface HatchStyle {
  readonly colour: string;
  readonly lineWidth: number;
  readonly step: number;
}

/** Fills the current clip over `box` with the hatch; the clip is the caller's. Blank draws nothing. */
export function drawHatch({ doc }: Press, hatch: Hatch, box: Box, style: HatchStyle): void {
  if (hatch === "blank") return;
  if (hatch === "solid") {
    doc.rect(box.x, box.y, box.width, box.height).fill(style.colour);
    return;
  }
  if (hatch === "dots") {
    drawDots(doc, box, style);
    return;
  }
  doc.lineWidth(style.lineWidth).strokeColor(style.colour);
  if (hatch === "dashes") doc.dash(style.step * 0.6, { space: style.step * 0.5 });
  const right = box.x + box.width;
  const bottom = box.y + box.height;
  if (hatch === "bars" || hatch === "grid" || hatch === "dashes") {
    for (let y = box.y + style.step / 2; y < bottom; y += style.step) doc.moveTo(box.x, y).lineTo(right, y);
  }
  if (hatch === "uprights" || hatch === "grid") {
    for (let x = box.x + style.step / 2; x < right; x += style.step) doc.moveTo(x, box.y).lineTo(x, bottom);
  }
  const slope = style.step * Math.SQRT2;
  if (hatch === "diagonal" || hatch === "cross") {
    for (let x = box.x; x < right + box.height; x += slope) doc.moveTo(x, box.y).lineTo(x - box.height, bottom);
  }
  if (hatch === "reverse" || hatch === "cross") {
    for (let x = box.x - box.height; x < right; x += slope) doc.moveTo(x, box.y).lineTo(x + box.height, bottom);
  }
  doc.stroke();
  if (hatch === "dashes") doc.undash();
}

/** Squares, which keep their shape on a coarse printer. */
function drawDots(doc: PDFKit.PDFDocument, box: Box, style: HatchStyle): void {
  const side = style.step * 0.46;
  let row = 0;
  for (let y = box.y + style.step * 0.3; y < box.y + box.height; y += style.step) {
    for (let x = box.x + style.step * 0.3; x < box.x + box.width; x += style.step) doc.rect(x, y, side, side);
    row += 1;
  }
  if (row) doc.fill(style.colour);
}
