import type { Hatch } from "@/labels/press/hatch";
import type { Picture } from "@/labels/press/picture";
import type { SheetBlock } from "@/labels/sheet/sheet-input";
import { analyseBlock } from "@/lib/core/patchwork/analyse-block";
import { layQuilt, quiltRole, usedBlocks } from "@/lib/core/patchwork/quilt-layout";
import type { RoleId } from "@/lib/core/piece/drawing";
import type { Polygon } from "@/lib/core/piece/patch";
import type { QuiltDesign } from "@/lib/core/piece/quilt-design";

/** How a fabric is drawn on paper. */
export interface FabricInk {
  readonly colour: string;
  readonly hatch: Hatch;
}

export type InkOfRole = (role: RoleId) => FabricInk;

const HATCHES: readonly Hatch[] = ["solid", "blank", "diagonal", "dots", "bars", "grid", "reverse", "uprights", "cross", "dashes"];

/** The hatch of the n-th fabric of a kit, the same on its label and its sheet; after ten they begin again. */
export function hatchOfFabric(index: number): Hatch {
  return HATCHES[index % HATCHES.length] ?? "blank";
}

/** The whole quilt in its fabrics, in 1/160 mm. Throws on a design that cannot be laid: no such version is kept. */
export function quiltPicture(design: QuiltDesign, ink: InkOfRole): Picture {
  const layout = layQuilt(design);
  if (!layout.ok) throw new Error(layout.fault.message);
  const { width, height, pieces } = layout.value;
  return { width, height, polygons: pieces.map(({ polygon, role }) => ({ points: rounded(polygon), ...ink(role) })) };
}

/** Each block that the quilt uses, upright, with the letters of its patches. */
export function blockPages(design: QuiltDesign, ink: InkOfRole): SheetBlock[] {
  return usedBlocks(design).map(({ index, block }) => {
    const analysis = analyseBlock(block.drawing, block.size);
    if (!analysis.ok) throw new Error(`${block.name}: ${analysis.fault.message}`);
    const { patches } = analysis.value;
    const polygons = patches.map((patch) => {
      const role = quiltRole(block, patch);
      if (!role.ok) throw new Error(role.fault.message);
      return { points: rounded(patch.corners), ...ink(role.value) };
    });
    const letters = patches.map((patch) => ({ text: patch.letter, ...middleOf(patch.corners) }));
    return {
      name: block.name,
      make: design.cells.filter((cell) => cell.kind === "block" && cell.block === index).length,
      finished: block.size,
      picture: { ...block.size, polygons, letters, seams: [], press: [] },
      steps: [],
    };
  });
}

/** 1/160 mm is finer than any printer, and whole numbers keep the queue's rows small. */
function rounded(polygon: Polygon): (readonly [number, number])[] {
  return polygon.map(([x, y]) => [Math.round(x), Math.round(y)] as const);
}

/** The centre of gravity by the shoelace sums; patches are convex enough for a letter to lie inside. */
function middleOf(polygon: Polygon): { x: number; y: number } {
  let [area, sumX, sumY] = [0, 0, 0];
  polygon.forEach(([x, y], index) => {
    const [nextX, nextY] = polygon[(index + 1) % polygon.length] ?? [x, y];
    const cross = x * nextY - nextX * y;
    area += cross;
    sumX += (x + nextX) * cross;
    sumY += (y + nextY) * cross;
  });
  return { x: Math.round(sumX / (3 * area)), y: Math.round(sumY / (3 * area)) };
}
