import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { inches } from "@/lib/core/measure/length";
import { analyseBlock } from "@/lib/core/patchwork/analyse-block";
import { formatExact, rational } from "@/lib/core/patchwork/exact";
import { formatPoint, toPlane } from "@/lib/core/patchwork/exact-point";
import { holds } from "@/lib/core/patchwork/locate-exact";
import { offsetOutwards } from "@/lib/core/patchwork/offset";
import { areaOf, turned } from "@/lib/core/patchwork/plane";
import { subdivide } from "@/lib/core/patchwork/subdivide";
import type { Drawing, ExactPoint, Seam } from "@/lib/core/piece/drawing";
import type { Polygon } from "@/lib/core/piece/patch";

const GRID = 8;
const at = (x: number, y: number): ExactPoint => [formatExact(rational(x, GRID)), formatExact(rational(y, GRID))];
const seam = (x1: number, y1: number, x2: number, y2: number): Seam => ({ kind: "straight", from: at(x1, y1), to: at(x2, y2) });
const drawing = (seams: readonly Seam[]): Drawing => ({ outline: "rectangle", grid: { columns: GRID, rows: GRID }, seams, paints: [] });
const SIZE = { width: inches(8), height: inches(8) };

function faces(seams: readonly Seam[]) {
  const result = subdivide(drawing(seams));
  if (!result.ok) throw new Error(result.fault.message);
  return result.value;
}

/** A seam right across the block through two grid points: both its ends lie on the edge, so nothing dangles. */
const across = fc.tuple(fc.nat(GRID), fc.nat(GRID), fc.boolean()).map(([a, b, level]) => (level ? seam(0, a, GRID, b) : seam(a, 0, b, GRID)));

describe("cutting a drawing into patches", () => {
  it("finds two for one seam across, and four for two that cross", () => {
    expect(faces([]).faces).toHaveLength(1);
    expect(faces([seam(0, 0, 8, 8)]).faces).toHaveLength(2);
    expect(faces([seam(0, 0, 8, 8), seam(8, 0, 0, 8)]).faces).toHaveLength(4);
    expect(faces([seam(0, 0, 8, 8), seam(8, 0, 0, 8), seam(0, 4, 8, 4), seam(4, 0, 4, 8)]).crowded.map(formatPoint)).toEqual([at(4, 4)]);
  });

  it("says where seams end in nothing, and where they hang together alone", () => {
    expect(faces([seam(0, 0, 4, 4)])).toMatchObject({ faces: [expect.anything()], openEnds: [expect.anything()] });
    const island = [seam(2, 2, 4, 2), seam(4, 2, 4, 4), seam(4, 4, 2, 2)];
    expect(faces(island).islands).toHaveLength(1);
    expect(faces(island).faces).toHaveLength(1);
    const tied = faces([...island, seam(0, 2, 2, 2)]);
    expect(tied.faces).toHaveLength(1);
    expect(tied.islands.length + tied.openEnds.length).toBeGreaterThan(0);
  });

  it("takes overlapping seams for one", () => {
    expect(faces([seam(0, 4, 6, 4), seam(2, 4, 8, 4), seam(0, 4, 8, 4)]).faces).toHaveLength(2);
  });

  it("refuses a seam of no length, outside the block, or unreadable", () => {
    for (const bad of [seam(1, 1, 1, 1), seam(0, 0, 9, 9), { kind: "straight" as const, from: ["x", "0"] as const, to: at(1, 1) }]) {
      expect(subdivide(drawing([bad]))).toMatchObject({ ok: false, fault: { code: "bad-drawing" } });
    }
  });

  it("gives up on seams that cross a million times, and on more than it may hold", () => {
    const line = (index: number, level: boolean): Seam => {
      const place = `${index + 1}/1001`;
      return level ? { kind: "straight", from: ["0", place], to: ["1", place] } : { kind: "straight", from: [place, "0"], to: [place, "1"] };
    };
    const net = Array.from({ length: 2000 }, (_, index) => line(index % 1000, index < 1000));
    expect(analyseBlock(drawing(net), SIZE)).toMatchObject({ ok: false, fault: { code: "too-large" } });
    expect(analyseBlock(drawing([...net, line(0, true)]), SIZE)).toMatchObject({ ok: false, fault: { code: "too-large" } });
    const full = Array.from({ length: 62 }, (_, index) => line(16 * (index % 31), index < 31));
    expect(analyseBlock(drawing(full.slice(0, 61)), SIZE)).toMatchObject({ ok: true });
    expect(analyseBlock(drawing(full), SIZE)).toMatchObject({ ok: false, fault: { code: "too-large" } });
  });

  it("covers the block once: areas add up, Euler's formula holds, and every place lies in one patch", () => {
    const place = fc.tuple(fc.integer({ min: 1, max: 996 }), fc.integer({ min: 1, max: 996 }));
    fc.assert(
      fc.property(fc.array(across, { maxLength: 7 }), fc.array(place, { minLength: 5, maxLength: 5 }), (seams, places) => {
        const { faces: found, openEnds, islands } = faces(seams);
        expect([...openEnds, ...islands]).toEqual([]);
        const area = found.reduce((sum, face) => sum + areaOf(face.map((corner) => toPlane(corner, 1, 1))), 0);
        expect(area).toBeCloseTo(1, 9);
        for (const [x, y] of places) {
          const point = { x: rational(x, 997), y: rational(y, 997) };
          const inside = found.filter((face) => holds(face, point)).length;
          expect(inside).toBeLessThanOrEqual(1);
          // 997 is prime: a place lies on a seam only where the seam's own equation says so.
          if (inside === 0) expect(seams.some((each) => liesOn(each, x / 997, y / 997))).toBe(true);
        }
        expect(found.length).toBe(facesByEuler(seams));
      }),
      { numRuns: 150 },
    );
  });
});

