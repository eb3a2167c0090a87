import type { CutPiece } from "@/lib/core/piece/cut-piece";
import { rulerLength } from "../press/lengths";
import { INK, QUIET, ruleAcross, type SheetFlow } from "../press/sheet-frame";
import { drawLine, drawParagraph, paragraphHeight, type Style } from "../press/type";
import { cutMapHeight, cutMapWidth, drawCutMap } from "./cut-map";
import { amountWords } from "./front-page";
import { afterCutting, blankWords } from "./method-words";
import { drawPatchRow, PATCH_ROW, patchesPerRow, type PatchRoom } from "./patch-pictures";
import type { InstructionSheetInput, SheetFabric } from "./sheet-input";
import { groupStrips, numberWords, type StripGroup } from "./strip-groups";
import { drawSwatch } from "./swatch";

const BODY: Style = { face: "text", size: 9.5, colour: INK };
const HEAD_HEIGHT = 24;

/** Fabric by fabric: strips and sub-cuts, where they lie on the cloth, and a picture of every patch. */
export function drawCuttingPages(flow: SheetFlow, sheet: InstructionSheetInput): void {
  const cut = sheet.fabrics.filter((fabric) => fabric.pieces.length || fabric.layout || fabric.remarks.length);
  if (!cut.length) return;
  flow.newPage();
  const { press, left, width } = flow;
  drawLine(press, sheet.kind === "pre-cut" ? "The patches" : "Cutting", { face: "word-strong", size: 22, colour: INK }, left, flow.y + 18);
  flow.y += 28;
  const how = "Strips run across the width, from selvage to selvage. Sizes are what the ruler reads; where the exact size lies between its marks it stands beside. On the patch pictures the solid line is cut and the dashed line is sewn.";
  flow.y = drawParagraph(press, how, { ...BODY, colour: QUIET }, left, flow.y, { width, leading: 1.35 }) + 8;
  for (const fabric of cut) drawFabric(flow, sheet, fabric);
}

function drawFabric(flow: SheetFlow, sheet: InstructionSheetInput, fabric: SheetFabric): void {
  const groups = fabric.layout ? groupStrips(fabric.layout.plan, fabric.layout.blanks) : [];
  const map = fabric.layout ? cutMapHeight(fabric.layout.plan, fabric.length, flow.width) : 0;
  const patches = patchesOf(fabric).length && !besideMap(flow, fabric, map) ? PATCH_ROW : 0;
  // A fabric is kept whole where a page can hold it, so that list, map and pictures are read together.
  const whole = HEAD_HEIGHT + (groups.length + 1) * 16 + map + patches;
  flow.need(Math.min(whole, (flow.floor - 100) * 0.75));
  drawFabricHead(flow, sheet, fabric);
  drawStripTable(flow, sheet, fabric, groups);
  for (const remark of fabric.remarks) {
    flow.need(paragraphHeight(flow.press, remark, BODY, { width: flow.width }) + 2);
    flow.y = drawParagraph(flow.press, remark, BODY, flow.left, flow.y + 2, { width: flow.width }) + 2;
  }
  const beside = besideMap(flow, fabric, map);
  if (fabric.layout) {
    flow.need(map + 8);
    const pieces = new Map(fabric.pieces.map((piece) => [piece.key, piece]));
    const room = { x: flow.left, y: flow.y + 8, width: flow.width };
    const top = flow.y + 4;
    const foot = drawCutMap(flow.press, fabric.layout.plan, fabric.layout.blanks, pieces, fabric.length, sheet.measure, room);
    flow.y = beside ? Math.max(foot, drawPatchRows(flow, sheet, fabric, { ...beside, y: top })) : foot;
  }
  drawPatches(flow, sheet, fabric, beside === null);
  flow.y += 8;
}

/** The column right of the cut map, where all the patch pictures fit into it; else null. */
function besideMap(flow: SheetFlow, fabric: SheetFabric, mapHeight: number): { readonly x: number; readonly width: number } | null {
  if (!fabric.layout) return null;
  const x = flow.left + Math.max(270, cutMapWidth(fabric.layout.plan, fabric.length, flow.width) + 20);
  const width = flow.right - x;
  const count = patchesOf(fabric).length;
  if (width < 168 || Math.ceil(count / patchesPerRow(width)) * PATCH_ROW > Math.max(mapHeight, PATCH_ROW * 2)) return null;
  return { x, width };
}

function patchesOf(fabric: SheetFabric): readonly CutPiece[] {
  return fabric.pieces.filter((piece) => piece.method.kind !== "long-strip");
}

