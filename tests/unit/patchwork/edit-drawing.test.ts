import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { inches } from "@/lib/core/measure/length";
import { analyseBlock } from "@/lib/core/patchwork/analyse-block";
import { draftReducer, openDraft, type Draft, type DraftAction } from "@/lib/core/patchwork/draft-reducer";
import { addSeam, moveSeam, moveSeamEnd, paintPatch, removeSeam, setGrid, snapToGrid, stepBetween } from "@/lib/core/patchwork/edit-drawing";
import { patchAt } from "@/lib/core/patchwork/locate";
import { TRADITIONAL_BLOCKS } from "@/lib/core/patchwork/traditional-blocks";
import type { Drawing } from "@/lib/core/piece/drawing";

const EMPTY: Drawing = { outline: "rectangle", grid: { columns: 4, rows: 4 }, seams: [], paints: [] };
const SIZE = { width: inches(8), height: inches(8) };

function must<Value>(result: { ok: true; value: Value } | { ok: false; fault: { message: string } }): Value {
  if (!result.ok) throw new Error(result.fault.message);
  return result.value;
}
const code = (result: { ok: boolean; fault?: { code: string } }) => result.fault?.code;
const patchesOf = (drawing: Drawing) => must(analyseBlock(drawing, SIZE)).patches;

describe("edits of a drawing", () => {
  it("adds, moves and removes a seam without touching the drawing before", () => {
    const cut = must(addSeam(EMPTY, ["1/2", "0"], ["2/4", "1"]));
    expect(cut.seams).toEqual([{ kind: "straight", from: ["1/2", "0"], to: ["1/2", "1"] }]);
    expect(patchesOf(cut)).toHaveLength(2);
    const aside = must(moveSeam(cut, 0, stepBetween(["1/2", "0"], ["1/4", "0"])));
    expect(aside.seams[0]).toEqual({ kind: "straight", from: ["1/4", "0"], to: ["1/4", "1"] });
    const slanting = must(moveSeamEnd(aside, 0, "to", ["1/2r2", "1"]));
    expect(slanting.seams[0]?.to).toEqual(["1/2r2", "1"]);
    expect(must(removeSeam(slanting, 0))).toEqual(EMPTY);
    expect(EMPTY.seams).toEqual([]);
  });

  it("says what is wrong and keeps the drawing", () => {
    const cut = must(addSeam(EMPTY, ["1/2", "0"], ["1/2", "1"]));
    expect(code(addSeam(cut, ["1/2", "1"], ["1/2", "0"]))).toBe("seam-there");
    expect(code(addSeam(cut, ["1/2", "0"], ["1/2", "0"]))).toBe("no-length");
    expect(code(addSeam(cut, ["r2", "0"], ["1/2", "0"]))).toBe("outside");
    expect(code(addSeam(cut, ["half", "0"], ["1/2", "0"]))).toBe("bad-point");
    expect(code(moveSeam(cut, 0, ["3/4", "0"]))).toBe("outside");
    expect(code(moveSeam(cut, 1, ["0", "0"]))).toBe("no-such-seam");
    expect(code(removeSeam(cut, -1))).toBe("no-such-seam");
    expect(code(setGrid(cut, 0, 4))).toBe("bad-grid");
    expect(code(setGrid(cut, 2.5, 4))).toBe("bad-grid");
    expect(must(setGrid(cut, 6, 3)).grid).toEqual({ columns: 6, rows: 3 });
  });

  it("paints a patch once, however often the mind changes", () => {
    const cut = must(addSeam(EMPTY, ["0", "0"], ["1", "1"]));
    const [first, second] = patchesOf(cut);
    if (!first || !second) throw new Error("two patches are wanted");
    const once = must(paintPatch(cut, first, "sky"));
    const again = must(paintPatch(must(paintPatch(once, second, "wheel")), first, "hub", "down-right"));
    expect(again.paints).toHaveLength(2);
    expect(patchesOf(again).map((patch) => [patch.role, patch.grain])).toEqual([["hub", "down-right"], ["wheel", "any"]]);
    expect(patchesOf(must(paintPatch(again, first, null))).map((patch) => patch.role)).toEqual([null, "wheel"]);
    expect(code(paintPatch(cut, first, "Sky blue"))).toBe("bad-role");
  });

  it("snaps to the nearest crossing of the grid, inside the block", () => {
    expect(snapToGrid({ columns: 3, rows: 4 }, [0.34, 0.6])).toEqual(["1/3", "1/2"]);
    expect(snapToGrid({ columns: 3, rows: 4 }, [-2, 1.4])).toEqual(["0", "1"]);
    expect(snapToGrid({ columns: 2, rows: 2 }, [0.26, 0.9], 2)).toEqual(["1/4", "1"]);
  });
});

describe("picking a patch", () => {
  it.each(TRADITIONAL_BLOCKS.map((block) => [block.slug, block] as const))("each point of %s lies in exactly one patch", (_slug, { drawing, size }) => {
    const { patches } = must(analyseBlock(drawing, size));
    const place = fc.double({ min: 0, max: 1, noNaN: true, maxExcluded: true });
    fc.assert(
      fc.property(place, place, (x, y) => {
        const point = [x * size.width, y * size.height] as const;
        const holders = patches.filter((patch) => patchAt([patch], point) !== null);
        expect(holders).toHaveLength(1);
        expect(patchAt(patches, point)).toBe(holders[0]);
      }),
      { numRuns: 40, seed: 7 },
    );
    expect(patchAt(patches, [-1, 5])).toBeNull();
  });
});

describe("a draft's undo", () => {
  const draft = (columns: number): Draft => ({ drawing: { ...EMPTY, grid: { columns, rows: 1 } }, size: SIZE });

  it("makes one step of a gesture, and none of one that was called off", () => {
    const [a, b, c] = [draft(1), draft(2), draft(3)];
    let state = openDraft(a);
    for (const action of [{ kind: "grab" }, { kind: "drag", draft: b }, { kind: "drag", draft: c }, { kind: "release" }] satisfies DraftAction[]) state = draftReducer(state, action);
    expect([state.present, state.past]).toEqual([c, [a]]);
    for (const action of [{ kind: "grab" }, { kind: "drag", draft: b }, { kind: "undo" }, { kind: "cancel" }] satisfies DraftAction[]) state = draftReducer(state, action);
    expect([state.present, state.past, state.grabbed]).toEqual([c, [a], null]);
    state = draftReducer(state, { kind: "undo" });
    expect(state.present).toBe(a);
    expect(draftReducer(state, { kind: "redo" }).present).toBe(c);
    expect(draftReducer(draftReducer(state, { kind: "change", draft: b }), { kind: "redo" }).present).toBe(b);
  });

  it("comes back to the start by undoing all, and to the end by redoing all", () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 1, max: 64 }), { maxLength: 30 }), (grids) => {
        const start = draft(1);
        const made = grids.map(draft).reduce((state, each) => draftReducer(state, { kind: "change", draft: each }), openDraft(start));
        const back = grids.reduce((state) => draftReducer(state, { kind: "undo" }), made);
        expect(back.present).toBe(start);
        expect(grids.reduce((state) => draftReducer(state, { kind: "redo" }), back)).toEqual(made);
      }),
    );
  });
});
