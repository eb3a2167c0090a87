import type { Length } from "@/lib/core/measure/length";
import type { Blank, Strip, StripPlan } from "@/lib/core/piece/strip-plan";

/** Strips of one width that are sub-cut alike. */
export interface StripGroup {
  readonly width: Length;
  readonly strips: number;
  /** Numbers of the strips on the cut map, from 1. */
  readonly numbers: readonly number[];
  /** What each strip gives, in the order the blanks were given. */
  readonly each: readonly { readonly blank: Blank; readonly count: number }[];
}

/** Groups the strips of a plan in cutting order, so that the list reads "7 strips 3 1/2 in, 12 squares each". */
export function groupStrips(plan: StripPlan, blanks: readonly Blank[]): StripGroup[] {
  const groups = new Map<string, { width: Length; numbers: number[]; each: StripGroup["each"] }>();
  plan.strips.forEach((strip, index) => {
    const each = countBlanks(strip, blanks);
    const key = `${strip.width}|${each.map(({ blank, count }) => `${blank.key}:${count}`).join("|")}`;
    const group = groups.get(key);
    if (group) group.numbers.push(index + 1);
    else groups.set(key, { width: strip.width, numbers: [index + 1], each });
  });
  return [...groups.values()].map((group) => ({ ...group, strips: group.numbers.length }));
}

function countBlanks(strip: Strip, blanks: readonly Blank[]): StripGroup["each"] {
  return blanks
    .map((blank) => ({ blank, count: strip.cuts.filter((cut) => cut.blank === blank.key).length }))
    .filter(({ count }) => count > 0);
}

/** "1 to 7, 9" */
export function numberWords(numbers: readonly number[]): string {
  const runs: [number, number][] = [];
  for (const number of numbers) {
    const last = runs[runs.length - 1];
    if (last && last[1] === number - 1) last[1] = number;
    else runs.push([number, number]);
  }
  return runs.map(([from, to]) => (from === to ? `${from}` : to === from + 1 ? `${from}, ${to}` : `${from} to ${to}`)).join(", ");
}
