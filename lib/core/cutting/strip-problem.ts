import type { Length } from "../measure/length";
import type { Blank } from "../piece/strip-plan";

/** Pieces that are cut alike, whichever blanks they belong to. */
export interface Kind {
  readonly blanks: readonly Blank[];
  readonly demand: number;
  /** How it may lie: as drawn, and turned where that is allowed and fits. In units of the problem. */
  readonly ways: readonly { readonly along: number; readonly across: number }[];
  /** Lost once in each strip that holds any of it, in across units. */
  readonly endWaste: number;
}

/**
 * Blanks made ready for search. Lengths are divided by their common divisor, so that inches and metres cost the same:
 * `acrossUnit` and `alongUnit` are those divisors in 1/160 mm.
 */
export interface StripProblem {
  readonly acrossUnit: number;
  readonly alongUnit: number;
  /** Usable width in across units, rounded down: no sum of pieces falls between. */
  readonly width: number;
  readonly kinds: readonly Kind[];
  /** Strip widths worth cutting, ascending, in along units: a strip is as wide as its widest piece. */
  readonly heights: readonly number[];
  /** `across[height][kind]`: least room the kind takes in such a strip, 0 where it does not fit. */
  readonly across: readonly (readonly number[])[];
}

/** Merges equal blanks, keeps the ways that fit, and scales. Blanks with no way to lie must be refused before. */
export function makeStripProblem(blanks: readonly Blank[], usableWidth: Length): StripProblem {
  const groups = groupAlike(blanks.filter((blank) => blank.count > 0), usableWidth);
  const ways = groups.map((group) => waysToLie(group[0], usableWidth));
  const acrossUnit = ways.flat().reduce((unit, way) => divisor(unit, way.across), groups.reduce((unit, [first]) => divisor(unit, first.endWaste), 0)) || 1;
  const alongUnit = ways.flat().reduce((unit, way) => divisor(unit, way.along), 0) || 1;
  const kinds = groups.map((group, index): Kind => ({
    blanks: group,
    demand: group.reduce((total, blank) => total + blank.count, 0),
    ways: (ways[index] ?? []).map((way) => ({ along: way.along / alongUnit, across: way.across / acrossUnit })),
    endWaste: group[0].endWaste / acrossUnit,
  }));
  const heights = [...new Set(kinds.flatMap((kind) => kind.ways.map((way) => way.along)))].sort((a, b) => a - b);
  const across = heights.map((height) => kinds.map((kind) => leastAcross(kind, height)));
  return { acrossUnit, alongUnit, width: Math.floor(usableWidth / acrossUnit), kinds, heights, across };
}

/** The ways a blank may lie within the width, as drawn first. Empty when it is too wide. */
export function waysToLie(blank: Blank, usableWidth: Length): { along: number; across: number }[] {
  const ways = [{ along: blank.along as number, across: blank.across as number }];
  // A strip cut at an angle cannot be turned: its sub-cuts follow the strip.
  if (blank.mayTurn && blank.endWaste === 0 && blank.along !== blank.across) {
    ways.push({ along: blank.across, across: blank.along });
  }
  return ways.filter((way) => way.across + blank.endWaste <= usableWidth);
}

type Group = [Blank, ...Blank[]];

/** Equal rectangles that may lie the same ways; angled strips stay apart, for each has slanting ends of its own. */
function groupAlike(blanks: readonly Blank[], usableWidth: Length): Group[] {
  const groups = new Map<string, Group>();
  for (const blank of blanks) {
    const ways = waysToLie(blank, usableWidth).map((way) => `${way.along}x${way.across}`);
    const name = blank.endWaste > 0 ? `angled ${blank.key}` : ways.sort().join(" or ");
    const group = groups.get(name);
    if (group) group.push(blank);
    else groups.set(name, [blank]);
  }
  return [...groups.values()];
}

function leastAcross(kind: Kind, height: number): number {
  const fitting = kind.ways.filter((way) => way.along <= height).map((way) => way.across);
  return fitting.length === 0 ? 0 : Math.min(...fitting);
}

function divisor(a: number, b: number): number {
  while (b !== 0) [a, b] = [b, a % b];
  return a;
}
