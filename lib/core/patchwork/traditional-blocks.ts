import { inches } from "../measure/length";
import type { BlockSize, Drawing, Role } from "../piece/drawing";
import { drawCells, type CellDrawing } from "./traditional/cells";
import { POINT_BLOCKS } from "./traditional/points";
import { SQUARE_BLOCKS } from "./traditional/squares";

/** A block in the public domain, drawn by us as data. */
export interface LibraryBlock {
  readonly slug: string;
  readonly name: string;
  /** The size it is usually finished at. */
  readonly size: BlockSize;
  readonly drawing: Drawing;
  readonly roles: readonly Role[];
  /** The grid that it lies on: "4 × 4". */
  readonly family: string;
  readonly skill: "first quilt" | "some practice" | "practised";
}

type Entry = readonly [slug: string, name: string, sizeInches: number, skill: LibraryBlock["skill"]];

/** Old names of the trade; sizes that the grid divides evenly. */
const ENTRIES: readonly Entry[] = [
  ["bear-paw", "Bear Paw", 14, "some practice"],
  ["broken-dishes", "Broken Dishes", 8, "first quilt"],
  ["churn-dash", "Churn Dash", 9, "first quilt"],
  ["clays-choice", "Clay’s Choice", 12, "some practice"],
  ["diamond-in-a-square", "Diamond in a Square", 6, "first quilt"],
  ["dutchmans-puzzle", "Dutchman’s Puzzle", 12, "some practice"],
  ["fifty-four-forty", "Fifty-four Forty or Fight", 12, "practised"],
  ["flying-geese", "Flying Geese", 6, "some practice"],
  ["four-patch", "Four Patch", 6, "first quilt"],
  ["friendship-star", "Friendship Star", 9, "first quilt"],
  ["hourglass", "Hourglass", 6, "first quilt"],
  ["jacobs-ladder", "Jacob’s Ladder", 12, "first quilt"],
  ["log-cabin", "Log Cabin", 7, "first quilt"],
  ["nine-patch", "Nine Patch", 9, "first quilt"],
  ["ohio-star", "Ohio Star", 12, "some practice"],
  ["pinwheel", "Pinwheel", 8, "first quilt"],
  ["rail-fence", "Rail Fence", 6, "first quilt"],
  ["sawtooth-star", "Sawtooth Star", 12, "some practice"],
  ["shoo-fly", "Shoo Fly", 9, "first quilt"],
  ["snowball", "Snowball", 9, "first quilt"],
  ["square-in-a-square", "Square in a Square", 6, "some practice"],
];

const VALUES: Readonly<Record<string, Role["value"]>> = { light: "light", sky: "light", medium: "medium", corner: "medium", hearth: "medium", centre: "medium" };

export const TRADITIONAL_BLOCKS: readonly LibraryBlock[] = ENTRIES.map(([slug, name, size, skill]) => {
  const cells = SQUARE_BLOCKS[slug] ?? POINT_BLOCKS[slug];
  if (!cells) throw new Error(`The block ${slug} is listed but not drawn.`);
  const drawing = drawCells(cells);
  return { slug, name, size: { width: inches(size), height: inches(size) }, drawing, roles: rolesOf(cells), family: `${drawing.grid.columns} × ${drawing.grid.rows}`, skill };
});

function rolesOf(cells: CellDrawing): Role[] {
  return [...new Set(Object.values(cells.roles))].map((id) => ({ id, name: id.charAt(0).toUpperCase() + id.slice(1), value: VALUES[id] ?? "dark" }));
}
