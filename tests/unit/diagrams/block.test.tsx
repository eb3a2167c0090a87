import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, it } from "vitest";
import { BlockDiagram } from "@/components/diagrams/block-diagram";
import { blockScale } from "@/components/diagrams/block-scale";
import { PatchDiagram } from "@/components/diagrams/patch-diagram";
import { middleOf } from "@/components/diagrams/patch-middle";
import { QuiltDiagram } from "@/components/diagrams/quilt-diagram";
import { RoleKey } from "@/components/diagrams/role-key";
import { seamLines } from "@/components/diagrams/seam-lines";
import { inches } from "@/lib/core/measure/length";
import type { Role } from "@/lib/core/piece/drawing";
import type { Patch, Polygon } from "@/lib/core/piece/patch";
import { rectangle } from "@/lib/core/patchwork/quilt-piece";
import { elements, figure, labelOf, texts } from "./read-svg";

const SIZE = { width: inches(4), height: inches(4) };
const ROLES: Role[] = [
  { id: "sky", name: "Sky", value: "light" },
  { id: "sea", name: "Sea", value: "light" },
  { id: "wheel", name: "Wheel", value: "dark" },
];
const FERRY = { id: "7", tile: "/fabrics/ferry.svg", colour: "#23365F" };
const IN = inches(1);

function patch(index: number, corners: Polygon, role: string | null, over: Partial<Patch> = {}): Patch {
  return { index, outline: [], corners, letter: "A", role, grain: "any", turn: 0, ...over };
}

/** A tall patch at the left, two squares at the right. */
const PATCHES = [
  patch(0, rectangle(0, 0, 2 * IN, 4 * IN), "wheel", { grain: "up" }),
  patch(1, rectangle(2 * IN, 0, 2 * IN, 2 * IN), "sky", { letter: "B" }),
  patch(2, rectangle(2 * IN, 2 * IN, 2 * IN, 2 * IN), null, { letter: "B" }),
];

describe("seam lines", () => {
  it("run through T-joints once and leave the outside out", () => {
    const lines = seamLines(PATCHES.map((each) => each.corners), SIZE.width, SIZE.height);
    const sorted = lines.map(({ from, to }) => [...from, ...to].map((part) => Math.round(part / IN))).sort((a, b) => (a[0] ?? 0) - (b[0] ?? 0) || (a[1] ?? 0) - (b[1] ?? 0));
    expect(sorted).toEqual([
      [2, 0, 2, 4],
      [2, 2, 4, 2],
    ]);
  });

  it("stay apart where nothing joins them, the three edges outside left out", () => {
    const steps = [rectangle(0, 0, 10, 10), rectangle(30, 0, 10, 10)];
    expect(seamLines(steps, 100, 100, 0.01)).toHaveLength(5);
  });
});

describe("the middle of a patch", () => {
  it("is its centre of gravity, with the room up to the nearest edge", () => {
    expect(middleOf(rectangle(0, 0, 10, 4))).toEqual({ at: [5, 2], room: 2 });
  });

  it("lies inside a patch that is bent round a corner", () => {
    const bent: Polygon = [[0, 0], [100, 0], [100, 10], [10, 10], [10, 100], [0, 100]];
    const { at, room } = middleOf(bent);
    expect(room).toBeGreaterThan(3);
    expect(at[0] < 10 || at[1] < 10).toBe(true);
  });
});

