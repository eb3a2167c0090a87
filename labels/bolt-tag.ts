import type { MeasureSystem } from "@/lib/core/measure/format";
import type { Length } from "@/lib/core/measure/length";
import { rulerLength } from "./press/lengths";
import { LABEL_SMALL, openPress, type Press } from "./press/press";
import { drawLine, drawParagraph, fittingSize, textWidth } from "./press/type";
import { drawTagCode, TAG_FLOOR, TAG_LEFT } from "./tag-code";

/** The tag that hangs on a bolt, a piece or a remnant. */
export interface BoltTagInput {
  readonly fabricName: string;
  readonly lot: string;
  readonly shelf: string;
  /** Usable width. */
  readonly width: Length;
  /** The tag itself, as it is scanned and typed. */
  readonly code: string;
  /** Small print beside the code, such as the date it was booked in; may be empty. */
  readonly remark: string;
  readonly measure: MeasureSystem;
}

export async function boltTagsPdf(tags: readonly BoltTagInput[]): Promise<Buffer> {
  const press = openPress({ title: tags.length === 1 ? `Bolt tag ${tags[0]?.code ?? ""}` : `${tags.length} bolt tags` });
  for (const tag of tags) drawBoltTag(press, tag);
  return press.finish();
}

/** Adds one 2 1/4 x 1 1/4 in tag as a page of its own. */
export function drawBoltTag(press: Press, tag: BoltTagInput): void {
  press.startPage(LABEL_SMALL);
  const width = drawTagCode(press, tag.code, tag.remark) - TAG_LEFT;
  const shelf = drawShelf(press, tag.shelf, TAG_LEFT + width, width * 0.36);
  const nameWidth = width - (shelf ? shelf + 8 : 0);
  const name = { face: "word-strong", size: 14 } as const;
  const size = fittingSize(press, tag.fabricName, name, nameWidth, 2, 10);
  drawParagraph(press, tag.fabricName, { ...name, size }, TAG_LEFT, 5, { width: nameWidth, maxLines: 2, leading: 1.15 });
  const facts = `lot ${tag.lot || "not known"}, ${rulerLength(tag.width, tag.measure)} wide`;
  drawLine(press, facts, { face: "strong", size: 9 }, TAG_LEFT, TAG_FLOOR - 5, { width });
}

/** The shelf at the top right; a long name shrinks, then takes a second line. Returns the width it took. */
function drawShelf(press: Press, shelf: string, right: number, most: number): number {
  if (!shelf) return 0;
  const style = { face: "bold", size: 12 } as const;
  const size = fittingSize(press, shelf, style, most, 2, 7);
  const width = Math.min(most, textWidth(press, shelf, { ...style, size }));
  drawParagraph(press, shelf, { ...style, size }, right - width, 6, { width: width + 0.1, maxLines: 2, align: "right", leading: 1.2 });
  return width;
}
