import type { MeasureSystem } from "@/lib/core/measure/format";
import { PER_CENTIMETRE, PER_INCH } from "@/lib/core/measure/length";
import type { BlockSize } from "@/lib/core/piece/drawing";
import { RULER_LEFT, RULER_TOP, type BlockScale } from "./block-scale";
import { figureStyle, INK, px, WELD } from "./ink";

interface RulersProps {
  readonly size: BlockSize;
  readonly scale: BlockScale;
  /** Grid lines stand out: their figures are bold. */
  readonly grid: { readonly columns: number; readonly rows: number };
  readonly system: MeasureSystem;
}

/** Yellow rulers above and beside a block, in inches or centimetres. */
export function BlockRulers({ size, scale, grid, system }: RulersProps) {
  const { left, top } = scale;
  const [across, down] = [size.width * scale.scale, size.height * scale.scale];
  const columns = marksOf(size.width, grid.columns, scale.scale, system);
  const rows = marksOf(size.height, grid.rows, scale.scale, system);
  return (
    <g data-mark="rulers">
      <rect x={left} y={top - RULER_TOP} width={px(across)} height={RULER_TOP} fill={WELD} />
      <rect x={left - RULER_LEFT} y={top} width={RULER_LEFT} height={px(down)} fill={WELD} />
      <path d={columns.map(({ at, part }) => `M${px(left + at)} ${top}v${px(-15 * part)}`).join("") + rows.map(({ at, part }) => `M${left} ${px(top + at)}h${px(-15 * part)}`).join("")} stroke={INK} />
      {columns.map(({ at, figure, bold }) =>
        figure === null || at < 14 ? null : (
          <text key={at} x={px(left + at - 4)} y={px(top - 12.5)} textAnchor="end" style={figureStyle(bold ? 13 : 11, bold ? 680 : 500)}>
            {figure}
          </text>
        ),
      )}
      {rows.map(({ at, figure, bold }) =>
        figure === null || at < 14 ? null : (
          <text key={at} x={px(left - RULER_LEFT + 3)} y={px(top + at - 4)} style={figureStyle(bold ? 13 : 11, bold ? 680 : 500)}>
            {figure}
          </text>
        ),
      )}
    </g>
  );
}

interface RulerMark {
  readonly at: number;
  readonly part: number;
  readonly figure: string | null;
  readonly bold: boolean;
}

/** Ticks that stand 4 px apart or more, figures 24 px. */
function marksOf(length: number, cells: number, scale: number, system: MeasureSystem): RulerMark[] {
  const unit = system === "yards" ? PER_INCH : PER_CENTIMETRE;
  const steps = system === "yards" ? [1 / 8, 1 / 4, 1 / 2, 1, 3, 6, 12] : [1 / 2, 1, 5, 10, 50];
  const step = (steps.find((each) => each * unit * scale >= (each < 1 ? 20 : 4)) ?? 12) * unit;
  const whole = [1, 2, 3, 5, 6, 10, 12, 20, 24, 50, 100].find((each) => each * unit * scale >= 24) ?? 100;
  return Array.from({ length: Math.floor(length / step + 1e-9) + 1 }, (_, index) => {
    const at = index * step;
    const units = at / unit;
    const isFigure = units > 0 && Math.abs(units / whole - Math.round(units / whole)) < 1e-9;
    const cell = (at * cells) / length;
    const bold = Math.abs(cell - Math.round(cell)) < 1e-9;
    const part = bold ? 1 : Number.isInteger(units) ? 0.73 : 0.46;
    return { at: at * scale, part, figure: isFigure ? String(Math.round(units)) : null, bold };
  });
}
