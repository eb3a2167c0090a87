import { describe, expect, it } from "vitest";
import { inches } from "@/lib/core/measure/length";
import type { Polygon } from "@/lib/core/piece/patch";
import type { QuarterTurn, QuiltCell, QuiltDesign } from "@/lib/core/piece/quilt-design";
import { layQuilt, type QuiltLayout } from "@/lib/core/patchwork/quilt-layout";
import { buildBlock, buildQuilt, HALF_AND_HALF } from "./build-quilt";

function lay(over: Partial<QuiltDesign>): QuiltLayout {
  const laid = layQuilt(buildQuilt(over));
  if (!laid.ok) throw new Error(laid.fault.message);
  return laid.value;
}

function areaOf(polygon: Polygon): number {
  return polygon.reduce((total, [x, y], index) => {
    const [u, v] = polygon[(index + 1) % polygon.length] ?? [x, y];
    return total + (x * v - u * y) / 2;
  }, 0);
}

function total(layout: QuiltLayout): number {
  return layout.pieces.reduce((sum, piece) => sum + areaOf(piece.polygon), 0);
}

const SASHING = { width: inches(2), role: "sash", cornerstones: "post", allRound: true };
const BORDERS = [{ width: inches(1.5), role: "light", corners: "post" }, { width: inches(4), role: "edge", corners: null }];

describe("a laid quilt", () => {
  it("is covered exactly by its pieces in the straight setting", () => {
    const layout = lay({ rows: 3, columns: 2, sashing: SASHING, borders: BORDERS });
    expect([layout.width, layout.height]).toEqual([inches(2 * 6 + 3 * 2 + 11), inches(3 * 6 + 4 * 2 + 11)]);
    expect(Number.isInteger(layout.width)).toBe(true);
    expect(Math.abs(total(layout) - layout.width * layout.height)).toBeLessThan(1);
  });

  it("is covered by its pieces on point, with sashing and borders", () => {
    for (const sashing of [null, SASHING, { ...SASHING, cornerstones: null }]) {
      const layout = lay({ setting: "on-point", rows: 3, columns: 2, sashing, borders: BORDERS });
      expect(total(layout) / (layout.width * layout.height)).toBeCloseTo(1, 9);
      expect(Math.min(...layout.pieces.map((piece) => areaOf(piece.polygon)))).toBeGreaterThan(0);
    }
  });

  it("has nine patches a block, in the quilt's own roles", () => {
    const layout = lay({ rows: 2, columns: 2, blocks: [buildBlock({ roles: { dark: "edge", light: "ground" } })] });
    expect(layout.pieces).toHaveLength(36);
    expect(layout.pieces.filter((piece) => piece.role === "edge")).toHaveLength(20);
    expect(layout.pieces.filter((piece) => piece.role === "ground")).toHaveLength(16);
  });

  it("counts a Weir Pool: 20 blocks, 49 sashing strips, 30 cornerstones, 66 by 80 inches", () => {
    const twelve = buildBlock({ size: { width: inches(12), height: inches(12) } });
    const layout = lay({ rows: 5, columns: 4, blocks: [twelve], sashing: SASHING, borders: [{ width: inches(4), role: "edge", corners: null }] });
    const kinds = layout.pieces.map((piece) => piece.source.kind);
    expect(kinds.filter((kind) => kind === "sashing")).toHaveLength(49);
    expect(kinds.filter((kind) => kind === "cornerstone")).toHaveLength(30);
    expect([layout.width, layout.height]).toEqual([inches(66), inches(80)]);
  });

  it("turns a block clockwise about its own middle", () => {
    const half = buildBlock({ name: "Half and half", drawing: HALF_AND_HALF });
    /** Where the right angle of the dark triangle lies: at the foot left upright, then clockwise. */
    const corners: Record<QuarterTurn, readonly [number, number]> = { 0: [0, 6], 90: [0, 0], 180: [6, 0], 270: [6, 6] };
    for (const turn of [0, 90, 180, 270] as const) {
      const cells: QuiltCell[] = [{ kind: "block", block: 0, turn }];
      const dark = lay({ rows: 1, columns: 1, blocks: [half], cells }).pieces.find((piece) => piece.role === "dark");
      const x = dark?.polygon.map((point) => point[0] / inches(1)).sort((a, b) => a - b)[1];
      const y = dark?.polygon.map((point) => point[1] / inches(1)).sort((a, b) => a - b)[1];
      expect([turn, x, y]).toEqual([turn, ...corners[turn]]);
    }
  });

  it("puts plain squares where the design has them", () => {
    const layout = lay({ rows: 1, columns: 2, cells: [{ kind: "plain", role: "ground" }, { kind: "block", block: 0, turn: 0 }] });
    expect(layout.pieces.filter((piece) => piece.source.kind === "plain").map((piece) => piece.polygon[0])).toEqual([[0, 0]]);
    expect(layout.pieces).toHaveLength(10);
  });

  it("says which block has a patch without a fabric", () => {
    const bare = buildBlock({ drawing: { ...HALF_AND_HALF, paints: [] } });
    const laid = layQuilt(buildQuilt({ blocks: [bare] }));
    expect(laid.ok ? "" : laid.fault.message).toMatch(/^Nine-patch: a patch [A-Z] has no fabric laid on it\.$/);
    const strange = layQuilt(buildQuilt({ blocks: [buildBlock({ roles: { dark: "dark" } })] }));
    expect(strange.ok ? "" : strange.fault.message).toContain("its “light” is");
  });
});
