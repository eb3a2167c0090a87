import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { BURST_RULES, onKey, onTime, QUIET, type BurstState } from "@/lib/core/codes/scan-burst";

interface Press {
  readonly key: string;
  /** Milliseconds since the key before. */
  readonly after: number;
}

interface Seen {
  readonly scans: string[];
  /** What reaches the page, in order: keys given back and keys that were never held. */
  readonly typed: string[];
}

/** Plays presses as a browser would, with the wake-ups that the machine asks for. */
function play(presses: readonly Press[]): Seen {
  let state: BurstState = QUIET;
  let now = 1000;
  let wakeAt: number | null = null;
  const seen: Seen = { scans: [], typed: [] };
  const wake = (until: number) => {
    while (wakeAt !== null && wakeAt <= until) {
      const step = onTime(state, wakeAt);
      seen.typed.push(...step.released);
      wakeAt = step.wakeInMs === null ? null : wakeAt + step.wakeInMs;
      state = step.state;
    }
  };
  for (const { key, after } of presses) {
    now += after;
    wake(now - 1);
    const step = onKey(state, key, now);
    seen.typed.push(...step.released);
    if (!step.isHeld) seen.typed.push(key);
    if (step.scan !== null) seen.scans.push(step.scan);
    state = step.state;
    wakeAt = step.wakeInMs === null ? null : now + step.wakeInMs;
  }
  wake(now + 10_000);
  return seen;
}

const keys = (text: string, after: number): Press[] => [...text].map((key) => ({ key, after }));
const enter = (after: number): Press => ({ key: "Enter", after });

describe("a burst of keys", () => {
  it("that ends in Enter is a scan, and nothing of it reaches the page", () => {
    expect(play([...keys("B0017K", 8), enter(8)])).toEqual({ scans: ["B0017K"], typed: [] });
    expect(play([...keys("B0017K", 8), { key: "Tab", after: 8 }])).toEqual({ scans: ["B0017K"], typed: [] });
  });

  it("may hold the shift keys that a scanner presses for capitals", () => {
    const presses = [{ key: "Shift", after: 8 }, ...keys("B", 4), { key: "Shift", after: 4 }, ...keys("0017", 8), { key: "Shift", after: 4 }, ...keys("K", 4), enter(8)];
    expect(play(presses).scans).toEqual(["B0017K"]);
  });

  it("is a person's when it is slow, short, or without Enter", () => {
    expect(play([...keys("hello", 120), enter(120)])).toEqual({ scans: [], typed: [..."hello", "Enter"] });
    expect(play([...keys("2 3", 20), enter(20)])).toEqual({ scans: [], typed: [..."2 3", "Enter"] });
    expect(play(keys("B0017K", 8))).toEqual({ scans: [], typed: [..."B0017K"] });
    expect(play([...keys("B0017K", 8), enter(50)])).toEqual({ scans: [], typed: [..."B0017K", "Enter"] });
    expect(play([enter(5)])).toEqual({ scans: [], typed: ["Enter"] });
  });

  it("lets what was typed just before go its own way", () => {
    expect(play([...keys("ab", 130), ...keys("x", 60), { key: "B", after: 55 }, ...keys("0017K", 8), enter(8)])).toEqual({ scans: ["B0017K"], typed: ["a", "b", "x"] });
  });

  it("gives everything back when another key breaks in", () => {
    expect(play([...keys("B0017", 8), { key: "ArrowDown", after: 8 }, ...keys("K", 8), enter(8)])).toEqual({ scans: [], typed: [..."B0017", "ArrowDown", "K", "Enter"] });
    expect(play([...keys("7".repeat(BURST_RULES.mostCharacters + 1), 5), enter(5)]).scans).toEqual([]);
  });

  it("takes two scans that follow each other", () => {
    expect(play([...keys("B0017K", 8), enter(8), ...keys("P0003X", 8), enter(8)]).scans).toEqual(["B0017K", "P0003X"]);
  });

  it("loses no key and changes no order, whatever is pressed", () => {
    const press = fc.record({ key: fc.constantFrom("a", "7", " ", "*", "Enter", "Tab", "Shift", "ArrowUp", "F5"), after: fc.integer({ min: 0, max: 120 }) });
    fc.assert(
      fc.property(fc.array(press, { maxLength: 60 }), (presses) => {
        const { scans, typed } = play(presses);
        const silent = (key: string) => key !== "Shift";
        const scanned = scans.reduce((sum, scan) => sum + scan.length + 1, 0);
        expect(typed.filter(silent).length + scanned).toBe(presses.filter((each) => silent(each.key)).length);
        if (scans.length === 0) expect(typed.filter(silent)).toEqual(presses.map((each) => each.key).filter(silent));
        for (const scan of scans) expect(scan.length).toBeGreaterThanOrEqual(BURST_RULES.leastCharacters);
      }),
      { numRuns: 500 },
    );
  });
});
