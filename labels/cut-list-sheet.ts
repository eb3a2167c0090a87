import type { MeasureSystem } from "@/lib/core/measure/format";
import type { Length } from "@/lib/core/measure/length";
import { PER_METRE, PER_YARD } from "@/lib/core/measure/length";
import { drawHatch } from "./press/hatch";
import { rulerLength, soldLength } from "./press/lengths";
import { openPress } from "./press/press";
import { INK, numberPages, QUIET, ruleAcross, startSheet, type SheetFlow, type SheetPaper } from "./press/sheet-frame";
import { drawLine, fittingSize, textWidth } from "./press/type";

export interface CutListCut {
  readonly length: Length;
  /** "bag 3"; for cloth that is cut away, why: "straighten", "string at 2 yd". */
  readonly goesTo: string;
  readonly purpose: "kit" | "waste";
}

export interface CutListBolt {
  readonly tag: string;
  readonly fabricName: string;
  readonly lot: string;
  readonly shelf: string;
  readonly usableWidth: Length;
  /** On the bolt before the first of these cuts. */
  readonly left: Length;
  /** In cutting order. */
  readonly cuts: readonly CutListCut[];
  /** Measured from today's cut edge. */
  readonly flaws: readonly { readonly startsAt: Length; readonly endsAt: Length }[];
}

/** The bolt-length list of a run; bolts in the order they stand on the shelves. */
export interface CutListInput {
  readonly shopName: string;
  readonly run: string;
  readonly kitName: string;
  readonly colourway: string;
  readonly kits: number;
  /** "1 December, for Thea Rusk" */
  readonly made: string;
  readonly bolts: readonly CutListBolt[];
  readonly measure: MeasureSystem;
  readonly paper: SheetPaper;
}

const COLUMNS = 4;
const ROW = 17;
const TAPE = 13;
const HEAD = 62;

export async function cutListPdf(list: CutListInput): Promise<Buffer> {
  const press = openPress({ title: `Bolt-length list, ${list.run}`, author: list.shopName, countsPages: true });
  const longest = Math.max(1, ...list.bolts.map((bolt) => bolt.left));
  const flow = startSheet(press, list.paper, (page) => {
    drawLine(press, `${list.run}, ${list.kitName}`, { face: "word-strong", size: 13, colour: INK }, page.left, page.y + 11, { width: page.width });
    return drawAxis(page, page.y + 20, longest, list.measure);
  });
  drawListHead(flow, list);
  flow.y = drawAxis(flow, flow.y, longest, list.measure);
  for (const bolt of list.bolts) drawBolt(flow, bolt, longest, list.measure);
  if (!list.bolts.length) drawLine(press, "No bolt is planned for this run.", { face: "text", size: 11, colour: INK }, flow.left, flow.y + 16);
  numberPages(flow, [list.shopName, list.run, list.made].filter(Boolean).join(", "));
  return press.finish();
}

function drawListHead(flow: SheetFlow, list: CutListInput): void {
  const { press, left, width } = flow;
  const style = { face: "word-strong", size: 26, colour: INK } as const;
  const size = fittingSize(press, list.kitName, style, width * 0.6, 1, 15);
  const name = drawLine(press, list.kitName, { ...style, size }, left, flow.y + 22, { width: width * 0.6 });
  drawLine(press, list.colourway, { face: "word-italic", size: 13, colour: INK }, left + name + 10, flow.y + 22, { width: width - name - 10 });
  ruleAcross(flow, flow.y + 30, 2.2);
  const cuts = list.bolts.reduce((sum, bolt) => sum + bolt.cuts.filter((cut) => cut.purpose === "kit").length, 0);
  const said = `${list.run}: ${counted(cuts, "length", "lengths")} from ${counted(list.bolts.length, "bolt", "bolts")} for ${counted(list.kits, "kit", "kits")}. ${list.made}`;
  drawLine(press, said, { face: "strong", size: 10.5, colour: INK }, left, flow.y + 46, { width });
  const how = "Take the bolts in this order. On each tape the core is at the left and the cut edge at the right; cut from the right.";
  drawLine(press, how, { face: "text", size: 9.5, colour: QUIET }, left, flow.y + 60, { width });
  flow.y += 72;
}

function counted(count: number, one: string, many: string): string {
  return `${count} ${count === 1 ? one : many}`;
}

/** The scale shared by every tape on the page. */
function drawAxis({ press, left, width }: SheetFlow, y: number, longest: number, measure: MeasureSystem): number {
  const unit = measure === "metres" ? PER_METRE : PER_YARD;
  const whole = Math.floor(longest / unit);
  const every = Math.max(1, Math.ceil(whole / 12));
  for (let at = 0; at <= whole; at += every) {
    const x = left + (at * unit * width) / longest;
    press.doc.rect(x, y + 11, 0.7, 4).fill(INK);
    const label = at === 0 ? `0 ${measure === "metres" ? "m" : "yd"}` : String(at);
    const align = at === 0 ? "left" : x > left + width - 8 ? "right" : "centre";
    drawLine(press, label, { face: "text", size: 8.5, colour: INK }, x, y + 9, { align });
  }
  press.doc.rect(left, y + 15, width, 0.7).fill(INK);
  return y + 22;
}

function drawBolt(flow: SheetFlow, bolt: CutListBolt, longest: number, measure: MeasureSystem): void {
  flow.need(HEAD + ROW);
  drawBoltHead(flow, bolt, measure);
  drawTape(flow, bolt, longest);
  flow.y += TAPE + 6;
  drawFlaws(flow, bolt, measure);
  drawCuts(flow, bolt, measure);
  flow.y += 5;
  ruleAcross(flow, flow.y, 0.7);
  flow.y += 9;
}

