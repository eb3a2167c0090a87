/** Minutes past midnight. */
export type Minute = number;

export interface DayHours {
  readonly from: Minute;
  readonly to: Minute;
}

/** Where a minute lies along the rod, as a share of its length between the caps. */
export function share(minute: Minute, hours: DayHours): string {
  const kept = Math.min(Math.max(minute, hours.from), hours.to);
  return `${(((kept - hours.from) / (hours.to - hours.from)) * 100).toFixed(3)}%`;
}

interface Stretch {
  readonly from: Minute;
  readonly to: Minute;
}

/** Lays stretches in as few rows as they need, the earliest lowest: first row whose last stretch has ended. */
export function placeLies<T extends Stretch>(lies: readonly T[]): readonly { lie: T; row: number }[] {
  const ends: Minute[] = [];
  return [...lies]
    .sort((a, b) => a.from - b.from || b.to - a.to)
    .map((lie) => {
      const free = ends.findIndex((end) => end <= lie.from);
      const row = free === -1 ? ends.length : free;
      ends[row] = lie.to;
      return { lie, row };
    });
}

/** A task's slip is this many quarters of an hour wide. */
const SLIP = 7;

export interface PlacedTask<T> {
  readonly task: T;
  readonly row: number;
  readonly column: number;
  readonly span: number;
  /** Near the end of the day a slip hangs to the left of its thread. */
  readonly leftward: boolean;
}

/**
 * Hangs tasks at their hour in rows that never overlap, in the order of the clock, so that no slip covers another and
 * the order read aloud is the order of the day.
 */
export function placeTasks<T extends { readonly at: Minute }>(tasks: readonly T[], hours: DayHours): readonly PlacedTask<T>[] {
  const slots = Math.max(1, Math.round((hours.to - hours.from) / 15));
  const span = Math.min(SLIP, slots);
  const taken: [start: number, end: number][][] = [];
  return [...tasks]
    .sort((a, b) => a.at - b.at)
    .map((task) => {
      const slot = Math.min(Math.max(Math.round((task.at - hours.from) / 15), 0), slots);
      const leftward = slot + span > slots;
      const column = leftward ? Math.max(0, slot - span) : slot;
      const free = taken.findIndex((row) => row.every(([start, end]) => column >= end || column + span <= start));
      const row = free === -1 ? taken.length : free;
      (taken[row] ??= []).push([column, column + span]);
      return { task, row, column, span, leftward };
    });
}
