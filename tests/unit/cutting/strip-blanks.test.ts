import { describe, expect, it } from "vitest";
import { blanksOf } from "@/lib/core/cutting/blanks";
import { formatMeasure } from "@/lib/core/measure/format";
import { inches, length, type Length } from "@/lib/core/measure/length";
import type { CutMethod, CutPiece, CutSize } from "@/lib/core/piece/cut-piece";

const WIDTH = inches(40);
const say = (value: Length) => formatMeasure(value, "yards");

function size(value: number): CutSize {
  return { exact: inches(value), ruler: inches(value) };
}

function buildPiece(method: CutMethod, count: number, more: Partial<CutPiece> = {}): CutPiece {
  return { key: "B/red/up", letter: "B", name: "Patch", role: "red" as CutPiece["role"], count, finished: [] as unknown as CutPiece["finished"], cut: [] as unknown as CutPiece["cut"], method, trimming: "sewn-as-cut", mayTurn: true, ...more };
}

function one(method: CutMethod, count: number, more: Partial<CutPiece> = {}) {
  const result = blanksOf([buildPiece(method, count, more)], WIDTH);
  if (!result.ok) throw new Error(result.fault.message);
  expect(result.value).toHaveLength(1);
  return result.value[0];
}

describe("blanksOf", () => {
  it("takes half as many squares for triangles cut once, a quarter for those cut twice, rounded up", () => {
    expect(one({ kind: "half-square", square: size(3.875) }, 21)).toMatchObject({ count: 11, gives: 2, mark: "diagonal", along: inches(3.875) });
    expect(one({ kind: "quarter-square", square: size(4.25) }, 21)).toMatchObject({ count: 6, gives: 4, mark: "both-diagonals" });
    expect(one({ kind: "half-rectangle", along: size(2), across: size(4) }, 5)).toMatchObject({ count: 3, gives: 2, mark: "diagonal", along: inches(2), across: inches(4) });
    expect(one({ kind: "square", side: size(2) }, 5)).toMatchObject({ count: 5, gives: 1, mark: "plain" });
    expect(one({ kind: "template", along: size(5), across: size(6) }, 5)).toMatchObject({ count: 5, mark: "template" });
  });

  it("counts angled strips by pitch, and never promises more than the exact pitch gives", () => {
    const method: CutMethod = { kind: "angled-strip", strip: size(3.5), pitch: { exact: inches(4) + 0.3, ruler: inches(4) }, endWaste: size(2), angleDegrees: 60, headToTail: true };
    expect(one(method, 12)).toMatchObject({ count: 12, along: inches(3.5), across: inches(4) + 1, endWaste: inches(2), mayTurn: false, mark: "slant" });
  });

  it("joins long strips from the fewest that are enough: n W - (n - 1) j", () => {
    const strip = (needed: number, lost: number): CutMethod => ({ kind: "long-strip", width: size(2.5), needed: inches(needed), join: "bias", lostAtJoin: inches(lost) });
    expect(one(strip(40, 2.5), 1)).toMatchObject({ count: 1, across: WIDTH, mark: "long" });
    expect(one(strip(30, 2.5), 2)).toMatchObject({ count: 2, across: inches(30) });
    expect(one(strip(77.5, 2.5), 1)).toMatchObject({ count: 2, across: WIDTH });
    expect(one(strip(78, 2.5), 1)).toMatchObject({ count: 3, across: WIDTH });
    // Common practice: 210 in of binding takes six strips across 40 in joined on the bias.
    expect(one(strip(210, 2.5), 1)).toMatchObject({ count: 6 });
  });

  it("leaves out what is not wanted and keeps equal blanks of two pieces apart", () => {
    const square: CutMethod = { kind: "square", side: size(2) };
    const result = blanksOf([buildPiece(square, 0, { key: "z" }), buildPiece(square, 3, { key: "a" }), buildPiece(square, 4, { key: "b" })], WIDTH);
    expect(result.ok && result.value.map((blank) => [blank.key, blank.count])).toEqual([["a", 3], ["b", 4]]);
  });

  it("names the piece that is too wide and what would fit", () => {
    const wide: CutMethod = { kind: "rectangle", along: size(4), across: size(41) };
    const kept = blanksOf([buildPiece(wide, 1, { mayTurn: false })], WIDTH, say);
    expect(kept).toMatchObject({ ok: false, fault: { code: "piece-too-wide", message: "B (Patch) is 41 in across, the fabric's usable width is 40 in. It would fit turned along the bolt, but its direction is kept." } });
    expect(blanksOf([buildPiece(wide, 1)], WIDTH).ok).toBe(true);
    const never = blanksOf([buildPiece({ kind: "square", side: size(41) }, 1)], WIDTH, say);
    expect(never).toMatchObject({ ok: false, fault: { message: "B (Patch) is 41 in across, the fabric's usable width is 40 in. It needs a fabric of 41 in usable width, or a seam." } });
    const join: CutMethod = { kind: "long-strip", width: size(2.5), needed: inches(90), join: "bias", lostAtJoin: length(WIDTH) };
    expect(blanksOf([buildPiece(join, 1)], WIDTH, say)).toMatchObject({ ok: false, fault: { code: "piece-too-wide" } });
  });
});
