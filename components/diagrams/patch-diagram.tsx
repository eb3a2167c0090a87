import { useId } from "react";
import type { Grain, Role } from "@/lib/core/piece/drawing";
import type { PlanePoint, Polygon } from "@/lib/core/piece/patch";
import { INK, outlinePath } from "./ink";
import { GrainMark, LetterMark, SewnLines } from "./marks-on-cloth";
import { middleOf } from "./patch-middle";
import { roleFills, type RoleCloth } from "./role-fills";

interface PatchDiagramProps {
  readonly letter: string;
  /** Finished and cut outlines in the same coordinates, 1/160 mm. */
  readonly finished: Polygon;
  readonly cut: Polygon;
  /** Null draws the bare shape. */
  readonly role?: Role | null;
  readonly cloth?: RoleCloth;
  /** Shown outside of the patch; "any" shows none. */
  readonly grain?: Grain;
  /** Says what the patch is: "B, half-square triangle, 3 in finished". */
  readonly label: string;
  /** Pixels of the longer side. */
  readonly side?: number;
  readonly chosen?: boolean;
}

/** One patch: its outer edge is cut and solid, the dashed line within is sewn; letter in a circle, grain outside. */
export function PatchDiagram({ letter, finished, cut, role = null, cloth, grain = "up", label, side = 64 }: PatchDiagramProps) {
  const id = `patch-${useId().replaceAll(/[^A-Za-z0-9_-]/g, "")}`;
  const { place, width, height } = patchScale(cut, side);
  const fills = roleFills(id, role ? [role] : [], cloth);
  const middle = middleOf(finished);
  const sewn = finished.map(place);
  const radius = Math.min(11, middle.room * (side / extentOf(cut)) * 0.86);
  const shown = grain !== "any";
  return (
    <svg className="patch-diagram" width={side + (shown ? 26 : 4)} height={side + 4} viewBox={`0 0 ${side + (shown ? 26 : 4)} ${side + 4}`} role="img" aria-label={label}>
      {fills.defs}
      <path data-mark="cut-edge" d={outlinePath(cut, place)} fill={fills.fill(role?.id ?? null)} stroke={INK} strokeWidth="2.4" strokeLinejoin="miter" strokeMiterlimit="10" />
      <SewnLines lines={sewn.map((from, index) => ({ from, to: sewn[(index + 1) % sewn.length] ?? from }))} weight={1} />
      {radius >= 5 ? <LetterMark at={place(middle.at)} letter={letter} radius={radius} /> : null}
      {shown ? <GrainMark at={[Math.min(side, width) + 15, 2 + height / 2]} grain={grain} reach={grain === "up" ? Math.max(10, height / 2 - 6) : 9} /> : null}
    </svg>
  );
}

function boundsOf(polygon: Polygon) {
  const [xs, ys] = [polygon.map(([x]) => x), polygon.map(([, y]) => y)];
  const [left, top] = [Math.min(...xs), Math.min(...ys)];
  return { left, top, width: Math.max(...xs) - left, height: Math.max(...ys) - top };
}

function extentOf(polygon: Polygon): number {
  const { width, height } = boundsOf(polygon);
  return Math.max(width, height) || 1;
}

/** At the left and level with the middle; a long thin patch keeps its own proportions. */
function patchScale(cut: Polygon, side: number) {
  const { left, top, width, height } = boundsOf(cut);
  const scale = side / (Math.max(width, height) || 1);
  const place = ([x, y]: PlanePoint): PlanePoint => [2 + (x - left) * scale, 2 + (y - top) * scale];
  return { place, width: width * scale, height: height * scale };
}
