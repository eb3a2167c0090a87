import { length } from "../measure/length";
import { roundNearest, roundUp } from "../measure/rounding";
import type { CutMethod, CuttingRules, CutPiece, CutSize } from "../piece/cut-piece";
import type { Polygon } from "../piece/patch";
import { halfSquareCut, quarterSquareCut, squareCut } from "./cut-sizes";
import { anglesOf, areParallel, heightOver, nameShape, nearly } from "./name-shape";
import { offsetOutwards } from "./offset";
import { boundsOf, directionOf, normalTurn, sideLength, sidesOf } from "./plane";

export interface MethodOfPatch {
  readonly method: CutMethod;
  readonly trimming: CutPiece["trimming"];
}

/** Lengths along a strip are summed up, never set on a ruler: they only must not come out short. */
const FINEST = length(1);

/**
 * How a finished shape is cut, with the lengthwise grain running up the page (turn the shape first where it runs
 * otherwise). What is trimmed after sewing is rounded up, what is sewn as cut goes to the nearest mark (`trade`,
 * "Arithmetic"). Anything that rulers do not know is a template.
 */
export function methodOf(finished: Polygon, rules: CuttingRules): MethodOfPatch {
  const seam = rules.seamAllowance;
  const up = (exact: number): CutSize => ({ exact, ruler: roundUp(exact, rules.rulerStep) });
  const nearest = (exact: number): CutSize => ({ exact, ruler: roundNearest(exact, rules.rulerStep) });
  const shape = nameShape(finished);
  switch (shape.kind) {
    case "square":
      return sewnAsCut({ kind: "square", side: nearest(squareCut(shape.side, seam)) });
    case "rectangle": {
      const { along, across } = rectangleAsItLies(finished);
      return sewnAsCut({ kind: "rectangle", along: nearest(squareCut(along, seam)), across: nearest(squareCut(across, seam)) });
    }
    case "right-isosceles": {
      const long = shape.leg * Math.SQRT2;
      const method: CutMethod = longSideOnGrain(finished, long)
        ? { kind: "quarter-square", square: up(quarterSquareCut(long, seam)) }
        : { kind: "half-square", square: up(halfSquareCut(shape.leg, seam)) };
      return { method, trimming: "trimmed-after-sewing" };
    }
    case "right-triangle":
      return { method: halfRectangle(finished, seam, up), trimming: "trimmed-after-sewing" };
    case "equilateral":
    case "isosceles":
    case "triangle":
      return sewnAsCut(triangleStrip(finished, rules));
    case "diamond":
    case "parallelogram":
      return sewnAsCut(parallelogramStrip(finished, rules));
    case "trapezoid":
      return sewnAsCut(trapezoidStrip(finished, rules));
    default:
      return sewnAsCut(template(finished, rules));
  }
}

function sewnAsCut(method: CutMethod): MethodOfPatch {
  return { method, trimming: "sewn-as-cut" };
}

/** A rectangle whose sides lie on the grain keeps its way; one on point is cut with its long side along the bolt. */
function rectangleAsItLies(finished: Polygon): { along: number; across: number } {
  const [first, second] = sidesOf(finished);
  if (!first || !second) throw new RangeError("A rectangle has four sides.");
  const [a, b] = [sideLength(first), sideLength(second)];
  if (!onGrain(directionOf(first))) return { along: Math.max(a, b), across: Math.min(a, b) };
  return normalTurn(directionOf(first)) % 180 === 0 ? { along: b, across: a } : { along: a, across: b };
}

function onGrain(direction: number): boolean {
  const rest = normalTurn(direction) % 90;
  return rest < 1e-4 || rest > 90 - 1e-4;
}

function longSideOnGrain(finished: Polygon, long: number): boolean {
  const side = sidesOf(finished).find((each) => nearly(sideLength(each), long));
  return side !== undefined && onGrain(directionOf(side));
}

/** The exact cut triangle's legs make the rectangle; the diagonal is trimmed after sewing, so both go up. */
function halfRectangle(finished: Polygon, seam: number, up: (exact: number) => CutSize): CutMethod {
  const cut = offsetOutwards(finished, seam);
  const right = anglesOf(cut).findIndex((angle) => Math.abs(angle - 90) < 1e-6);
  const sides = sidesOf(cut);
  const leaving = sides[right] ?? [0, 0];
  const arriving = sides[(right + 2) % 3] ?? [0, 0];
  const level = Math.abs(leaving[0]) >= Math.abs(leaving[1]) ? [leaving, arriving] : [arriving, leaving];
  return { kind: "half-rectangle", along: up(sideLength(level[1] ?? [0, 0])), across: up(sideLength(level[0] ?? [0, 0])) };
}

