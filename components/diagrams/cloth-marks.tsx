import type { ReactNode } from "react";
import { clothFill, type ClothTile } from "@/components/ui/cloth";
import { INDIGO, INK, MADDER, PAPER, px } from "./ink";

/** Plain cloth where no fabric is chosen. */
const NO_CLOTH = "var(--flax-2)";

/** The fill of a fabric; its own colour until the page's patterns are there, and plain where there is no fabric. */
export function tileFill(cloth: ClothTile | null | undefined): string {
  return cloth ? `${clothFill(cloth.id)} ${cloth.colour}` : NO_CLOTH;
}

/** The two patterns of a tape, under ids of its own. Drawn only where they are needed. */
export function TapeMarks({ id, reserved, flaws }: { readonly id: string; readonly reserved: boolean; readonly flaws: boolean }): ReactNode {
  if (!reserved && !flaws) return null;
  return (
    <defs>
      {reserved ? (
        <pattern id={`${id}-reserved`} width="7" height="7" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <rect width="2" height="7" fill={INDIGO} />
        </pattern>
      ) : null}
      {flaws ? (
        <pattern id={`${id}-flaw`} width="6" height="6" patternUnits="userSpaceOnUse">
          <rect width="6" height="6" fill={PAPER} />
          <path d="M0 0L6 6M6 0L0 6" stroke={MADDER} strokeWidth="1.1" />
        </pattern>
      ) : null}
    </defs>
  );
}

interface BandProps {
  readonly id: string;
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/** Cloth veiled with paper, then the indigo hatch of what is reserved. */
export function ReservedBand({ id, x, y, width, height }: BandProps) {
  const box = { x: px(x), y: px(y), width: px(width), height: px(height) };
  return (
    <g data-mark="reserved">
      <rect {...box} fill={PAPER} fillOpacity=".65" />
      <rect {...box} fill={`url(#${id}-reserved)`} fillOpacity=".8" />
      <path d={`M${px(x)} ${px(y)}v${px(height)}M${px(x + width)} ${px(y)}v${px(height)}`} stroke={INDIGO} strokeWidth="1.6" />
    </g>
  );
}

/** The mill's red string and the cross-hatch from one measured edge of a flaw to the other. */
export function FlawBand({ id, x, y, width, height, string }: BandProps & { readonly string: number }) {
  const box = { x: px(x), y: px(y), width: px(width), height: px(height) };
  const end = px(x + width);
  return (
    <g data-mark="flaw">
      <rect {...box} fill={`url(#${id}-flaw)`} stroke={MADDER} strokeWidth="1.4" />
      <path
        d={`M${end} ${px(y + height)}V${px(y)}C${px(end + 7)} ${px(y - string * 0.4)} ${px(end - 6)} ${px(y - string * 0.6)} ${px(end + 2)} ${px(y - string)}`}
        fill="none"
        stroke={MADDER}
        strokeWidth="2.4"
      />
    </g>
  );
}

/** The mark below which a fabric is to be ordered: dotted ink with a foot. */
export function LowMark({ x, top, foot }: { readonly x: number; readonly top: number; readonly foot: number }) {
  return (
    <g data-mark="low">
      <path d={`M${px(x)} ${px(top - 2)}V${px(foot + 1)}`} stroke={INK} strokeWidth="1.4" strokeDasharray="3 2.5" />
      <path d={`M${px(x)} ${px(foot)}l-4.5 6.5h9z`} fill={INK} />
    </g>
  );
}

/** Where the next cut is made. */
export function CutNotch({ x, top, foot, height }: { readonly x: number; readonly top: number; readonly foot: number; readonly height: number }) {
  const [wide, deep] = [5 + height * 0.1, 8 + height * 0.12];
  return (
    <g data-mark="next-cut">
      <path d={`M${px(x)} ${px(top - 2)}V${px(foot + 2)}`} stroke={INK} strokeWidth="3" />
      <path d={`M${px(x)} ${px(top)}l${px(-wide)} ${px(-deep)}h${px(2 * wide)}z`} fill={INK} />
    </g>
  );
}
