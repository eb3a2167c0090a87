import type { MeasureSystem } from "@/lib/core/measure/format";
import type { Length } from "@/lib/core/measure/length";
import { code128, DOT, drawSymbol, qr, toDots } from "./barcode";
import { drawHatch, type Box, type Hatch } from "./press/hatch";
import { rulerFigure, rulerUnit, soldFigure } from "./press/lengths";
import { drawPicture, fitPicture, type Picture } from "./press/picture";
import { LABEL_4X6, openPress, type Press } from "./press/press";
import { drawLine, drawParagraph, fittingSize, paragraphHeight, textWidth, type Style, type Text } from "./press/type";

export interface KitLabelFabric {
  readonly name: string;
  readonly lot: string;
  readonly length: Length;
  /** The same hatch as in the picture. */
  readonly hatch: Hatch;
}

/** What the label of one packed kit says. Sums of money come written, since the shop's currency decides how. */
export interface KitLabelInput {
  readonly shopName: string;
  /** Top right, such as "quilt kit 2 of 3". */
  readonly note: string;
  readonly kitName: string;
  readonly colourway: string;
  /** Printed in letters and as Code 128. */
  readonly serial: string;
  /** Content of the QR code: the address of the kit's page, or the serial. */
  readonly link: string;
  readonly finished: { readonly width: Length; readonly height: Length } | null;
  /** Short lines beside the picture: blocks, what is in it, who cut it. The first four are printed. */
  readonly facts: readonly string[];
  readonly picture: Picture | null;
  readonly fabrics: readonly KitLabelFabric[];
  /** What else lies in the bag: "the printed sheet", "4 yd of ribbon". */
  readonly alsoInside: readonly string[];
  readonly fibre: string;
  readonly origin: string;
  readonly care: string;
  /** Prints the small-parts caution. */
  readonly smallParts: boolean;
  readonly price: string | null;
  readonly measure: MeasureSystem;
}

const LEFT = 13;
const RIGHT = LABEL_4X6.width - 13;
const WIDTH = RIGHT - LEFT;
const CAUTION = "Not a toy: small parts. Keep from small children.";
const BAR_HEIGHT = toDots(34);
/** Where the serial and the price stand. */
const FOOT_BASELINE = 420;

/** A PDF of 4 x 6 in labels, one a page. */
export async function kitLabelsPdf(labels: readonly KitLabelInput[]): Promise<Buffer> {
  const press = openPress({ title: labels.length === 1 ? `Kit label ${labels[0]?.serial ?? ""}` : `${labels.length} kit labels` });
  for (const label of labels) drawKitLabel(press, label);
  return press.finish();
}

/** Adds one label as a page of its own. Pure black on white, for a thermal printer. */
export function drawKitLabel(press: Press, label: KitLabelInput): void {
  press.startPage(LABEL_4X6);
  const named = drawHead(press, label);
  const floor = drawFoot(press, label);
  const beside = drawPictureAndFacts(press, label, named + 7);
  const fine = fineText(label);
  const fineSize = fittingFine(press, fine, floor - beside);
  const fineHeight = heightOfFine(press, fine, fineSize);
  const listed = drawFabrics(press, label, beside + 6, floor - fineHeight - 5);
  drawFine(press, fine, fineSize, listed + 4, floor);
}

function rule({ doc }: Press, y: number, thickness: number): void {
  doc.rect(LEFT, y, WIDTH, thickness).fill("#000000");
}

/** Shop, kit and colourway; returns the foot of what was written. */
function drawHead(press: Press, label: KitLabelInput): number {
  const line: Style = { face: "strong", size: 9.6 };
  const noteWidth = drawLine(press, label.note, line, RIGHT, 18, { align: "right", width: WIDTH * 0.4 });
  const shopWidth = WIDTH - noteWidth - (noteWidth ? 12 : 0);
  const shopSize = fittingSize(press, label.shopName, line, shopWidth, 1, 7);
  drawLine(press, label.shopName, { ...line, size: shopSize }, LEFT, 18, { width: shopWidth });
  rule(press, 23, 2.4);
  const style: Style = { face: "word-strong", size: 36 };
  let size = fittingSize(press, label.kitName, style, WIDTH, 1, 22);
  const oneLine = textWidth(press, label.kitName, { ...style, size }) <= WIDTH;
  if (!oneLine) size = fittingSize(press, label.kitName, { ...style, size: 22 }, WIDTH, 2, 13);
  const foot = drawParagraph(press, label.kitName, { ...style, size }, LEFT, 28, { width: WIDTH, maxLines: oneLine ? 1 : 2, leading: 1.1 });
  if (!label.colourway) return foot;
  const colourway: Style = { face: "word-strong", size: 15 };
  drawLine(press, label.colourway, { ...colourway, size: fittingSize(press, label.colourway, colourway, WIDTH, 1, 10) }, LEFT, foot + 14, { width: WIDTH });
  return foot + 19;
}

