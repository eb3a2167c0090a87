import { drawPicture, fitPicture } from "../press/picture";
import { rulerFigure, rulerLength, rulerUnit, soldLength } from "../press/lengths";
import { INK, ruleAcross, type SheetFlow } from "../press/sheet-frame";
import { drawLine, drawParagraph, fittingSize, paragraphHeight, type Style, type Text } from "../press/type";
import type { InstructionSheetInput, SheetFabric } from "./sheet-input";
import { drawSwatch } from "./swatch";
import { drawTestMark, TEST_MARK_HEIGHT } from "./test-mark";

const BODY: Style = { face: "text", size: 10, colour: INK };
const PICTURE_WIDTH = 250;
const PICTURE_HEIGHT = 330;

/** Name, quilt, what is in the kit, what to know before beginning, and the test mark. */
export function drawFrontPage(flow: SheetFlow, sheet: InstructionSheetInput): void {
  drawTitle(flow, sheet);
  const top = flow.y;
  const pictureFoot = drawQuilt(flow, sheet, top);
  flow.y = top;
  const turned = drawMaterials(flow, sheet, flow.left + PICTURE_WIDTH + 24, pictureFoot);
  flow.y = (turned ? flow.y : Math.max(flow.y, pictureFoot)) + 14;
  drawBeforeYouBegin(flow, sheet);
  drawMarkAtFoot(flow, sheet);
}

function drawTitle(flow: SheetFlow, sheet: InstructionSheetInput): void {
  const { press, left, width } = flow;
  const style: Style = { face: "word-strong", size: 38, colour: INK };
  const size = fittingSize(press, sheet.kitName, style, width, 2, 18);
  const foot = drawParagraph(press, sheet.kitName, { ...style, size }, left, flow.y - 4, { width, maxLines: 2, leading: 1.12 });
  const under = [sheet.colourway, sheet.shopName].filter(Boolean).join(", from ");
  drawLine(press, under, { face: "word-italic", size: 14, colour: INK }, left, foot + 15, { width });
  ruleAcross(flow, foot + 24, 2.4);
  flow.y = foot + 40;
}

function drawQuilt({ press, left }: SheetFlow, sheet: InstructionSheetInput, top: number): number {
  const box = fitPicture(sheet.quilt, { x: left, y: top, width: PICTURE_WIDTH, height: PICTURE_HEIGHT });
  const fine = sheet.quilt.polygons.length > 900;
  drawPicture(press, sheet.quilt, box, { as: "colour", lineWidth: fine ? 0.2 : 0.35, hatchStep: 3.4, hatchWidth: 0.3, frameWidth: 1.2 });
  const { finished, measure } = sheet;
  const said = `Finished size ${rulerFigure(finished.width, measure)} \u00d7 ${rulerFigure(finished.height, measure)} ${rulerUnit(measure)}`;
  drawLine(press, said, { face: "bold", size: 12, colour: INK }, left, box.y + box.height + 17, { width: PICTURE_WIDTH });
  return box.y + box.height + 22;
}

/** What the kit holds; a list too long for the column runs on over the whole width. Returns whether it turned the page. */
function drawMaterials(flow: SheetFlow, sheet: InstructionSheetInput, x: number, pictureFoot: number): boolean {
  const { press } = flow;
  const column = { x, width: flow.right - x };
  let turned = false;
  const makeRoom = (height: number) => {
    if (flow.need(height)) turned = true;
    if (turned || flow.y > pictureFoot + 10) Object.assign(column, { x: flow.left, width: flow.width });
  };
  drawLine(press, "In this kit", { face: "word-strong", size: 15, colour: INK }, column.x, flow.y + 12);
  flow.y += 20;
  for (const fabric of sheet.fabrics) {
    makeRoom(19);
    drawFabricRow(flow, fabric, sheet, column);
  }
  for (const notion of sheet.notions) {
    makeRoom(17);
    const amount = drawLine(press, notion.amount, { ...BODY, face: "strong" }, column.x + column.width, flow.y + 11, { align: "right", width: column.width * 0.4 });
    drawLine(press, notion.name, { ...BODY, face: "mid" }, column.x, flow.y + 11, { width: column.width - amount - 8 });
    flow.y += 16;
    press.doc.rect(column.x, flow.y, column.width, 0.5).fill("#999999");
  }
  if (!sheet.alsoNeeded.length) return turned;
  flow.y += 8;
  const text: Text = [{ text: "You also need ", face: "bold" }, { text: `${sheet.alsoNeeded.join("; ")}.`, face: "text" }];
  makeRoom(paragraphHeight(press, text, BODY, { width: column.width }));
  flow.y = drawParagraph(press, text, BODY, column.x, flow.y, { width: column.width });
  return turned;
}

