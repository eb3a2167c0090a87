import { inches, length } from "@/lib/core/measure/length";
import type { Drawing, Paint } from "@/lib/core/piece/drawing";
import type { QuiltBlock, QuiltCell, QuiltDesign } from "@/lib/core/piece/quilt-design";

/** A square of two half-square triangles, dark below the seam that falls to the right. */
export const HALF_AND_HALF: Drawing = {
  outline: "rectangle",
  grid: { columns: 1, rows: 1 },
  seams: [{ kind: "straight", from: ["0", "0"], to: ["1", "1"] }],
  paints: [
    { at: ["3/4", "1/4"], role: "light" },
    { at: ["1/4", "3/4"], role: "dark" },
  ],
};

const NINTHS = ["1/6", "1/2", "5/6"] as const;

/** Nine squares, corners and middle dark. */
export const NINE_PATCH: Drawing = {
  outline: "rectangle",
  grid: { columns: 3, rows: 3 },
  seams: (["1/3", "2/3"] as const).flatMap((at) => [
    { kind: "straight" as const, from: [at, "0"] as const, to: [at, "1"] as const },
    { kind: "straight" as const, from: ["0", at] as const, to: ["1", at] as const },
  ]),
  paints: NINTHS.flatMap((y, row) => NINTHS.map((x, column): Paint => ({ at: [x, y], role: (row + column) % 2 === 0 ? "dark" : "light" }))),
};

export function buildBlock(over: Partial<QuiltBlock> = {}): QuiltBlock {
  return { name: "Nine-patch", drawing: NINE_PATCH, size: { width: inches(6), height: inches(6) }, roles: { dark: "dark", light: "light" }, ...over };
}

/** Blocks all over, upright, no sashing and no borders. */
export function buildQuilt(over: Partial<QuiltDesign> = {}): QuiltDesign {
  const { rows = 3, columns = 2, setting = "straight" } = over;
  const cells = rows * columns + (setting === "on-point" ? (rows - 1) * (columns - 1) : 0);
  return {
    setting,
    rows,
    columns,
    blocks: [buildBlock()],
    cells: Array.from({ length: Math.max(0, cells) }, (): QuiltCell => ({ kind: "block", block: 0, turn: 0 })),
    ...(setting === "on-point" ? { settingRole: "ground" } : {}),
    sashing: null,
    borders: [],
    binding: null,
    backing: null,
    roles: ["dark", "light", "ground", "sash", "post", "edge"].map((id) => ({ id, name: id, value: "medium" })),
    ...over,
  };
}

export const RULES = { seamAllowance: inches(0.25), rulerStep: inches(0.125) };
export const NO_EXTRA = length(0);
