import { LABEL_SMALL, openPress, type Press } from "./press/press";
import { drawParagraph, fittingSize, textWidth } from "./press/type";
import { drawTagCode, TAG_LEFT } from "./tag-code";

/** The label on a shelf's edge. */
export interface ShelfLabelInput {
  /** "B 4" */
  readonly shelf: string;
  /** What stands there: "Blues, prints". */
  readonly holds: string;
  readonly code: string;
}

export async function shelfLabelsPdf(labels: readonly ShelfLabelInput[]): Promise<Buffer> {
  const press = openPress({ title: labels.length === 1 ? `Shelf ${labels[0]?.shelf ?? ""}` : `${labels.length} shelf labels` });
  for (const label of labels) drawShelfLabel(press, label);
  return press.finish();
}

/** Adds one 2 1/4 x 1 1/4 in label as a page of its own. */
export function drawShelfLabel(press: Press, label: ShelfLabelInput): void {
  press.startPage(LABEL_SMALL);
  const width = drawTagCode(press, label.code) - TAG_LEFT;
  const style = { face: "word-strong", size: 34 } as const;
  const most = label.holds ? width * 0.6 : width;
  const single = fittingSize(press, label.shelf, style, most, 1, 17);
  const stands = textWidth(press, label.shelf, { ...style, size: single }) <= most;
  const size = stands ? single : fittingSize(press, label.shelf, { ...style, size: 20 }, most, 2, 11);
  const used = Math.min(most, textWidth(press, label.shelf, { ...style, size }));
  drawParagraph(press, label.shelf, { ...style, size }, TAG_LEFT, 6, { width: used + 0.1, maxLines: stands ? 1 : 2, leading: 1.1 });
  if (!label.holds) return;
  const x = TAG_LEFT + used + 10;
  drawParagraph(press, label.holds, { face: "strong", size: 10 }, x, 10, { width: TAG_LEFT + width - x, maxLines: 3, leading: 1.25 });
}
