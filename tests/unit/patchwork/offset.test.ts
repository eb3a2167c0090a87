import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { signatureOf } from "@/lib/core/patchwork/congruence";
import { multiply, negate, parseExact, rational, subtract, add, type Exact } from "@/lib/core/patchwork/exact";
import type { Vector } from "@/lib/core/patchwork/exact-point";
import { offsetOutwards } from "@/lib/core/patchwork/offset";
import type { PlanePoint, Polygon } from "@/lib/core/piece/patch";

/** Distance from a point to the straight through two others, by the foot of the perpendicular: no code shared with the offset. */
function distance([px, py]: PlanePoint, [ax, ay]: PlanePoint, [bx, by]: PlanePoint): number {
  const along = ((px - ax) * (bx - ax) + (py - ay) * (by - ay)) / ((bx - ax) ** 2 + (by - ay) ** 2);
  return Math.hypot(px - (ax + along * (bx - ax)), py - (ay + along * (by - ay)));
}

function contains(polygon: Polygon, [x, y]: PlanePoint): boolean {
  const winding = polygon.reduce((sum, [ax, ay], index) => {
    const [bx, by] = polygon[(index + 1) % polygon.length] ?? [ax, ay];
    return sum + Math.atan2((ax - x) * (by - y) - (bx - x) * (ay - y), (ax - x) * (bx - x) + (ay - y) * (by - y));
  }, 0);
  return Math.abs(winding) > Math.PI;
}

/** Star-shaped about the middle, so simple, and often not convex; clockwise on the screen. */
const simple = fc.array(fc.integer({ min: 4000, max: 12000 }), { minLength: 3, maxLength: 9 }).map((reaches): Polygon =>
  reaches.map((reach, index) => {
    const angle = (2 * Math.PI * index) / reaches.length;
    return [reach * Math.cos(angle), reach * Math.sin(angle)];
  }),
);

describe("the cut shape", () => {
  it("has each side a seam outside the finished side, both its ends, and holds the finished shape", () => {
    fc.assert(
      fc.property(simple, fc.integer({ min: 10, max: 60 }), (finished, seam) => {
        const cut = offsetOutwards(finished, seam);
        for (const [index, corner] of finished.entries()) {
          const next = (index + 1) % finished.length;
          const to = finished[next] ?? corner;
          for (const end of [cut[index], cut[next]]) expect(distance(end ?? [0, 0], corner, to)).toBeCloseTo(seam, 5);
          expect(contains(cut, corner)).toBe(true);
        }
      }),
    );
  });

  it("keeps a point of 10 degrees sharp", () => {
    const finished: Polygon = [[0, 0], [10000, 10000 * Math.tan(Math.PI / 18)], [0, 10000 * Math.tan(Math.PI / 18)]];
    const cut = offsetOutwards(finished, 1016);
    const tip = cut[1] ?? [0, 0];
    // A tip reaches out by the seam over the sine of half its angle, whatever the angle.
    expect(Math.hypot(tip[0] - 10000, tip[1] - 10000 * Math.tan(Math.PI / 18))).toBeCloseTo(1016 / Math.sin(Math.PI / 36), 3);
  });
});

function number(text: string): Exact {
  const parsed = parseExact(text);
  if (!parsed.ok) throw new Error(parsed.fault.message);
  return parsed.value;
}

describe("congruence", () => {
  const place = fc.integer({ min: -20, max: 20 });
  const shapes = fc.uniqueArray(fc.tuple(place, place), { minLength: 3, maxLength: 7, selector: String }).map((corners) => corners.map(([x, y]): Vector => ({ x: rational(x), y: rational(y) })));
  const [half, root] = [number("1/2"), number("1/2r3")];
  /** By 60 degrees about the origin, and away. */
  const laidElsewhere = (corners: readonly Vector[]) =>
    corners.map(({ x, y }) => ({ x: add(subtract(multiply(x, half), multiply(y, root)), number("1/7r2")), y: add(multiply(x, root), multiply(y, half)) }));

  it("knows a shape wherever it lies, turned by 60 degrees, and begun at any corner", () => {
    fc.assert(
      fc.property(shapes, fc.nat(6), (corners, start) => {
        const begun = start % corners.length;
        const other = laidElsewhere([...corners.slice(begun), ...corners.slice(0, begun)]);
        expect(signatureOf(other).text).toBe(signatureOf(corners).text);
      }),
    );
  });

  it("knows a mirror image for one, and a shape of another size for none", () => {
    fc.assert(
      fc.property(shapes, (corners) => {
        const own = signatureOf(corners);
        const mirror = signatureOf([...corners].reverse().map(({ x, y }) => ({ x: negate(x), y })));
        expect([mirror.text, mirror.mirrored]).toEqual([own.mirrored, own.text]);
        const larger = signatureOf(corners.map(({ x, y }) => ({ x: multiply(x, number("r2")), y: multiply(y, number("r2")) })));
        expect([own.text, own.mirrored]).not.toContain(larger.text);
      }),
    );
  });
});
