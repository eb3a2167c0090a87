import { plus, times, type Length } from "@/lib/core/measure/length";
import { rulerFigure, rulerLength } from "../press/lengths";
import { INK, QUIET, ruleAcross, type SheetFlow } from "../press/sheet-frame";
import { drawLine, drawParagraph, paragraphHeight, type Style } from "../press/type";
import { drawArrow, drawLettered } from "./lettered-picture";
import type { InstructionSheetInput, LetteredPicture, SheetBlock, SheetStep } from "./sheet-input";
import { drawSwatch } from "./swatch";

const BODY: Style = { face: "text", size: 9.5, colour: INK };
const BLOCK_PICTURE = 190;
/** Pictures of a step, side by side: before, an arrow, after. */
const STEP_PICTURE = 54;
const GAP = 10;
const ARROW = 18;

/** Each block with its letters, then its units in sewing order; then the quilt, row by row, to the binding. */
export function drawSewingPages(flow: SheetFlow, sheet: InstructionSheetInput): void {
  for (const block of sheet.blocks) drawBlock(flow, block, sheet);
  if (!sheet.assembly.length) return;
  flow.newPage();
  drawLine(flow.press, "The quilt", { face: "word-strong", size: 22, colour: INK }, flow.left, flow.y + 18);
  flow.y += 28;
  ruleAcross(flow, flow.y, 1.2);
  flow.y += 2;
  drawSteps(flow, sheet.assembly, 112);
}

function drawBlock(flow: SheetFlow, block: SheetBlock, sheet: InstructionSheetInput): void {
  flow.newPage();
  const { press, left, right, width } = flow;
  const make = drawLine(press, `make ${block.make}`, { face: "strong", size: 12, colour: INK }, right, flow.y + 18, { align: "right" });
  drawLine(press, block.name, { face: "word-strong", size: 22, colour: INK }, left, flow.y + 18, { width: width - make - 12 });
  flow.y += 28;
  ruleAcross(flow, flow.y, 2.2);
  flow.y += 12;
  const box = drawLettered(press, block.picture, { x: left + 1, y: flow.y, width: BLOCK_PICTURE, height: BLOCK_PICTURE });
  press.doc.rect(box.x, box.y, box.width, box.height).lineWidth(1.3).strokeColor(INK).stroke();
  const x = left + BLOCK_PICTURE + 24;
  const seams = times(sheet.seamAllowance, 2);
  const size = `Finishes ${sizeWords(block.finished.width, block.finished.height, sheet)}; measures ${sizeWords(plus(block.finished.width, seams), plus(block.finished.height, seams), sheet)} before it is sewn in.`;
  let y = drawParagraph(press, size, { ...BODY, face: "strong", size: 10.5 }, x, flow.y - 2, { width: right - x }) + 6;
  y = drawParagraph(press, letterWords(block.picture), BODY, x, y, { width: right - x, leading: 1.38 }) + 6;
  y = drawLegend(flow, block.picture, sheet, x, y);
  drawKey(flow, x, Math.max(y + 14, box.y + box.height - 6));
  flow.y = Math.max(y + 24, box.y + box.height + 14);
  ruleAcross(flow, flow.y, 1.2);
  flow.y += 2;
  drawSteps(flow, block.steps, STEP_PICTURE);
}

function sizeWords(width: Length, height: Length, sheet: InstructionSheetInput): string {
  return `${rulerFigure(width, sheet.measure)} \u00d7 ${rulerLength(height, sheet.measure)}`;
}

/** Which fabric is which in the block; the first six that occur in it. */
function drawLegend({ press, right }: SheetFlow, picture: LetteredPicture, sheet: InstructionSheetInput, x: number, top: number): number {
  const used = sheet.fabrics.filter((fabric) => picture.polygons.some(({ colour, hatch }) => colour === fabric.colour && hatch === fabric.hatch));
  let y = top;
  for (const fabric of used.slice(0, 6)) {
    drawSwatch(press, fabric, { x, y, width: 19, height: 12 });
    drawLine(press, fabric.name, { ...BODY, face: "strong" }, x + 26, y + 9.5, { width: right - x - 26 });
    y += 17;
  }
  return y;
}

