import type { MeasureSystem } from "../measure/format";
import { PER_INCH } from "../measure/length";
import type { BlockSize, Drawing, ExactPoint, Grain, Paint } from "../piece/drawing";
import type { Patch, Polygon, Shape } from "../piece/patch";
import { fail, ok, type Result } from "../result";
import { signatureOf, type Signature } from "./congruence";
import { multiply, rational } from "./exact";
import { formatPoint, parsePoint, toPlane, type Vector } from "./exact-point";
import { holds, insideOf } from "./locate-exact";
import { sayShape } from "./name-shape";
import { directionOf, narrowestWidth, normalTurn, sidesOf, toOrigin, turned } from "./plane";
import { outlineOf, subdivide, type Subdivision } from "./subdivide";

export type ComplaintCode = "open-seam" | "island" | "sliver" | "unpainted" | "bias-edge" | "crowded";

/** What is wrong with a drawing, in place. */
export interface Complaint {
  readonly code: ComplaintCode;
  readonly sentence: string;
  readonly at?: ExactPoint;
}

export interface BlockAnalysis {
  readonly patches: readonly Patch[];
  readonly shapes: readonly Shape[];
  readonly complaints: readonly Complaint[];
}

const MOST_PATCHES = 1000;
const LEAST_SIZE = PER_INCH / 2;
const MOST_SIZE = 200 * PER_INCH;
const SLIVER = PER_INCH / 4;

/**
 * Everything the geometry alone says of a block: its patches in reading order with letters, the shapes that the letters
 * name, and what is wrong. Letters go by the reading order of the first patch of each shape; a mirror image has its
 * shape's letter with an r. Faults: `bad-drawing` with the seam, `too-large` with the limits.
 */
export function analyseBlock(drawing: Drawing, size: BlockSize, system: MeasureSystem = "yards"): Result<BlockAnalysis, "bad-drawing" | "too-large"> {
  if (![size.width, size.height].every((side) => Number.isSafeInteger(side) && side >= LEAST_SIZE && side <= MOST_SIZE)) {
    return fail("too-large", "A block is from 1/2 in to 200 in finished, both ways.");
  }
  const subdivision = subdivide(drawing);
  if (!subdivision.ok) return subdivision;
  const { faces } = subdivision.value;
  if (faces.length > MOST_PATCHES) return fail("too-large", `The drawing has ${faces.length} patches; a block has at most ${MOST_PATCHES}.`);
  const paints = paintsOf(faces, drawing.paints);
  if (!paints.ok) return paints;
  const lettered = letterFaces(faces, size);
  const patches = faces.map((face, index): Patch => {
    const { letter, turn, start } = lettered.faces[index] ?? { letter: "?", turn: 0, start: 0 };
    const paint = paints.value[index];
    // Patches of one letter begin at the same corner of it.
    const ordered = [...face.slice(start), ...face.slice(0, start)];
    return { index, outline: outlineOf(ordered), corners: cornersOf(ordered, size), letter, role: paint?.role ?? null, grain: paint?.grain ?? "any", turn };
  });
  const shapes = [...lettered.models].map(([letter, { model, symmetric }]): Shape => ({
    letter,
    finished: model,
    name: sayShape(model, system),
    symmetric,
    count: patches.filter((patch) => patch.letter === letter).length,
  }));
  return ok({ patches, shapes, complaints: complaintsOf(subdivision.value, patches) });
}

function cornersOf(face: readonly Vector[], { width, height }: BlockSize): Polygon {
  return face.map((corner) => toPlane(corner, width, height));
}

/** The last paint that lies strictly inside each face. */
function paintsOf(faces: readonly (readonly Vector[])[], paints: readonly Paint[]): Result<(Paint | undefined)[], "bad-drawing"> {
  const found: (Paint | undefined)[] = faces.map(() => undefined);
  for (const paint of paints) {
    const at = parsePoint(paint.at);
    if (!at.ok) return fail("bad-drawing", at.fault.message);
    const index = faces.findIndex((face) => holds(face, at.value));
    if (index >= 0) found[index] = paint;
  }
  return ok(found);
}

interface Model {
  readonly model: Polygon;
  readonly symmetric: boolean;
  /** The direction of the side at which the signature begins, in the model. */
  readonly direction: number;
}

