import { code128, DOT, drawSymbol, qr, toDots } from "./barcode";
import { LABEL_SMALL, type Press } from "./press/press";
import { drawLine, textWidth } from "./press/type";

/** Side margin of every 2 1/4 x 1 1/4 in tag, in points. */
export const TAG_LEFT = 9;
export const TAG_RIGHT = LABEL_SMALL.width - 9;
export const TAG_WIDTH = TAG_RIGHT - TAG_LEFT;
/** Text above the bars ends here. */
export const TAG_FLOOR = 54;

const BAR_TOP = toDots(56);
const BAR_HEIGHT = toDots(21);
const CODE_BASELINE = 86;
const SMALL_QR_MODULE = 4;

/** Bars along the foot of a small tag with the code in letters below; a code too long for bars becomes a QR code. Returns the right limit of the text above. */
export function drawTagCode(press: Press, code: string, remark = ""): number {
  const whole = toDots(LABEL_SMALL.width);
  const bars = code128(code, whole, BAR_HEIGHT);
  if (!bars) return drawTagQr(press, code);
  const left = Math.max(toDots(TAG_LEFT), bars.quiet);
  drawSymbol(press, bars, left, BAR_TOP);
  const style = { face: "strong", size: 8 } as const;
  const written = drawLine(press, code, style, left * DOT, CODE_BASELINE, { width: TAG_WIDTH });
  const room = TAG_RIGHT - left * DOT - written - 8;
  if (remark && room > 20) drawLine(press, remark, { face: "mid", size: 7.5 }, TAG_RIGHT, CODE_BASELINE, { align: "right", width: room });
  return TAG_RIGHT;
}

function drawTagQr(press: Press, code: string): number {
  const room = toDots(LABEL_SMALL.height) - toDots(20);
  let symbol = qr(code, SMALL_QR_MODULE);
  for (let dots = SMALL_QR_MODULE - 1; dots >= 1 && symbol.height + symbol.quiet > room; dots -= 1) symbol = qr(code, dots);
  const left = toDots(LABEL_SMALL.width) - symbol.quiet - symbol.width;
  drawSymbol(press, symbol, left, symbol.quiet);
  const size = Math.max(4.5, Math.min(8, (8 * TAG_WIDTH) / textWidth(press, code, { face: "strong", size: 8 })));
  drawLine(press, code, { face: "strong", size }, TAG_LEFT, CODE_BASELINE, { width: TAG_WIDTH });
  return (left - symbol.quiet) * DOT;
}
