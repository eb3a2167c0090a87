import { describe, expect, it } from "vitest";
import { inches } from "@/lib/core/measure/length";
import { analyseBlock } from "@/lib/core/patchwork/analyse-block";
import { blockCutList, type CutListOptions } from "@/lib/core/patchwork/cut-list";
import { drawCells } from "@/lib/core/patchwork/traditional/cells";
import type { Drawing, Grain } from "@/lib/core/piece/drawing";

const RULES = { seamAllowance: inches(0.25), rulerStep: inches(0.125) };
const ROLES = { a: "dark", b: "light" };

function listed(drawing: Drawing, width: number, height: number, options: CutListOptions = {}) {
  const size = { width: inches(width), height: inches(height) };
  const analysis = analyseBlock(drawing, size);
  if (!analysis.ok) throw new Error(analysis.fault.message);
  return { list: blockCutList(analysis.value, size, RULES, options), complaints: analysis.value.complaints.map((each) => each.code) };
}

const grained = (drawing: Drawing, role: string, grain: Grain): Drawing => ({ ...drawing, paints: drawing.paints.map((paint) => (paint.role === role ? { ...paint, grain } : paint)) });

describe("the cut list of a block", () => {
  it("multiplies its counts by the copies", () => {
    const { list } = listed(drawCells({ rows: ["a b", "b a"], roles: ROLES }), 6, 6, { copies: 12 });
    expect(list.map((piece) => [piece.letter, piece.role, piece.count])).toEqual([["A", "dark", 24], ["A", "light", 24]]);
  });

  it("cuts a triangle with its short sides on the grain from a square in halves, with its long side on it in quarters", () => {
    const halves = drawCells({ rows: ["a\\b"], roles: ROLES });
    expect(listed(halves, 4, 4).list.map((piece) => piece.method.kind)).toEqual(["half-square", "half-square"]);
    const { list, complaints } = listed(grained(halves, "dark", "down-right"), 4, 4);
    expect(list.map((piece) => [piece.role, piece.method.kind])).toEqual([["dark", "quarter-square"], ["light", "half-square"]]);
    expect(complaints).toEqual(["bias-edge"]);
    expect(list.map((piece) => piece.note !== undefined)).toEqual([true, false]);
  });

  it("tells the two hands of half-rectangles apart", () => {
    const { list } = listed(drawCells({ rows: ["a\\b b/a"], roles: ROLES }), 8, 8);
    expect(list.map((piece) => [piece.letter, piece.role, piece.count, piece.method.kind])).toEqual([
      ["A", "dark", 1, "half-rectangle"],
      ["A", "light", 1, "half-rectangle"],
      ["Ar", "dark", 1, "half-rectangle"],
      ["Ar", "light", 1, "half-rectangle"],
    ]);
  });

  it("keeps pieces of a one-way print in the turns that they have in the block", () => {
    const rails = drawCells({ rows: ["a a", "b b"], roles: ROLES, joined: [[0, 0, 1, 2], [1, 0, 1, 1]] });
    const free = listed(rails, 6, 6).list;
    const directed = listed(rails, 6, 6, { oneWay: new Set(["dark"]) }).list;
    expect(free.every((piece) => piece.mayTurn)).toBe(true);
    expect(directed.filter((piece) => piece.role === "dark").every((piece) => !piece.mayTurn)).toBe(true);
    expect(new Set(directed.map((piece) => piece.key)).size).toBe(directed.length);
  });
});
