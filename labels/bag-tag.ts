import { LABEL_SMALL, openPress, type Press } from "./press/press";
import { drawLine, fittingSize } from "./press/type";
import { drawTagCode, TAG_FLOOR, TAG_LEFT } from "./tag-code";

/** The tag of one bag of a run, while its lengths are being gathered. */
export interface BagTagInput {
  /** The run as the table calls it: "Run 12". */
  readonly run: string;
  readonly kitName: string;
  readonly colourway: string;
  /** Counted from 1. */
  readonly bag: number;
  readonly of: number;
  readonly serial: string;
}

export async function bagTagsPdf(tags: readonly BagTagInput[]): Promise<Buffer> {
  const press = openPress({ title: `Bag tags, ${tags[0]?.run ?? "no run"}` });
  for (const tag of tags) drawBagTag(press, tag);
  return press.finish();
}

/** Adds one 2 1/4 x 1 1/4 in tag as a page of its own. */
export function drawBagTag(press: Press, tag: BagTagInput): void {
  press.startPage(LABEL_SMALL);
  const width = drawTagCode(press, tag.serial) - TAG_LEFT;
  const right = TAG_LEFT + width;
  const bag = drawLine(press, `bag ${tag.bag}`, { face: "bold", size: 17 }, right, 21, { align: "right" });
  drawLine(press, `of ${tag.of}`, { face: "mid", size: 9 }, right, 33, { align: "right" });
  const left = width - bag - 8;
  const style = { face: "word-strong", size: 14 } as const;
  const size = fittingSize(press, tag.kitName, style, left, 1, 9);
  drawLine(press, tag.kitName, { ...style, size }, TAG_LEFT, 19, { width: left });
  drawLine(press, tag.colourway, { face: "word", size: 9.5 }, TAG_LEFT, 32, { width: left });
  drawLine(press, tag.run, { face: "strong", size: 9 }, TAG_LEFT, TAG_FLOOR - 6, { width });
}
