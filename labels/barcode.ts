import bwip from "bwip-js/node";
import type { Press } from "./press/press";

/** The label printers' resolution. */
export const DOTS_PER_INCH = 203;
/** One printer dot in points. */
export const DOT = 72 / DOTS_PER_INCH;

/** Dots a module: what hand scanners read from arm's length, and a phone from a hand's breadth. */
const CODE_128_MODULE = 3;
const CODE_128_LEAST_MODULE = 2;
const QR_MODULE = 5;
/** Modules of white on each side that the symbologies ask for (ISO/IEC 15417 and 18004). */
const CODE_128_QUIET = 10;
const QR_QUIET = 4;

/** A symbol measured in whole printer dots, quiet zone not counted. */
export interface BarSymbol {
  readonly kind: "code-128" | "qr";
  readonly width: number;
  readonly height: number;
  readonly quiet: number;
  /** Black rectangles in dots: x, y, width, height. A height of 0 runs the symbol's full height. */
  readonly bars: readonly (readonly [number, number, number, number])[];
}

/** Rounds points to the dot grid. */
export function toDots(points: number): number {
  return Math.round(points / DOT);
}

/**
 * Code 128 of printable ASCII. The module is three dots, or two where three would not fit `room` with the quiet
 * zones; null where two do not fit either.
 *
 * @param room dots, quiet zones included.
 * @param height dots.
 */
export function code128(text: string, room: number, height: number): BarSymbol | null {
  if (!/^[\x20-\x7e]+$/.test(text)) return null;
  const [symbol] = bwip.raw({ bcid: "code128", text });
  if (!symbol || !("sbs" in symbol)) throw new Error("Code 128 came without its bars");
  const modules = symbol.sbs.reduce((sum: number, width: number) => sum + width, 0);
  for (let dots = CODE_128_MODULE; dots >= CODE_128_LEAST_MODULE; dots -= 1) {
    if ((modules + 2 * CODE_128_QUIET) * dots > room) continue;
    return { kind: "code-128", width: modules * dots, height, quiet: CODE_128_QUIET * dots, bars: barsOf(symbol.sbs, dots) };
  }
  return null;
}

function barsOf(widths: readonly number[], dots: number): [number, number, number, number][] {
  const bars: [number, number, number, number][] = [];
  let at = 0;
  widths.forEach((width, i) => {
    if (i % 2 === 0) bars.push([at * dots, 0, width * dots, 0]);
    at += width;
  });
  return bars;
}

/** QR code, error correction M, five dots a module; `dots` may be made smaller where room is short. */
export function qr(text: string, dots = QR_MODULE): BarSymbol {
  const key = `${dots} ${text}`;
  const known = lastCodes.get(key);
  if (known) return known;
  const symbol = makeQr(text, dots);
  if (lastCodes.size >= KEPT_CODES) lastCodes.clear();
  lastCodes.set(key, symbol);
  return symbol;
}

/** Working out a QR code takes longer than setting the rest of a label, and the labels of a run often share one. */
const lastCodes = new Map<string, BarSymbol>();
const KEPT_CODES = 64;

function makeQr(text: string, dots: number): BarSymbol {
  const options = { bcid: "qrcode", text: utf8(text), eclevel: "M" };
  const [symbol] = bwip.raw(options);
  if (!symbol || !("pixs" in symbol)) throw new Error("The QR code came without its modules");
  const side = symbol.pixx;
  const bars: [number, number, number, number][] = [];
  for (let y = 0; y < side; y += 1) {
    let run = 0;
    for (let x = 0; x <= side; x += 1) {
      if (x < side && symbol.pixs[y * side + x] === 1) run += 1;
      else if (run) {
        bars.push([(x - run) * dots, y * dots, run * dots, dots]);
        run = 0;
      }
    }
  }
  return { kind: "qr", width: side * dots, height: side * dots, quiet: QR_QUIET * dots, bars };
}

/** bwip-js takes one byte a character. */
function utf8(text: string): string {
  return Buffer.from(text, "utf8").toString("latin1");
}

/** Draws a symbol with its top left corner on the dot grid; `left` and `top` in dots, quiet zone outside them. */
export function drawSymbol({ doc }: Press, symbol: BarSymbol, left: number, top: number): void {
  for (const [x, y, width, height] of symbol.bars) {
    doc.rect((left + x) * DOT, (top + y) * DOT, width * DOT, (height || symbol.height) * DOT);
  }
  doc.fill("#000000");
}
