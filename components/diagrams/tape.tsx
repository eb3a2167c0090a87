import { useId } from "react";
import type { MeasureSystem } from "@/lib/core/measure/format";
import { CutNotch, FlawBand, LowMark, ReservedBand, TapeMarks, tileFill } from "./cloth-marks";
import { Dimension, EDGE, figureStyle, INDIGO, INK, PAPER, Plate, px, WELD } from "./ink";
import type { TapeBand, TapeProps } from "./tape-props";
import { figureStep, tapeTicks, unitOf } from "./tape-scale";
import { tapeSentence } from "./tape-words";

/** A bolt to scale: its core at the left, its cut edge a thick rule at the right, cloth above the tape. */
export function Tape(props: TapeProps) {
  const id = `tape-${useId().replaceAll(/[^A-Za-z0-9_-]/g, "")}`;
  const { reserved = [], flaws = [], dims = [], width, label, hidden = false } = props;
  const frame = frameOf(props);
  const said = hidden ? { "aria-hidden": true } : { role: "img", "aria-label": label ?? tapeSentence(props) };
  return (
    <svg className="tape" width={width} height={px(frame.height)} viewBox={`0 0 ${width} ${px(frame.height)}`} {...said}>
      <TapeMarks id={id} reserved={reserved.length > 0} flaws={flaws.length > 0} />
      <Ghost {...props} frame={frame} />
      {props.left > 0 ? <Cloth {...props} frame={frame} id={id} /> : <path d={`M2.5 ${px(frame.top - 2)}V${px(frame.foot + 2)}`} stroke={INK} strokeWidth="3" />}
      {props.lowMark ? <LowMark x={frame.x(props.lowMark)} top={frame.top} foot={frame.foot} /> : null}
      <Plates {...props} frame={frame} />
      {props.cutNow ? <CutNow cut={props.cutNow} left={props.left} frame={frame} /> : null}
      {dims.map((dim) => (
        <Dimension key={`${dim.from}-${dim.to}-${dim.label}`} from={frame.x(dim.from)} to={frame.x(dim.to)} y={frame.dimAt(dim.row ?? 0)} size={frame.size} colour={TONES[dim.tone ?? "ink"]}>
          {dim.label}
        </Dimension>
      ))}
      <Figures {...props} frame={frame} />
    </svg>
  );
}

const TONES = { ink: INK, reserved: INDIGO, quiet: "var(--walnut-3)" } as const;

interface Frame {
  readonly scale: number;
  readonly top: number;
  readonly cloth: number;
  readonly tape: number;
  readonly foot: number;
  readonly string: number;
  readonly size: number;
  readonly height: number;
  readonly x: (units: number) => number;
  readonly dimAt: (row: number) => number;
}

function frameOf({ flaws = [], lowMark, cutNow, dims = [], width, max, full = false, figures = false, clothHeight = 18, tapeHeight = 10, figureSize = 13 }: TapeProps): Frame {
  const rows = dims.reduce((most, dim) => Math.max(most, (dim.row ?? 0) + 1), 0);
  const rowHeight = figureSize * 1.6;
  const string = flaws.length > 0 ? Math.max(8, clothHeight * 0.45) : 0;
  const above = rows > 0 ? rows * rowHeight + 2 : 0;
  const top = 2 + above + Math.max(string, cutNow ? 8 + clothHeight * 0.12 : 0);
  const tape = full ? tapeHeight : 0;
  const foot = top + clothHeight + tape;
  const scale = max > 0 ? (width - 2) / max : 0;
  return {
    scale,
    top,
    cloth: clothHeight,
    tape,
    foot,
    string,
    size: figureSize,
    height: foot + (lowMark ? 7 : 3) + (figures ? figureSize + 3 : 0),
    x: (units) => 1 + units * scale,
    dimAt: (row) => rowHeight * (row + 0.5),
  };
}

type Framed = TapeProps & { readonly frame: Frame };

function Ghost({ putUp, left, frame }: Framed) {
  if (putUp <= left) return null;
  const from = frame.x(Math.max(0, left));
  return <rect data-mark="ghost" x={px(from)} y={px(frame.top + 0.5)} width={px(frame.x(putUp) - from)} height={px(frame.cloth + frame.tape - 1)} fill="none" stroke={EDGE} strokeDasharray="3 4" />;
}

