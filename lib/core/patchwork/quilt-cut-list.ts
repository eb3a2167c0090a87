import type { CutPiece, CuttingRules } from "../piece/cut-piece";
import type { RoleId } from "../piece/drawing";
import type { QuarterTurn, QuiltBlock, QuiltDesign } from "../piece/quilt-design";
import { fail, ok, type Result } from "../result";
import { backingPanels } from "./quilt-backing";
import { blockPieces } from "./quilt-block-pieces";
import { layQuilt, usedBlocks, type QuiltLayout } from "./quilt-layout";
import { settingPieces, sizeName, USUAL_WIDTH, type QuiltCutOptions } from "./quilt-setting-pieces";
import { bindingLength, cutLongStrip, cutRectangle } from "./quilt-strips";

/**
 * Every cut piece of a quilt, role by role: the blocks' patches over all blocks and turns, cornerstones, sashing, plain
 * squares, setting triangles, borders, binding and backing. A patch keeps its block's letter, and where several blocks are used
 * its name says which block; the setting's shapes take the letters after the blocks' last one.
 *
 * @param rules the seam allowance and the step of the shop's rulers.
 * @param options directions, widths and choices of the shop; lengths in 1/160 mm.
 * @returns keys are unique and stable for the same design. `bad-quilt` where the design cannot be laid or cut.
 */
export function quiltCutList(design: QuiltDesign, rules: CuttingRules, options: QuiltCutOptions = {}): Result<CutPiece[], "bad-quilt"> {
  const layout = layQuilt(design);
  if (!layout.ok) return layout;
  const widthFault = narrowFault(design, rules, options);
  if (widthFault) return fail("bad-quilt", widthFault);
  const patches = piecesOfBlocks(design, rules, options.oneWay ?? []);
  if (!patches.ok) return patches;
  const letters = lettersAfter(patches.value.map((piece) => piece.letter));
  return ok([...patches.value, ...settingPieces(layout.value.pieces, rules, options, letters), ...finishing(design, layout.value, rules, options)]);
}

function piecesOfBlocks(design: QuiltDesign, rules: CuttingRules, oneWay: readonly RoleId[]): Result<CutPiece[], "bad-quilt"> {
  const used = usedBlocks(design);
  const pieces: CutPiece[] = [];
  for (const { index, block } of used) {
    const name = blockName(used.map((each) => each.block), block, index);
    const cut = blockPieces({ block, name, turns: turnsOf(design, index) }, rules, oneWay);
    if (!cut.ok) return cut;
    pieces.push(...(used.length > 1 ? cut.value.map((piece) => ({ ...piece, name: `${piece.name} (${name})` })) : cut.value));
  }
  return ok(pieces);
}

function blockName(blocks: readonly QuiltBlock[], block: QuiltBlock, index: number): string {
  return blocks.filter((each) => each.name === block.name).length > 1 ? `${block.name} ${index + 1}` : block.name;
}

function turnsOf({ cells }: QuiltDesign, block: number): ReadonlyMap<QuarterTurn, number> {
  const turns = new Map<QuarterTurn, number>();
  for (const cell of cells) {
    if (cell.kind === "block" && cell.block === block) turns.set(cell.turn, (turns.get(cell.turn) ?? 0) + 1);
  }
  return turns;
}

function finishing(design: QuiltDesign, layout: QuiltLayout, rules: CuttingRules, options: QuiltCutOptions): CutPiece[] {
  const { binding, backing } = design;
  const lines: CutPiece[] = [];
  if (binding) {
    const head = { key: `binding/${binding.role}`, letter: "Binding", name: `Binding, ${sizeName(binding.stripWidth, options.system)} strips joined on the bias`, role: binding.role };
    lines.push(cutLongStrip(head, { exact: binding.stripWidth, ruler: binding.stripWidth }, bindingLength(layout, binding.extra), "bias", rules));
  }
  if (backing) {
    const size = { width: layout.width, height: layout.height, overhang: backing.overhang, oneWay: options.oneWay?.includes(backing.role) };
    const panels = backingPanels(size, widthOf(options, backing.role), rules.seamAllowance, rules.rulerStep);
    const said = panels.seams === null ? "one panel" : `${panels.panels} panels, seams ${panels.seams} the quilt`;
    const head = { key: `backing/${backing.role}`, letter: "Backing", name: `Backing, ${said}`, role: backing.role };
    const seam = 2 * rules.seamAllowance;
    lines.push(cutRectangle(head, { along: panels.panelLength - seam, across: panels.panelAcross - seam }, panels.panels, false, rules));
  }
  return lines;
}

function widthOf(options: QuiltCutOptions, role: RoleId) {
  return (options.usableWidth ?? (() => USUAL_WIDTH))(role);
}

function narrowFault({ backing }: QuiltDesign, rules: CuttingRules, options: QuiltCutOptions): string | null {
  if (!backing || widthOf(options, backing.role) > 4 * rules.seamAllowance) return null;
  return `The backing's fabric is ${sizeName(widthOf(options, backing.role), options.system)} wide, which its own seams would use up.`;
}

/** A, B … Z, AA, AB …: the next one each time, after the last that is taken. */
function lettersAfter(taken: readonly string[]): () => string {
  let next = Math.max(0, ...taken.filter((letter) => /^[A-Z]+r?$/.test(letter)).map((letter) => numberOf(letter.replace(/r$/, ""))));
  return () => letterOf(++next);
}

function numberOf(letter: string): number {
  return [...letter].reduce((number, each) => number * 26 + each.charCodeAt(0) - 64, 0);
}

function letterOf(number: number): string {
  const last = (number - 1) % 26;
  const before = (number - 1 - last) / 26;
  return (before > 0 ? letterOf(before) : "") + String.fromCharCode(65 + last);
}
