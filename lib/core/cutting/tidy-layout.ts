import { mostOf } from "./fill-strip";
import type { Layout } from "./strip-layout";
import { gather, narrowest } from "./strip-layout";
import type { StripProblem } from "./strip-problem";

/**
 * Makes a layout easier to cut without lengthening it: among the strips of one width, as many as possible get pieces
 * of one size only, the rest are filled again, and strips that become empty fall away.
 */
export function tidyLayout(problem: StripProblem, layout: Layout): Layout {
  const strips: { height: number; counts: readonly number[] }[] = [];
  for (const height of new Set(layout.groups.map((group) => group.height))) {
    const groups = layout.groups.filter((group) => group.height === height);
    const limit = groups.reduce((total, group) => total + group.times, 0);
    const wanted = problem.kinds.map((_, kind) => groups.reduce((total, group) => total + group.times * (group.counts[kind] ?? 0), 0));
    const uniform = fillUniformly(problem, height, wanted, limit);
    const same = groups.flatMap((group) => Array.from({ length: group.times }, () => group.counts));
    const chosen = uniform && mixture(uniform) < mixture(same) ? uniform : same;
    for (const counts of chosen) strips.push({ height: narrowest(problem, counts, height), counts });
  }
  const tidied = gather(problem, strips);
  return tidied.length <= layout.length ? tidied : layout;
}

/** What one more strip width weighs against one more setting of the ruler: it is another stack to keep apart. */
export const WIDTH_WEIGHT = 3;

/**
 * What a layout asks of the cutter: strip widths count most, then the sizes in each strip and the pieces trimmed. Only
 * for comparing layouts of the same pieces.
 */
export function effortOf(problem: StripProblem, layout: Layout): number {
  const widths = new Set(layout.groups.map((group) => group.height)).size;
  return layout.groups.reduce((total, group) => {
    const kinds = group.counts.flatMap((count, kind) => (count > 0 ? [kind] : []));
    const trimmed = kinds.filter((kind) => !problem.kinds[kind]?.ways.some((way) => way.along === problem.heights[group.height] && way.across === problem.across[group.height]?.[kind]));
    return total + group.times * (1 + kinds.length + trimmed.length);
  }, widths * WIDTH_WEIGHT);
}

/** Different sizes summed over the strips, then different strips: the fewer, the less there is to read and to set. */
function mixture(strips: readonly (readonly number[])[]): number {
  const sizes = strips.reduce((total, counts) => total + counts.filter((count) => count > 0).length, 0);
  return sizes * 1000 + new Set(strips.map((counts) => counts.join(","))).size;
}

/** Full strips of one kind as far as the rest still fits the strips left; null when nothing fits. */
function fillUniformly(problem: StripProblem, height: number, wanted: readonly number[], limit: number): number[][] | null {
  const widths = problem.across[height] ?? [];
  const full = problem.kinds.map((kind, index) => mostOf(widths[index] ?? 0, kind.endWaste, wanted[index] ?? 0, problem.width));
  const uniform = full.map((most, kind) => (most > 0 ? Math.floor((wanted[kind] ?? 0) / most) : 0));
  for (;;) {
    const used = uniform.reduce((total, times) => total + times, 0);
    const left = wanted.map((count, kind) => count - (uniform[kind] ?? 0) * (full[kind] ?? 0));
    const rest = firstFit(problem, height, left);
    if (used + rest.length <= limit) {
      const strips = uniform.flatMap((times, kind) => Array.from({ length: times }, () => wanted.map((_, other) => (other === kind ? (full[kind] ?? 0) : 0))));
      return [...strips, ...rest];
    }
    // Give up a strip of the kind that leaves most cloth unused, so that the mixed strips can use it.
    const wasteful = uniform
      .map((times, kind) => ({ kind, times, waste: problem.width - (full[kind] ?? 0) * (widths[kind] ?? 0) }))
      .filter(({ times, waste }) => times > 0 && waste > 0)
      .sort((a, b) => b.waste - a.waste || a.kind - b.kind)[0];
    if (!wasteful) return null;
    uniform[wasteful.kind] = (uniform[wasteful.kind] ?? 1) - 1;
  }
}

function firstFit(problem: StripProblem, height: number, wanted: readonly number[]): number[][] {
  const widths = problem.across[height] ?? [];
  const order = [...wanted.keys()].filter((kind) => (wanted[kind] ?? 0) > 0).sort((a, b) => (widths[b] ?? 0) - (widths[a] ?? 0) || a - b);
  const strips: { counts: number[]; room: number }[] = [];
  for (const kind of order) {
    const across = widths[kind] ?? 0;
    const endWaste = problem.kinds[kind]?.endWaste ?? 0;
    let left = wanted[kind] ?? 0;
    for (let at = 0; left > 0; at++) {
      const strip = (strips[at] ??= { counts: wanted.map(() => 0), room: problem.width });
      const count = mostOf(across, endWaste, left, strip.room);
      if (count === 0) continue;
      strip.counts[kind] = count;
      strip.room -= count * across + endWaste;
      left -= count;
    }
  }
  return strips.map((strip) => strip.counts);
}
