import { length, longer, type Length } from "../measure/length";
import { roundUp } from "../measure/rounding";
import type { CutPiece, CutSize } from "../piece/cut-piece";
import type { Blank } from "../piece/strip-plan";
import { fail, ok, type Result } from "../result";

/** How a length is said to a person, with its unit: "3 7/8 in". */
export type SayLength = (value: Length) => string;

type BlankFault = "piece-too-wide";

const UNIT = length(1);

/**
 * The rectangles to lay on the cloth for a cut list. Squares cut once give 2 patches, cut twice 4; an angled strip is
 * counted by its pitch, its slanting ends once a strip; a long strip takes the least number of whole strips across
 * the width, or one shorter piece where one width is enough. Equal blanks of several pieces stay apart.
 *
 * @param usableWidth across the fabric, selvages off, already narrowed by shrinkage where the fabric is prewashed.
 * @returns one blank a piece, in the list's order. `piece-too-wide` names the piece, the width it needs and whether it
 * would fit turned (facts: `piece`, `across`, `usableWidth`, `turnedAcross`).
 */
export function blanksOf(pieces: readonly CutPiece[], usableWidth: Length, sayLength?: SayLength): Result<Blank[], BlankFault> {
  const blanks: Blank[] = [];
  for (const piece of pieces) {
    if (piece.count <= 0) continue;
    const blank = piece.method.kind === "long-strip" ? longStrips(piece, piece.method, usableWidth) : rectangleOf(piece);
    if (!blank || !fitsWidth(blank, usableWidth)) return tooWide(piece, blank, usableWidth, sayLength);
    blanks.push(blank);
  }
  return ok(blanks);
}

type LongStrip = Extract<CutPiece["method"], { kind: "long-strip" }>;

/** The smallest n with n W - (n - 1) j >= needed. Null where a strip would be all join. */
function longStrips(piece: CutPiece, method: LongStrip, usableWidth: Length): Blank | null {
  const width = method.width.ruler;
  const base = { ...sameForAll(piece), along: width, gives: 1, mayTurn: false, endWaste: length(0), mark: "long" as const };
  if (method.needed <= usableWidth) return { ...base, across: method.needed, count: piece.count };
  const gained = usableWidth - method.lostAtJoin;
  if (gained <= 0) return null;
  const strips = Math.ceil((method.needed - method.lostAtJoin) / gained);
  return { ...base, across: usableWidth, count: strips * piece.count };
}

function rectangleOf(piece: CutPiece): Blank {
  const { method } = piece;
  const base = { ...sameForAll(piece), mayTurn: piece.mayTurn, endWaste: length(0) };
  const cutInto = (gives: number) => ({ gives, count: Math.ceil(piece.count / gives) });
  switch (method.kind) {
    case "square":
      return { ...base, ...cutInto(1), ...square(method.side), mark: "plain" };
    case "half-square":
      return { ...base, ...cutInto(2), ...square(method.square), mark: "diagonal" };
    case "quarter-square":
      return { ...base, ...cutInto(4), ...square(method.square), mark: "both-diagonals" };
    case "rectangle":
      return { ...base, ...cutInto(1), along: method.along.ruler, across: method.across.ruler, mark: "plain" };
    case "half-rectangle":
      return { ...base, ...cutInto(2), along: method.along.ruler, across: method.across.ruler, mark: "diagonal" };
    case "template":
      return { ...base, ...cutInto(1), along: method.along.ruler, across: method.across.ruler, mark: "template" };
    case "angled-strip":
      return { ...base, ...cutInto(1), along: method.strip.ruler, across: taken(method.pitch), mayTurn: false, endWaste: taken(method.endWaste), mark: "slant" };
    case "long-strip":
      throw new Error("A long strip is not a rectangle of its own.");
  }
}

function sameForAll(piece: CutPiece): { key: string; pieceKey: string; label: string } {
  return { key: piece.key, pieceKey: piece.key, label: piece.letter };
}

function square(side: CutSize): { along: Length; across: Length } {
  return { along: side.ruler, across: side.ruler };
}

/** Room along the strip: a pitch rounded down to the ruler would promise a piece too many. */
function taken(size: CutSize): Length {
  return longer(size.ruler, roundUp(size.exact, UNIT));
}

function fitsWidth(blank: Blank, usableWidth: Length): boolean {
  return blank.across + blank.endWaste <= usableWidth || (blank.mayTurn && blank.along <= usableWidth);
}

function tooWide(piece: CutPiece, blank: Blank | null, usableWidth: Length, sayLength: SayLength | undefined) {
  const across = blank ? length(blank.across + blank.endWaste) : null;
  const turnedAcross = blank && blank.endWaste === 0 && blank.along <= usableWidth ? blank.along : null;
  const name = `${piece.letter} (${piece.name})`;
  const found = sayLength && across ? `${name} is ${sayLength(across)} across, the fabric's usable width is ${sayLength(usableWidth)}.` : `${name} is wider than the fabric's usable width.`;
  const wanted = turnedAcross
    ? "It would fit turned along the bolt, but its direction is kept."
    : across
      ? `It needs a fabric ${sayLength ? `of ${sayLength(across)} usable width` : "that wide"}, or a seam.`
      : "Its joins take more than a strip gives.";
  return fail("piece-too-wide", `${found} ${wanted}`, { facts: { piece: piece.key, across, usableWidth, turnedAcross } });
}