interface Lettered {
  readonly faces: readonly { readonly letter: string; readonly turn: number; readonly start: number }[];
  readonly models: ReadonlyMap<string, Model>;
}

function letterFaces(faces: readonly (readonly Vector[])[], size: BlockSize): Lettered {
  const letters = new Map<string, string>();
  const models = new Map<string, Model>();
  let next = 0;
  const out = faces.map((face) => {
    const real = atSize(face, size);
    const signature = signatureOf(real);
    if (!letters.has(signature.text)) {
      const letter = letterOf(next);
      next += 1;
      letters.set(signature.text, letter);
      if (signature.mirrored !== signature.text) letters.set(signature.mirrored, `${letter}r`);
    }
    const letter = letters.get(signature.text) ?? "?";
    const corners = cornersOf(face, size);
    const direction = directionOf(sidesOf(corners)[signature.start] ?? [1, 0]);
    const model = models.get(letter) ?? modelOf(corners, signature, direction);
    models.set(letter, model);
    return { letter, turn: normalTurn(direction - model.direction), start: signature.start };
  });
  return { faces: out, models };
}

/** In real lengths, so that a rectangle in a block that is not square is seen for what it is. */
function atSize(face: readonly Vector[], { width, height }: BlockSize): Vector[] {
  const [across, down] = [rational(width), rational(height)];
  return face.map(({ x, y }) => ({ x: multiply(x, across), y: multiply(y, down) }));
}

/** Laid with its longest straight side level (the longest of all where none is straight) and below the shape. */
function modelOf(corners: Polygon, signature: Signature, direction: number): Model {
  const sides = sidesOf(corners).map((side) => ({ way: directionOf(side), long: Math.hypot(...side), straight: directionOf(side) % 90 === 0 }));
  const straight = sides.filter((side) => side.straight);
  const [base] = (straight.length ? straight : sides).sort((a, b) => b.long - a.long);
  const turn = 180 - (base?.way ?? 180);
  return { model: toOrigin(turned(corners, turn)), symmetric: signature.text === signature.mirrored, direction: normalTurn(direction + turn) };
}

/** A to Z, then AA, AB … */
function letterOf(index: number): string {
  const last = String.fromCharCode(65 + (index % 26));
  return index < 26 ? last : letterOf(Math.floor(index / 26) - 1) + last;
}

function complaintsOf(subdivision: Subdivision, patches: readonly Patch[]): Complaint[] {
  const complaints: Complaint[] = [
    ...subdivision.openEnds.map((point) => ({ code: "open-seam" as const, sentence: "A seam ends here without meeting another. Draw it on to a seam or to the edge.", at: formatPoint(point) })),
    ...subdivision.islands.map((point) => ({ code: "island" as const, sentence: "These seams hang together but reach no edge. Join them to the rest of the block.", at: formatPoint(point) })),
  ];
  for (const patch of patches) {
    const at = insideOf(patch);
    if (narrowestWidth(patch.corners) < SLIVER - 1e-6) complaints.push({ code: "sliver", sentence: `Patch ${patch.letter} is narrower than 1/4 in finished.`, at });
    if (patch.role === null) complaints.push({ code: "unpainted", sentence: `Patch ${patch.letter} has no fabric yet.`, at });
    if (hasBiasEdge(patch)) complaints.push({ code: "bias-edge", sentence: `Patch ${patch.letter} has its bias on the outside edge, where it stretches.`, at });
  }
  return [...complaints, ...subdivision.crowded.map((point) => ({ code: "crowded" as const, sentence: "Eight or more seams meet here. Press the last one open.", at: formatPoint(point) }))];
}

/** The grain runs aslant and the patch has a side on the outside edge of the block. */
export function hasBiasEdge(patch: Pick<Patch, "grain" | "outline">): boolean {
  return isDiagonal(patch.grain) && touchesEdge(patch);
}

function isDiagonal(grain: Grain): boolean {
  return grain === "down-right" || grain === "down-left";
}

function touchesEdge({ outline }: Pick<Patch, "outline">): boolean {
  return outline.some(([x, y], index) => {
    const [nextX, nextY] = outline[(index + 1) % outline.length] ?? [x, y];
    return (x === nextX && (x === "0" || x === "1")) || (y === nextY && (y === "0" || y === "1"));
  });
}

