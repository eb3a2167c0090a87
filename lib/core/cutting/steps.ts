import type { Length } from "../measure/length";
import type { Blank, Strip, StripPlan, SubCut } from "../piece/strip-plan";
import type { SayLength } from "./blanks";

/** What a blank is called when read aloud; without one it is called by its label. */
export type BlankLabels = ReadonlyMap<string, string>;

/**
 * The plan as sentences for the cutter, equal strips in one: "Cut 12 strips 3 7/8 in. Sub-cut each into 10 squares.
 * Cut each once corner to corner: 240 B."
 *
 * @param blanks those the plan was made for.
 * @param labels names by blank key, where they differ from the blanks' own.
 * @returns one entry a group of equal strips, in cutting order.
 */
export function readAloud(plan: StripPlan, blanks: readonly Blank[], sayLength: SayLength, labels?: BlankLabels): string[] {
  const byKey = new Map(blanks.map((blank) => [blank.key, blank]));
  return groupEqual(plan.strips).map(({ strip, times }) => {
    const parts = partsOf(strip, byKey);
    const name = (blank: Blank) => labels?.get(blank.key) ?? blank.label;
    const sentences = [`Cut ${counted(times, "strip")} ${sayLength(strip.width)} wide.`, ...subCuts(strip, parts, times, sayLength, name)];
    for (const part of parts) sentences.push(...laterCuts(part, times, name, parts.length > 1));
    return sentences.join(" ");
  });
}

/** Pieces of one blank that lie side by side in a strip. */
interface Part {
  readonly blank: Blank;
  readonly cut: SubCut;
  readonly count: number;
}

/** Strips are equal when the same pieces lie at the same places. */
function groupEqual(strips: readonly Strip[]): { strip: Strip; times: number }[] {
  const groups: { strip: Strip; name: string; times: number }[] = [];
  for (const strip of strips) {
    const name = `${strip.width}:${strip.cuts.map((cut) => `${cut.blank}@${cut.at}${cut.turned ? "t" : ""}`).join(",")}`;
    const last = groups.at(-1);
    if (last?.name === name) last.times += 1;
    else groups.push({ strip, name, times: 1 });
  }
  return groups;
}

function partsOf(strip: Strip, blanks: ReadonlyMap<string, Blank>): Part[] {
  const parts: { blank: Blank; cut: SubCut; count: number }[] = [];
  for (const cut of strip.cuts) {
    const blank = blanks.get(cut.blank);
    if (!blank) throw new Error(`The plan holds ${cut.blank}, which is none of the blanks.`);
    const last = parts.at(-1);
    if (last?.blank === blank && last.cut.turned === cut.turned) last.count += 1;
    else parts.push({ blank, cut, count: 1 });
  }
  return parts;
}

function subCuts(strip: Strip, parts: readonly Part[], times: number, sayLength: SayLength, name: (blank: Blank) => string): string[] {
  const each = times > 1 ? "each" : "it";
  const only = parts[0];
  if (parts.length === 1 && only) {
    if (only.blank.mark === "long") return [only.count > 1 ? `Sub-cut ${each} into ${only.count} lengths of ${sayLength(only.cut.across)}.` : `Keep ${each} ${sayLength(only.cut.across)} long.`];
    if (only.blank.mark === "slant") return [`Sub-cut ${each} at an angle into ${only.count}, ${sayLength(only.cut.across)} apart along the strip${trimmed(only, strip.width, sayLength)}.`];
    return [`Sub-cut ${each} into ${only.count} ${shape(only, sayLength, strip.width)}${trimmed(only, strip.width, sayLength)}.`];
  }
  const list = parts.map((part) => `${part.count} ${name(part.blank)}: ${words(part, sayLength)}${trimmed(part, strip.width, sayLength)}`);
  return [`Sub-cut ${each} from the near selvage into ${list.join("; then ")}.`];
}

function words(part: Part, sayLength: SayLength): string {
  if (part.blank.mark === "slant") return `at an angle, ${sayLength(part.cut.across)} apart along the strip`;
  if (part.blank.mark === "long") return `length ${sayLength(part.cut.across)}`;
  return shape(part, sayLength, null);
}

/** In a strip of its own width a square needs no measure: the strip gives it. */
function shape(part: Part, sayLength: SayLength, stripWidth: Length | null): string {
  const { across, along } = part.cut;
  const many = part.count > 1 ? "s" : "";
  if (across === along) return across === stripWidth ? `square${many}` : `square${many} ${sayLength(across)}`;
  return along === stripWidth ? `rectangle${many} ${sayLength(across)} long` : `rectangle${many} ${sayLength(across)} along the strip by ${sayLength(along)}`;
}

function trimmed(part: Part, stripWidth: Length, sayLength: SayLength): string {
  return part.cut.along < stripWidth ? `, trimmed to ${sayLength(part.cut.along)}` : "";
}

/** What is still to be cut out of the rectangles, and how many patches that gives. */
function laterCuts(part: Part, times: number, name: (blank: Blank) => string, several: boolean): string[] {
  const patches = `${part.count * times * part.blank.gives} ${name(part.blank)}`;
  const what = several ? `the pieces for ${name(part.blank)}` : "each";
  switch (part.blank.mark) {
    case "diagonal":
      return [`Cut ${what} once corner to corner: ${patches}.`];
    case "both-diagonals":
      return [`Cut ${what} twice corner to corner: ${patches}.`];
    case "template":
      return [`Cut ${what} by the template: ${patches}.`];
    case "plain":
    case "slant":
    case "long":
      return several ? [] : [`This gives ${patches}.`];
  }
}

function counted(count: number, word: string): string {
  return `${count} ${word}${count === 1 ? "" : "s"}`;
}
