import { formatInches } from "../measure/format";
import { inches, type Length } from "../measure/length";
import type { RoleId } from "../piece/drawing";
import type { QuiltCell, QuiltDesign } from "../piece/quilt-design";
import { fail, ok, type Result } from "../result";

export const MOST_ROWS = 40;
export const MOST_BORDERS = 12;
/** A bed sheet of a giant: nothing that is sewn is larger, and all sums stay far inside a safe integer. */
export const LARGEST_QUILT: Length = inches(1000);
const LEAST_STRIP: Length = inches(0.25);

/** What the squares of a quilt have in common, in 1/160 mm, finished. */
export interface SquareSize {
  readonly width: Length;
  readonly height: Length;
}

/**
 * Says whether a design can be laid at all: counts, sizes and roles. The squares of a setting are all of one size, that
 * of the first block used; a block turned by a quarter must still fit it.
 *
 * @returns the size of a square. `bad-quilt` with a sentence on the first thing that is wrong.
 */
export function checkQuilt(design: QuiltDesign): Result<SquareSize, "bad-quilt"> {
  const wrong = countsFault(design) ?? widthsFault(design) ?? rolesFault(design);
  if (wrong) return fail("bad-quilt", wrong);
  const size = squareOf(design);
  if (!size) return fail("bad-quilt", "No square of the quilt holds a block, so nothing says how large its squares are.");
  const unfit = design.cells.map((cell, index) => cellFault(design, cell, index, size)).find((each) => each !== null);
  if (unfit) return fail("bad-quilt", unfit);
  if (design.setting === "on-point" && size.width !== size.height) return fail("bad-quilt", `Blocks set on point are square; these are ${sizeText(size)}.`);
  return largeFault(design, size) ?? ok(size);
}

/** How many squares a setting has: on point the inner ones lie between the outer ones. */
export function cellsOf({ setting, rows, columns }: Pick<QuiltDesign, "setting" | "rows" | "columns">): number {
  return rows * columns + (setting === "on-point" ? (rows - 1) * (columns - 1) : 0);
}

function countsFault(design: QuiltDesign): string | null {
  const { rows, columns, cells, blocks, borders } = design;
  if (!isCount(rows)) return `A quilt has 1 to ${MOST_ROWS} rows, not ${rows}.`;
  if (!isCount(columns)) return `A quilt has 1 to ${MOST_ROWS} columns, not ${columns}.`;
  if (blocks.length === 0) return "The quilt has no block.";
  const wanted = cellsOf(design);
  if (cells.length !== wanted) {
    const how = design.setting === "on-point" ? `${rows} rows of ${columns} on point, with the squares between them,` : `${rows} rows of ${columns}`;
    return `${how} make ${wanted} squares, and ${cells.length} are given.`;
  }
  return borders.length > MOST_BORDERS ? `A quilt has at most ${MOST_BORDERS} borders, not ${borders.length}.` : null;
}

function isCount(value: number): boolean {
  return Number.isInteger(value) && value >= 1 && value <= MOST_ROWS;
}

function widthsFault({ setting, blocks, sashing, borders, binding, backing }: QuiltDesign): string | null {
  for (const { name, size } of blocks) {
    if (!isSize(size.width) || !isSize(size.height)) return `${name} is ${sizeText(size)}; a block is at least 1/4 in and at most ${formatInches(LARGEST_QUILT)} in each way.`;
  }
  if (sashing && !isSize(sashing.width)) return stripFault("The sashing", sashing.width);
  if (sashing && setting === "on-point" && !sashing.allRound) return "On point the sashing goes round every block, so it also goes all round.";
  const thin = borders.findIndex((border) => !isSize(border.width));
  if (thin >= 0) return stripFault(`Border ${thin + 1}`, borders[thin]?.width ?? 0);
  if (binding && (!isSize(binding.stripWidth) || binding.stripWidth > inches(12))) return `The binding's strips are ${formatInches(binding.stripWidth)} in wide; 1/4 to 12 in is wanted.`;
  if (binding && !isExtra(binding.extra)) return "The extra length of the binding is 0 to 100 in.";
  return backing && !isExtra(backing.overhang) ? "The backing stands out by 0 to 100 in on every side." : null;
}

