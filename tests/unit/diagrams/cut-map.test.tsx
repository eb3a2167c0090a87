import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, it } from "vitest";
import { CutMap } from "@/components/diagrams/cut-map";
import { diagonalsOf, stripRuns } from "@/components/diagrams/cut-map-plan";
import { inches, length, yards } from "@/lib/core/measure/length";
import type { Blank, Strip, StripPlan, WasteAllowance } from "@/lib/core/piece/strip-plan";
import { elements, figure, labelOf, texts } from "./read-svg";

const NONE = length(0);

function blank(over: Partial<Blank> & Pick<Blank, "key">): Blank {
  return { pieceKey: over.key, label: over.key, along: inches(4), across: inches(4), count: 1, gives: 1, mayTurn: false, endWaste: NONE, mark: "plain", ...over };
}

function strip(startsAt: number, width: number, cuts: readonly [key: string, across: number, along: number][]): Strip {
  let at = 0;
  return {
    startsAt: inches(startsAt),
    width: inches(width),
    cuts: cuts.map(([key, across, along]) => {
      const cut = { blank: key, at: inches(at), across: inches(across), along: inches(along), turned: false };
      at += across;
      return cut;
    }),
  };
}

const STRIPS = [strip(0, 4, [["B", 4, 4], ["B", 4, 4], ["C", 10, 3]]), strip(4, 4, [["B", 4, 4]]), strip(8, 2.5, [["Binding", 40, 2.5]])];
const PLAN: StripPlan = {
  status: "optimal",
  usableWidth: inches(40),
  strips: STRIPS,
  length: inches(10.5),
  bounds: { strips: inches(10.5), anyLayout: inches(10.5) },
  work: { patterns: 0, programmes: 0, nodes: 0 },
};
const BLANKS = [blank({ key: "B", mark: "diagonal" }), blank({ key: "C" }), blank({ key: "Binding", mark: "long" })];
const ALLOWANCE: WasteAllowance = { net: PLAN.length, straightening: inches(1), misCuts: NONE, prewash: NONE, endOfBolt: NONE, rounding: NONE, cutLength: yards(0.5), fits: null };

describe("a cut map", () => {
  const markup = renderToStaticMarkup(<CutMap plan={PLAN} blanks={BLANKS} allowance={ALLOWANCE} system="yards" width={400} mostHeight={900} name="Midnight Ferry" />);
  const cloth = elements(markup, "rect", { "data-mark": "cloth" })[0];
  const scale = figure(cloth, "width") / 18;

  it("draws both ways at one scale", () => {
    expect(figure(cloth, "height") / 40).toBeCloseTo(scale, 2);
  });

  it("lays every sub-cut at its place and in its size", () => {
    const wanted = STRIPS.flatMap((each) => each.cuts.map((cut) => ({ key: cut.blank, x: (each.startsAt + inches(1)) / inches(1), y: cut.at / inches(1), width: cut.along / inches(1), height: cut.across / inches(1) })));
    const drawn = elements(markup, "rect").filter((each) => each["data-cut"] !== undefined);
    expect(drawn).toHaveLength(wanted.length);
    drawn.forEach((rect, index) => {
      const want = wanted[index];
      expect(rect["data-cut"]).toBe(want?.key);
      expect((figure(rect, "x") - figure(cloth, "x")) / scale).toBeCloseTo(want?.x ?? NaN, 1);
      expect((figure(rect, "y") - figure(cloth, "y")) / scale).toBeCloseTo(want?.y ?? NaN, 1);
      expect(figure(rect, "width") / scale).toBeCloseTo(want?.width ?? NaN, 1);
      expect(figure(rect, "height") / scale).toBeCloseTo(want?.height ?? NaN, 1);
    });
  });

  it("numbers strips in cutting order and measures them at the foot", () => {
    expect(texts(markup).slice(0, 20)).toEqual(expect.arrayContaining(["1", "2", "3"]));
    expect(texts(markup)).toEqual(expect.arrayContaining(["2 strips of 4 in", "2 1\u20442 in", "6 1\u20442"]));
  });

  it("says what it shows", () => {
    expect(labelOf(markup)).toBe(
      "Cut map of half a yard of Midnight Ferry, 40 inches wide, both ways at one scale: 1 inch squares the end; strips 1 to 2 are 4 inches wide and strip 3 is 2 and a half inches wide; 6 and a half inches stays spare.",
    );
  });

  it("stays inside the height it is given, still at one scale", () => {
    const low = renderToStaticMarkup(<CutMap plan={PLAN} blanks={BLANKS} system="metres" width={2000} mostHeight={300} name="Osier" />);
    const sheet = elements(low, "rect", { "data-mark": "cloth" })[0];
    expect(figure(elements(low, "svg")[0], "height")).toBeLessThanOrEqual(300);
    expect(figure(sheet, "width") / 10.5).toBeCloseTo(figure(sheet, "height") / 40, 1);
  });

  it("draws a plan of nothing", () => {
    const empty = renderToStaticMarkup(<CutMap plan={{ ...PLAN, strips: [], length: NONE }} blanks={[]} allowance={ALLOWANCE} system="yards" width={400} name="Osier" />);
    expect(labelOf(empty)).toContain("there is nothing to cut");
    expect(empty).not.toContain("NaN");
  });
});

describe("runs of strips", () => {
  it("join equal neighbours and say the least that is over", () => {
    expect(stripRuns(PLAN, BLANKS).map((run) => [run.first, run.count, run.width, run.over])).toEqual([
      [0, 2, inches(4), inches(22)],
      [2, 1, inches(2.5), NONE],
    ]);
  });

  it("count what is lost at slanting ends as used", () => {
    const slanting = blank({ key: "D", mark: "slant", endWaste: inches(2) });
    const plan = { ...PLAN, strips: [strip(0, 3, [["D", 3, 3], ["D", 3, 3]])] };
    expect(stripRuns(plan, [slanting])[0]?.over).toBe(inches(32));
  });
});

describe("diagonals", () => {
  const half = { kind: "half-rectangle", along: { exact: 2, ruler: length(2) }, across: { exact: 4, ruler: length(4) } } as const;
  const piece = { key: "E", letter: "E", name: "", role: "a", count: 1, cut: [], method: half, trimming: "trimmed-after-sewing", mayTurn: true } as const;

  it("cut squares once or twice, and nothing else", () => {
    expect(diagonalsOf(blank({ key: "B", mark: "both-diagonals" }), undefined, false)).toEqual({ rises: true, falls: true });
    expect(Object.values(diagonalsOf(blank({ key: "B", mark: "diagonal" }), undefined, false)).filter(Boolean)).toHaveLength(1);
    expect(diagonalsOf(blank({ key: "B" }), undefined, false)).toEqual({ rises: false, falls: false });
  });

  it("cut a rectangle along the diagonal of its hand, the other one when it is turned or mirrored", () => {
    const mark = blank({ key: "E", mark: "diagonal" });
    const finished = [[0, 0], [4, 2], [0, 2]] as const;
    const mirrored = [[4, 0], [4, 2], [0, 2]] as const;
    const way = diagonalsOf(mark, { ...piece, finished }, false);
    expect(diagonalsOf(mark, { ...piece, finished }, true)).toEqual({ rises: way.falls, falls: way.rises });
    expect(diagonalsOf(mark, { ...piece, finished: mirrored }, false)).toEqual({ rises: way.falls, falls: way.rises });
  });
});
