import { A4, LETTER, type Paper, type Press } from "./press";
import { drawLine, type Style } from "./type";

export type SheetPaper = "letter" | "a4";

export const SHEET_PAPERS: Readonly<Record<SheetPaper, Paper>> = { letter: LETTER, a4: A4 };

export const SHEET_MARGIN = 36;
/** Height kept free at the foot of each page. */
export const FOOT_HEIGHT = 30;
export const INK = "#111111";
export const QUIET = "#444444";

/** A cursor going down pages of one paper; `need` opens the next page when a thing does not fit. */
export interface SheetFlow {
  readonly press: Press;
  readonly paper: Paper;
  readonly left: number;
  readonly right: number;
  readonly width: number;
  y: number;
  /** The lowest y that may be drawn on. */
  floor: number;
  /** True when a new page was begun. */
  readonly need: (height: number) => boolean;
  readonly newPage: () => void;
}

/** Starts the first page; `onPage` draws what stands at the head of each page from the second on and returns its foot. */
export function startSheet(press: Press, size: SheetPaper, onPage: (flow: SheetFlow) => number): SheetFlow {
  const paper = SHEET_PAPERS[size];
  const floor = paper.height - SHEET_MARGIN - FOOT_HEIGHT;
  const flow: SheetFlow = {
    press,
    paper,
    left: SHEET_MARGIN,
    right: paper.width - SHEET_MARGIN,
    width: paper.width - 2 * SHEET_MARGIN,
    y: SHEET_MARGIN,
    floor,
    need: (height) => {
      if (flow.y + height <= flow.floor) return false;
      flow.newPage();
      return true;
    },
    newPage: () => {
      press.startPage(paper);
      flow.floor = floor;
      flow.y = SHEET_MARGIN;
      flow.y = onPage(flow);
    },
  };
  press.startPage(paper);
  return flow;
}

/** Writes "page n of N" and a line of words at the foot of every page. */
export function numberPages({ press, left, right, width, paper }: SheetFlow, words: string): void {
  const { doc } = press;
  const { start, count } = doc.bufferedPageRange();
  const style: Style = { face: "text", size: 8.5, colour: INK };
  for (let page = start; page < start + count; page += 1) {
    doc.switchToPage(page);
    const baseline = paper.height - SHEET_MARGIN + 4;
    const number = drawLine(press, `page ${page - start + 1} of ${count}`, style, right, baseline, { align: "right" });
    drawLine(press, words, style, left, baseline, { width: width - number - 24 });
  }
}

export function ruleAcross({ press, left, width }: SheetFlow, y: number, thickness: number, colour = INK): void {
  press.doc.rect(left, y, width, thickness).fill(colour);
}