describe("a block", () => {
  const markup = renderToStaticMarkup(<BlockDiagram patches={PATCHES} size={SIZE} roles={ROLES} cloth={{ wheel: FERRY }} side={400} label="Two squares beside a bar." grain chosen={[1]} />);
  const fillOf = (index: number) => elements(markup, "path", { "data-patch": String(index) })[0]?.["fill"];

  it("fills a role with its fabric, a bare role with the grey of its value, and an unpainted patch with paper", () => {
    expect(fillOf(0)).toBe("url(#cloth-7) #23365F");
    expect(fillOf(1)).toMatch(/^url\(#block-.*-role-0\) #F1F1EC$/);
    expect(fillOf(2)).toBe("var(--paper)");
  });

  it("tells two roles of one value apart by their hatch", () => {
    const [sky, sea] = elements(markup, "pattern").map((each) => each["id"]);
    expect(sky).not.toBe(sea);
    const bodies = markup.match(/<pattern.*?<\/pattern>/g)?.map((each) => each.replace(/id="[^"]*"/, ""));
    expect(new Set(bodies).size).toBe(2);
  });

  it("draws patches to scale, the outside solid and the seams dashed", () => {
    expect(elements(markup, "path", { "data-patch": "0" })[0]?.["d"]).toBe("M3 3L203 3L203 403L3 403Z");
    const edge = elements(markup, "rect", { "data-mark": "cut-edge" })[0];
    expect([figure(edge, "width"), figure(edge, "height"), edge?.["stroke-dasharray"]]).toEqual([400, 400, undefined]);
    expect(markup).toMatch(/data-mark="sewn".*?stroke-dasharray="6 4"/);
  });

  it("writes every letter, an arrow where the grain is kept, and crosses round what is chosen", () => {
    expect(texts(markup)).toEqual(["A", "B", "B"]);
    expect(markup.match(/data-mark="grain"/g)).toHaveLength(1);
    expect(markup.match(/data-mark="chosen"/g)).toHaveLength(1);
    expect(labelOf(markup)).toBe("Two squares beside a bar.");
  });

  it("takes points of the picture to fractions of the block and back", () => {
    const scale = blockScale({ width: inches(4), height: inches(2) }, 400, true);
    const [x, y] = scale.place([inches(1), inches(1)]);
    expect(scale.fraction([x, y]).map((part) => Math.round(part * 1000) / 1000)).toEqual([0.25, 0.5]);
  });
});

describe("a patch", () => {
  it("has a solid cut edge, a dashed sewn line inside it, its letter and its grain", () => {
    const finished: Polygon = rectangle(0, 0, 3 * IN, 3 * IN);
    const markup = renderToStaticMarkup(<PatchDiagram letter="Dr" finished={finished} cut={rectangle(-IN / 4, -IN / 4, 3.5 * IN, 3.5 * IN)} role={ROLES[2]} label="Dr, square, 3 in finished" />);
    expect(elements(markup, "path", { "data-mark": "cut-edge" })[0]?.["d"]).toBe("M2 2L66 2L66 66L2 66Z");
    expect(markup).toContain("M6.6 6.6L61.4 6.6");
    expect(texts(markup)).toEqual(["Dr"]);
    expect(markup).toContain('data-mark="grain"');
  });
});

describe("a quilt", () => {
  const pieces = PATCHES.map(({ corners }, index) => ({ polygon: corners, role: index === 0 ? "wheel" : "sky", source: { kind: "plain" as const, cell: index } }));
  const layout = { width: SIZE.width, height: SIZE.height, centre: SIZE, pieces, bindingEdge: rectangle(0, 0, SIZE.width, SIZE.height) };
  const markup = renderToStaticMarkup(<QuiltDiagram layout={layout} roles={ROLES} cloth={{ wheel: FERRY }} width={402} height={202} label="A small quilt." binding="wheel" />);

  it("is one path a role, to scale inside its frame", () => {
    const paths = elements(markup, "path").filter((each) => each["data-role"] !== undefined);
    expect(paths.map((each) => each["data-role"])).toEqual(["wheel", "sky"]);
    expect(paths[0]?.["d"]).toBe("M1 1L101 1L101 201L1 201Z");
    expect(paths[1]?.["d"]?.match(/M/g)).toHaveLength(2);
    expect([figure(elements(markup, "svg")[0], "width"), figure(elements(markup, "svg")[0], "height")]).toEqual([202, 202]);
  });

  it("carries its own cloth, smaller than life, and says what it is", () => {
    expect(markup).toMatch(/<pattern id="quilt-[^"]*-cloth-0"[^>]*patternTransform="scale\(0.35\)"/);
    expect(labelOf(markup)).toBe("A small quilt.");
    expect(elements(markup, "rect", { "data-mark": "binding" })).toHaveLength(1);
  });
});

describe("the key of a drawing's roles", () => {
  it("names every role, with its fabric where it has one and its value where it has none", () => {
    const markup = renderToStaticMarkup(<RoleKey roles={ROLES} cloth={{ wheel: FERRY }} said={{ wheel: "Midnight Ferry, lot 7731" }} />);
    expect(markup.replaceAll(/<[^>]*>/g, "|").split("|").filter(Boolean)).toEqual(["Sky, light", "Sea, light", "Wheel: Midnight Ferry, lot 7731"]);
    expect(markup.match(/<pattern id="key-[^"]*-role-/g)).toHaveLength(2);
  });
});
