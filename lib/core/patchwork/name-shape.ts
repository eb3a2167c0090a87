import { formatCentimetres, formatExactInches, type MeasureSystem } from "../measure/format";
import type { PlanePoint, Polygon } from "../piece/patch";
import { boundsOf, directionOf, narrowestWidth, normalTurn, sideLength, sidesOf } from "./plane";

/** What a quilter sees in a finished shape; `side`s and angles are floats, lengths in 1/160 mm. */
export type NamedShape =
  | { readonly kind: "square"; readonly side: number }
  | { readonly kind: "rectangle"; readonly long: number; readonly short: number }
  | { readonly kind: "right-isosceles"; readonly leg: number }
  | { readonly kind: "right-triangle"; readonly long: number; readonly short: number }
  | { readonly kind: "equilateral"; readonly side: number }
  | { readonly kind: "isosceles"; readonly base: number; readonly height: number }
  | { readonly kind: "triangle" }
  | { readonly kind: "diamond"; readonly side: number; readonly degrees: number }
  | { readonly kind: "parallelogram" }
  | { readonly kind: "trapezoid" }
  | { readonly kind: "kite" }
  | { readonly kind: "many-sided"; readonly sides: number; readonly regular: boolean };

/** Floats of one and the same exact figure differ far less than this; sizes that a person tells apart differ far more. */
const SAME = 1e-3;
const SAME_DEGREES = 1e-6;

export function nearly(a: number, b: number): boolean {
  return Math.abs(a - b) < SAME;
}

/** Interior angles in degrees, one a corner. */
export function anglesOf(polygon: Polygon): number[] {
  const sides = sidesOf(polygon);
  return sides.map((side, index) => {
    const before = sides[(index + sides.length - 1) % sides.length] ?? side;
    const turn = normalTurn(directionOf(side) - directionOf(before));
    return 180 - (turn > 180 ? turn - 360 : turn);
  });
}

export function areParallel(a: PlanePoint, b: PlanePoint): boolean {
  return Math.abs(a[0] * b[1] - a[1] * b[0]) < SAME_DEGREES * sideLength(a) * sideLength(b);
}

export function nameShape(polygon: Polygon): NamedShape {
  const sides = sidesOf(polygon);
  const lengths = sides.map(sideLength);
  const angles = anglesOf(polygon);
  if (polygon.length === 3) return nameTriangle(lengths, angles, polygon);
  if (polygon.length === 4 && angles.every((angle) => angle < 180)) return nameFourSided(sides, lengths, angles);
  const regular = lengths.every((each) => nearly(each, lengths[0] ?? 0)) && angles.every((each) => Math.abs(each - (angles[0] ?? 0)) < 1e-3);
  return { kind: "many-sided", sides: polygon.length, regular };
}

function nameTriangle(lengths: readonly number[], angles: readonly number[], polygon: Polygon): NamedShape {
  const [shortest = 0, middle = 0, longest = 0] = [...lengths].sort((a, b) => a - b);
  if (angles.some((angle) => Math.abs(angle - 90) < SAME_DEGREES)) {
    return nearly(shortest, middle) ? { kind: "right-isosceles", leg: shortest } : { kind: "right-triangle", long: middle, short: shortest };
  }
  if (nearly(shortest, longest)) return { kind: "equilateral", side: longest };
  if (nearly(shortest, middle)) return { kind: "isosceles", base: longest, height: heightOver(polygon, lengths.indexOf(longest)) };
  if (nearly(middle, longest)) return { kind: "isosceles", base: shortest, height: heightOver(polygon, lengths.indexOf(shortest)) };
  return { kind: "triangle" };
}

/** How far the polygon reaches square to one of its sides. */
export function heightOver(polygon: Polygon, index: number): number {
  const [x, y] = polygon[index] ?? [0, 0];
  const [dx, dy] = sidesOf(polygon)[index] ?? [1, 0];
  return Math.max(...polygon.map(([px, py]) => Math.abs(dx * (py - y) - dy * (px - x)))) / Math.hypot(dx, dy);
}

function nameFourSided(sides: readonly PlanePoint[], lengths: readonly number[], angles: readonly number[]): NamedShape {
  const [a = 0, b = 0, c = 0, d = 0] = lengths;
  const allSame = [b, c, d].every((each) => nearly(each, a));
  if (angles.every((angle) => Math.abs(angle - 90) < SAME_DEGREES)) return allSame ? { kind: "square", side: a } : { kind: "rectangle", long: Math.max(a, b), short: Math.min(a, b) };
  const [first, second, third, fourth] = sides;
  const firstPair = first !== undefined && third !== undefined && areParallel(first, third);
  const secondPair = second !== undefined && fourth !== undefined && areParallel(second, fourth);
  if (firstPair && secondPair) return allSame ? { kind: "diamond", side: a, degrees: Math.min(...angles) } : { kind: "parallelogram" };
  if (firstPair || secondPair) return { kind: "trapezoid" };
  if ((nearly(a, b) && nearly(c, d)) || (nearly(b, c) && nearly(d, a))) return { kind: "kite" };
  return { kind: "many-sided", sides: 4, regular: false };
}

const MANY: Readonly<Record<number, string>> = { 4: "Four-sided shape", 5: "Pentagon", 6: "Hexagon", 7: "Heptagon", 8: "Octagon" };

/** "Square, 3 in", "Half-square triangle, 3 in"; sizes as finished, exact to three decimals of an inch. */
export function sayShape(polygon: Polygon, system: MeasureSystem): string {
  const shape = nameShape(polygon);
  const { size, unit } = inSystem(system);
  switch (shape.kind) {
    case "square":
      return `Square, ${size(shape.side)} ${unit}`;
    case "rectangle":
      return `Rectangle, ${size(shape.short)} × ${size(shape.long)} ${unit}`;
    case "right-isosceles":
      return `Half-square triangle, ${size(shape.leg)} ${unit}`;
    case "right-triangle":
      return `Half-rectangle triangle, ${size(shape.short)} × ${size(shape.long)} ${unit}`;
    case "equilateral":
      return `Equilateral triangle, ${size(shape.side)} ${unit}`;
    case "isosceles":
      return `Triangle, base ${size(shape.base)}, height ${size(shape.height)} ${unit}`;
    case "diamond":
      return `Diamond of ${Math.round(shape.degrees)} degrees, ${size(shape.side)} ${unit}`;
    case "many-sided":
      return `${MANY[shape.sides] ?? `Shape of ${shape.sides} sides`}, ${size(narrowestWidth(polygon))} ${unit} across`;
    default: {
      const { width, height } = boundsOf(polygon);
      const name = { triangle: "Triangle", parallelogram: "Parallelogram", trapezoid: "Trapezoid", kite: "Kite" }[shape.kind];
      return `${name}, ${size(height)} × ${size(width)} ${unit}`;
    }
  }
}

/** A right triangle that is cut from a square cut twice is named by its long side, as quilters do: "Quarter-square triangle, 6 in". */
export function sayQuarterSquare(polygon: Polygon, system: MeasureSystem): string {
  const { size, unit } = inSystem(system);
  return `Quarter-square triangle, ${size(Math.max(...sidesOf(polygon).map(sideLength)))} ${unit}`;
}

function inSystem(system: MeasureSystem): { size: (units: number) => string; unit: string } {
  return system === "yards" ? { size: (units) => formatExactInches(units), unit: "in" } : { size: (units) => formatCentimetres(units), unit: "cm" };
}
