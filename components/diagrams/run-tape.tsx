import type { ClothTile } from "@/components/ui/cloth";
import { displayLength, wordsOfLength, type MeasureSystem } from "@/lib/core/measure/format";
import type { Length } from "@/lib/core/measure/length";
import { tileFill } from "./cloth-marks";
import { figureStyle, INK, PAPER, px, textWidth, WELD } from "./ink";

/** One bolt of a run, with the lengths that are cut from it in their order. */
export interface RunStop {
  readonly key: string;
  /** Where the bolt stands: "W2 · 14". */
  readonly place: string;
  /** The fabric. */
  readonly name: string;
  readonly cloth: ClothTile | null;
  readonly lengths: readonly { readonly length: Length; readonly done: boolean }[];
}

interface RunTapeProps {
  /** In shelf order. */
  readonly stops: readonly RunStop[];
  /** The key of the bolt that lies on the table; null when none does. */
  readonly now: string | null;
  /** Pixels. */
  readonly width: number;
  readonly system: MeasureSystem;
  readonly size?: number;
}

const TOP = 26;
const CLOTH = 30;
const TAPE = 11;

/** A whole run as one tape in shelf order: what is cut has the yellow tape under it, the rest is veiled. */
export function RunTape({ stops, now, width, system, size = 18 }: RunTapeProps) {
  const total = stops.reduce((sum, stop) => sum + lengthOf(stop), 0);
  const scale = total > 0 ? (width - 6) / total : 0;
  const placed = stops.map((stop, index) => ({ stop, from: 3 + stops.slice(0, index).reduce((sum, each) => sum + lengthOf(each), 0) * scale, width: lengthOf(stop) * scale }));
  const here = placed.find(({ stop }) => stop.key === now);
  const height = TOP + CLOTH + TAPE + size + 6;
  return (
    <svg className="run-tape" width={width} height={height} viewBox={`0 0 ${width} ${height}`} role="img" aria-label={runSentence(stops, now, total, system)} style={{ maxWidth: "100%" }}>
      {placed.map((each) => (
        <Stop key={each.stop.key} {...each} scale={scale} isNow={each === here} system={system} size={size} />
      ))}
      {here ? <Notch x={here.from + doneOf(here.stop) * scale} /> : null}
    </svg>
  );
}

interface StopProps {
  readonly stop: RunStop;
  readonly from: number;
  readonly width: number;
  readonly scale: number;
  readonly isNow: boolean;
  readonly system: MeasureSystem;
  readonly size: number;
}

function Stop({ stop, from, width, scale, isNow, system, size }: StopProps) {
  const done = doneOf(stop) * scale;
  const weight = isNow ? 680 : 520;
  const ends = endsOf(stop).map(({ end, isDone }) => ({ x: px(from + end * scale), isDone }));
  const words = wordsOf(stop, system);
  return (
    <g data-stop={stop.key}>
      <rect x={px(from)} y={TOP} width={px(width)} height={CLOTH} fill={tileFill(stop.cloth)} />
      {done < width - 0.05 ? <rect data-mark="veil" x={px(from + done)} y={TOP} width={px(width - done)} height={CLOTH} fill={PAPER} fillOpacity={isNow ? 0.35 : 0.55} /> : null}
      {done > 0 ? <rect data-mark="tape" x={px(from)} y={TOP + CLOTH} width={px(done)} height={TAPE} fill={WELD} stroke={INK} strokeWidth="1.2" /> : null}
      {ends.slice(0, -1).map(({ x, isDone }) => (
        <path key={x} d={`M${x} ${TOP}v${isDone ? CLOTH + TAPE : CLOTH}`} stroke={INK} strokeWidth="1.6" strokeDasharray={isDone ? undefined : "4 3"} />
      ))}
      <rect x={px(from)} y={TOP} width={px(width)} height={CLOTH} fill="none" stroke={INK} strokeWidth={isNow ? 3 : 1.2} />
      {isNow || textWidth(stop.place, size) <= width ? (
        <text x={px(from + 3)} y="18" style={figureStyle(size, weight)}>
          {stop.place}
        </text>
      ) : null}
      {isNow || textWidth(words, size) <= width ? (
        <text x={px(from + 3)} y={TOP + CLOTH + TAPE + size} style={figureStyle(size, weight)}>
          {words}
        </text>
      ) : null}
    </g>
  );
}

/** The mark the cutter is at: yellow with an ink edge. */
function Notch({ x }: { readonly x: number }) {
  return <path data-mark="now" d={`M${px(x - 11)} 13h22l-11 14z`} fill={WELD} stroke={INK} strokeWidth="1.5" />;
}

function lengthOf({ lengths }: RunStop): number {
  return lengths.reduce((sum, each) => sum + each.length, 0);
}

function doneOf({ lengths }: RunStop): number {
  return lengths.reduce((sum, each) => sum + (each.done ? each.length : 0), 0);
}

function endsOf({ lengths }: RunStop): { readonly end: number; readonly isDone: boolean }[] {
  let end = 0;
  return lengths.map(({ length, done }) => ({ end: (end += length), isDone: done }));
}

/** "3 cut", "1 of 3 × 2 yd", "3 × 5⁄8 yd"; lengths that differ are counted only. */
function wordsOf({ lengths }: RunStop, system: MeasureSystem): string {
  const done = lengths.filter((each) => each.done).length;
  if (done === lengths.length) return `${done} cut`;
  const count = done > 0 ? `${done} of ${lengths.length}` : String(lengths.length);
  const first = lengths[0]?.length ?? 0;
  return lengths.every((each) => each.length === first) ? `${count} × ${displayLength(first, system)}` : `${count} lengths`;
}

function runSentence(stops: readonly RunStop[], now: string | null, total: number, system: MeasureSystem): string {
  const parts = stops.map((stop) => {
    const done = stop.lengths.filter((each) => each.done).length;
    const state = done === 0 ? `${stop.lengths.length} to cut` : done === stop.lengths.length ? `all ${done} cut` : `${done} of ${stop.lengths.length} cut`;
    return `${stop.name} on ${stop.place}, ${state}${stop.key === now ? ", on the table now" : ""}`;
  });
  return `The run in shelf order, ${wordsOfLength(total, system)}: ${parts.length > 0 ? parts.join("; ") : "nothing to cut"}.`;
}