function stripFault(what: string, width: number): string {
  return `${what} is ${formatInches(width)} in wide; 1/4 in is the least and ${formatInches(LARGEST_QUILT)} in the most.`;
}

function isSize(value: number): boolean {
  return Number.isSafeInteger(value) && value >= LEAST_STRIP && value <= LARGEST_QUILT;
}

function isExtra(value: number): boolean {
  return Number.isSafeInteger(value) && value >= 0 && value <= inches(100);
}

function rolesFault(design: QuiltDesign): string | null {
  const known = new Set(design.roles.map((role) => role.id));
  if (known.size !== design.roles.length) return "Two roles of the quilt have the same name.";
  if (design.setting === "on-point" && design.settingRole === undefined) return "Nothing says which fabric the setting triangles are cut from.";
  const strange = usedRoles(design).find(([, role]) => !known.has(role));
  return strange ? `${strange[0]} asks for the role “${strange[1]}”, which the quilt does not have.` : null;
}

function usedRoles({ setting, settingRole, blocks, cells, sashing, borders, binding, backing }: QuiltDesign): (readonly [string, RoleId])[] {
  return [
    ...blocks.flatMap((block) => Object.values(block.roles).map((role) => [block.name, role] as const)),
    ...cells.flatMap((cell) => (cell.kind === "plain" ? [["A plain square", cell.role] as const] : [])),
    ...(setting === "on-point" && settingRole !== undefined ? [["The setting", settingRole] as const] : []),
    ...(sashing ? [["The sashing", sashing.role] as const] : []),
    ...(sashing?.cornerstones ? [["The sashing's cornerstones", sashing.cornerstones] as const] : []),
    ...borders.map((border, index) => [`Border ${index + 1}`, border.role] as const),
    ...borders.flatMap((border, index) => (border.corners === null ? [] : [[`The corners of border ${index + 1}`, border.corners] as const])),
    ...(binding ? [["The binding", binding.role] as const] : []),
    ...(backing ? [["The backing", backing.role] as const] : []),
  ];
}

function squareOf({ cells, blocks }: QuiltDesign): SquareSize | null {
  const first = cells.find((cell) => cell.kind === "block" && blocks[cell.block] !== undefined);
  const size = first?.kind === "block" ? blocks[first.block]?.size : undefined;
  if (!size || first?.kind !== "block") return null;
  return first.turn === 90 || first.turn === 270 ? { width: size.height, height: size.width } : { width: size.width, height: size.height };
}

function cellFault({ blocks }: QuiltDesign, cell: QuiltCell, index: number, square: SquareSize): string | null {
  if (cell.kind === "plain") return null;
  const block = blocks[cell.block];
  if (!block) return `Square ${index + 1} asks for block ${cell.block + 1}, and the quilt has ${blocks.length}.`;
  if (![0, 90, 180, 270].includes(cell.turn)) return `${block.name} in square ${index + 1} is turned by ${cell.turn} degrees; quarters are wanted.`;
  const turned = cell.turn === 90 || cell.turn === 270;
  const [width, height] = turned ? [block.size.height, block.size.width] : [block.size.width, block.size.height];
  if (width === square.width && height === square.height) return null;
  return `${block.name} in square ${index + 1} is ${sizeText({ width, height })}, and the squares of this quilt are ${sizeText(square)}.`;
}

function largeFault({ setting, rows, columns, sashing, borders }: QuiltDesign, { width, height }: SquareSize) {
  const step = sashing?.width ?? 0;
  const diagonal = setting === "on-point" ? Math.SQRT2 : 1;
  const round = 2 * borders.reduce((total, border) => total + border.width, 0) + step;
  const [across, down] = [columns * (width + step) * diagonal + round, rows * (height + step) * diagonal + round];
  if (Math.max(across, down) <= LARGEST_QUILT) return null;
  return fail("bad-quilt", `The quilt would be about ${Math.round(across / inches(1))} × ${Math.round(down / inches(1))} in; ${formatInches(LARGEST_QUILT)} in each way is the most.`);
}

function sizeText({ width, height }: { readonly width: number; readonly height: number }): string {
  return `${formatInches(width)} × ${formatInches(height)} in`;
}