/** "In one block: 4 A, 24 B." */
function letterWords(picture: LetteredPicture): string {
  const counts = new Map<string, number>();
  for (const { text } of picture.letters) counts.set(text, (counts.get(text) ?? 0) + 1);
  const said = [...counts].sort(([a], [b]) => a.localeCompare(b)).map(([letter, count]) => `${count} ${letter}`);
  return said.length ? `In one block: ${said.join(", ")}. A letter names a shape, whatever its fabric.` : "";
}

function drawKey({ press }: SheetFlow, x: number, y: number): void {
  const { doc } = press;
  const style: Style = { face: "text", size: 9, colour: QUIET };
  doc.moveTo(x, y).lineTo(x + 26, y).lineWidth(1.1).dash(3, { space: 2.2 }).strokeColor(INK).stroke().undash();
  const seam = drawLine(press, "seam", style, x + 31, y + 3);
  const cut = x + 31 + seam + 14;
  doc.moveTo(cut, y).lineTo(cut + 26, y).lineWidth(1.1).strokeColor(INK).stroke();
  const cutWidth = drawLine(press, "cut", style, cut + 31, y + 3);
  const arrow = cut + 31 + cutWidth + 14;
  drawArrow(press, [arrow, y], [arrow + 26, y]);
  drawLine(press, "press this way", style, arrow + 31, y + 3);
}

function stepPicturesWidth(step: SheetStep, size: number): number {
  const count = step.before.length + (step.after ? 1 : 0);
  if (!count) return 0;
  return count * size + (count - 1) * GAP + (step.after && step.before.length ? ARROW : 0) + 14;
}

function drawSteps(flow: SheetFlow, steps: readonly SheetStep[], size: number): void {
  steps.forEach((step, index) => drawStep(flow, step, index + 1, size));
}

function drawStep(flow: SheetFlow, step: SheetStep, number: number, most: number): void {
  const { press, left, right, width } = flow;
  // Many pictures shrink, so that a readable column is left for the words.
  let size = most;
  while (size > 26 && stepPicturesWidth(step, size) > width * 0.62) size -= 2;
  const pictures = stepPicturesWidth(step, size);
  const textOptions = { width: width - pictures, leading: 1.38 };
  const textHeight = paragraphHeight(press, step.text, BODY, textOptions);
  const height = 25 + Math.max(textHeight, pictures ? size : 0) + 10;
  flow.need(height);
  const note = step.note ? drawLine(press, step.note, { face: "strong", size: 10, colour: INK }, right, flow.y + 17, { align: "right", width: 160 }) : 0;
  drawLine(press, `${number}. ${step.title}`, { face: "word-strong", size: 13, colour: INK }, left, flow.y + 17, { width: width - note - 12 });
  const top = flow.y + 25;
  if (pictures) drawStepPictures(flow, step, size, top);
  drawParagraph(press, step.text, BODY, left + pictures, top - 2, textOptions);
  flow.y += height;
  press.doc.moveTo(left, flow.y).lineTo(right, flow.y).lineWidth(0.8).dash(3, { space: 2.4 }).strokeColor("#777777").stroke().undash();
}

function drawStepPictures({ press, left }: SheetFlow, step: SheetStep, size: number, top: number): void {
  let x = left + 1;
  for (const picture of step.before) {
    drawLettered(press, picture, { x, y: top, width: size, height: size });
    x += size + GAP;
  }
  if (!step.after) return;
  if (step.before.length) {
    drawArrow(press, [x - 3, top + size / 2], [x + ARROW - 7, top + size / 2]);
    x += ARROW;
  }
  drawLettered(press, step.after, { x, y: top, width: size, height: size });
}

