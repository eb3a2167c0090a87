import type { PlanBolt } from "../piece/bolt-plan";
import type { BoltLay } from "./bolt-lay";

/** Numbers the counts of several lengths, from none of each to the most of each, with one index. */
export class CountGrid {
  readonly strides: readonly number[];
  readonly size: number;

  constructor(readonly most: readonly number[]) {
    const strides: number[] = [];
    let size = 1;
    for (const each of most) {
      strides.push(size);
      size *= each + 1;
    }
    this.strides = strides;
    this.size = size;
  }

  /** Null when a count is more than the grid holds. */
  indexOf(counts: readonly number[]): number | null {
    return counts.every((count, kind) => count <= (this.most[kind] ?? 0)) ? counts.reduce((sum, count, kind) => sum + count * (this.strides[kind] ?? 0), 0) : null;
  }

  countsOf(index: number): number[] {
    return this.most.map((most, kind) => Math.floor(index / (this.strides[kind] ?? 1)) % (most + 1));
  }

  /** The index of two counts together; null when that is more than the grid holds. */
  sum(a: number, b: number): number | null {
    for (const [kind, most] of this.most.entries()) {
      const stride = this.strides[kind] ?? 1;
      if ((Math.floor(a / stride) % (most + 1)) + (Math.floor(b / stride) % (most + 1)) > most) return null;
    }
    return a + b;
  }
}

export interface LaidBolt {
  readonly bolt: PlanBolt;
  readonly lays: readonly BoltLay[];
}

export interface Cost {
  readonly scrap: number;
  readonly touched: number;
}

export const NO_COST: Cost = { scrap: 0, touched: 0 };

/** Less scrap, then fewer bolts. */
export function isCheaper(a: Cost, b: Cost | null | undefined): boolean {
  return !b || a.scrap < b.scrap || (a.scrap === b.scrap && a.touched < b.touched);
}

export function addCosts(a: Cost, b: Cost): Cost {
  return { scrap: a.scrap + b.scrap, touched: a.touched + b.touched };
}

/**
 * What some bolts together give: for every count in the grid the least (scrap, bolts touched), and which lay of each bolt
 * makes it. Dynamic programming over the bolts, exact; O(bolts × grid × lays of a bolt).
 */
export class BoltTable {
  private readonly scrap: Float64Array;
  private readonly touched: Float64Array;
  /** Per bolt and index, the lay taken of that bolt; -1 where the index cannot be had from the bolts so far. */
  private readonly steps: Int32Array[] = [];

  constructor(
    readonly bolts: readonly LaidBolt[],
    readonly grid: CountGrid,
  ) {
    let scrap = new Float64Array(grid.size).fill(Infinity);
    let touched = new Float64Array(grid.size).fill(Infinity);
    scrap[0] = 0;
    touched[0] = 0;
    for (const { lays } of bolts) {
      const next = { scrap: new Float64Array(grid.size).fill(Infinity), touched: new Float64Array(grid.size).fill(Infinity), step: new Int32Array(grid.size).fill(-1) };
      for (let from = 0; from < grid.size; from += 1) {
        if (scrap[from] !== Infinity) this.extend(from, { scrap: scrap[from] ?? 0, touched: touched[from] ?? 0 }, lays, next);
      }
      ({ scrap, touched } = next);
      this.steps.push(next.step);
    }
    this.scrap = scrap;
    this.touched = touched;
  }

  private extend(from: number, cost: Cost, lays: readonly BoltLay[], next: { scrap: Float64Array; touched: Float64Array; step: Int32Array }): void {
    for (const [at, lay] of lays.entries()) {
      const index = this.grid.sum(from, lay.index);
      if (index === null) continue;
      const better = { scrap: cost.scrap + lay.scrap, touched: cost.touched + (lay.index > 0 ? 1 : 0) };
      if (!isCheaper(better, { scrap: next.scrap[index] ?? Infinity, touched: next.touched[index] ?? Infinity })) continue;
      next.scrap[index] = better.scrap;
      next.touched[index] = better.touched;
      next.step[index] = at;
    }
  }

  /** Null when the bolts cannot give these counts. */
  costOf(counts: readonly number[]): Cost | null {
    const index = this.grid.indexOf(counts);
    if (index === null || this.scrap[index] === Infinity) return null;
    return { scrap: this.scrap[index] ?? 0, touched: this.touched[index] ?? 0 };
  }

  /** The lay of each bolt, in the bolts' order. Throws when the bolts cannot give the counts. */
  laysFor(counts: readonly number[]): BoltLay[] {
    let index = this.grid.indexOf(counts) ?? -1;
    const chosen: BoltLay[] = [];
    for (let bolt = this.bolts.length - 1; bolt >= 0; bolt -= 1) {
      const lay = this.bolts[bolt]?.lays[this.steps[bolt]?.[index] ?? -1];
      if (!lay) throw new Error("More lengths were laid out than the bolts allow.");
      chosen.unshift(lay);
      index -= lay.index;
    }
    return chosen;
  }
}
