import type { CutPiece, CuttingRules } from "../piece/cut-piece";
import type { RoleId } from "../piece/drawing";
import type { Patch } from "../piece/patch";
import type { QuarterTurn, QuiltBlock } from "../piece/quilt-design";
import { fail, ok, type Result } from "../result";
import { analyseBlock } from "./analyse-block";
import { blockCutList } from "./cut-list";
import { quiltRole } from "./quilt-layout";
import { turnDrawing, turnPoint } from "./quilt-turn";

export interface BlockInQuilt {
  readonly block: QuiltBlock;
  /** Unique among the quilt's blocks. */
  readonly name: string;
  /** How often it is set each way. */
  readonly turns: ReadonlyMap<QuarterTurn, number>;
}

/**
 * The cut lines of one block over all its copies, in the quilt's roles. A fabric with a direction is cut for each turn
 * as it will lie in the quilt; all other fabrics are cut as drawn, whatever the turn. Two roles of the block in one
 * fabric of the quilt are one line.
 *
 * @returns letters as of the block upright. `bad-quilt` with the block's name before its own fault.
 */
export function blockPieces({ block, name, turns }: BlockInQuilt, rules: CuttingRules, oneWay: readonly RoleId[]): Result<CutPiece[], "bad-quilt"> {
  const upright = analyseBlock(block.drawing, block.size);
  if (!upright.ok) return fail("bad-quilt", `${block.name}: ${upright.fault.message}`);
  for (const patch of upright.value.patches) {
    const role = quiltRole(block, patch);
    if (!role.ok) return role;
  }
  const directed = Object.entries(block.roles).flatMap(([role, inQuilt]) => (oneWay.includes(inQuilt) ? [role] : []));
  const copies = [...turns.values()].reduce((total, count) => total + count, 0);
  const lines = blockCutList(upright.value, block.size, rules, { copies, oneWay: new Set(directed) }).filter((piece) => !directed.includes(piece.role));
  if (directed.length > 0) {
    for (const [turn, count] of turns) {
      const turned = turnedPieces(block, turn, count, { rules, directed, upright: upright.value.patches });
      if (!turned.ok) return turned;
      lines.push(...turned.value);
    }
  }
  return ok(merged(lines.map((piece) => inQuiltRoles(piece, block, name))));
}

interface Directed {
  readonly rules: CuttingRules;
  readonly directed: readonly RoleId[];
  readonly upright: readonly Patch[];
}

function turnedPieces(block: QuiltBlock, turn: QuarterTurn, copies: number, { rules, directed, upright }: Directed): Result<CutPiece[], "bad-quilt"> {
  const drawing = turnDrawing(block.drawing, turn);
  if (!drawing.ok) return fail("bad-quilt", `${block.name}: ${drawing.fault.message}`);
  const { width, height } = block.size;
  const size = turn === 90 || turn === 270 ? { width: height, height: width } : { width, height };
  const analysis = analyseBlock(drawing.value, size);
  if (!analysis.ok) return fail("bad-quilt", `${block.name}: ${analysis.fault.message}`);
  const letters = lettersUpright(upright, analysis.value.patches, turn);
  const pieces = blockCutList(analysis.value, size, rules, { copies, oneWay: new Set(directed) }).filter((piece) => directed.includes(piece.role));
  return ok(pieces.map((piece) => ({ ...piece, letter: letters.get(piece.letter) ?? piece.letter })));
}

/** A turned block is lettered afresh; its shapes get the letters back that they have upright. */
function lettersUpright(upright: readonly Patch[], turned: readonly Patch[], turn: QuarterTurn): ReadonlyMap<string, string> {
  const letterAt = new Map(upright.map((patch) => [outlineKey(patch.outline.map((point) => turnPoint(point, turn) ?? point)), patch.letter]));
  return new Map(turned.map((patch) => [patch.letter, letterAt.get(outlineKey(patch.outline)) ?? patch.letter]));
}

/** The corners whatever the first is. */
function outlineKey(outline: Patch["outline"]): string {
  return outline.map(([x, y]) => `${x},${y}`).sort().join(" ");
}

function inQuiltRoles(piece: CutPiece, block: QuiltBlock, name: string): CutPiece {
  const role = block.roles[piece.role] ?? piece.role;
  const rest = piece.key.split("/").slice(2).join("/");
  return { ...piece, role, key: [name, piece.letter, role, rest].filter(Boolean).join("/") };
}

/** Lines of one shape, fabric and way of cutting are one; where only the key is the same, the later one is numbered. */
function merged(pieces: readonly CutPiece[]): CutPiece[] {
  const lines = new Map<string, CutPiece>();
  for (const piece of pieces) {
    let key = piece.key;
    for (let time = 2; ; time++) {
      const found = lines.get(key);
      if (!found || isCutAlike(found, piece)) {
        lines.set(key, found ? { ...found, count: found.count + piece.count } : { ...piece, key });
        break;
      }
      key = `${piece.key}-${time}`;
    }
  }
  return [...lines.values()];
}

function isCutAlike(a: CutPiece, b: CutPiece): boolean {
  return a.mayTurn === b.mayTurn && a.trimming === b.trimming && a.note === b.note && JSON.stringify(rounded(a)) === JSON.stringify(rounded(b));
}

/** Exact sizes of a turned block differ from the upright one's by float noise. */
function rounded({ method, finished }: CutPiece): unknown {
  return JSON.parse(JSON.stringify({ method, finished }), (_, value: unknown) => (typeof value === "number" ? Math.round(value * 1000) / 1000 : value));
}
