import { readFileSync } from "node:fs";
import path from "node:path";
import { describe, expect, it } from "vitest";
import { blanksOf } from "@/lib/core/cutting/blanks";
import { inches, length, toInches, type Length } from "@/lib/core/measure/length";
import { roundUp } from "@/lib/core/measure/rounding";
import { backingPanels } from "@/lib/core/patchwork/quilt-backing";
import { layBorders } from "@/lib/core/patchwork/quilt-borders";
import type { LaidSetting } from "@/lib/core/patchwork/quilt-piece";
import { bindingLength, cutHalfSquare, cutLongStrip, cutQuarterSquare, sewnAsCut } from "@/lib/core/patchwork/quilt-strips";
import { laySetOnPoint } from "@/lib/core/patchwork/setting-on-point";
import { laySetStraight } from "@/lib/core/patchwork/setting-straight";
import { buildQuilt, RULES } from "../unit/quilts/build-quilt";

/**
 * Published worked examples of finishing: binding, backing, borders, sashing and settings on point. Each row names its
 * source; rows that do not follow their own rule, or ask for something that is not made here, carry the reason.
 */
interface Row {
  readonly id: string;
  readonly kind: string;
  readonly inputs: Readonly<Record<string, unknown>>;
  readonly expected: unknown;
  readonly reason?: string;
}

const file = path.join(import.meta.dirname, "../fixtures/published-finishing.json");
const rows = (JSON.parse(readFileSync(file, "utf8")) as { rows: Row[] }).rows;
const SEAM = RULES.seamAllowance;
const EIGHTH: Length = inches(0.125);

function rowsOf(kind: string, where: (row: Row) => boolean = () => true): Row[] {
  const found = rows.filter((row) => row.kind === kind && row.reason === undefined && where(row));
  expect(found.length).toBeGreaterThan(0);
  return found;
}

function number(row: Row, name: string): number {
  const value = row.inputs[name];
  if (typeof value !== "number") throw new Error(`${row.id} lacks ${name}.`);
  return value;
}

function pair(row: Row, name: string): [number, number] {
  const value = row.inputs[name];
  if (!Array.isArray(value)) throw new Error(`${row.id} lacks ${name}.`);
  return [Number(value[0]), Number(value[1])];
}

/** Strips of a binding; the rule of the tables loses nothing at the joins, ours the strip's width on the bias. */
function bindingStrips(needed: number, width: number, stripLength: number, lost: "nothing" | "on the bias"): number {
  const strip = cutLongStrip({ key: "b", letter: "Binding", name: "Binding", role: "b" }, { exact: inches(width), ruler: inches(width) }, inches(needed), "bias", RULES);
  const piece = lost === "nothing" && strip.method.kind === "long-strip" ? { ...strip, method: { ...strip.method, lostAtJoin: length(0) } } : strip;
  const blanks = blanksOf([piece], inches(stripLength));
  if (!blanks.ok) throw new Error(blanks.fault.message);
  return blanks.value[0]?.count ?? 0;
}

function countOf(setting: LaidSetting, kind: string): number {
  return setting.pieces.filter((piece) => piece.source.kind === kind).length;
}

/** Up to the part of a yard that a row says; a quarter where it says nothing. */
function yardsOf(units: number, row: Row): number {
  const part = { "1/8": 8, "1/4": 4, "1/3": 3 }[String(row.inputs["round"] ?? "1/4")] ?? 4;
  return Math.ceil((toInches(units) / 36) * part - 1e-9) / part;
}

