import type { RoleId } from "../piece/drawing";
import type { Patch, PlanePoint, Polygon } from "../piece/patch";
import type { QuiltBlock, QuiltDesign } from "../piece/quilt-design";
import { fail, ok, type Result } from "../result";
import { analyseBlock } from "./analyse-block";
import { layBorders } from "./quilt-borders";
import { checkQuilt, type SquareSize } from "./quilt-check";
import { rectangle, type QuiltPiece, type SquarePlace } from "./quilt-piece";
import { turnInBlock } from "./quilt-turn";
import { laySetOnPoint } from "./setting-on-point";
import { laySetStraight } from "./setting-straight";

export interface QuiltLayout {
  /** Finished, as floats; whole numbers in the straight setting. */
  readonly width: number;
  readonly height: number;
  /** Without its borders. */
  readonly centre: { readonly width: number; readonly height: number };
  /** They cover the quilt without a gap and without overlap. */
  readonly pieces: readonly QuiltPiece[];
  /** The edge that the binding goes round. */
  readonly bindingEdge: Polygon;
}

/**
 * Lays a whole quilt: every patch of every block, sashing, cornerstones, plain squares, setting triangles and borders
 * at their finished places. On point an outer square's diagonal is level, side triangles are half squares and corner
 * triangles quarter squares.
 *
 * @returns `bad-quilt` when the design cannot be laid; a block's own fault carries its name before the sentence.
 */
export function layQuilt(design: QuiltDesign): Result<QuiltLayout, "bad-quilt"> {
  const square = checkQuilt(design);
  if (!square.ok) return square;
  const patches = patchesOfBlocks(design);
  if (!patches.ok) return patches;
  const setting = design.setting === "straight" ? laySetStraight(design, square.value) : laySetOnPoint(design, square.value);
  const borders = layBorders(design.borders, setting.width, setting.height);
  const inner = [...setting.squares.flatMap((place) => squarePieces(design, patches.value, place, square.value)), ...setting.pieces];
  const { width, height, inset } = borders;
  return ok({
    width,
    height,
    centre: { width: setting.width, height: setting.height },
    pieces: [...inner.map((piece) => moved(piece, inset)), ...borders.pieces],
    bindingEdge: rectangle(0, 0, width, height),
  });
}

/** The blocks that the squares ask for, in the design's order; a block that is in no square is left out. */
export function usedBlocks({ blocks, cells }: QuiltDesign): readonly { readonly index: number; readonly block: QuiltBlock }[] {
  const used = new Set(cells.flatMap((cell) => (cell.kind === "block" ? [cell.block] : [])));
  return blocks.map((block, index) => ({ index, block })).filter(({ index }) => used.has(index));
}

/** The quilt's role of a block's patch, or a sentence that says what is missing. */
export function quiltRole(block: QuiltBlock, patch: Pick<Patch, "role" | "letter">): Result<RoleId, "bad-quilt"> {
  if (patch.role === null) return fail("bad-quilt", `${block.name}: a patch ${patch.letter} has no fabric laid on it.`);
  const role = block.roles[patch.role];
  return role === undefined ? fail("bad-quilt", `${block.name}: nothing says which fabric of the quilt its “${patch.role}” is.`) : ok(role);
}

interface PlacedPatch {
  readonly patch: Patch;
  readonly role: RoleId;
}

function patchesOfBlocks(design: QuiltDesign): Result<ReadonlyMap<number, readonly PlacedPatch[]>, "bad-quilt"> {
  const found = new Map<number, readonly PlacedPatch[]>();
  for (const { index, block } of usedBlocks(design)) {
    const analysis = analyseBlock(block.drawing, block.size);
    if (!analysis.ok) return fail("bad-quilt", `${block.name}: ${analysis.fault.message}`);
    const placed: PlacedPatch[] = [];
    for (const patch of analysis.value.patches) {
      const role = quiltRole(block, patch);
      if (!role.ok) return role;
      placed.push({ patch, role: role.value });
    }
    found.set(index, placed);
  }
  return ok(found);
}

function squarePieces(design: QuiltDesign, patches: ReadonlyMap<number, readonly PlacedPatch[]>, { cell: index, place }: SquarePlace, square: SquareSize): QuiltPiece[] {
  const cell = design.cells[index];
  if (!cell) throw new Error(`The setting asks for square ${index}, which the design does not have.`);
  if (cell.kind === "plain") {
    return [{ polygon: rectangle(0, 0, square.width, square.height).map(place), role: cell.role, source: { kind: "plain", cell: index } }];
  }
  const { block, turn } = cell;
  const size = design.blocks[block]?.size ?? square;
  return (patches.get(block) ?? []).map(({ patch, role }) => ({
    polygon: patch.corners.map((corner) => place(turnInBlock(corner, turn, size.width, size.height))),
    role,
    source: { kind: "block", block, patch: patch.index, letter: patch.letter, cell: index, turn },
  }));
}

function moved(piece: QuiltPiece, by: number): QuiltPiece {
  return by === 0 ? piece : { ...piece, polygon: piece.polygon.map(([x, y]): PlanePoint => [x + by, y + by]) };
}
