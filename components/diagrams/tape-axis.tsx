import type { CSSProperties } from "react";
import { wordsOfLength, type MeasureSystem } from "@/lib/core/measure/format";
import type { Length } from "@/lib/core/measure/length";
import { figureStyle, px } from "./ink";
import { axisStep, unitOf } from "./tape-scale";

interface TapeAxisProps {
  /** Pixels, the same as every tape of the table. */
  readonly width: number;
  /** What fills the width, the same as every tape of the table. */
  readonly max: Length;
  readonly system: MeasureSystem;
  readonly size?: number;
}

/** The one scale of a table, in its head. */
export function TapeAxis({ width, max, system, size = 13 }: TapeAxisProps) {
  const scale = (width - 2) / max;
  const unit = unitOf(system);
  const step = axisStep(max, scale, system);
  const figures = Array.from({ length: Math.floor(max / unit / step + 1e-9) + 1 }, (_, index) => index * step);
  const last = figures[figures.length - 1] ?? 0;
  return (
    <svg className="axis" width={width} height={size + 4} viewBox={`0 0 ${width} ${size + 4}`} role="img" aria-label={`Scale from 0 to ${wordsOfLength(max, system)}.`} style={{ overflow: "visible" }}>
      {figures.map((figure) => {
        const x = 1 + figure * unit * scale;
        const isLast = figure === last && figure > 0;
        return (
          <text key={figure} x={px(x)} y={size} textAnchor={figure === 0 ? "start" : isLast && x > width - 40 ? "end" : "middle"} style={figureStyle(size, 560)}>
            {isLast ? `${figure} ${system === "yards" ? "yd" : "m"}` : figure}
          </text>
        );
      })}
    </svg>
  );
}

/**
 * The faint lines that carry the axis down a column: a background for the cells. Every yard or metre, or every second
 * and so on where they would stand closer than 8 px.
 *
 * @param offset where the tape begins in the cell, in pixels.
 */
export function yardLines({ width, max, system, offset = 0 }: Omit<TapeAxisProps, "size"> & { readonly offset?: number }): CSSProperties {
  const scale = (width - 2) / max;
  const unit = unitOf(system);
  const every = Math.max(1, Math.ceil(8 / (unit * scale)));
  const step = unit * every * scale;
  const lines = Math.floor(max / (unit * every) + 1e-9);
  return {
    backgroundImage: `repeating-linear-gradient(90deg, var(--line) 0 1px, transparent 1px ${step.toFixed(3)}px)`,
    backgroundPosition: `${offset}px 0`,
    backgroundSize: `${px(lines * step + 1.5)}px 100%`,
    backgroundRepeat: "no-repeat",
  };
}
