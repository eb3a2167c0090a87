import type { Budget, PlanControl } from "../piece/strip-plan";
import { achievableLength } from "./achievable-length";
import { boundAnyLayout, boundStripCount } from "./bound-bars";
import { diveForLayout } from "./dive-strips";
import { fillByValue, firstFitShelves } from "./fill-greedily";
import { StripFiller } from "./fill-strip";
import { canSimplify, simplifyLayout } from "./simplify-strips";
import { settleByInteger } from "./settle-strips";
import type { Solver } from "./solver";
import { SolverBroken } from "./solver";
import type { Layout, StripGroup } from "./strip-layout";
import { trimLayout } from "./strip-layout";
import type { Relaxation } from "./strip-master";
import { StripMaster } from "./strip-master";
import type { StripProblem } from "./strip-problem";
import { WorkMeter } from "./work-meter";

export interface SearchOutcome {
  readonly layout: Layout;
  /** In along units. */
  readonly stripsBound: number;
  readonly anyLayoutBound: number;
  readonly meter: WorkMeter;
}

/** Dives with one choice taken second-best, at most, after the first (limited discrepancy, Harvey and Ginsberg 1995). */
const DISCREPANCIES = 8;

/** One search for the shortest layout: bounds from below, layouts from above, until they meet or the budget is spent. */
export class StripSearch {
  readonly filler: StripFiller;
  readonly meter: WorkMeter;
  best: Layout;
  bound = 0;
  anyLayoutBound = 0;

  constructor(
    readonly problem: StripProblem,
    readonly solver: Solver,
    budget: Budget,
    control: PlanControl | undefined,
  ) {
    this.filler = new StripFiller(problem);
    this.meter = new WorkMeter(budget, control);
    this.best = startLayout(problem, this.filler);
    const area = problem.kinds.reduce((total, kind) => total + kind.demand * Math.min(...kind.ways.map((way) => way.along * way.across)), 0);
    this.raise(area / problem.width);
    this.anyLayoutBound = this.bound;
  }

  get settled(): boolean {
    return this.best.length <= this.bound;
  }

  /** Raises the bound to the next length that strips can add up to. */
  raise(bound: number): void {
    this.bound = Math.min(this.best.length, Math.max(this.bound, achievableLength(this.problem.heights, bound)));
  }

  offer(strips: readonly StripGroup[]): void {
    const layout = trimLayout(this.problem, strips);
    if (layout && layout.length < this.best.length) this.best = layout;
  }

  async run(): Promise<SearchOutcome> {
    try {
      if (!this.settled) await this.boundFromBelow();
      if ((!this.settled || canSimplify(this)) && !this.meter.stopped) await this.searchStrips();
    } catch (error) {
      // The solver broke: the best layout and the bounds proved so far still hold.
      if (!(error instanceof SolverBroken)) throw error;
    }
    return { layout: this.best, stripsBound: this.bound, anyLayoutBound: this.anyLayoutBound, meter: this.meter };
  }

  private async boundFromBelow(): Promise<void> {
    this.meter.say(0.05, "Finding what no layout can undercut.");
    this.raise(await boundAnyLayout(this.problem, this.solver, this.meter));
    this.anyLayoutBound = this.bound;
  }

  private async searchStrips(): Promise<void> {
    const master = await StripMaster.open(this.problem, this.filler, this.solver, this.meter);
    try {
      for (const group of this.best.groups) master.add(group);
      this.meter.say(0.1, `Finding strips for ${this.problem.kinds.length === 1 ? "one size" : `${this.problem.kinds.length} sizes`}.`);
      const relaxation = await master.relax(this.problem.kinds.map((kind) => kind.demand), []);
      this.raise(relaxation.bound);
      if (!this.settled) await this.shorten(master, relaxation);
      if (canSimplify(this)) {
        this.meter.say(0.95, "Looking for fewer strip widths of the same length.");
        await simplifyLayout(this, relaxation);
      }
    } finally {
      master.dispose();
    }
  }

  private async shorten(master: StripMaster, first: Relaxation): Promise<void> {
    const { problem, meter } = this;
    const demand = problem.kinds.map((kind) => kind.demand);
    this.round(first, master);
    if (this.settled || meter.spent) return;
    await this.countStrips(master);
    this.raise((await master.relax(demand, [])).bound);
    for (let skipped = -1; skipped < DISCREPANCIES && !this.settled && !meter.spent; skipped++) {
      meter.say(0.3 + 0.04 * (skipped + 1), "Rounding to whole strips.");
      await diveForLayout(this, master, skipped);
    }
    if (this.settled || meter.spent) return;
    meter.say(0.7, "Trying to prove the plan or to better it.");
    await settleByInteger(this, master, await master.relax(demand, []));
  }

  /** Whole strips of the relaxation, the rest by value. */
  private round(relaxation: Relaxation, master: StripMaster): void {
    const left = this.problem.kinds.map((kind) => kind.demand);
    const strips: StripGroup[] = [];
    master.pool.forEach((pattern, index) => {
      const times = Math.floor((relaxation.values[index] ?? 0) + 1e-6);
      if (times === 0) return;
      strips.push({ ...pattern, times });
      pattern.counts.forEach((count, kind) => (left[kind] = Math.max(0, (left[kind] ?? 0) - count * times)));
    });
    this.complete(strips, left, relaxation.prices);
  }

  /** Offers the strips together with several greedy fillings of what is left (sequential value correction, Belov and Scheithauer 2007). */
  complete(strips: readonly StripGroup[], left: readonly number[], prices: ArrayLike<number>): void {
    const base = this.problem.kinds.map((kind, index) => Math.max(prices[index] ?? 0, 1e-3 * leastArea(kind.ways) / this.problem.width));
    for (const power of [1, 1.03, 1.1]) {
      const values = base.map((value) => value ** power);
      for (const widestFirst of [false, true]) this.offer([...strips, ...fillByValue(this.problem, this.filler, left, values, widestFirst)]);
    }
  }

  /** Counts the strips that the wide pieces need at the least, and holds the master to it. */
  private async countStrips(master: StripMaster): Promise<void> {
    for (const [level, height] of master.levels.entries()) {
      const members = this.problem.kinds.map((kind) => Math.min(...kind.ways.map((way) => way.along)) >= (this.problem.heights[height] ?? 0));
      master.requireStrips(level, await boundStripCount(this.problem, members, this.filler, this.solver, this.meter));
    }
  }
}

function startLayout(problem: StripProblem, filler: StripFiller): Layout {
  const areas = problem.kinds.map((kind) => leastArea(kind.ways));
  const demand = problem.kinds.map((kind) => kind.demand);
  const candidates = [firstFitShelves(problem), fillByValue(problem, filler, demand, areas, true), fillByValue(problem, filler, demand, areas.map((area) => area ** 1.05), false)];
  const layouts = candidates.map((strips) => trimLayout(problem, strips)).filter((layout) => layout !== null);
  return layouts.reduce((best, layout) => (layout.length < best.length ? layout : best));
}

function leastArea(ways: readonly { along: number; across: number }[]): number {
  return Math.min(...ways.map((way) => way.along * way.across));
}
