import loadHighs from "highs";
import { firstFitShelves } from "@/lib/core/cutting/fill-greedily";
import { createHighsSolver } from "@/lib/core/cutting/highs-solver";
import { planStrips, STRIP_BUDGET } from "@/lib/core/cutting/plan-strips";
import { makeStripProblem } from "@/lib/core/cutting/strip-problem";
import { blanksOfLoad, listLoads, type Lie, PER_UNIT } from "../fixtures/cutting/loads";
import { length } from "@/lib/core/measure/length";
import type { BenchRow } from "./bench-row";

/** Plans of the patchwork loads for 1, 24 and 60 kits: time, gap to the proven bound, and length against plain shelves. */
export async function benchStrips(): Promise<BenchRow[]> {
  const solver = createHighsSolver(() => loadHighs());
  const rows: BenchRow[] = [];
  for (const kits of [1, 24, 60]) {
    for (const lie of ["rotatable", "oriented"] as const) rows.push(...(await benchLoads(kits, lie, solver)));
  }
  return rows;
}

export default benchStrips;

async function benchLoads(kits: number, lie: Lie, solver: ReturnType<typeof createHighsSolver>): Promise<BenchRow[]> {
  const gaps: number[] = [];
  const times: number[] = [];
  const against: number[] = [];
  let optimal = 0;
  let longer = 0;
  for (const load of listLoads("patchwork_synthetic")) {
    const blanks = blanksOfLoad(load, kits, lie);
    const width = length(load.W * PER_UNIT);
    const began = performance.now();
    const plan = await planStrips(blanks, width, STRIP_BUDGET, solver);
    times.push(performance.now() - began);
    if (!plan.ok) throw new Error(plan.fault.message);
    gaps.push(plan.value.length / plan.value.bounds.strips - 1);
    against.push(plan.value.length / shelvesLength(blanks, width));
    if (plan.value.status === "optimal") optimal += 1;
    if (plan.value.length / PER_UNIT > load.best(kits, lie)) longer += 1;
  }
  const name = `patchwork x${kits}, ${lie === "rotatable" ? "turned" : "direction kept"}`;
  return [
    { name: `${name}: gap`, figure: `${percent(mean(gaps))} mean, ${percent(Math.max(...gaps))} max`, ratio: 1 + mean(gaps), note: `${optimal} of ${gaps.length} proved optimal, ${longer} longer than the best listed` },
    { name: `${name}: length`, figure: `${percent(1 - mean(against))} less`, ratio: mean(against), note: "against first-fit decreasing height shelves in the same run" },
    { name: `${name}: time`, figure: `${mean(times).toFixed(0)} ms mean, ${Math.max(...times).toFixed(0)} ms max`, ratio: null, note: "one fabric, solver warm after the first" },
  ];
}

function shelvesLength(blanks: Parameters<typeof makeStripProblem>[0], width: Parameters<typeof makeStripProblem>[1]): number {
  const problem = makeStripProblem(blanks, width);
  return firstFitShelves(problem).reduce((total, strip) => total + strip.times * (problem.heights[strip.height] ?? 0), 0) * problem.alongUnit;
}

function mean(values: readonly number[]): number {
  return values.reduce((total, value) => total + value, 0) / values.length;
}

function percent(share: number): string {
  return `${(100 * share).toFixed(3)} %`;
}
