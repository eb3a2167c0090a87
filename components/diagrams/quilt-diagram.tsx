import { useId } from "react";
import type { QuiltLayout } from "@/lib/core/patchwork/quilt-layout";
import type { Role, RoleId } from "@/lib/core/piece/drawing";
import type { Polygon } from "@/lib/core/piece/patch";
import { INK, px } from "./ink";
import { roleFills, type RoleCloth } from "./role-fills";

interface QuiltDiagramProps {
  readonly layout: QuiltLayout;
  readonly roles: readonly Role[];
  readonly cloth?: RoleCloth;
  /** Pixels that the quilt fits into. */
  readonly width: number;
  readonly height?: number;
  /** Says what hangs here: "Weir Pool, 66 by 80 inches". */
  readonly label: string;
  /** The fabric of the binding, drawn as the edge that is seen. */
  readonly binding?: RoleId | null;
  /** Pixels of the picture a pixel of the cloth's tile; smaller than life, so that a print still reads. */
  readonly clothScale?: number;
}

/** Finished binding of 3/8 in, in 1/160 mm (common practice). */
const BINDING = 1524;

/** A whole quilt to scale. All pieces of a role are one path, so that a bed quilt stays light. */
export function QuiltDiagram({ layout, roles, cloth, width, height = Infinity, label, binding = null, clothScale = 0.35 }: QuiltDiagramProps) {
  const id = `quilt-${useId().replaceAll(/[^A-Za-z0-9_-]/g, "")}`;
  const scale = Math.min((width - 2) / layout.width, (height - 2) / layout.height);
  const [across, down] = [px(layout.width * scale + 2), px(layout.height * scale + 2)];
  const fills = roleFills(id, roles, cloth, clothScale);
  const seam = Math.min(0.8, Math.max(0.25, scale * 400));
  const edge = Math.max(1.2, BINDING * scale);
  return (
    <svg className="quilt-diagram" width={across} height={down} viewBox={`0 0 ${across} ${down}`} role="img" aria-label={label} style={{ maxWidth: "100%", height: "auto" }}>
      {fills.defs}
      {pathsOf(layout, scale).map(([role, path]) => (
        <path key={role} data-role={role} d={path} fill={fills.fill(role)} stroke={INK} strokeOpacity=".35" strokeWidth={px(seam)} strokeLinejoin="round" />
      ))}
      {binding === null ? null : <rect data-mark="binding" x={px(1 + edge / 2)} y={px(1 + edge / 2)} width={px(across - 2 - edge)} height={px(down - 2 - edge)} fill="none" stroke={fills.fill(binding)} strokeWidth={px(edge)} />}
      <rect data-mark="cut-edge" x="1" y="1" width={px(across - 2)} height={px(down - 2)} fill="none" stroke={INK} strokeWidth="1.2" />
    </svg>
  );
}

function pathsOf({ pieces }: QuiltLayout, scale: number): [RoleId, string][] {
  const paths = new Map<RoleId, string[]>();
  for (const { role, polygon } of pieces) {
    const list = paths.get(role);
    if (list) list.push(pathOf(polygon, scale));
    else paths.set(role, [pathOf(polygon, scale)]);
  }
  return [...paths].map(([role, list]) => [role, list.join("")]);
}

/** To a hundredth of a pixel: in a bed quilt small errors would add up to gaps. */
function pathOf(polygon: Polygon, scale: number): string {
  const place = (units: number) => Math.round((1 + units * scale) * 100) / 100;
  return `M${polygon.map(([x, y]) => `${place(x)} ${place(y)}`).join("L")}Z`;
}
