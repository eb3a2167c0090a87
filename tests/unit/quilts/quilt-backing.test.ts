import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { inches, length } from "@/lib/core/measure/length";
import { backingPanels } from "@/lib/core/patchwork/quilt-backing";

const SEAM = inches(0.25);
const NONE = length(0);

/** The least over both ways and every number of panels up to 60, by trying. */
function leastLength(across: number, down: number, width: number): number {
  const lengths: number[] = [];
  for (let panels = 1; panels <= 60; panels++) {
    const covered = panels * width - (panels - 1) * 2 * SEAM;
    if (covered >= across) lengths.push(panels * down);
    if (covered >= down) lengths.push(panels * across);
  }
  return Math.min(...lengths);
}

describe("backing panels", () => {
  it("take the least length of all ways to join them, and cover the backing", () => {
    const size = fc.integer({ min: 8, max: 130 * 8 });
    fc.assert(
      fc.property(size, size, fc.integer({ min: 20 * 8, max: 110 * 8 }), (across, down, wide) => {
        const [width, height, usable] = [inches(across / 8), inches(down / 8), inches(wide / 8)];
        const found = backingPanels({ width, height, overhang: NONE }, usable, SEAM);
        expect(found.length).toBe(leastLength(width, height, usable));
        expect(found.panelAcross).toBeLessThanOrEqual(usable);
        const covered = found.panels * found.panelAcross - (found.panels - 1) * 2 * SEAM;
        const [joined, long] = found.seams === "across" || (found.seams === null && found.panelLength === width) ? [height, width] : [width, height];
        expect(covered).toBeGreaterThanOrEqual(joined);
        expect(found.panelLength).toBe(long);
        expect(found.seams === null).toBe(found.panels === 1);
      }),
      { numRuns: 400, seed: 5 },
    );
  });

  it("stand upright in a fabric with a direction", () => {
    const size = { width: inches(80), height: inches(60), overhang: inches(2) };
    expect(backingPanels(size, inches(42), SEAM).seams).toBe("across");
    expect(backingPanels({ ...size, oneWay: true }, inches(42), SEAM)).toMatchObject({ seams: "down", panels: 3, panelLength: inches(64) });
  });

  it("need a fabric that is wider than its seams", () => {
    expect(() => backingPanels({ width: 10, height: 10, overhang: NONE }, inches(0.5), SEAM)).toThrow(RangeError);
  });
});