function drawBoltHead(flow: SheetFlow, bolt: CutListBolt, measure: MeasureSystem): void {
  const { press, left, right, width, y } = flow;
  const taken = bolt.cuts.reduce((sum, cut) => sum + cut.length, 0);
  const facts = `${soldLength(bolt.left, measure)} on it, leaves ${soldLength(Math.max(0, bolt.left - taken) as Length, measure)}`;
  const factsWidth = drawLine(press, facts, { face: "strong", size: 10, colour: INK }, right, y + 12, { align: "right", width: width * 0.45 });
  const shelfName = bolt.shelf || "no shelf";
  const shelfStyle = { face: "bold", size: 12, colour: INK } as const;
  const shelf = drawLine(press, shelfName, { ...shelfStyle, size: fittingSize(press, shelfName, shelfStyle, 104, 1, 8) }, left, y + 12, { width: 104 });
  const room = width - factsWidth - shelf - 22;
  const name = drawLine(press, bolt.fabricName, { face: "word-strong", size: 12.5, colour: INK }, left + shelf + 10, y + 12, { width: room * 0.62 });
  const more = `${bolt.tag}, lot ${bolt.lot || "not known"}, ${rulerLength(bolt.usableWidth, measure)} usable`;
  drawLine(press, more, { face: "text", size: 9.5, colour: INK }, left + shelf + name + 18, y + 12, { width: room - name - 12 });
  flow.y += 19;
}

/** Core at the left, cut edge at the right; what is to be cut is dashed, the flaw is crossed. */
function drawTape({ press, left, width, y }: SheetFlow, bolt: CutListBolt, longest: number): void {
  const { doc } = press;
  const scale = width / longest;
  const end = left + bolt.left * scale;
  doc.rect(left, y, bolt.left * scale, TAPE).lineWidth(0.7).strokeColor(INK).stroke();
  let edge = bolt.left as number;
  for (const cut of bolt.cuts) {
    const x = left + Math.max(0, edge - cut.length) * scale;
    const box = { x, y, width: Math.max(0, left + edge * scale - x), height: TAPE };
    if (cut.purpose === "waste") {
      doc.save();
      doc.rect(box.x, box.y, box.width, box.height).clip();
      drawHatch(press, "diagonal", box, { colour: "#777777", lineWidth: 0.6, step: 4 });
      doc.restore();
    }
    doc.moveTo(x, y).lineTo(x, y + TAPE).lineWidth(0.8).dash(2.4, { space: 1.6 }).strokeColor(INK).stroke().undash();
    const said = cut.goesTo.replace(/^bag /, "");
    const style = { face: "strong", size: 8, colour: INK } as const;
    if (cut.purpose === "kit" && textWidth(press, said, style) < box.width - 3) drawLine(press, said, style, x + box.width / 2, y + 9.3, { align: "centre" });
    edge -= cut.length;
  }
  for (const flaw of bolt.flaws) {
    const x = left + Math.max(0, bolt.left - flaw.endsAt) * scale;
    const box = { x, y: y - 2, width: Math.max(2.5, (flaw.endsAt - flaw.startsAt) * scale), height: TAPE + 4 };
    doc.rect(box.x, box.y, box.width, box.height).fillAndStroke("#ffffff", INK);
    doc.save();
    doc.rect(box.x, box.y, box.width, box.height).clip();
    drawHatch(press, "cross", box, { colour: INK, lineWidth: 0.7, step: 3 });
    doc.restore();
  }
  doc.rect(end - 2, y - 2, 2, TAPE + 4).fill(INK);
}

function drawFlaws(flow: SheetFlow, bolt: CutListBolt, measure: MeasureSystem): void {
  for (const flaw of bolt.flaws) {
    const said = `Flaw from ${soldLength(flaw.startsAt, measure)} to ${soldLength(flaw.endsAt, measure)} from today\u2019s cut edge: cut round it.`;
    drawLine(flow.press, said, { face: "bold", size: 9.5, colour: INK }, flow.left, flow.y + 9, { width: flow.width });
    flow.y += 14;
  }
}

/** A box to tick for every length, in cutting order, read along the rows. */
function drawCuts(flow: SheetFlow, bolt: CutListBolt, measure: MeasureSystem): void {
  const { press, left, width } = flow;
  const column = width / COLUMNS;
  bolt.cuts.forEach((cut, index) => {
    if (index % COLUMNS === 0) {
      if (flow.need(ROW + 4) && index > 0) {
        drawLine(press, `${bolt.fabricName}, ${bolt.tag}, continued`, { face: "strong", size: 10, colour: INK }, left, flow.y + 9, { width });
        flow.y += 15;
      }
    }
    const x = left + (index % COLUMNS) * column;
    press.doc.rect(x + 0.5, flow.y + 3, 9.5, 9.5).lineWidth(0.9).strokeColor(INK).stroke();
    const length = drawLine(press, soldLength(cut.length, measure), { face: "bold", size: 10.5, colour: INK }, x + 15, flow.y + 11.5);
    const face = cut.purpose === "kit" ? "mid" : "text";
    const said = cut.purpose === "kit" ? cut.goesTo : `cut away, ${cut.goesTo}`;
    drawLine(press, said, { face, size: 9.5, colour: INK }, x + 15 + length + 7, flow.y + 11.5, { width: column - 28 - length });
    if (index % COLUMNS === COLUMNS - 1 || index === bolt.cuts.length - 1) flow.y += ROW;
  });
}