function drawFabricRow(flow: SheetFlow, fabric: SheetFabric, sheet: InstructionSheetInput, column: { x: number; width: number }): void {
  const { press } = flow;
  drawSwatch(press, fabric, { x: column.x + 0.5, y: flow.y + 3, width: 19, height: 12 });
  const length = drawLine(press, amountWords(fabric, sheet), { face: "bold", size: 10.5, colour: INK }, column.x + column.width, flow.y + 12.5, { align: "right" });
  const room = column.width - 27 - length - 8;
  const text: Text = [{ text: fabric.name, face: "strong" }, { text: fabric.role ? `, ${fabric.role}` : "", face: "text" }];
  drawLine(press, text, { face: "strong", size: 10.5, colour: INK }, column.x + 26, flow.y + 12.5, { width: room });
  flow.y += 18.5;
  press.doc.rect(column.x, flow.y, column.width, 0.5).fill("#999999");
}

export function amountWords(fabric: SheetFabric, sheet: InstructionSheetInput): string {
  if (sheet.kind === "pre-cut") return "cut to size";
  if (fabric.fits === "fat-quarter") return "1 fat quarter";
  if (fabric.fits === "fat-eighth") return "1 fat eighth";
  return soldLength(fabric.length, sheet.measure);
}

function drawBeforeYouBegin(flow: SheetFlow, sheet: InstructionSheetInput): void {
  const { press, left, width } = flow;
  const wash = sheet.prewash ? "Wash and press the cloth before cutting; the lengths allow for shrinking." : "The lengths do not allow for washing first.";
  const kind = { lengths: "Cut everything before you sew, widest strips first.", "fat-quarters": "Cut everything before you sew, widest strips first.", "pre-cut": "The patches come cut; count them against the list first." }[sheet.kind];
  const text: Text = [
    { text: "Before you begin. ", face: "bold" },
    { text: `Seams are ${rulerLength(sheet.seamAllowance, sheet.measure)}, sewn a thread scant; the cut sizes have them in. Strips are planned on ${rulerLength(sheet.usableWidth, sheet.measure)} of usable width, selvages off. ${wash} ${kind}`, face: "text" },
  ];
  flow.need(paragraphHeight(press, text, BODY, { width, leading: 1.38 }) + 4);
  flow.y = drawParagraph(press, text, BODY, left, flow.y, { width, leading: 1.38 }) + 8;
  drawCautions(flow, sheet);
}

const CAUTIONS =
  "Retract the blade of the rotary cutter after every cut. Cut away from your body, on a self-healing mat, along a gripped ruler. Irons and steam burn. Count pins and needles before you begin and when you end. Keep all of these away from children.";

function drawCautions(flow: SheetFlow, sheet: InstructionSheetInput): void {
  const { press, left, width } = flow;
  const text: Text = [
    { text: "Take care. ", face: "bold" },
    { text: CAUTIONS, face: "text" },
    { text: sheet.smallParts ? " This kit is not a toy: it has small parts." : "", face: "strong" },
  ];
  const options = { width: width - 20, leading: 1.38 };
  const height = paragraphHeight(press, text, BODY, options) + 13;
  flow.need(height);
  press.doc.rect(left + 0.6, flow.y, width - 1.2, height).lineWidth(1.2).strokeColor(INK).stroke();
  drawParagraph(press, text, BODY, left + 10, flow.y + 6, options);
  flow.y += height + 10;
}

function drawMarkAtFoot(flow: SheetFlow, sheet: InstructionSheetInput): void {
  flow.need(TEST_MARK_HEIGHT);
  const y = flow.floor - TEST_MARK_HEIGHT;
  drawTestMark(flow.press, sheet.paper, flow.left + 0.5, y, flow.width);
  flow.y = flow.floor;
}
