import type { StripGroup } from "./strip-layout";
import type { StripMaster } from "./strip-master";
import type { StripSearch } from "./strip-search";

/**
 * Rounds the relaxation step by step, pricing anew for what is left after each step: whole strips are fixed, else the
 * fullest fraction is rounded up. `skipped` names the one step that takes the second choice, -1 for none.
 */
export async function diveForLayout(search: StripSearch, master: StripMaster, skipped: number): Promise<void> {
  const { problem, meter } = search;
  const left = problem.kinds.map((kind) => kind.demand);
  const fixedStrips = master.levels.map(() => 0);
  const strips: StripGroup[] = [];
  for (let step = 0; left.some((count) => count > 0); ) {
    const relaxation = await master.relax(left, fixedStrips);
    const spent = strips.reduce((total, strip) => total + strip.times * (problem.heights[strip.height] ?? 0), 0);
    if (meter.spent || spent + relaxation.bound >= search.best.length - 1e-6) break;
    meter.nodes += 1;
    const whole = wholeStrips(master, relaxation.values);
    const chosen = whole.length > 0 ? whole : fullestFraction(master, relaxation.values, step === skipped ? 1 : 0);
    if (whole.length === 0) {
      if (step === 0 || step === skipped + 1) search.complete(strips, left, relaxation.prices);
      step += 1;
    }
    for (const strip of chosen) {
      strips.push(strip);
      strip.counts.forEach((count, kind) => (left[kind] = Math.max(0, (left[kind] ?? 0) - count * strip.times)));
      master.levels.forEach((height, level) => {
        if (strip.height >= height) fixedStrips[level] = (fixedStrips[level] ?? 0) + strip.times;
      });
    }
  }
  if (left.every((count) => count === 0)) search.offer(strips);
}

function wholeStrips(master: StripMaster, values: Float64Array): StripGroup[] {
  return master.pool.flatMap((pattern, index) => {
    const times = Math.floor((values[index] ?? 0) + 1e-6);
    return times > 0 ? [{ ...pattern, times }] : [];
  });
}

function fullestFraction(master: StripMaster, values: Float64Array, rank: number): StripGroup[] {
  const order = [...master.pool.keys()].filter((index) => (values[index] ?? 0) > 1e-6).sort((a, b) => (values[b] ?? 0) - (values[a] ?? 0) || a - b);
  const pattern = master.pool[order[Math.min(rank, order.length - 1)] ?? 0];
  return pattern ? [{ ...pattern, times: 1 }] : [];
}
