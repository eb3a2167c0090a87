import { describe, expect, it } from "vitest";
import type { Drawing } from "@/lib/core/piece/drawing";
import { turnDrawing, turnInBlock, turnPoint } from "@/lib/core/patchwork/quilt-turn";
import { HALF_AND_HALF, NINE_PATCH } from "./build-quilt";

function turned(drawing: Drawing, turn: 0 | 90 | 180 | 270): Drawing {
  const result = turnDrawing(drawing, turn);
  if (!result.ok) throw new Error(result.fault.message);
  return result.value;
}

describe("turning a drawing", () => {
  it("takes the top left to the top right, and a root along exactly", () => {
    expect(turnPoint(["0", "0"], 90)).toEqual(["1", "0"]);
    expect(turnPoint(["1-1/2r2", "1/3"], 90)).toEqual(["2/3", "1-1/2r2"]);
    expect(turnPoint(["1-1/2r2", "1/3"], 180)).toEqual(["1/2r2", "2/3"]);
    expect(turnPoint(["1/4", "nine"], 90)).toBeNull();
  });

  it("comes back after four quarters, and two quarters are a half", () => {
    for (const drawing of [HALF_AND_HALF, NINE_PATCH]) {
      const once = turned(drawing, 90);
      expect(turned(turned(turned(once, 90), 90), 90)).toEqual(drawing);
      expect(turned(once, 90)).toEqual(turned(drawing, 180));
      expect(turned(once, 180)).toEqual(turned(drawing, 270));
    }
  });

  it("turns the grain and the grid with the patches", () => {
    const drawing: Drawing = { outline: "rectangle", grid: { columns: 3, rows: 2 }, seams: [], paints: [{ at: ["1/4", "1/2"], role: "a", grain: "up" }, { at: ["1/2", "1/2"], role: "a", grain: "down-right" }] };
    const once = turned(drawing, 90);
    expect(once.grid).toEqual({ columns: 2, rows: 3 });
    expect(once.paints.map((paint) => paint.grain)).toEqual(["across", "down-left"]);
    expect(turned(drawing, 180).paints.map((paint) => paint.grain)).toEqual(["up", "down-right"]);
  });

  it("moves a point of an oblong block where its turned outline has it", () => {
    expect(turnInBlock([0, 0], 90, 40, 60)).toEqual([60, 0]);
    expect(turnInBlock([40, 60], 180, 40, 60)).toEqual([0, 0]);
    expect(turnInBlock([40, 0], 270, 40, 60)).toEqual([0, 0]);
  });

  it("says that a point cannot be read", () => {
    const broken = turnDrawing({ ...HALF_AND_HALF, paints: [{ at: ["x", "0"], role: "a" }] }, 90);
    expect(broken.ok ? "" : broken.fault.code).toBe("bad-drawing");
  });
});
