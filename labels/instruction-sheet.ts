import { openPress } from "./press/press";
import { INK, numberPages, ruleAcross, startSheet } from "./press/sheet-frame";
import { drawLine } from "./press/type";
import { drawCuttingPages } from "./sheet/cutting-pages";
import { drawFrontPage } from "./sheet/front-page";
import { drawSewingPages } from "./sheet/sewing-pages";
import type { InstructionSheetInput } from "./sheet/sheet-input";

/** The printed sheet of a kit on letter or A4: materials, cutting list, cut maps, block and quilt assembly. */
export async function instructionSheetPdf(sheet: InstructionSheetInput): Promise<Buffer> {
  const press = openPress({ title: `${sheet.kitName}, instruction sheet`, language: sheet.language, author: sheet.shopName, countsPages: true });
  const flow = startSheet(press, sheet.paper, (page) => {
    const colourway = drawLine(press, sheet.colourway, { face: "word-italic", size: 10.5, colour: INK }, page.right, page.y + 8, { align: "right", width: page.width * 0.4 });
    drawLine(press, sheet.kitName, { face: "word-strong", size: 10.5, colour: INK }, page.left, page.y + 8, { width: page.width - colourway - 14 });
    ruleAcross(page, page.y + 14, 0.8);
    return page.y + 24;
  });
  drawFrontPage(flow, sheet);
  drawCuttingPages(flow, sheet);
  drawSewingPages(flow, sheet);
  numberPages(flow, [sheet.version, sheet.credit, sheet.shopName, "for your own sewing"].filter(Boolean).join(", "));
  return press.finish();
}
