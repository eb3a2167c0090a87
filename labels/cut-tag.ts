import type { MeasureSystem } from "@/lib/core/measure/format";
import type { Length } from "@/lib/core/measure/length";
import { soldLength } from "./press/lengths";
import { LABEL_SMALL, openPress, type Press } from "./press/press";
import { drawLine, fittingSize } from "./press/type";
import { drawTagCode, TAG_FLOOR, TAG_LEFT } from "./tag-code";

/** The tag pinned to one cut length on its way to a bag or a customer. */
export interface CutTagInput {
  readonly length: Length;
  readonly fabricName: string;
  readonly lot: string;
  /** Where it goes: "bag 3 of run 12", "put by for R. Amadi". */
  readonly goesTo: string;
  readonly code: string;
  readonly measure: MeasureSystem;
}

export async function cutTagsPdf(tags: readonly CutTagInput[]): Promise<Buffer> {
  const press = openPress({ title: tags.length === 1 ? `Cut tag ${tags[0]?.code ?? ""}` : `${tags.length} cut tags` });
  for (const tag of tags) drawCutTag(press, tag);
  return press.finish();
}

/** Adds one 2 1/4 x 1 1/4 in tag as a page of its own. */
export function drawCutTag(press: Press, tag: CutTagInput): void {
  press.startPage(LABEL_SMALL);
  const width = drawTagCode(press, tag.code) - TAG_LEFT;
  const said = soldLength(tag.length, tag.measure);
  const figure = { face: "bold", size: 18 } as const;
  const length = drawLine(press, said, { ...figure, size: fittingSize(press, said, figure, width * 0.6, 1, 11) }, TAG_LEFT, 21);
  drawLine(press, tag.goesTo, { face: "strong", size: 9.5 }, TAG_LEFT + width, 20, { align: "right", width: width - length - 8 });
  const style = { face: "word-strong", size: 13 } as const;
  const size = fittingSize(press, tag.fabricName, style, width, 1, 9);
  drawLine(press, tag.fabricName, { ...style, size }, TAG_LEFT, 36, { width });
  drawLine(press, tag.lot ? `lot ${tag.lot}` : "lot not known", { face: "mid", size: 9 }, TAG_LEFT, TAG_FLOOR - 5, { width });
}
