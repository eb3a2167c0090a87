import type { StripFiller, StripPattern } from "./fill-strip";
import type { LinearProgramme, Solver } from "./solver";
import type { StripProblem } from "./strip-problem";
import type { WorkMeter } from "./work-meter";

/** A reduced cost nearer to zero than this is float noise. */
const NO_GAIN = 1e-7;

export interface Relaxation {
  readonly objective: number;
  /** Strips of each pattern of the pool, fractional. */
  readonly values: Float64Array;
  /** Worth of one piece of each kind. */
  readonly prices: Float64Array;
  /** For each height, its cost less what the rows on numbers of strips pay for one. */
  readonly stripCosts: Float64Array;
  /** A valid bound even where the programme was not priced to its end (Farley 1990). */
  readonly bound: number;
}

/**
 * The set-covering master over strip patterns: least total strip width so that every kind is covered, by column
 * generation (Gilmore and Gomory 1961, 1965). Rows on the number of strips of at least some width can be tightened;
 * they change only what a strip costs, so pricing stays an exact knapsack.
 */
export class StripMaster {
  readonly pool: StripPattern[] = [];
  /** Heights from which on the number of strips is counted, ascending: indices into `problem.heights`. */
  readonly levels: readonly number[];
  private readonly known = new Set<string>();
  private readonly least: number[];

  private constructor(
    private readonly problem: StripProblem,
    private readonly filler: StripFiller,
    private readonly programme: LinearProgramme,
    private readonly meter: WorkMeter,
  ) {
    this.levels = levelsOf(problem);
    this.least = this.levels.map(() => 0);
  }

  static async open(problem: StripProblem, filler: StripFiller, solver: Solver, meter: WorkMeter): Promise<StripMaster> {
    const rows = [
      ...problem.kinds.map((kind) => ({ lower: kind.demand, upper: Infinity })),
      ...levelsOf(problem).map(() => ({ lower: 0, upper: Infinity })),
    ];
    return new StripMaster(problem, filler, await solver.openProgramme(rows), meter);
  }

  /** At least so many strips are as wide as the level's height or wider. */
  requireStrips(level: number, count: number): void {
    this.least[level] = Math.max(this.least[level] ?? 0, count);
    this.programme.setRow(this.problem.kinds.length + level, { lower: this.least[level] ?? 0, upper: Infinity });
  }

  get required(): readonly number[] {
    return this.least;
  }

  add(pattern: StripPattern): boolean {
    const name = `${pattern.height}:${pattern.counts.join(",")}`;
    if (this.known.has(name)) return false;
    this.known.add(name);
    this.pool.push(pattern);
    this.programme.addColumns([{ cost: this.problem.heights[pattern.height] ?? 0, ...this.entries(pattern), lower: 0, upper: Infinity }]);
    this.meter.patterns += 1;
    return true;
  }

  /** Rows and values of a pattern in this master's programme. */
  entries(pattern: StripPattern): { rows: number[]; values: number[] } {
    const rows: number[] = [];
    const values: number[] = [];
    pattern.counts.forEach((count, kind) => {
      if (count === 0) return;
      rows.push(kind);
      values.push(count);
    });
    this.levels.forEach((height, level) => {
      if (pattern.height < height) return;
      rows.push(this.problem.kinds.length + level);
      values.push(1);
    });
    return { rows, values };
  }

  /**
   * Solves for what is still wanted, strips already fixed taken off the required numbers, and prices until nothing is
   * gained, the meter is spent or a person stops.
   */
  async relax(wanted: readonly number[], fixedStrips: readonly number[]): Promise<Relaxation> {
    wanted.forEach((lower, kind) => this.programme.setRow(kind, { lower, upper: Infinity }));
    this.levels.forEach((_, level) => {
      const lower = Math.max(0, (this.least[level] ?? 0) - (fixedStrips[level] ?? 0));
      this.programme.setRow(this.problem.kinds.length + level, { lower, upper: Infinity });
    });
    let bound = 0;
    for (;;) {
      const answer = this.programme.solve();
      this.meter.programmes += 1;
      if (answer.status !== "optimal") throw new Error("The strip master has no answer: a kind fits no pattern of the pool.");
      const prices = answer.duals.slice(0, wanted.length).map((price) => Math.max(0, price));
      const levelPrices = answer.duals.slice(wanted.length).map((price) => Math.max(0, price));
      const stripCosts = this.stripCosts(levelPrices);
      const priced = this.price(wanted, prices, stripCosts, levelPrices, fixedStrips);
      bound = Math.max(bound, priced.bound);
      const spent = await this.meter.pause();
      if (!priced.added || spent) return { objective: answer.objective, values: answer.values, prices, stripCosts, bound };
    }
  }

  dispose(): void {
    this.programme.dispose();
  }

  private stripCosts(levelPrices: Float64Array): Float64Array {
    return Float64Array.from(this.problem.heights, (height, index) =>
      this.levels.reduce((cost, from, level) => (index >= from ? cost - (levelPrices[level] ?? 0) : cost), height),
    );
  }

  /** Adds the best pattern of each height that gains; the bound scales the prices until no pattern gains. */
  private price(wanted: readonly number[], prices: Float64Array, stripCosts: Float64Array, levelPrices: Float64Array, fixedStrips: readonly number[]) {
    let added = false;
    let scale = 1;
    for (let height = 0; height < stripCosts.length; height++) {
      const { value, counts } = this.filler.fill(height, prices, wanted);
      const cost = stripCosts[height] ?? 0;
      const full = this.problem.heights[height] ?? 0;
      // Prices of pieces and of strips shrink together: value and the levels' part must stay within the full cost.
      scale = Math.max(scale, (value + full - cost) / full);
      if (value > cost + NO_GAIN * (1 + full) && this.add({ height, counts })) added = true;
    }
    const worth = wanted.reduce((total, count, kind) => total + count * (prices[kind] ?? 0), 0);
    const paid = this.least.reduce((total, count, level) => total + Math.max(0, count - (fixedStrips[level] ?? 0)) * (levelPrices[level] ?? 0), 0);
    return { added, bound: (worth + paid) / scale };
  }
}

/** The heights some kind needs at the least: below them it cannot lie, so the strips from there up can be counted. */
function levelsOf(problem: StripProblem): number[] {
  const needed = problem.kinds.map((kind) => problem.heights.indexOf(Math.min(...kind.ways.map((way) => way.along))));
  return [...new Set(needed)].sort((a, b) => a - b);
}
