import type { MeasureSystem } from "@/lib/core/measure/format";
import type { Length } from "@/lib/core/measure/length";
import { code128, DOT, drawSymbol, qr, toDots, type BarSymbol } from "./barcode";
import { soldLength } from "./press/lengths";
import { openPress, RECEIPT_WIDTH, type Press } from "./press/press";
import { drawLine, drawParagraph, paragraphHeight, textWidth, type Style } from "./press/type";

export interface ReceiptLine {
  readonly name: string;
  /** Cloth has a length; what is counted has a quantity. */
  readonly sold: { readonly kind: "cloth"; readonly length: Length } | { readonly kind: "counted"; readonly quantity: number };
  /** As written: "$12.50 a yard", "$3.20 each". */
  readonly price: string;
  readonly amount: string;
  /** Lot, serial, reduction; may be empty. */
  readonly remark: string;
}

/** A receipt for the 80 mm roll. Sums come written; the words about tax and returns are the shop's own. */
export interface ReceiptInput {
  readonly shopName: string;
  readonly address: readonly string[];
  /** "Receipt", "Return", "Copy of a receipt". */
  readonly heading: string;
  readonly number: string;
  readonly soldAt: string;
  readonly servedBy: string;
  readonly lines: readonly ReceiptLine[];
  readonly subtotal: string;
  readonly taxes: readonly { readonly label: string; readonly amount: string }[];
  readonly total: string;
  readonly tenders: readonly { readonly label: string; readonly amount: string }[];
  readonly change: string | null;
  readonly taxWording: string;
  /** Printed under the totals; the shop's default is `CUT_GOODS_RULE`. */
  readonly returnRule: string;
  readonly thanks: string;
  readonly measure: MeasureSystem;
}

export const CUT_GOODS_RULE = "Cut goods are not returned unless flawed.";

const MARGIN = 12;
const LEFT = MARGIN;
const RIGHT = RECEIPT_WIDTH - MARGIN;
const WIDTH = RIGHT - LEFT;
const BAR_HEIGHT = toDots(30);

/** A part of the receipt that knows its height before the paper is measured off. */
interface Part {
  readonly height: number;
  readonly draw: (top: number) => void;
}

/** One receipt on a page as long as it needs. */
export async function receiptPdf(receipt: ReceiptInput): Promise<Buffer> {
  const press = openPress({ title: `${receipt.heading} ${receipt.number}`, author: receipt.shopName });
  drawReceipt(press, receipt);
  return press.finish();
}

export function drawReceipt(press: Press, receipt: ReceiptInput): void {
  const parts = [...headParts(press, receipt), ...lineParts(press, receipt), ...sumParts(press, receipt), ...footParts(press, receipt)];
  const height = parts.reduce((sum, part) => sum + part.height, 0) + MARGIN * 2;
  press.startPage({ width: RECEIPT_WIDTH, height });
  let top = MARGIN;
  for (const part of parts) {
    part.draw(top);
    top += part.height;
  }
}

function gap(height: number): Part {
  return { height, draw: () => undefined };
}

function rule({ doc }: Press, thickness: number): Part {
  return { height: thickness + 5, draw: (top) => void doc.rect(LEFT, top + 2.5, WIDTH, thickness).fill("#000000") };
}

function block(press: Press, text: string, style: Style, align: "left" | "centre" = "left"): Part {
  if (!text) return gap(0);
  const options = { width: WIDTH, align, leading: 1.25 };
  return { height: paragraphHeight(press, text, style, options), draw: (top) => void drawParagraph(press, text, style, LEFT, top, options) };
}

/** Words at the left, a sum at the right; the words wrap, the sum never does. */
function pair(press: Press, text: string, sum: string, style: Style, sumStyle: Style = style): Part {
  const sumWidth = Math.min(textWidth(press, sum, sumStyle), WIDTH * 0.5);
  const options = { width: WIDTH - sumWidth - 8, leading: 1.25 };
  const height = Math.max(paragraphHeight(press, text, style, options), sumStyle.size * 1.25);
  return {
    height,
    draw: (top) => {
      drawParagraph(press, text, style, LEFT, top, options);
      drawLine(press, sum, sumStyle, RIGHT, top + style.size * 0.98, { align: "right", width: WIDTH * 0.5 });
    },
  };
}

function headParts(press: Press, receipt: ReceiptInput): Part[] {
  const small: Style = { face: "mid", size: 9 };
  return [
    block(press, receipt.shopName, { face: "word-strong", size: 16 }, "centre"),
    gap(2),
    ...receipt.address.map((line) => block(press, line, small, "centre")),
    gap(5),
    rule(press, 2),
    pair(press, `${receipt.heading} ${receipt.number}`, receipt.soldAt, { face: "strong", size: 9 }, small),
    block(press, receipt.servedBy, small),
    rule(press, 0.8),
  ];
}

function lineParts(press: Press, receipt: ReceiptInput): Part[] {
  return receipt.lines.flatMap((line) => {
    const amount = line.sold.kind === "cloth" ? soldLength(line.sold.length, receipt.measure) : String(line.sold.quantity);
    const said = [`${amount} at ${line.price}`, line.remark].filter(Boolean).join(", ");
    return [pair(press, line.name, line.amount, { face: "strong", size: 10 }), block(press, said, { face: "mid", size: 9 }), gap(3)];
  });
}

function sumParts(press: Press, receipt: ReceiptInput): Part[] {
  const style: Style = { face: "mid", size: 9.5 };
  return [
    rule(press, 0.8),
    pair(press, "Before tax", receipt.subtotal, style),
    ...receipt.taxes.map((tax) => pair(press, tax.label, tax.amount, style)),
    gap(2),
    pair(press, "Total", receipt.total, { face: "bold", size: 14 }),
    rule(press, 0.8),
    ...receipt.tenders.map((tender) => pair(press, tender.label, tender.amount, style)),
    ...(receipt.change === null ? [] : [pair(press, "Change", receipt.change, { face: "strong", size: 9.5 })]),
    rule(press, 2),
  ];
}

function footParts(press: Press, receipt: ReceiptInput): Part[] {
  const small: Style = { face: "mid", size: 9 };
  const bars = code128(receipt.number, toDots(RECEIPT_WIDTH), BAR_HEIGHT) ?? qr(receipt.number);
  return [
    gap(2),
    block(press, receipt.returnRule, { face: "strong", size: 9 }),
    block(press, receipt.taxWording, small),
    gap(8),
    symbolPart(press, bars),
    block(press, receipt.number, { face: "strong", size: 9 }, "centre"),
    ...(receipt.thanks ? [gap(6), block(press, receipt.thanks, { face: "word", size: 10.5 }, "centre")] : []),
  ];
}

function symbolPart(press: Press, symbol: BarSymbol): Part {
  const left = Math.round((toDots(RECEIPT_WIDTH) - symbol.width) / 2);
  return { height: symbol.height * DOT + 4, draw: (top) => drawSymbol(press, symbol, left, toDots(top)) };
}
