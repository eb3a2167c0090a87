import type { CSSProperties, ReactNode } from "react";
import type { PlanePoint, Polygon } from "@/lib/core/piece/patch";

/** Colours of the drawings, by what they stand for. Madder is flaw and short, yellow measured cloth, nothing else. */
export const INK = "var(--walnut)";
export const PAPER = "var(--paper)";
export const INDIGO = "var(--indigo)";
export const MADDER = "var(--madder)";
export const WELD = "var(--weld)";
export const EDGE = "var(--line-2)";

/** To a tenth of a pixel: finer cannot be seen, and the markup stays small. */
export function px(value: number): number {
  const rounded = Math.round(value * 10) / 10;
  return rounded === 0 ? 0 : rounded;
}

/** Figures on a drawing: tabular, fractions set as mixed numbers. */
export function figureStyle(size: number, weight = 600, fill: string = INK): CSSProperties {
  return { font: `${weight} ${size}px var(--f-ui)`, fontFeatureSettings: '"tnum", "frac"', fill };
}

/** About how wide a text is set, in pixels; a fraction such as 7⁄8 takes the room of one and a half figures. */
export function textWidth(text: string, size: number): number {
  const letters = text.replace(/\d+\u2044\d+/g, "0.");
  return [...letters].reduce((total, letter) => total + (/[ .,·'’ijl1|]/.test(letter) ? 0.32 : /[mwMW×]/.test(letter) ? 0.85 : 0.58), 0) * size;
}

/** A polygon's corners as a closed path. */
export function outlinePath(polygon: Polygon, place: (point: PlanePoint) => PlanePoint = (point) => point): string {
  return `M${polygon.map((point) => place(point).map(px).join(" ")).join("L")}Z`;
}

interface DimensionProps {
  readonly from: number;
  readonly to: number;
  readonly y: number;
  readonly size: number;
  readonly colour?: string;
  readonly children: string;
}

/** A dimension line with its figure in the middle; where the figure has no room the line is left to its ends. */
export function Dimension({ from, to, y, size, colour = INK, children }: DimensionProps): ReactNode {
  const middle = (from + to) / 2;
  const room = textWidth(children, size) + 12;
  const line = to - from > room + 8 ? `M${px(from)} ${px(y)}H${px(middle - room / 2)}M${px(middle + room / 2)} ${px(y)}H${px(to)}` : "";
  return (
    <g>
      <path d={`M${px(from)} ${px(y - 6)}v12M${px(to)} ${px(y - 6)}v12${line}`} stroke={colour} strokeWidth="1.5" fill="none" />
      <text x={px(middle)} y={px(y + size * 0.36)} textAnchor="middle" style={figureStyle(size, 600, colour)}>
        {children}
      </text>
    </g>
  );
}

/** A word on a paper plate, so that it is read on any cloth. */
export function Plate({ x, y, size, children }: { readonly x: number; readonly y: number; readonly size: number; readonly children: string }) {
  const width = textWidth(children, size) + 14;
  return (
    <g>
      <rect x={px(x - width / 2)} y={px(y - size * 0.72)} width={px(width)} height={px(size * 1.44)} fill={PAPER} stroke={INK} />
      <text x={px(x)} y={px(y + size * 0.35)} textAnchor="middle" style={figureStyle(size)}>
        {children}
      </text>
    </g>
  );
}

/** "WP, SR and WP" with its "and"; nothing for nothing. */
export function listed(words: readonly string[]): string {
  return words.length < 2 ? (words[0] ?? "") : `${words.slice(0, -1).join(", ")} and ${words[words.length - 1] ?? ""}`;
}