function drawFabricHead(flow: SheetFlow, sheet: InstructionSheetInput, fabric: SheetFabric): void {
  const { press, left, right, width } = flow;
  drawSwatch(press, fabric, { x: left + 0.5, y: flow.y + 2, width: 22, height: 14 });
  const amount = drawLine(press, amountWords(fabric, sheet), { face: "bold", size: 11, colour: INK }, right, flow.y + 14, { align: "right" });
  drawLine(press, fabric.name, { face: "word-strong", size: 14, colour: INK }, left + 30, flow.y + 14, { width: width - 42 - amount });
  flow.y += 20;
  ruleAcross(flow, flow.y, 1.2);
  flow.y += 4;
}

/** Columns: strips, sub-cuts from each, what they become, patches. */
function drawStripTable(flow: SheetFlow, sheet: InstructionSheetInput, fabric: SheetFabric, groups: readonly StripGroup[]): void {
  const { press, left, right } = flow;
  const pieces = new Map(fabric.pieces.map((piece) => [piece.key, piece]));
  const usableWidth = fabric.layout?.plan.usableWidth ?? sheet.usableWidth;
  const columns = { numbers: left + 92, each: left + 168, becomes: left + 330 };
  if (groups.length) {
    const style: Style = { face: "text", size: 8.5, colour: QUIET };
    drawLine(press, "Strips", style, left, flow.y + 9);
    drawLine(press, "on the map", style, columns.numbers, flow.y + 9);
    drawLine(press, "Sub-cut from each", style, columns.each, flow.y + 9);
    drawLine(press, "Then", style, columns.becomes, flow.y + 9);
    drawLine(press, "Patches", style, right, flow.y + 9, { align: "right" });
    flow.y += 13;
  }
  for (const group of groups) {
    const lines = Math.max(1, group.each.length);
    flow.need(lines * 13 + 4);
    const first = flow.y + 10.5;
    drawLine(press, `${group.strips} of ${rulerLength(group.width, sheet.measure)}`, { face: "strong", size: 10, colour: INK }, left, first, { width: 88 });
    drawLine(press, numberWords(group.numbers), BODY, columns.numbers, first, { width: 70 });
    group.each.forEach(({ blank, count }, i) => {
      const piece = pieces.get(blank.pieceKey);
      const baseline = first + i * 13;
      drawLine(press, piece ? blankWords(piece, blank, count, usableWidth, sheet.measure) : `${count} ${blank.label}`, BODY, columns.each, baseline, { width: 156 });
      const patches = drawLine(press, patchWords(piece, blank.label, group.strips * count * blank.gives), { face: "bold", size: 10, colour: INK }, right, baseline, { align: "right" });
      drawLine(press, piece ? afterCutting(piece) : "", BODY, columns.becomes, baseline, { width: right - columns.becomes - patches - 6 });
    });
    flow.y += lines * 13 + 3;
    press.doc.rect(left, flow.y, flow.width, 0.5).fill("#999999");
  }
}

function patchWords(piece: CutPiece | undefined, label: string, patches: number): string {
  if (piece?.method.kind === "long-strip") return piece.letter;
  return `${patches} ${piece?.letter ?? label}`;
}

function drawPatchRows(flow: SheetFlow, sheet: InstructionSheetInput, fabric: SheetFabric, room: PatchRoom): number {
  const pieces = patchesOf(fabric);
  const across = patchesPerRow(room.width);
  let y = room.y;
  for (let at = 0; at < pieces.length; at += across) y = drawPatchRow(flow.press, pieces.slice(at, at + across), pieces, sheet.measure, { ...room, y });
  return y;
}

function drawPatches(flow: SheetFlow, sheet: InstructionSheetInput, fabric: SheetFabric, pictures: boolean): void {
  const drawn = pictures ? patchesOf(fabric) : [];
  const across = patchesPerRow(flow.width);
  for (let at = 0; at < drawn.length; at += across) {
    flow.need(PATCH_ROW);
    flow.y = drawPatchRow(flow.press, drawn.slice(at, at + across), drawn, sheet.measure, { x: flow.left, y: flow.y, width: flow.width });
  }
  for (const piece of fabric.pieces) if (piece.method.kind === "long-strip") drawLongPiece(flow, piece, sheet);
}

function drawLongPiece(flow: SheetFlow, piece: CutPiece, sheet: InstructionSheetInput): void {
  const text = [
    { text: `${piece.letter}. `, face: "bold" },
    { text: longWords(piece, sheet), face: "text" },
  ] as const;
  flow.need(paragraphHeight(flow.press, text, BODY, { width: flow.width }) + 4);
  flow.y = drawParagraph(flow.press, text, BODY, flow.left, flow.y + 3, { width: flow.width }) + 2;
}

function longWords(piece: CutPiece, sheet: InstructionSheetInput): string {
  if (piece.method.kind !== "long-strip") return "";
  const { width, needed, join } = piece.method;
  const note = piece.note ? ` ${piece.note}` : "";
  return `${rulerLength(needed, sheet.measure)} in all of strips ${rulerLength(width.ruler, sheet.measure)} wide, joined ${join === "bias" ? "on the bias" : "straight"}.${note}`;
}
