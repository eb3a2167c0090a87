import { StripFiller } from "./fill-strip";
import type { Solver, SolverColumn } from "./solver";
import type { StripProblem } from "./strip-problem";
import type { WorkMeter } from "./work-meter";

const NO_GAIN = 1e-7;
/** Rounds of pricing, at most: the bound is valid after any of them. */
const ROUNDS = 300;

/**
 * A length that no layout of any kind undercuts, in along units: every line across the cloth meets pieces that fit
 * side by side, so the pieces sliced into bars must fit a cutting-stock relaxation (Scheithauer 1999). It is never
 * weaker than area or any dual feasible function of the widths. Where pieces may turn, the relaxation chooses.
 */
export async function boundAnyLayout(problem: StripProblem, solver: Solver, meter: WorkMeter): Promise<number> {
  const lying = problem.kinds.flatMap((kind, index) => kind.ways.map((way) => ({ kind: index, ...way })));
  const bars = barProblem(problem, lying);
  const filler = new StripFiller(bars);
  const limits = lying.map((way) => problem.kinds[way.kind]?.demand ?? 0);
  const programme = await solver.openProgramme([
    ...problem.kinds.map((kind) => ({ lower: kind.demand, upper: Infinity })),
    ...lying.map(() => ({ lower: 0, upper: Infinity })),
  ]);
  const count = problem.kinds.length;
  const barColumn = (counts: readonly number[]): SolverColumn => column(1, counts.map((each, way) => [count + way, each] as const));
  try {
    programme.addColumns(lying.map((way, index) => column(0, [[way.kind, 1], [count + index, -way.along]])));
    programme.addColumns(lying.map((way, index) => barColumn(lying.map((_, other) => (other === index ? Math.min(limits[index] ?? 0, Math.floor(problem.width / way.across)) : 0)))));
    let bound = 0;
    for (let round = 0; round < ROUNDS; round++) {
      const answer = programme.solve();
      meter.programmes += 1;
      if (answer.status !== "optimal") break;
      const prices = answer.duals.slice(count).map((price) => Math.max(0, price));
      const { value, counts } = filler.fill(0, prices, limits);
      bound = Math.max(bound, worthOf(problem, lying, prices) / Math.max(1, value));
      if (value <= 1 + NO_GAIN || (await meter.pause())) break;
      programme.addColumns([barColumn(counts)]);
    }
    return bound;
  } finally {
    programme.dispose();
  }
}

/** The least number of strips that hold the kinds named, whatever else lies in them: cutting stock in one dimension. */
export async function boundStripCount(problem: StripProblem, members: readonly boolean[], filler: StripFiller, solver: Solver, meter: WorkMeter): Promise<number> {
  const widest = problem.heights.length - 1;
  const limits = problem.kinds.map((kind, index) => (members[index] ? kind.demand : 0));
  const programme = await solver.openProgramme(limits.map((lower) => ({ lower, upper: Infinity })));
  const stripColumn = (counts: readonly number[]): SolverColumn => column(1, counts.map((each, kind) => [kind, each] as const));
  try {
    for (const [kind, limit] of limits.entries()) {
      if (limit === 0) continue;
      const { counts } = filler.fill(widest, limits.map((_, other) => (other === kind ? 1 : 0)), limits);
      programme.addColumns([stripColumn(counts)]);
    }
    let bound = 0;
    for (let round = 0; round < ROUNDS; round++) {
      const answer = programme.solve();
      meter.programmes += 1;
      if (answer.status !== "optimal") break;
      const prices = answer.duals.map((price) => Math.max(0, price));
      const { value, counts } = filler.fill(widest, prices, limits);
      const worth = limits.reduce((total, limit, kind) => total + limit * (prices[kind] ?? 0), 0);
      bound = Math.max(bound, worth / Math.max(1, value));
      if (value <= 1 + NO_GAIN || (await meter.pause())) break;
      programme.addColumns([stripColumn(counts)]);
    }
    return Math.ceil(bound - 1e-6);
  } finally {
    programme.dispose();
  }
}

interface Lying {
  readonly kind: number;
  readonly along: number;
  readonly across: number;
}

/** Each way of each kind becomes a kind of its own that fits one sort of bar. */
function barProblem(problem: StripProblem, lying: readonly Lying[]): StripProblem {
  return {
    ...problem,
    kinds: lying.map((way) => ({ blanks: [], demand: problem.kinds[way.kind]?.demand ?? 0, ways: [way], endWaste: 0 })),
    heights: [1],
    across: [lying.map((way) => way.across)],
  };
}

/** What the prices prove: each kind is worth at least its cheaper way of lying. */
function worthOf(problem: StripProblem, lying: readonly Lying[], prices: Float64Array): number {
  const cheapest = problem.kinds.map(() => Infinity);
  lying.forEach((way, index) => (cheapest[way.kind] = Math.min(cheapest[way.kind] ?? Infinity, way.along * (prices[index] ?? 0))));
  return problem.kinds.reduce((total, kind, index) => total + kind.demand * (cheapest[index] ?? 0), 0);
}

function column(cost: number, entries: readonly (readonly [number, number])[]): SolverColumn {
  const used = entries.filter(([, value]) => value !== 0);
  return { cost, rows: used.map(([row]) => row), values: used.map(([, value]) => value), lower: 0, upper: Infinity };
}
