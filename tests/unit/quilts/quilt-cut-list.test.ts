import { describe, expect, it } from "vitest";
import { blanksOf } from "@/lib/core/cutting/blanks";
import { inches, length, toInches } from "@/lib/core/measure/length";
import type { CutPiece } from "@/lib/core/piece/cut-piece";
import type { QuarterTurn, QuiltCell, QuiltDesign } from "@/lib/core/piece/quilt-design";
import { quiltCutList } from "@/lib/core/patchwork/quilt-cut-list";
import { layQuilt } from "@/lib/core/patchwork/quilt-layout";
import type { QuiltCutOptions } from "@/lib/core/patchwork/quilt-setting-pieces";
import { buildBlock, buildQuilt, HALF_AND_HALF, RULES } from "./build-quilt";

function cut(over: Partial<QuiltDesign>, options?: QuiltCutOptions): CutPiece[] {
  const list = quiltCutList(buildQuilt(over), RULES, options);
  if (!list.ok) throw new Error(list.fault.message);
  return list.value;
}

function find(pieces: readonly CutPiece[], key: string): CutPiece {
  const piece = pieces.find((each) => each.key.startsWith(key));
  if (!piece) throw new Error(`No ${key} among ${pieces.map((each) => each.key).join(", ")}.`);
  return piece;
}

function rulerSizes(piece: CutPiece): number[] {
  const { method } = piece;
  if (method.kind === "square") return [toInches(method.side.ruler)];
  if (method.kind === "rectangle") return [toInches(method.along.ruler), toInches(method.across.ruler)];
  if (method.kind === "half-square" || method.kind === "quarter-square") return [toInches(method.square.ruler)];
  return method.kind === "long-strip" ? [toInches(method.width.ruler), toInches(method.needed)] : [];
}

const SASHING = { width: inches(2), role: "sash", cornerstones: "post", allRound: true };
const TWELVE = buildBlock({ size: { width: inches(12), height: inches(12) } });
const ON_42 = { usableWidth: () => inches(42) };

describe("the pieces of a quilt", () => {
  const weir = { rows: 5, columns: 4, blocks: [TWELVE], sashing: SASHING, borders: [{ width: inches(4), role: "edge", corners: null }], binding: { stripWidth: inches(2.5), role: "dark", extra: inches(10) } };
  const pieces = cut(weir, ON_42);

  it("are as many as the layout has, kind by kind", () => {
    const laid = layQuilt(buildQuilt(weir));
    const patches = laid.ok ? laid.value.pieces.filter((piece) => piece.source.kind === "block").length : NaN;
    expect(pieces.filter((piece) => piece.key.startsWith("Nine-patch/")).reduce((total, piece) => total + piece.count, 0)).toBe(patches);
    expect(patches).toBe(180);
  });

  it("cut 49 strips 2 1/2 by 12 1/2 and 30 cornerstones 2 1/2, lettered after the block", () => {
    expect([find(pieces, "sashing/sash").count, ...rulerSizes(find(pieces, "sashing/sash"))]).toEqual([49, 2.5, 12.5]);
    expect([find(pieces, "cornerstone/post").count, ...rulerSizes(find(pieces, "cornerstone/post"))]).toEqual([30, 2.5]);
    const blocks = pieces.filter((piece) => piece.key.startsWith("Nine-patch/")).map((piece) => piece.letter);
    expect(blocks).not.toContain(find(pieces, "sashing/sash").letter);
    expect(find(pieces, "cornerstone/post").letter).toBe("B");
  });

  it("cut the border from 7 whole strips joined straight, and the binding from 8", () => {
    const border = find(pieces, "border-1/edge");
    expect(rulerSizes(border)).toEqual([4.5, 2 * 72.5 + 2 * 66.5]);
    const blanks = blanksOf([border, find(pieces, "binding/dark")], inches(42));
    expect(blanks.ok ? blanks.value.map((blank) => blank.count) : []).toEqual([7, 8]);
  });

  it("have keys of their own, the same each time", () => {
    expect(new Set(pieces.map((piece) => piece.key)).size).toBe(pieces.length);
    expect(cut(weir, ON_42)).toEqual(pieces);
  });
});