/** Bars, serial, price and QR; returns the height above which everything else must end. */
function drawFoot(press: Press, label: KitLabelInput): number {
  const symbol = qr(label.link);
  const side = symbol.width;
  const qrLeft = toDots(RIGHT) - side;
  const qrTop = toDots(FOOT_BASELINE + 2) - side;
  drawSymbol(press, symbol, qrLeft, qrTop);
  const room = (qrLeft - symbol.quiet) * DOT - LEFT;
  const bars = code128(label.serial, toDots(room + LEFT), BAR_HEIGHT);
  const barsTop = toDots(FOOT_BASELINE - 15) - BAR_HEIGHT;
  if (bars) drawSymbol(press, bars, Math.max(toDots(LEFT), bars.quiet), barsTop);
  const barsRight = bars ? (Math.max(toDots(LEFT), bars.quiet) + bars.width) * DOT : LEFT + room;
  drawSerialAndPrice(press, label, barsRight, (qrLeft - symbol.quiet) * DOT);
  return Math.min(barsTop, qrTop - symbol.quiet) * DOT - 3;
}

/** The serial is never cut: the price gives way, first by moving right, then by shrinking. */
function drawSerialAndPrice(press: Press, label: KitLabelInput, barsRight: number, limit: number): void {
  const serial: Style = { face: "strong", size: 10.6 };
  const size = fittingSize(press, label.serial, serial, limit - LEFT, 1, 5);
  const serialRight = LEFT + drawLine(press, label.serial, { ...serial, size }, LEFT, FOOT_BASELINE, { width: limit - LEFT });
  if (!label.price) return;
  const price: Style = { face: "bold", size: 16 };
  const fitted = { ...price, size: fittingSize(press, label.price, price, limit - serialRight - 8, 1, 7) };
  const right = Math.max(barsRight, serialRight + 8 + textWidth(press, label.price, fitted));
  drawLine(press, label.price, fitted, Math.min(right, limit), FOOT_BASELINE, { align: "right" });
}

function drawPictureAndFacts(press: Press, label: KitLabelInput, top: number): number {
  const side = 84;
  let textLeft = LEFT;
  let foot = top;
  if (label.picture) {
    const box = fitPicture(label.picture, { x: LEFT + 1, y: top + 1, width: side, height: side });
    drawPicture(press, label.picture, box, { as: "ink", lineWidth: 2 * DOT, hatchStep: 10 * DOT, hatchWidth: 3 * DOT, frameWidth: 4 * DOT });
    textLeft = box.x + box.width + 13;
    foot = box.y + box.height + 1;
  }
  const width = RIGHT - textLeft;
  let y = top - 1;
  if (label.finished) {
    y = drawParagraph(press, "finished quilt", { face: "mid", size: 10 }, textLeft, y, { width, leading: 1.2 });
    const size = `${rulerFigure(label.finished.width, label.measure)} \u00d7 ${rulerFigure(label.finished.height, label.measure)} ${rulerUnit(label.measure)}`;
    const style: Style = { face: "bold", size: 19 };
    y = drawParagraph(press, size, { ...style, size: fittingSize(press, size, style, width, 1, 11) }, textLeft, y, { width, maxLines: 1, leading: 1.2 }) + 2;
  }
  const fact: Style = { face: "mid", size: 10 };
  let lines = 4;
  for (const text of label.facts.slice(0, 4)) {
    const options = { width, maxLines: Math.min(2, lines), leading: 1.28 };
    if (lines <= 0) break;
    lines -= Math.round(paragraphHeight(press, text, fact, options) / (10 * 1.28));
    y = drawParagraph(press, text, fact, textLeft, y, options);
  }
  return Math.max(foot, y);
}

