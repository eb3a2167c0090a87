/**
 * Tells a scanner, which types like a keyboard, from a person. Keys wait; characters that follow each other fast enough and
 * end in Enter are a scan and are swallowed whole, so that the Enter presses no button; all else is given back as typed.
 * A pure state machine: the time is handed in, and the caller does what the steps say.
 */
export interface BurstRules {
  /** A key that follows within this many milliseconds belongs to the same burst; as long as a key waits at most. */
  readonly gapMs: number;
  /** Fewer characters before Enter are a person's. */
  readonly leastCharacters: number;
  /** More than this is no code; the keys are given back. */
  readonly mostCharacters: number;
}

export const BURST_RULES: BurstRules = { gapMs: 50, leastCharacters: 4, mostCharacters: 200 };

/** A key as the browser names it: one character, or "Enter", "Tab", "Shift". */
export type Key = string;

export interface BurstState {
  readonly waiting: readonly Key[];
  /** When the last waiting key came, in milliseconds on any clock that only goes forward. */
  readonly lastAt: number;
}

export interface BurstStep {
  readonly state: BurstState;
  /** The browser must not act on this key: it waits, or it was part of a scan. */
  readonly isHeld: boolean;
  /** Keys to give back now, in order, before anything else. */
  readonly released: readonly Key[];
  readonly scan: string | null;
  /** Call `onTime` this many milliseconds from now unless another key comes; null when nothing waits. */
  readonly wakeInMs: number | null;
}

export const QUIET: BurstState = { waiting: [], lastAt: 0 };

/** Keys that scanners press along with characters, and that say nothing themselves. */
const SILENT = new Set(["Shift", "CapsLock", "AltGraph"]);

/**
 * A key went down. Auto-repeat must not be handed in: a key held down is a person's. Enter and Tab end a burst; any other
 * key with a name (arrows, F-keys) gives everything back and is the browser's.
 */
export function onKey(state: BurstState, key: Key, now: number, rules: BurstRules = BURST_RULES): BurstStep {
  const isLate = state.waiting.length > 0 && now - state.lastAt >= rules.gapMs;
  const late = isLate ? state.waiting : [];
  const waiting = isLate ? [] : state.waiting;
  if (SILENT.has(key)) return { state: { waiting, lastAt: state.lastAt }, isHeld: false, released: late, scan: null, wakeInMs: waiting.length ? rules.gapMs - (now - state.lastAt) : null };
  if (key === "Enter" || key === "Tab") return endBurst(waiting, late, rules);
  if ([...key].length !== 1 || waiting.length >= rules.mostCharacters) return { state: QUIET, isHeld: false, released: [...late, ...waiting], scan: null, wakeInMs: null };
  return { state: { waiting: [...waiting, key], lastAt: now }, isHeld: true, released: late, scan: null, wakeInMs: rules.gapMs };
}

/** An end key right behind enough characters makes a scan; else it is a person's and follows what waited. */
function endBurst(waiting: readonly Key[], late: readonly Key[], rules: BurstRules): BurstStep {
  if (waiting.length >= rules.leastCharacters) return { state: QUIET, isHeld: true, released: late, scan: waiting.join(""), wakeInMs: null };
  return { state: QUIET, isHeld: false, released: [...late, ...waiting], scan: null, wakeInMs: null };
}

/** Time has passed without a key: what has waited long enough is a person's typing and is given back. */
export function onTime(state: BurstState, now: number, rules: BurstRules = BURST_RULES): BurstStep {
  const left = rules.gapMs - (now - state.lastAt);
  if (state.waiting.length === 0) return { state: QUIET, isHeld: false, released: [], scan: null, wakeInMs: null };
  if (left > 0) return { state, isHeld: false, released: [], scan: null, wakeInMs: left };
  return { state: QUIET, isHeld: false, released: state.waiting, scan: null, wakeInMs: null };
}
