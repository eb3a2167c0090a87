import { describe, expect, it } from "vitest";
import { inches, length } from "@/lib/core/measure/length";
import type { QuiltCell, QuiltDesign } from "@/lib/core/piece/quilt-design";
import { checkQuilt } from "@/lib/core/patchwork/quilt-check";
import { buildBlock, buildQuilt } from "./build-quilt";

const BLOCK: QuiltCell = { kind: "block", block: 0, turn: 0 };

function sentence(over: Partial<QuiltDesign>): string {
  const checked = checkQuilt(buildQuilt(over));
  return checked.ok ? "" : checked.fault.message;
}

describe("a quilt that can be laid", () => {
  it("has squares of the size of its first block", () => {
    const tall = buildBlock({ size: { width: inches(4), height: inches(6) } });
    const checked = checkQuilt(buildQuilt({ rows: 1, columns: 1, blocks: [tall], cells: [{ ...BLOCK, turn: 90 }] }));
    expect(checked).toEqual({ ok: true, value: { width: inches(6), height: inches(4) } });
  });

  it("may have one square, or forty by forty of them", () => {
    expect(sentence({ rows: 1, columns: 1 })).toBe("");
    expect(sentence({ rows: 40, columns: 40 })).toBe("");
    expect(sentence({ rows: 40, columns: 40, setting: "on-point", blocks: [buildBlock({ size: { width: inches(6), height: inches(6) } })] })).toBe("");
  });
});

describe("a quilt that cannot be laid says why", () => {
  const wrong: readonly (readonly [string, Partial<QuiltDesign>, RegExp])[] = [
    ["no rows", { rows: 0 }, /1 to 40 rows, not 0/],
    ["too many columns", { columns: 41 }, /1 to 40 columns, not 41/],
    ["half a row", { rows: 2.5 }, /not 2.5/],
    ["no block", { blocks: [] }, /has no block/],
    ["a square too few", { rows: 2, columns: 2, cells: [BLOCK, BLOCK, BLOCK] }, /2 rows of 2 make 4 squares, and 3 are given/],
    ["no inner squares on point", { setting: "on-point", rows: 2, columns: 2, cells: [BLOCK, BLOCK, BLOCK, BLOCK] }, /make 5 squares, and 4 are given/],
    ["only plain squares", { rows: 1, columns: 1, cells: [{ kind: "plain", role: "ground" }] }, /No square of the quilt holds a block/],
    ["a block that is not there", { rows: 1, columns: 2, cells: [BLOCK, { ...BLOCK, block: 3 }] }, /Square 2 asks for block 4, and the quilt has 1/],
    ["a turn that is no quarter", { rows: 1, columns: 1, cells: [{ ...BLOCK, turn: 45 as 90 }] }, /turned by 45 degrees/],
    ["a block of another size", { rows: 1, columns: 2, blocks: [buildBlock(), buildBlock({ name: "Star", size: { width: inches(8), height: inches(8) } })], cells: [BLOCK, { ...BLOCK, block: 1 }] }, /Star in square 2 is 8 × 8 in, and the squares of this quilt are 6 × 6 in/],
    ["an oblong block turned", { rows: 1, columns: 2, blocks: [buildBlock({ size: { width: inches(4), height: inches(6) } })], cells: [BLOCK, { ...BLOCK, turn: 270 }] }, /is 6 × 4 in/],
    ["an oblong block on point", { setting: "on-point", rows: 1, columns: 1, blocks: [buildBlock({ size: { width: inches(4), height: inches(6) } })] }, /on point are square/],
    ["a block of no size", { blocks: [buildBlock({ size: { width: length(0), height: inches(6) } })] }, /Nine-patch is 0 × 6 in/],
    ["sashing too thin", { sashing: { width: inches(0.125), role: "sash", cornerstones: null, allRound: true } }, /The sashing is 1\/8 in wide/],
    ["inner sashing on point", { setting: "on-point", sashing: { width: inches(1), role: "sash", cornerstones: null, allRound: false } }, /goes round every block/],
    ["on point without a fabric for its triangles", { setting: "on-point", settingRole: undefined }, /setting triangles/],
    ["a border too wide", { borders: [{ width: inches(2000), role: "edge", corners: null }] }, /Border 1 is 2000 in wide/],
    ["thirteen borders", { borders: Array.from({ length: 13 }, () => ({ width: inches(1), role: "edge", corners: null })) }, /at most 12 borders, not 13/],
    ["a border of a role that is not there", { borders: [{ width: inches(2), role: "fringe", corners: null }] }, /Border 1 asks for the role “fringe”/],
    ["a block of a role that is not there", { blocks: [buildBlock({ roles: { dark: "night", light: "light" } })] }, /Nine-patch asks for the role “night”/],
    ["a binding wider than cloth is for", { binding: { stripWidth: inches(13), role: "edge", extra: inches(10) } }, /strips are 13 in wide/],
    ["a backing that stands out for yards", { backing: { role: "ground", overhang: inches(101) } }, /0 to 100 in/],
    ["a quilt of a mile", { rows: 40, columns: 40, blocks: [buildBlock({ size: { width: inches(60), height: inches(60) } })] }, /would be about 2400 × 2400 in/],
  ];

  it.each(wrong)("%s", (_, over, said) => {
    const message = sentence(over);
    expect(message).toMatch(said);
    expect(message).toMatch(/^[A-Z0-9].*\.$/);
  });
});