describe("blocks in several turns", () => {
  const half = buildBlock({ name: "Half", drawing: HALF_AND_HALF });
  const turned = ([0, 90, 180, 270] as const).map((turn: QuarterTurn): QuiltCell => ({ kind: "block", block: 0, turn }));
  const design = { rows: 2, columns: 2, blocks: [half], cells: turned };

  it("are one line a fabric where the cloth has no direction", () => {
    const pieces = cut(design);
    expect(pieces.map((piece) => [piece.role, piece.count])).toEqual(expect.arrayContaining([["dark", 4], ["light", 4]]));
    expect(pieces).toHaveLength(2);
  });

  it("keep their direction in a one-way fabric, and their letter", () => {
    const pieces = cut(design, { oneWay: ["dark"] });
    const dark = pieces.filter((piece) => piece.role === "dark");
    expect(dark.reduce((total, piece) => total + piece.count, 0)).toBe(4);
    expect(dark.every((piece) => !piece.mayTurn)).toBe(true);
    expect(new Set(pieces.map((piece) => piece.letter))).toEqual(new Set(["A"]));
    expect(pieces.filter((piece) => piece.role === "light").map((piece) => piece.count)).toEqual([4]);
  });

  it("join two roles of a block that lie in one fabric", () => {
    const pieces = cut({ ...design, blocks: [{ ...half, roles: { dark: "ground", light: "ground" } }] });
    expect(pieces.map((piece) => [piece.role, piece.count])).toEqual([["ground", 8]]);
  });

  it("stay apart from the shapes of another block, which is named", () => {
    const pieces = cut({ rows: 1, columns: 2, blocks: [half, buildBlock({ name: "Nine" })], cells: [{ kind: "block", block: 0, turn: 0 }, { kind: "block", block: 1, turn: 0 }] });
    expect(pieces.filter((piece) => piece.key.startsWith("Half/"))).toHaveLength(2);
    expect(pieces.filter((piece) => piece.key.startsWith("Nine/"))).toHaveLength(2);
    expect(pieces.every((piece) => /\((Half|Nine)\)$/.test(piece.name))).toBe(true);
  });
});

describe("a quilt on point", () => {
  const block = buildBlock();

  it("cuts side triangles from squares cut twice and corners from squares cut once", () => {
    const pieces = cut({ setting: "on-point", rows: 4, columns: 4, blocks: [block] });
    expect([find(pieces, "setting-triangle/ground").count, ...rulerSizes(find(pieces, "setting-triangle/ground"))]).toEqual([12, 9.75]);
    expect([find(pieces, "corner-triangle/ground").count, ...rulerSizes(find(pieces, "corner-triangle/ground"))]).toEqual([4, 5.125]);
    expect(find(pieces, "Nine-patch/").count + find(pieces, "Nine-patch/A/light").count).toBeGreaterThan(0);
  });

  it("cuts them larger by choice", () => {
    const pieces = cut({ setting: "on-point", rows: 4, columns: 4, blocks: [block] }, { settingOversize: inches(0.5) });
    expect(rulerSizes(find(pieces, "setting-triangle/ground"))).toEqual([10.25]);
  });

  it("gives a one-way fabric a square for every triangle of the fullest side", () => {
    const piece = find(cut({ setting: "on-point", rows: 5, columns: 3, blocks: [block] }, { oneWay: ["ground"] }), "setting-triangle/ground");
    expect([piece.count, piece.mayTurn]).toEqual([16, false]);
    expect(piece.note).toContain("12 are used");
  });

  it("halves the cornerstones at the edge", () => {
    const pieces = cut({ setting: "on-point", rows: 3, columns: 2, blocks: [block], sashing: { ...SASHING, width: inches(1) } });
    expect([find(pieces, "half-cornerstone/post").count, find(pieces, "cornerstone/post").count, find(pieces, "sashing/sash").count]).toEqual([10, 7, 24]);
    expect(rulerSizes(find(pieces, "sashing/sash"))).toEqual([1.5, 6.5]);
  });
});