function Cloth({ id, left, reserved = [], flaws = [], cutNow, cloth, system, frame }: Framed & { readonly id: string }) {
  const { top, foot } = frame;
  const end = frame.x(left);
  const band = ({ from, to }: TapeBand) => ({ id, x: frame.x(from), y: top, width: (to - from) * frame.scale, height: frame.cloth });
  return (
    <>
      <rect data-mark="cloth" x="1" y={px(top)} width={px(end - 1)} height={px(frame.cloth)} fill={tileFill(cloth)} />
      {cutNow ? <Veils left={left} cut={cutNow} frame={frame} /> : null}
      {reserved.map((each) => (
        <ReservedBand key={`${each.from}-${each.to}`} {...band(each)} />
      ))}
      {frame.tape > 0 ? <YellowTape left={left} system={system} frame={frame} /> : null}
      <rect x="1" y={px(top)} width={px(end - 1)} height={px(frame.cloth + frame.tape)} fill="none" stroke={INK} />
      <path d={`M1 ${px(top + frame.cloth)}H${px(end)}`} stroke={INK} strokeWidth="1.4" />
      <path data-mark="cut-edge" d={`M${px(end)} ${px(top - 2)}V${px(foot + 2)}`} stroke={INK} strokeWidth="3" />
      {flaws.map((each) => (
        <FlawBand key={`${each.from}-${each.to}`} {...band(each)} width={Math.max(4, (each.to - each.from) * frame.scale)} string={frame.string} />
      ))}
    </>
  );
}

function Veils({ left, cut, frame }: { readonly left: number; readonly cut: TapeBand; readonly frame: Frame }) {
  const veils = [
    [0, cut.from],
    [cut.to, left],
  ] as const;
  return veils.map(([from, to]) =>
    to > from ? <rect key={from} data-mark="veil" x={px(frame.x(from))} y={px(frame.top)} width={px((to - from) * frame.scale)} height={px(frame.cloth)} fill={PAPER} fillOpacity=".45" /> : null,
  );
}

function YellowTape({ left, system, frame }: { readonly left: number; readonly system: MeasureSystem; readonly frame: Frame }) {
  const y = frame.top + frame.cloth;
  const ticks = tapeTicks(left, frame.scale, system).map(({ at, part }) => `M${px(frame.x(at))} ${px(y)}v${px(frame.tape * part)}`);
  return (
    <>
      <rect data-mark="tape" x="1" y={px(y)} width={px(left * frame.scale)} height={px(frame.tape)} fill={WELD} />
      <path data-mark="ticks" d={ticks.join("")} stroke={INK} strokeWidth={frame.tape > 14 ? 1.2 : 0.9} />
    </>
  );
}

function Plates({ reserved = [], frame }: Framed) {
  return reserved.map(({ from, to, label }) =>
    label === "" ? null : (
      <Plate key={`${from}-${to}`} x={frame.x((from + to) / 2)} y={frame.top + frame.cloth / 2} size={Math.min(frame.size, frame.cloth * 0.72)}>
        {label}
      </Plate>
    ),
  );
}

function CutNow({ cut, left, frame }: { readonly cut: TapeBand; readonly left: number; readonly frame: Frame }) {
  const [from, to] = [frame.x(cut.from), frame.x(cut.to)];
  return (
    <>
      {cut.from > 0 && cut.from < left ? <CutNotch x={from} top={frame.top} foot={frame.foot} height={frame.cloth} /> : null}
      <rect data-mark="cut-now" x={px(from)} y={px(frame.top - 1)} width={px(to - from)} height={px(frame.cloth + frame.tape + 2)} fill="none" stroke={INK} strokeWidth="2.4" strokeDasharray="8 6" />
    </>
  );
}

function Figures({ figures = false, putUp, left, max, width, system, frame }: Framed) {
  if (!figures) return null;
  const unit = unitOf(system);
  const step = figureStep(frame.scale, system, frame.size * 2);
  const last = Math.min(max, Math.max(putUp, left));
  return Array.from({ length: Math.floor(last / unit / step + 1e-9) + 1 }, (_, index) => index * step).map((figure) => (
    <text key={figure} x={px(frame.x(figure * unit))} y={px(frame.height - 4)} textAnchor={figure === 0 ? "start" : frame.x(figure * unit) > width - frame.size * 0.6 ? "end" : "middle"} style={figureStyle(frame.size, 560)}>
      {figure}
    </text>
  ));
}