describe("binding", () => {
  it("goes round the quilt", () => {
    for (const row of rowsOf("perimeter")) {
      const [width, height] = pair(row, "quilt");
      expect([row.id, toInches(bindingLength({ width: inches(width), height: inches(height) }, 0))]).toEqual([row.id, row.expected]);
    }
    for (const row of rowsOf("perimeter-yards")) {
      const [width, height] = pair(row, "quilt");
      expect([row.id, toInches(bindingLength({ width: inches(width), height: inches(height) }, 0)) / 36]).toEqual([row.id, row.expected]);
    }
  });

  it("takes the strips that the tables give where nothing is lost at the joins, and never fewer with our joins", () => {
    for (const row of rowsOf("binding")) {
      const [needed, width, strip] = [number(row, "perimeter") + number(row, "extra"), number(row, "strip_width"), number(row, "strip_length")];
      const { strips, inches: total } = row.expected as { strips: number; inches: number | null };
      expect([row.id, bindingStrips(needed, width, strip, "nothing")]).toEqual([row.id, strips]);
      if (total !== null) expect([row.id, strips * width]).toEqual([row.id, total]);
      expect(bindingStrips(needed, width, strip, "on the bias")).toBeGreaterThanOrEqual(strips);
    }
    for (const row of rowsOf("binding-yardage")) {
      const [width, height] = pair(row, "quilt");
      const needed = 2 * (width + height) + number(row, "extra");
      const strips = bindingStrips(needed, number(row, "strip"), number(row, "strip_length"), "nothing");
      expect([row.id, yardsOf(strips * inches(number(row, "strip")), row)]).toEqual([row.id, row.expected]);
    }
  });
});

describe("backing", () => {
  it("takes the panels and the length of the tables", () => {
    for (const row of rowsOf("backing", ({ inputs }) => inputs["panels"] === undefined)) {
      const [width, height] = row.inputs["quilt"] ? pair(row, "quilt") : pair(row, "backing");
      const overhang = inches(row.inputs["quilt"] ? number(row, "overage_total") / 2 : 0);
      const across = inches(row.inputs["wide"] === undefined ? number(row, "usable_width") : number(row, "wide"));
      const panels = backingPanels({ width: inches(width), height: inches(height), overhang }, across, SEAM);
      expect([row.id, Math.round(yardsOf(panels.length, row) * 1e6)]).toEqual([row.id, Math.round(Number(row.expected) * 1e6)]);
    }
  });

  it("is as long as its panels together", () => {
    for (const row of rowsOf("backing", ({ inputs }) => inputs["panels"] !== undefined)) {
      const total = (number(row, "panels") * number(row, "length")) / 36;
      expect(total).toBeLessThanOrEqual(Number(row.expected) + 0.02);
      expect(Number(row.expected) - total).toBeLessThan(1 / 8);
    }
  });

  it("stands out on every side by what the tables say", () => {
    for (const row of rowsOf("longarm-overage")) {
      const [width, height] = pair(row, "quilt");
      const over = inches(number(row, "per_side"));
      const wide = backingPanels({ width: inches(width), height: inches(height), overhang: over }, inches(108), SEAM);
      expect([row.id, [toInches(wide.panelAcross), toInches(wide.panelLength)].sort((a, b) => a - b)]).toEqual([row.id, row.expected]);
    }
    for (const row of rowsOf("domestic-overage")) {
      const [width, height] = pair(row, "quilt");
      const sizes = row.expected as { batting: number[]; backing: number[] };
      expect([width + 2 * 2, height + 2 * 2]).toEqual(sizes.batting);
      const wide = backingPanels({ width: inches(width), height: inches(height), overhang: inches(4) }, inches(60), SEAM);
      expect([toInches(wide.panelAcross), toInches(wide.panelLength)].sort((a, b) => a - b)).toEqual(sizes.backing);
    }
  });
});

/** Cut lengths of a border by side, for a top of the size that it has unfinished. */
function borderLengths(top: readonly [number, number], cutWidth: number, corners: string | null): Record<string, number> {
  const finished = (cut: number) => inches(cut - 0.5);
  const { pieces } = layBorders([{ width: finished(cutWidth), role: "edge", corners }], finished(top[0]), finished(top[1]));
  return Object.fromEntries(
    pieces.flatMap(({ source, polygon }) => {
      if (source.kind !== "border") return [];
      const [xs, ys] = [polygon.map(([x]) => x), polygon.map(([, y]) => y)];
      const long = Math.max(Math.max(...xs) - Math.min(...xs), Math.max(...ys) - Math.min(...ys));
      return [[source.side, toInches(sewnAsCut(long, RULES).ruler)]];
    }),
  );
}

