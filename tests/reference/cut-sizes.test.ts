import { describe, expect, it } from "vitest";
import {
  cornerSettingSquare,
  diamondStrip,
  eightHalfSquares,
  equilateralStrip,
  flyingGeeseLargeSquare,
  flyingGeeseSmallSquare,
  halfSquareCut,
  octagonCorner,
  octagonInnerPart,
  octagonSide,
  quarterSquareCut,
  sideSettingSquare,
  squareCut,
} from "@/lib/core/patchwork/cut-sizes";
import { figure, readRows, type PublishedRow } from "./published-rows";

type Row = PublishedRow<string, number | number[]>;

const SEAM = 0.25;
const upToEighth = (size: number) => Math.ceil(size * 8 - 1e-9) / 8;
const nearestEighth = (size: number) => Math.round(size * 8) / 8;

interface Rule {
  readonly says: string;
  readonly size: (row: Row) => number;
}

const exactUp = (size: Rule["size"]): Rule => ({ says: "exact, then up to 1/8", size: (row) => upToEighth(size(row)) });
const exact = (size: Rule["size"]): Rule => ({ says: "exact", size });

/** One rule for each family of rows. */
const RULES: Readonly<Record<string, Rule>> = {
  square: exact((row) => squareCut(figure(row, "finished"), SEAM)),
  HST: exactUp((row) => halfSquareCut(figure(row, "finished"), SEAM)),
  QST: exactUp((row) => quarterSquareCut(figure(row, "finished_long_side"), SEAM)),
  "setting-triangle-side": { says: "rule of thumb: block × 1.414 + 1 1/4, up to 1/8", size: (row) => upToEighth(figure(row, "finished_block") * 1.414 + 1.25) },
  "setting-triangle-corner": { says: "rule of thumb: block × 0.707 + 7/8, up to 1/8", size: (row) => upToEighth(figure(row, "finished_block") * 0.707 + 0.875) },
  "block-diagonal": { says: "exact, to the nearest 1/8", size: (row) => nearestEighth(figure(row, "finished_block") * Math.SQRT2) },
  "flying-geese-4-at-once-large": exactUp((row) => flyingGeeseLargeSquare(figure(row, "finished_base"), SEAM)),
  "flying-geese-4-at-once-small": exactUp((row) => flyingGeeseSmallSquare(figure(row, "finished_base"), SEAM)),
  "HST-8-at-once": {
    says: "two half-square squares, each up to 1/8; oversize takes the next 1/8 of each",
    size: (row) => 2 * (upToEighth(eightHalfSquares(figure(row, "finished"), SEAM) / 2) + (row.inputs["style"] === "oversize" ? 0.125 : 0)),
  },
  "square-in-square-corner": exactUp((row) => halfSquareCut(figure(row, "finished_triangle_leg"), SEAM)),
  "equilateral-triangle-strip": exact((row) => equilateralStrip(figure(row, "finished_height"), SEAM)),
  "60-diamond-strip": exact((row) => diamondStrip(0, figure(row, "seam"))),
  "8-point-star-part": {
    says: "exact, or to the nearest 1/8 where the row says so",
    size: (row) => (row.inputs["round"] === "nearest-1/8" ? nearestEighth : (size: number) => size)(octagonCorner(figure(row, "finished_block"))),
  },
  "castle-wall-inner-part": exact((row) => octagonInnerPart(figure(row, "finished_block"))),
  "octagon-flat-length": exact((row) => octagonSide(figure(row, "finished_block"))),
};

const rows = readRows<string, number | number[]>("published-cut-sizes");
const followed = rows.filter((row) => row.recomputed === true);

describe("published cut sizes", () => {
  it.each(followed.map((row) => [row.id, row] as const))("%s", (_id, row) => {
    const rule = RULES[row.kind];
    if (!rule) throw new Error(`No rule is stated for ${row.kind}.`);
    expect(Math.abs(rule.size(row) - Number(row.expected)), rule.says).toBeLessThanOrEqual(row.tolerance + 1e-9);
  });

  it("says why the other rows differ", () => {
    const others = rows.filter((row) => row.recomputed !== true);
    expect(others.map((row) => row.id)).toEqual(["A-KM-side-6", "A-RTB-SIS-inner", "A-MTS-SIS-5", "A-QB-rect-add"]);
    for (const row of others) expect(row.reason, row.id).toMatch(/\w+/);
    expect(followed).toHaveLength(110);
  });

  it("setting triangles by thumb and exact-then-up part only where a mark lies between the two", () => {
    const parting = (kind: string, square: (block: number, seam: number) => number) =>
      followed.filter((row) => row.kind === kind && upToEighth(square(figure(row, "finished_block"), SEAM)) !== row.expected).map((row) => row.id);
    // 7 in: 11.107 exact is 11 1/8, 11.148 by thumb is 11 1/4. 13 in: 19.592 exact is 19 5/8, 19.632 by thumb is 19 3/4.
    expect(parting("setting-triangle-side", sideSettingSquare)).toEqual(["A-TANI-side-7", "A-TANI-side-13"]);
    expect(parting("setting-triangle-corner", cornerSettingSquare)).toEqual([]);
  });
});