/** Each fabric with its lot, its length drawn to one scale and in words; returns the foot of the table. */
function drawFabrics(press: Press, label: KitLabelInput, top: number, floor: number): number {
  const { doc } = press;
  const rows = label.fabrics.length + 1;
  const height = Math.max(9.5, Math.min(15.5, (floor - top) / rows));
  const shown = Math.max(0, Math.min(label.fabrics.length, Math.floor((floor - top + 0.5) / height) - 1));
  const size = Math.min(10.2, height * 0.72);
  const longest = Math.max(1, ...label.fabrics.map((fabric) => fabric.length));
  const columns = { lot: LEFT + WIDTH * 0.34, tape: LEFT + WIDTH * 0.54, tapeWidth: WIDTH * 0.28 };
  rule(press, top, 1.1);
  let y = top;
  for (const fabric of label.fabrics.slice(0, shown)) {
    const baseline = y + height / 2 + size * 0.36;
    drawLine(press, fabric.name, { face: "strong", size }, LEFT, baseline, { width: columns.lot - LEFT - 6 });
    drawLine(press, `lot ${fabric.lot}`, { face: "mid", size }, columns.lot, baseline, { width: columns.tape - columns.lot - 5 });
    const tape = { x: columns.tape, y: y + height * 0.24, width: columns.tapeWidth * (fabric.length / longest), height: height * 0.54 };
    drawTape(press, tape, fabric.hatch);
    drawFigure(press, fabric.length, label.measure, size, baseline);
    y += height;
    doc.rect(LEFT, y, WIDTH, 2 * DOT).fill("#000000");
  }
  const baseline = y + height / 2 + size * 0.36;
  const total = label.fabrics.reduce((sum, fabric) => sum + fabric.length, 0) as Length;
  const figureWidth = drawFigure(press, total, label.measure, size, baseline);
  drawLine(press, closingLine(label, shown), { face: "strong", size }, LEFT, baseline, { width: WIDTH - figureWidth - 8 });
  rule(press, y + height, 1.1);
  return y + height + 1.1;
}

function closingLine(label: KitLabelInput, shown: number): string {
  const left = label.fabrics.length - shown;
  const more = left > 0 ? [`${left} more ${left === 1 ? "fabric" : "fabrics"}`] : [];
  const also = [...more, ...label.alsoInside];
  return also.length ? `and ${also.join(", ")}. Cloth in all` : "Cloth in all";
}

function drawTape(press: Press, tape: Box, hatch: Hatch): void {
  const { doc } = press;
  doc.save();
  doc.rect(tape.x, tape.y, tape.width, tape.height).clip();
  drawHatch(press, hatch, tape, { colour: "#000000", lineWidth: 3 * DOT, step: 10 * DOT });
  doc.restore();
  doc.rect(tape.x, tape.y, tape.width, tape.height).lineWidth(2 * DOT).strokeColor("#000000").stroke();
  // The heavy rule is the cut edge.
  doc.rect(tape.x + tape.width - 1.4, tape.y - 1, 1.4, tape.height + 2).fill("#000000");
}

function drawFigure(press: Press, value: Length, measure: MeasureSystem, size: number, baseline: number): number {
  const { figure, unit } = soldFigure(value, measure);
  const text: Text = [
    { text: figure, face: "bold" },
    { text: ` ${unit}`, face: "mid" },
  ];
  return drawLine(press, text, { face: "bold", size: size + 0.4 }, RIGHT, baseline, { align: "right" });
}

function fineText(label: KitLabelInput): Text[] {
  const made: Text = [
    { text: label.fibre ? `${label.fibre} ` : "", face: "bold" },
    { text: label.origin, face: "mid" },
  ];
  const care: Text = [
    { text: label.care ? `${label.care} ` : "", face: "mid" },
    { text: label.smallParts ? CAUTION : "", face: "bold" },
  ];
  return [made, care].filter((text) => typeof text === "string" || text.some((span) => span.text.trim()));
}

function heightOfFine(press: Press, paragraphs: readonly Text[], size: number): number {
  return paragraphs.reduce((sum: number, text) => sum + paragraphHeight(press, text, { face: "mid", size }, { width: WIDTH, leading: 1.25 }) + 1.5, 0);
}

/** Fibre, origin and cautions are what the law may ask for: they shrink before they are cut. */
function fittingFine(press: Press, paragraphs: readonly Text[], room: number): number {
  for (let size = 8.6; size > 5.6; size -= 0.5) if (heightOfFine(press, paragraphs, size) <= room * 0.42) return size;
  return 5.6;
}

function drawFine(press: Press, paragraphs: readonly Text[], size: number, top: number, floor: number): void {
  let y = top;
  for (const text of paragraphs) {
    const lines = Math.max(1, Math.floor((floor - y + 0.5) / (size * 1.25)));
    y = drawParagraph(press, text, { face: "mid", size }, LEFT, y, { width: WIDTH, leading: 1.25, maxLines: lines }) + 1.5;
  }
}