describe("borders", () => {
  it("are butted: sides at the height, then top and bottom over them", () => {
    for (const row of rowsOf("butted-border")) {
      const { first, second } = row.expected as { first: number; second: number };
      expect([row.id, borderLengths(pair(row, "top"), number(row, "strip"), null)]).toEqual([row.id, { left: first, right: first, top: second, bottom: second }]);
    }
  });

  it("have the edge's own length between corner squares", () => {
    for (const row of rowsOf("cornerstone-border")) {
      const { sides, ends, cornerstones } = row.expected as { sides: number; ends: number; cornerstones: number };
      expect([row.id, borderLengths(pair(row, "top"), number(row, "strip"), "post")]).toEqual([row.id, { left: sides, right: sides, top: ends, bottom: ends }]);
      expect(cornerstones).toBe(4);
    }
  });

  it("add up to the tables' total, which counts the quilt finished and the seams of four strips", () => {
    for (const row of rowsOf("border-total-length")) {
      const [width, height] = pair(row, "quilt");
      const lengths = borderLengths([width + 0.5, height + 0.5], number(row, "cut"), null);
      expect([row.id, Object.values(lengths).reduce((total, each) => total + each, 0)]).toEqual([row.id, row.expected]);
    }
  });
});

describe("settings", () => {
  const square = { width: inches(6), height: inches(6) };

  it("count the sashing between columns", () => {
    for (const row of rowsOf("sashing-inner-vertical")) {
      const sashing = { width: inches(2), role: "sash", cornerstones: null, allRound: false };
      const setting = laySetStraight(buildQuilt({ rows: number(row, "rows"), columns: number(row, "cols"), sashing }), square);
      expect([row.id, countOf(setting, "sashing")]).toEqual([row.id, row.expected]);
    }
  });

  it("count the blocks and triangles on point", () => {
    for (const row of rowsOf("on-point")) {
      const setting = laySetOnPoint(buildQuilt({ setting: "on-point", rows: number(row, "down"), columns: number(row, "across") }), square);
      const sides = countOf(setting, "setting-triangle");
      const ours: Record<string, number> = { blocks: setting.squares.length, side_triangles: sides, side_squares: Math.ceil(sides / 4) };
      for (const [what, count] of Object.entries(row.expected as Record<string, number>)) expect([row.id, what, ours[what]]).toEqual([row.id, what, count]);
    }
  });

  it("measure the quilt on point, the seams of its edge included", () => {
    for (const row of rowsOf("on-point-size")) {
      const block = inches(number(row, "block"));
      const setting = laySetOnPoint(buildQuilt({ setting: "on-point", rows: number(row, "down"), columns: number(row, "across") }), { width: block, height: block });
      const [width, height] = row.expected as [number, number];
      expect(Math.abs(toInches(setting.width) + 0.5 - width)).toBeLessThan(0.011);
      expect(Math.abs(toInches(setting.height) + 0.5 - height)).toBeLessThan(0.011);
    }
  });

  /**
   * The tables add the thumb's 1 1/4 and 7/8 in before they round up to the eighth. The exact addition is smaller by less
   * than an eighth, so the square is theirs or the eighth under it, and never smaller than the exact triangle needs.
   */
  it("cut setting triangles from the tables' squares or one eighth less", () => {
    for (const kind of ["setting-triangle-side", "setting-triangle-corner"]) {
      for (const row of rowsOf(kind)) {
        const [block, oversize] = [inches(number(row, "finished_block")), inches(Number(row.inputs["oversize"] ?? 0))];
        const head = { key: "t", letter: "T", name: "Triangle", role: "ground" };
        const piece = kind === "setting-triangle-side" ? cutQuarterSquare(head, block * Math.SQRT2, 4, true, RULES, oversize) : cutHalfSquare(head, block / Math.SQRT2, 4, true, RULES, oversize);
        const square = piece.method.kind === "quarter-square" || piece.method.kind === "half-square" ? piece.method.square : null;
        expect(square?.ruler).toBe(roundUp(square?.exact ?? 0, EIGHTH));
        expect([row.id, [0, 0.125].includes(Number(row.expected) - toInches(square?.ruler ?? 0))]).toEqual([row.id, true]);
      }
    }
  });
});

describe("the rows that are left out", () => {
  it("say why", () => {
    for (const row of rows.filter((each) => each.reason !== undefined)) expect(row.reason?.length).toBeGreaterThan(20);
    expect(rows.filter((each) => each.reason !== undefined).map((each) => each.id)).toEqual(["D-bind-3", "D-bias-2", "D-bias-3", "D-back-ST", "D-back-f7", "D-over-COW", "D-mit-4", "D-mit-5"]);
  });
});
