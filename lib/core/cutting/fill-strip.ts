import type { StripProblem } from "./strip-problem";

/** What one strip holds: pieces of each kind in a strip of `heights[height]`. */
export interface StripPattern {
  readonly height: number;
  readonly counts: readonly number[];
}

export interface FilledStrip {
  readonly value: number;
  readonly counts: number[];
}

/**
 * Fills one strip with the most valuable pieces: an exact bounded knapsack over the reachable sums of widths (normal
 * positions, Herz 1972), O(positions x kinds x pieces a strip). A kind with slanting ends pays for them once.
 */
export class StripFiller {
  /** Reachable sums of widths, ascending; the last stands for the whole width. */
  private readonly positions: Int32Array;
  /** For a room in units, the index of the largest reachable sum that fits it. */
  private readonly under: Int32Array;
  private readonly best: Float64Array[];
  private readonly chosen: Uint16Array[];

  constructor(private readonly problem: StripProblem) {
    const reachable = reachableSums(problem);
    this.positions = reachable.positions;
    this.under = reachable.under;
    this.best = Array.from({ length: problem.kinds.length + 1 }, () => new Float64Array(this.positions.length));
    this.chosen = problem.kinds.map(() => new Uint16Array(this.positions.length));
  }

  /** The best filling of a strip of the given height when each kind is worth `values` and no more than `limits` are wanted. */
  fill(height: number, values: ArrayLike<number>, limits: ArrayLike<number>): FilledStrip {
    this.tabulate(height, values, limits);
    return this.readBest(height);
  }

  /**
   * Every filling to which nothing can be added, worth at least `least`, found by depth-first search bounded by the
   * knapsack's own tables. Null when there are more than `most`.
   */
  fillings(height: number, values: ArrayLike<number>, limits: ArrayLike<number>, least: number, most: number): number[][] | null {
    this.tabulate(height, values, limits);
    const widths = this.problem.across[height] ?? [];
    const { kinds, width } = this.problem;
    const found: number[][] = [];
    const counts = new Array<number>(kinds.length).fill(0);
    let visited = 0;
    const search = (kind: number, room: number, needed: number): boolean => {
      if (++visited > most * 200) return false;
      if (kind < 0) {
        if (canTakeMore(counts, widths, limits, kinds, room)) return true;
        found.push([...counts]);
        return found.length <= most;
      }
      const across = widths[kind] ?? 0;
      const value = values[kind] ?? 0;
      const endWaste = kinds[kind]?.endWaste ?? 0;
      const below = this.best[kind] as Float64Array;
      for (let count = mostOf(across, endWaste, limits[kind] ?? 0, room); count >= 0; count--) {
        const left = room - count * across - (count > 0 ? endWaste : 0);
        const still = needed - count * value;
        if ((below[this.under[left] ?? 0] ?? 0) < still - 1e-9) continue;
        counts[kind] = count;
        if (!search(kind - 1, left, still)) return false;
      }
      counts[kind] = 0;
      return true;
    };
    return search(kinds.length - 1, width, least) ? found : null;
  }

  private tabulate(height: number, values: ArrayLike<number>, limits: ArrayLike<number>): void {
    const widths = this.problem.across[height] ?? [];
    this.problem.kinds.forEach((kind, index) => {
      const before = this.best[index] as Float64Array;
      const after = this.best[index + 1] as Float64Array;
      const chosen = this.chosen[index] as Uint16Array;
      const value = values[index] ?? 0;
      const across = widths[index] ?? 0;
      const limit = value > 0 ? mostOf(across, kind.endWaste, limits[index] ?? 0, this.problem.width) : 0;
      after.set(before);
      chosen.fill(0);
      if (limit > 0) this.addKind(before, after, chosen, value, across, kind.endWaste, limit);
    });
  }

  private addKind(before: Float64Array, after: Float64Array, chosen: Uint16Array, value: number, across: number, endWaste: number, limit: number): void {
    const { positions, under } = this;
    for (let place = 0; place < positions.length; place++) {
      const room = (positions[place] as number) - endWaste;
      let best = after[place] as number;
      let count = 0;
      for (let tried = 1; tried <= limit && tried * across <= room; tried++) {
        const worth = (before[under[room - tried * across] as number] as number) + tried * value;
        if (worth > best + 1e-12) {
          best = worth;
          count = tried;
        }
      }
      after[place] = best;
      chosen[place] = count;
    }
  }

  private readBest(height: number): FilledStrip {
    const widths = this.problem.across[height] ?? [];
    const counts = new Array<number>(this.problem.kinds.length).fill(0);
    let place = this.positions.length - 1;
    const value = this.best[counts.length]?.[place] ?? 0;
    for (let kind = counts.length - 1; kind >= 0; kind--) {
      const count = this.chosen[kind]?.[place] ?? 0;
      if (count === 0) continue;
      counts[kind] = count;
      const taken = count * (widths[kind] ?? 0) + (this.problem.kinds[kind]?.endWaste ?? 0);
      place = this.under[(this.positions[place] as number) - taken] as number;
    }
    return { value, counts };
  }
}

/** How many of a kind one strip can hold. */
export function mostOf(across: number, endWaste: number, limit: number, room: number): number {
  if (across === 0 || room < across + endWaste) return 0;
  return Math.min(limit, Math.floor((room - endWaste) / across));
}

function canTakeMore(counts: readonly number[], widths: readonly number[], limits: ArrayLike<number>, kinds: StripProblem["kinds"], room: number): boolean {
  return kinds.some((kind, index) => {
    const across = widths[index] ?? 0;
    const count = counts[index] ?? 0;
    return across > 0 && count < (limits[index] ?? 0) && across + (count === 0 ? kind.endWaste : 0) <= room;
  });
}

function reachableSums(problem: StripProblem): { positions: Int32Array; under: Int32Array } {
  const { width, kinds, across } = problem;
  const reached = new Uint8Array(width + 1);
  reached[0] = 1;
  kinds.forEach((kind, index) => {
    const widths = [...new Set(across.map((row) => row[index] ?? 0))].filter((each) => each > 0);
    if (kind.endWaste > 0) for (let at = width; at >= kind.endWaste; at--) if (reached[at - kind.endWaste]) reached[at] = 1;
    for (const each of widths) for (let at = each; at <= width; at++) if (reached[at - each]) reached[at] = 1;
  });
  const positions: number[] = [];
  const under = new Int32Array(width + 1);
  for (let at = 0; at <= width; at++) {
    if (reached[at] || at === width) positions.push(at);
    under[at] = positions.length - 1;
  }
  return { positions: Int32Array.from(positions), under };
}
