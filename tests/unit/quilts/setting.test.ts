import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { inches, length, type Length } from "@/lib/core/measure/length";
import type { Polygon } from "@/lib/core/piece/patch";
import type { QuiltDesign, Sashing } from "@/lib/core/piece/quilt-design";
import { layBorders } from "@/lib/core/patchwork/quilt-borders";
import { rectangle, type LaidSetting } from "@/lib/core/patchwork/quilt-piece";
import { laySetOnPoint } from "@/lib/core/patchwork/setting-on-point";
import { laySetStraight } from "@/lib/core/patchwork/setting-straight";
import { buildQuilt } from "./build-quilt";

const SQUARE = { width: inches(6), height: inches(6) };

function sashingOf(width: Length, over: Partial<Sashing> = {}): Sashing {
  return { width, role: "sash", cornerstones: "post", allRound: true, ...over };
}

function polygonsOf(setting: LaidSetting, square = SQUARE): Polygon[] {
  return [...setting.squares.map(({ place }) => rectangle(0, 0, square.width, square.height).map(place)), ...setting.pieces.map((piece) => piece.polygon)];
}

/** Twice the area with its sign: above zero when the corners go clockwise on the screen. */
function signedArea(polygon: Polygon): number {
  return polygon.reduce((total, [x, y], index) => {
    const [u, v] = polygon[(index + 1) % polygon.length] ?? [x, y];
    return total + (x * v - u * y) / 2;
  }, 0);
}

/** By crossings, sharing nothing with the code that lays the pieces. */
function holds(polygon: Polygon, [x, y]: readonly [number, number]): boolean {
  return polygon.reduce((inside, [u, v], index) => {
    const [s, t] = polygon[(index + 1) % polygon.length] ?? [u, v];
    return v > y !== t > y && x < u + ((y - v) / (t - v)) * (s - u) ? !inside : inside;
  }, false);
}

function expectCovered(polygons: readonly Polygon[], width: number, height: number) {
  const areas = polygons.map(signedArea);
  expect(Math.min(...areas)).toBeGreaterThan(0);
  expect(areas.reduce((total, area) => total + area, 0) / (width * height)).toBeCloseTo(1, 9);
  for (const [x, y] of polygons.flat()) {
    expect(x).toBeGreaterThan(-1e-3);
    expect(y).toBeGreaterThan(-1e-3);
    expect(x).toBeLessThan(width + 1e-3);
    expect(y).toBeLessThan(height + 1e-3);
  }
  for (let sample = 1; sample <= 200; sample++) {
    const point = [((sample * 0.754877666) % 1) * width, ((sample * 0.569840291) % 1) * height] as const;
    expect(polygons.filter((polygon) => holds(polygon, point))).toHaveLength(1);
  }
}

const designs = fc.record({
  rows: fc.integer({ min: 1, max: 5 }),
  columns: fc.integer({ min: 1, max: 5 }),
  sashing: fc.option(fc.record({ width: fc.integer({ min: 1, max: 30 }), corners: fc.boolean(), allRound: fc.boolean() })),
});

function designOf({ rows, columns, sashing }: { rows: number; columns: number; sashing: { width: number; corners: boolean; allRound: boolean } | null }, over: Partial<QuiltDesign> = {}) {
  const strips = sashing && sashingOf(inches(sashing.width / 8), { cornerstones: sashing.corners ? "post" : null, allRound: sashing.allRound });
  return buildQuilt({ rows, columns, sashing: strips, ...over });
}

function countOf(setting: LaidSetting, kind: string): number {
  return setting.pieces.filter((piece) => piece.source.kind === kind).length;
}

describe("a straight setting", () => {
  it("covers its middle without gap or overlap, whatever the sashing", () => {
    fc.assert(
      fc.property(designs, (raw) => {
        const square = { width: inches(6), height: inches(4.5) };
        const setting = laySetStraight(designOf(raw), square);
        expectCovered(polygonsOf(setting, square), setting.width, setting.height);
        expect(Number.isInteger(setting.width) && Number.isInteger(setting.height)).toBe(true);
      }),
      { numRuns: 60, seed: 11 },
    );
  });

  it("has (columns - 1) x rows strips between columns inside, and (columns + 1) x rows all round", () => {
    const inner = laySetStraight(buildQuilt({ rows: 7, columns: 6, sashing: sashingOf(inches(2), { allRound: false, cornerstones: null }) }), SQUARE);
    expect([countOf(inner, "sashing"), countOf(inner, "sashing-row")]).toEqual([35, 6]);
    const round = laySetStraight(buildQuilt({ rows: 5, columns: 4, sashing: sashingOf(inches(2)) }), SQUARE);
    expect([countOf(round, "sashing"), countOf(round, "cornerstone")]).toEqual([49, 30]);
    expect([round.width, round.height]).toEqual([inches(4 * 6 + 5 * 2), inches(5 * 6 + 6 * 2)]);
  });
});

describe("a setting on point", () => {
  it("covers its middle without gap or overlap, with and without sashing", () => {
    fc.assert(
      fc.property(designs, (raw) => {
        const setting = laySetOnPoint(designOf({ ...raw, sashing: raw.sashing && { ...raw.sashing, allRound: true } }, { setting: "on-point" }), SQUARE);
        expectCovered(polygonsOf(setting), setting.width, setting.height);
      }),
      { numRuns: 60, seed: 12 },
    );
  });

  it("measures columns and rows times the diagonal of a square with its sashing", () => {
    const plain = laySetOnPoint(buildQuilt({ setting: "on-point", rows: 5, columns: 4 }), SQUARE);
    expect(plain.width).toBeCloseTo(4 * SQUARE.width * Math.SQRT2, 6);
    const sashed = laySetOnPoint(buildQuilt({ setting: "on-point", rows: 5, columns: 4, sashing: sashingOf(inches(1)) }), SQUARE);
    expect(sashed.height).toBeCloseTo(5 * inches(7) * Math.SQRT2, 6);
    expect([countOf(sashed, "sashing"), countOf(sashed, "half-cornerstone")]).toEqual([80, 18]);
    expect(countOf(sashed, "cornerstone")).toBe(4 * 4 + 3 * 5);
  });

  it("has 2 (rows - 1) + 2 (columns - 1) side triangles and four corners", () => {
    const setting = laySetOnPoint(buildQuilt({ setting: "on-point", rows: 10, columns: 9 }), SQUARE);
    expect([setting.squares.length, countOf(setting, "setting-triangle"), countOf(setting, "corner-triangle")]).toEqual([162, 34, 4]);
  });
});

describe("borders", () => {
  it("frame what they enclose without gap or overlap, butted and with corner squares", () => {
    for (const corners of [null, "post"]) {
      const borders = [{ width: inches(1.5), role: "edge", corners: null }, { width: inches(4), role: "edge", corners }];
      const laid = layBorders(borders, inches(30), inches(40));
      expect([laid.width, laid.height, laid.inset]).toEqual([inches(41), inches(51), inches(5.5)]);
      expectCovered([rectangle(laid.inset, laid.inset, inches(30), inches(40)), ...laid.pieces.map((piece) => piece.polygon)], laid.width, laid.height);
    }
  });

  it("butts the sides first, then top and bottom over them", () => {
    const laid = layBorders([{ width: inches(4), role: "edge", corners: null }], inches(28), inches(36));
    const longest = laid.pieces.map(({ polygon }) => Math.max(...polygon.map(([x]) => x)) - Math.min(...polygon.map(([x]) => x)));
    expect(longest.map((each) => length(each))).toEqual([inches(4), inches(4), inches(36), inches(36)]);
  });
});