describe("names", () => {
  it("say sizes in inches, between the marks as a decimal, or in centimetres", () => {
    const design = { setting: "on-point", rows: 2, columns: 2, borders: [{ width: inches(2), role: "edge", corners: "post" }] } as const;
    const names = (options?: QuiltCutOptions) => cut(design, options).map((piece) => piece.name).slice(-4);
    expect(names()).toEqual(["Setting triangle, 8.485 in long side", "Corner triangle, 4.243 in short sides", "Border, 2 in × 16.971 in", "Border corner, 2 in"]);
    expect(names({ system: "metres" })).toContain("Corner triangle, 10.8 cm short sides");
  });
});

describe("long pieces", () => {
  it("are whole where they fit across the fabric, and one joined run where they do not", () => {
    const borders = [{ width: inches(2), role: "edge", corners: null }];
    const small = cut({ rows: 2, columns: 2, borders });
    expect(small.filter((piece) => piece.role === "edge").map((piece) => [piece.count, ...rulerSizes(piece)])).toEqual([
      [2, 2.5, 12.5],
      [2, 2.5, 16.5],
    ]);
    const large = cut({ rows: 8, columns: 8, borders });
    expect(large.filter((piece) => piece.role === "edge").map((piece) => [piece.count, piece.method.kind, ...rulerSizes(piece)])).toEqual([[1, "long-strip", 2.5, 2 * 48.5 + 2 * 52.5]]);
  });

  it("are cut whole along the selvage by choice", () => {
    const pieces = cut({ rows: 8, columns: 8, borders: [{ width: inches(2), role: "edge", corners: null }] }, { borders: "along" });
    expect(pieces.filter((piece) => piece.role === "edge").map((piece) => [piece.count, ...rulerSizes(piece), piece.mayTurn])).toEqual([
      [2, 48.5, 2.5, false],
      [2, 52.5, 2.5, false],
    ]);
  });

  it("run the sides of a one-way border along the bolt", () => {
    const pieces = cut({ rows: 2, columns: 2, borders: [{ width: inches(2), role: "edge", corners: null }] }, { oneWay: ["edge"] });
    expect(rulerSizes(find(pieces, "border-1/edge/sides"))).toEqual([12.5, 2.5]);
    expect(rulerSizes(find(pieces, "border-1/edge/ends"))).toEqual([2.5, 16.5]);
  });

  it("run sashing through between rows where there are no cornerstones", () => {
    const pieces = cut({ rows: 3, columns: 2, sashing: { ...SASHING, cornerstones: null } });
    expect([find(pieces, "sashing/sash").count, ...rulerSizes(find(pieces, "sashing/sash"))]).toEqual([9, 2.5, 6.5]);
    expect([find(pieces, "sashing-row/sash").count, ...rulerSizes(find(pieces, "sashing-row/sash"))]).toEqual([4, 2.5, 18.5]);
  });

  it("cut the backing as panels that take the least cloth", () => {
    const backing = { role: "ground", overhang: inches(4) };
    const piece = find(cut({ rows: 5, columns: 4, blocks: [TWELVE], sashing: SASHING, borders: [{ width: inches(4), role: "edge", corners: null }], backing }, ON_42), "backing/ground");
    expect([piece.count, rulerSizes(piece)[0]]).toEqual([2, 88]);
    expect(piece.name).toBe("Backing, 2 panels, seams down the quilt");
    expect(rulerSizes(piece)[1]).toBeLessThanOrEqual(42);
    const narrow = quiltCutList(buildQuilt({ backing }), RULES, { usableWidth: () => length(inches(1) - 1) });
    expect(narrow.ok ? "" : narrow.fault.message).toContain("its own seams would use up");
  });
});