/**
 * Triangles head to tail in a strip that is as high as the cut triangle over its base. A triangle as high as its base is
 * wide (the middle of a triangle-in-a-square) loses its tip at the strip's edge, which lies 2 s over the finished height.
 */
function triangleStrip(finished: Polygon, rules: CuttingRules): CutMethod {
  const cut = offsetOutwards(finished, rules.seamAllowance);
  const index = baseOf(finished);
  const base = sideLength(sidesOf(cut)[index] ?? [0, 0]);
  const sharp = heightOver(cut, index);
  const height = heightOver(finished, index);
  const [left = 60, right = 60] = [anglesOf(finished)[index], anglesOf(finished)[(index + 1) % 3]];
  const isosceles = Math.abs(left - right) < 1e-6;
  const blunted = isosceles && nearly(height, sideLength(sidesOf(finished)[index] ?? [0, 0]));
  const strip = blunted ? squareCut(height, rules.seamAllowance) : sharp;
  const top = base * (1 - strip / sharp);
  return angled(rules, { strip, pitch: (base + top) / 2, endWaste: isosceles ? (base - top) / 2 : base - top, degrees: Math.min(left, right), headToTail: true });
}

function parallelogramStrip(finished: Polygon, rules: CuttingRules): CutMethod {
  const cut = offsetOutwards(finished, rules.seamAllowance);
  const index = baseOf(finished);
  const degrees = Math.min(...anglesOf(finished));
  const strip = heightOver(cut, index);
  return angled(rules, { strip, pitch: sideLength(sidesOf(cut)[index] ?? [0, 0]), endWaste: strip / Math.tan((degrees * Math.PI) / 180), degrees, headToTail: false });
}

function trapezoidStrip(finished: Polygon, rules: CuttingRules): CutMethod {
  const cut = offsetOutwards(finished, rules.seamAllowance);
  const sides = sidesOf(cut);
  const [first, , third] = sides;
  const index = first && third && areParallel(first, third) ? 0 : 1;
  const [one, other] = [sideLength(sides[index] ?? [0, 0]), sideLength(sides[index + 2] ?? [0, 0])];
  const sharpest = Math.min(...anglesOf(finished));
  return angled(rules, { strip: heightOver(cut, index), pitch: (one + other) / 2, endWaste: Math.abs(one - other), degrees: sharpest, headToTail: true });
}

interface Angled {
  readonly strip: number;
  readonly pitch: number;
  readonly endWaste: number;
  readonly degrees: number;
  readonly headToTail: boolean;
}

function angled(rules: CuttingRules, { strip, pitch, endWaste, degrees, headToTail }: Angled): CutMethod {
  const along = (exact: number): CutSize => ({ exact, ruler: roundUp(exact, FINEST) });
  return { kind: "angled-strip", strip: { exact: strip, ruler: roundNearest(strip, rules.rulerStep) }, pitch: along(pitch), endWaste: along(endWaste), angleDegrees: degrees, headToTail };
}

/** The side that lies along the strip: the longest one on the grain, else the longest. */
function baseOf(finished: Polygon): number {
  const sides = sidesOf(finished).map((side, index) => ({ index, long: sideLength(side), straight: onGrain(directionOf(side)) }));
  const straight = sides.filter((side) => side.straight);
  const [best] = (straight.length ? straight : sides).sort((a, b) => b.long - a.long || a.index - b.index);
  return best?.index ?? 0;
}

/** The rectangle that holds the cut shape as it lies; rounded up, since a template that is short spoils the patch. */
function template(finished: Polygon, rules: CuttingRules): CutMethod {
  const { width, height } = boundsOf(offsetOutwards(finished, rules.seamAllowance));
  const up = (exact: number): CutSize => ({ exact, ruler: roundUp(exact, rules.rulerStep) });
  return { kind: "template", along: up(height), across: up(width) };
}

/** How much wider than finished the sewn patch comes out: the ruler's mark less the exact cut, both ways; 0 where trimmed. */
export function growthOf({ method, trimming }: MethodOfPatch): { along: number; across: number } {
  if (trimming === "trimmed-after-sewing") return { along: 0, across: 0 };
  const over = (size: CutSize): number => size.ruler - size.exact;
  switch (method.kind) {
    case "square":
      return { along: over(method.side), across: over(method.side) };
    case "rectangle":
      return { along: over(method.along), across: over(method.across) };
    case "angled-strip":
      return { along: over(method.strip), across: 0 };
    default:
      return { along: 0, across: 0 };
  }
}

