import { describe, expect, it } from "vitest";
import { inches } from "@/lib/core/measure/length";
import { analyseBlock } from "@/lib/core/patchwork/analyse-block";
import { blockCutList, blockGrowth } from "@/lib/core/patchwork/cut-list";
import { areaOf } from "@/lib/core/patchwork/plane";
import { TRADITIONAL_BLOCKS } from "@/lib/core/patchwork/traditional-blocks";

const RULES = { seamAllowance: inches(0.25), rulerStep: inches(0.125) };

function analysed(slug: string) {
  const block = TRADITIONAL_BLOCKS.find((each) => each.slug === slug);
  if (!block) throw new Error(`no block ${slug}`);
  const analysis = analyseBlock(block.drawing, block.size);
  if (!analysis.ok) throw new Error(analysis.fault.message);
  return { block, ...analysis.value, list: blockCutList(analysis.value, block.size, RULES) };
}

const lines = (slug: string) => analysed(slug).list.map((piece) => `${piece.count} ${piece.letter} ${piece.role} ${piece.method.kind}`);
const exactInches = (units: number) => Math.round((units / 4064) * 1000) / 1000;

describe("every block of the library", () => {
  it.each(TRADITIONAL_BLOCKS.map((block) => block.slug))("%s is whole, painted and cuttable", (slug) => {
    const { block, patches, shapes, complaints, list } = analysed(slug);
    expect(complaints.filter((each) => each.code !== "crowded")).toEqual([]);
    const area = patches.reduce((sum, patch) => sum + areaOf(patch.corners), 0);
    expect(area).toBeCloseTo(block.size.width * block.size.height, 0);
    for (const patch of patches) expect(areaOf(patch.corners)).toBeGreaterThan(0);
    expect(list.reduce((sum, piece) => sum + piece.count, 0)).toBe(patches.length);
    expect(shapes.reduce((sum, shape) => sum + shape.count, 0)).toBe(patches.length);
    expect(new Set(list.map((piece) => piece.key)).size).toBe(list.length);
    const roles = new Set(block.roles.map((role) => role.id));
    for (const piece of list) expect(roles).toContain(piece.role);
  });
});

describe("cut lists that a quilter knows (common practice)", () => {
  it("a nine patch of 9 in is nine squares of 3 1/2 in", () => {
    expect(lines("nine-patch")).toEqual(["5 A dark square", "4 A light square"]);
    const [piece] = analysed("nine-patch").list;
    expect(piece?.method).toEqual({ kind: "square", side: { exact: inches(3.5), ruler: inches(3.5) } });
    expect(piece?.trimming).toBe("sewn-as-cut");
  });

  it("Clay's Choice of 12 in has 3 7/8 in squares for its triangles, one letter in three fabrics", () => {
    expect(lines("clays-choice")).toEqual(["4 A corner square", "4 B hub half-square", "8 B sky half-square", "12 B wheel half-square"]);
    const { shapes, list } = analysed("clays-choice");
    expect(shapes).toHaveLength(2);
    const [, hub] = list;
    if (hub?.method.kind !== "half-square") throw new Error("not a half-square");
    expect(hub.method.square.ruler).toBe(inches(3.875));
    expect(exactInches(hub.method.square.exact)).toBe(3.854);
  });

  it("an Ohio Star of 12 in has quarter-square triangles of 5 1/4 in", () => {
    const star = analysed("ohio-star").list.filter((piece) => piece.method.kind === "quarter-square");
    expect(star.map((piece) => [piece.count, piece.role])).toEqual([[8, "dark"], [8, "light"]]);
    for (const { method } of star) expect(method.kind === "quarter-square" && method.square.ruler).toBe(inches(5.25));
  });

  it("a Sawtooth Star of 12 in has geese from 7 1/4 in and star points from 3 7/8 in squares", () => {
    const { list } = analysed("sawtooth-star");
    const squares = list.flatMap(({ method, role, count }) => (method.kind === "quarter-square" || method.kind === "half-square" ? [`${count} ${role} ${exactInches(method.square.ruler)}`] : []));
    expect(squares.sort()).toEqual(["4 light 7.25", "8 dark 3.875"]);
    expect(list.map((piece) => piece.name)).toContain("Quarter-square triangle, 6 in");
  });

  it("a square set on point in a 6 in block has sides of 3 times the root of 2", () => {
    const { list } = analysed("diamond-in-a-square");
    const centre = list.find((piece) => piece.role === "centre");
    if (centre?.method.kind !== "square") throw new Error("not a square");
    expect(exactInches(centre.method.side.exact)).toBe(4.743);
    expect(centre.method.side.ruler).toBe(inches(4.75));
    expect(centre.name).toBe("Square, 4.243 in");
  });

  it("a triangle in a square has a blunted strip and a pair of hands", () => {
    const { shapes, list } = analysed("fifty-four-forty");
    expect(shapes.map((shape) => shape.letter).sort()).toEqual(["A", "B", "C", "Cr"].sort());
    const middle = list.find((piece) => piece.method.kind === "angled-strip");
    if (middle?.method.kind !== "angled-strip") throw new Error("no strip");
    expect(middle.method.strip.ruler).toBe(inches(4.5));
    expect(middle.method.angleDegrees).toBeCloseTo((Math.atan(2) * 180) / Math.PI, 6);
    const sides = list.filter((piece) => piece.method.kind === "half-rectangle");
    expect(sides.map((piece) => piece.count)).toEqual([4, 4]);
    for (const side of sides) expect(side.trimming).toBe("trimmed-after-sewing");
  });

  it("eight seams at a pinwheel's hub are told, and nothing grows that falls on the ruler", () => {
    expect(analysed("pinwheel").complaints.map((each) => each.code)).toEqual(["crowded"]);
    expect(blockGrowth(analysed("nine-patch"), RULES)).toEqual({ across: 0, down: 0 });
    const grown = blockGrowth(analysed("diamond-in-a-square"), RULES);
    expect(exactInches(grown.across)).toBeGreaterThan(0);
  });
});
