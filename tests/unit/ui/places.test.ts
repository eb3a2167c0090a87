import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { placeLies, placeTasks, share } from "@/components/shell/day-places";
import { currentSection, SECTIONS, sectionsFor } from "@/components/shell/sections";
import { sayConnection } from "@/components/shell/station-shell";

const HOURS = { from: 510, to: 1080 };
const minute = fc.integer({ min: HOURS.from, max: HOURS.to });

describe("the day", () => {
  it("lays stretches so that none lies over another", () => {
    fc.assert(
      fc.property(fc.array(fc.tuple(minute, fc.integer({ min: 1, max: 200 })), { maxLength: 30 }), (stretches) => {
        const laid = placeLies(stretches.map(([from, long]) => ({ from, to: from + long })));
        for (const a of laid) for (const b of laid) if (a !== b && a.row === b.row) expect(a.lie.to <= b.lie.from || b.lie.to <= a.lie.from).toBe(true);
      }),
    );
  });

  it("hangs tasks inside the day, in the order of the clock, none over another", () => {
    fc.assert(
      fc.property(fc.array(minute, { maxLength: 30 }), (times) => {
        const placed = placeTasks(times.map((at) => ({ at })), HOURS);
        const slots = (HOURS.to - HOURS.from) / 15;
        expect(placed.map(({ task }) => task.at)).toEqual([...times].sort((a, b) => a - b));
        for (const a of placed) {
          expect(a.column).toBeGreaterThanOrEqual(0);
          expect(a.column + a.span).toBeLessThanOrEqual(slots);
          for (const b of placed) if (a !== b && a.row === b.row) expect(a.column + a.span <= b.column || b.column + b.span <= a.column).toBe(true);
        }
      }),
    );
  });

  it("measures the rod from cap to cap", () => {
    expect(share(510, HOURS)).toBe("0.000%");
    expect(share(795, HOURS)).toBe("50.000%");
    expect(share(2000, HOURS)).toBe("100.000%");
  });
});

describe("the rooms", () => {
  it("shows each person the rooms that are theirs", () => {
    const labels = (role: "cutter" | "counter" | "owner") => sectionsFor({ roles: [role] }).map((section) => section.label);
    expect(labels("cutter")).toContain("Cutting");
    expect(labels("cutter")).not.toContain("Counter");
    expect(labels("counter")).not.toContain("Cutting");
    expect(labels("owner")).toEqual(SECTIONS.map((section) => section.label));
  });

  it("points the notch at the room one is in, and at Today only on Today", () => {
    expect(currentSection("/staff/bolts/B1234", SECTIONS)?.label).toBe("Bolts");
    expect(currentSection("/staff", SECTIONS)?.label).toBe("Today");
    expect(currentSection("/counter", SECTIONS)?.label).toBe("Counter");
    expect(currentSection("/elsewhere", SECTIONS)).toBeNull();
  });

  it("does not claim Today for a room that is not in the row", () => {
    expect(currentSection("/staff/people", SECTIONS)).toBeNull();
  });
});

describe("the line to the shop", () => {
  it("says what is kept and what waits", () => {
    expect(sayConnection({ state: "connected", waiting: 0 })).toBe("Connected, nothing waits to be sent");
    expect(sayConnection({ state: "sending", waiting: 1 })).toBe("Connected, sending 1 entry");
    expect(sayConnection({ state: "lost", waiting: 4, since: "11.20" })).toBe("No connection since 11.20, 4 entries kept here until it is back");
  });
});