function ends({ from, to }: Seam): [number, number, number, number] {
  const read = (text: string) => {
    const [over = "0", under = "1"] = text.split("/");
    return Number(over) / Number(under);
  };
  return [read(from[0]), read(from[1]), read(to[0]), read(to[1])];
}

function liesOn(each: Seam, x: number, y: number): boolean {
  const [x1, y1, x2, y2] = ends(each);
  return Math.abs((x2 - x1) * (y - y1) - (y2 - y1) * (x - x1)) < 1e-9;
}

/** For lines right across a convex block: one face, and one more for each line at each crossing that it enters. */
function facesByEuler(seams: readonly Seam[]): number {
  const lines: [number, number, number, number][] = [];
  for (const each of seams.map(ends)) {
    const [x1, y1, x2, y2] = each;
    const edge = (x1 === x2 && (x1 === 0 || x1 === 1)) || (y1 === y2 && (y1 === 0 || y1 === 1));
    const same = lines.some(([a, b, c, d]) => [[x1, y1], [x2, y2]].every(([x = 0, y = 0]) => Math.abs((c - a) * (y - b) - (d - b) * (x - a)) < 1e-12));
    if (!edge && !same) lines.push(each);
  }
  let count = 1;
  lines.forEach(([x1, y1, x2, y2], index) => {
    const crossings = new Set<string>();
    for (const [x3, y3, x4, y4] of lines.slice(0, index)) {
      const turn = (x2 - x1) * (y4 - y3) - (y2 - y1) * (x4 - x3);
      if (Math.abs(turn) < 1e-12) continue;
      const t = ((x3 - x1) * (y4 - y3) - (y3 - y1) * (x4 - x3)) / turn;
      const s = ((x3 - x1) * (y2 - y1) - (y3 - y1) * (x2 - x1)) / turn;
      if (t > 1e-9 && t < 1 - 1e-9 && s > 1e-9 && s < 1 - 1e-9) crossings.add((Math.round(t * 1e9) / 1e9).toFixed(7));
    }
    count += 1 + crossings.size;
  });
  return count;
}

describe("letters", () => {
  it("name a shape whatever its turn, and its mirror image with an r", () => {
    // Two half-rectangle triangles of each hand.
    const result = analyseBlock(drawing([seam(4, 0, 4, 8), seam(0, 0, 4, 8), seam(4, 8, 8, 0)]), SIZE);
    if (!result.ok) throw new Error(result.fault.message);
    expect(result.value.patches.map((patch) => patch.letter)).toEqual(["A", "A", "Ar", "Ar"].sort());
    expect(result.value.shapes.map((shape) => [shape.letter, shape.count, shape.symmetric])).toEqual([["A", 2, false], ["Ar", 2, false]]);
  });

  it("come from the geometry alone", () => {
    const seams = [seam(0, 0, 8, 8), seam(8, 0, 0, 8)];
    const bare = analyseBlock(drawing(seams), SIZE);
    const painted = analyseBlock({ ...drawing([...seams].reverse()), paints: [{ at: at(4, 1), role: "sky" }] }, SIZE);
    if (!bare.ok || !painted.ok) throw new Error("not read");
    expect(painted.value.patches.map((patch) => patch.letter)).toEqual(bare.value.patches.map((patch) => patch.letter));
    expect(painted.value.patches.filter((patch) => patch.role === "sky")).toHaveLength(1);
  });

  it("lay their model over each patch at its turn", () => {
    const result = analyseBlock(drawing([seam(0, 0, 8, 8), seam(8, 0, 0, 8), seam(4, 0, 8, 4)]), SIZE);
    if (!result.ok) throw new Error(result.fault.message);
    for (const patch of result.value.patches) {
      const model = result.value.shapes.find((shape) => shape.letter === patch.letter)?.finished ?? [];
      expect(sides(turned(model, patch.turn))).toEqual(sides(patch.corners));
    }
  });
});

/** The sides as a set of arrows, whatever corner comes first. */
function sides(polygon: Polygon): string[] {
  const tidy = (value: number) => (Math.round(value) === 0 ? 0 : Math.round(value));
  return polygon.map(([x, y], index) => {
    const [nextX, nextY] = polygon[(index + 1) % polygon.length] ?? [x, y];
    return `${tidy(nextX - x)},${tidy(nextY - y)}`;
  }).sort();
}

describe("the cut shape", () => {
  it("keeps every side a seam away from the finished one, however sharp the corner", () => {
    const corner = fc.tuple(fc.integer({ min: 1, max: 400 }), fc.integer({ min: 1, max: 400 }));
    fc.assert(
      fc.property(fc.tuple(corner, corner, corner), fc.integer({ min: 1, max: 20 }), ([a, b, c], seamWidth) => {
        const triangle = areaOf([a, b, c]) > 0 ? [a, b, c] : [a, c, b];
        if (Math.abs(areaOf(triangle)) < 1) return;
        const cut = offsetOutwards(triangle, seamWidth);
        for (const [index, [x, y]] of cut.entries()) {
          const [x1, y1] = triangle[index] ?? [0, 0];
          const [x2, y2] = triangle[(index + 1) % 3] ?? [0, 0];
          const distance = ((x2 - x1) * (y - y1) - (y2 - y1) * (x - x1)) / Math.hypot(x2 - x1, y2 - y1);
          expect(distance).toBeCloseTo(-seamWidth, 4);
        }
      }),
    );
  });
});
