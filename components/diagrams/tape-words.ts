import { wordsOfLength } from "@/lib/core/measure/format";
import { listed } from "./ink";
import type { TapeProps } from "./tape-props";

/** What a bolt's tape shows, as a sentence for those who do not see it. */
export function tapeSentence({ name, putUp, left, reserved = [], flaws = [], lowMark, cutNow, system }: TapeProps): string {
  const say = (units: number) => wordsOfLength(units, system);
  const held = reserved.reduce((total, band) => total + band.to - band.from, 0);
  const names = listed([...new Set(reserved.map((band) => band.label).filter((label) => label !== ""))]);
  const parts = [
    left > 0 ? `${say(left)} on the bolt` : "nothing left on the bolt",
    putUp > left ? `of ${say(putUp)} put up` : "",
    held > 0 ? `${say(held)} reserved${names ? ` for ${names}` : ""}` : "",
    ...flaws.map((flaw) => `a flaw from ${say(flaw.from)} to ${say(flaw.to)} from the core`),
    cutNow ? `to cut now ${say(cutNow.to - cutNow.from)}, which leaves ${stays(left, cutNow, say)}` : "",
    lowMark ? `the low mark is ${say(lowMark)}` : "",
  ].filter(Boolean);
  return `${name ? `${name}: ` : ""}${parts.join("; ")}.`;
}

function stays(left: number, cut: { readonly from: number; readonly to: number }, say: (units: number) => string): string {
  const rest = left - (cut.to - cut.from);
  return rest > 0 ? say(rest) : "nothing";
}

