import { useId } from "react";
import type { PointerEvent, ReactNode } from "react";
import type { MeasureSystem } from "@/lib/core/measure/format";
import type { BlockSize, Role } from "@/lib/core/piece/drawing";
import type { Patch, PlanePoint } from "@/lib/core/piece/patch";
import { BlockRulers } from "./block-rulers";
import { blockScale, type BlockScale } from "./block-scale";
import { INK, outlinePath } from "./ink";
import { BastingCrosses, GrainMark, LetterMark, SewnLines } from "./marks-on-cloth";
import { middleOf } from "./patch-middle";
import { roleFills, type RoleCloth } from "./role-fills";
import { seamLines } from "./seam-lines";

export interface BlockDiagramProps {
  readonly patches: readonly Patch[];
  readonly size: BlockSize;
  readonly roles: readonly Role[];
  readonly cloth?: RoleCloth;
  /** Pixels of the block's longer side, without the rulers. */
  readonly side: number;
  /** Says what the block is, in a sentence. */
  readonly label: string;
  readonly letters?: boolean;
  /** Grain arrows on the patches whose grain is kept. */
  readonly grain?: boolean;
  readonly seams?: boolean;
  readonly rulers?: { readonly grid: { readonly columns: number; readonly rows: number }; readonly system: MeasureSystem };
  /** Indices of the chosen patches: framed with basting crosses. */
  readonly chosen?: readonly number[];
  /** Given where the drawing carries its cloth itself: user units a pixel of the tile. */
  readonly clothScale?: number;
  /** A press on a patch, with its index and where, in fractions of the block. */
  readonly onPick?: (patch: number, at: PlanePoint) => void;
  /** The pointer anywhere on the sheet, in fractions of the block. */
  readonly onPointer?: (kind: "press" | "move" | "release" | "leave", at: PlanePoint) => void;
  /** Laid over the block; in pixels of the picture, see `blockScale`. */
  readonly children?: (scale: BlockScale) => ReactNode;
}

/** A block: cloth, letters in circles, seams dashed, the outer cut edge solid. */
export function BlockDiagram(props: BlockDiagramProps) {
  const id = `block-${useId().replaceAll(/[^A-Za-z0-9_-]/g, "")}`;
  const { patches, size, roles, cloth, side, label, seams = true, rulers, chosen = [], clothScale, onPick, onPointer, children } = props;
  const scale = blockScale(size, side, rulers !== undefined);
  const fills = roleFills(id, roles, cloth, clothScale);
  const place = (patch: Patch) => patch.corners.map(scale.place);
  const framed = patches.filter((patch) => chosen.includes(patch.index)).map(place);
  const lines = seams ? seamLines(patches.map((patch) => patch.corners), size.width, size.height) : [];
  return (
    <svg className="block-diagram" width={scale.width} height={scale.height} viewBox={`0 0 ${scale.width} ${scale.height}`} role="img" aria-label={label} {...pointerProps(scale, onPointer)}>
      {fills.defs}
      {rulers ? <BlockRulers size={size} scale={scale} {...rulers} /> : null}
      {patches.map((patch) => (
        <path
          key={patch.index}
          data-patch={patch.index}
          d={outlinePath(patch.corners, scale.place)}
          fill={fills.fill(patch.role)}
          style={onPick ? { cursor: "pointer" } : undefined}
          onClick={onPick ? (event) => onPick(patch.index, whereIs(event.currentTarget.ownerSVGElement, event, scale)) : undefined}
        />
      ))}
      <g style={{ pointerEvents: "none" }}>
        <SewnLines lines={lines.map(({ from, to }) => ({ from: scale.place(from), to: scale.place(to) }))} weight={side < 200 ? 1 : 1.6} />
        <rect data-mark="cut-edge" x={scale.left} y={scale.top} width={size.width * scale.scale} height={size.height * scale.scale} fill="none" stroke={INK} strokeWidth={side < 200 ? 1.6 : 2.6} />
        <PatchMarks {...props} scale={scale} />
        {framed.length > 0 ? <BastingCrosses polygons={framed} /> : null}
        {children?.(scale)}
      </g>
    </svg>
  );
}

/** Letters where there is room for a circle of 6 px or more; grain arrows run out from under them. */
function PatchMarks({ patches, letters = true, grain = false, scale }: BlockDiagramProps & { readonly scale: BlockScale }) {
  if (!letters && !grain) return null;
  return patches.map((patch) => {
    const { at, room } = middleOf(patch.corners);
    const [middle, pixels] = [scale.place(at), room * scale.scale];
    const radius = Math.min(13, pixels * 0.72);
    return (
      <g key={patch.index}>
        {grain && patch.grain !== "any" && pixels >= 7 ? <GrainMark at={middle} grain={patch.grain} reach={Math.max(radius + 9, pixels * 0.9)} halo /> : null}
        {letters && radius >= 6 ? <LetterMark at={middle} letter={patch.letter} radius={radius} /> : null}
      </g>
    );
  });
}

function pointerProps(scale: BlockScale, onPointer: BlockDiagramProps["onPointer"]) {
  if (!onPointer) return {};
  const tell = (kind: "press" | "move" | "release" | "leave") => (event: PointerEvent<SVGSVGElement>) => onPointer(kind, whereIs(event.currentTarget, event, scale));
  return { onPointerDown: tell("press"), onPointerMove: tell("move"), onPointerUp: tell("release"), onPointerLeave: tell("leave"), style: { touchAction: "none" } };
}

/** The picture may be shown smaller than it is drawn, so the pointer is taken back to its own pixels. */
function whereIs(svg: SVGSVGElement | null, { clientX, clientY }: { readonly clientX: number; readonly clientY: number }, scale: BlockScale): PlanePoint {
  const box = svg?.getBoundingClientRect();
  if (!box || box.width === 0 || box.height === 0) return [NaN, NaN];
  return scale.fraction([((clientX - box.left) * scale.width) / box.width, ((clientY - box.top) * scale.height) / box.height]);
}
