import { useId } from "react";
import type { ClothTile } from "@/components/ui/cloth";
import { displayInches, displayMeasure, formatCentimetres, wordsOfInches, wordsOfLength, type MeasureSystem } from "@/lib/core/measure/format";
import { PER_CENTIMETRE } from "@/lib/core/measure/length";
import type { CutPiece } from "@/lib/core/piece/cut-piece";
import type { Blank, Strip, StripPlan, WasteAllowance } from "@/lib/core/piece/strip-plan";
import { tileFill } from "./cloth-marks";
import { diagonalsOf, stripRuns, type StripRun } from "./cut-map-plan";
import { acrossTicks, alongTicks, MAP_LEFT, MAP_TOP, mapScale, type MapScale } from "./cut-map-scale";
import { Dimension, figureStyle, INK, listed, PAPER, px, textWidth, WELD } from "./ink";

export interface CutMapProps {
  readonly plan: StripPlan;
  readonly blanks: readonly Blank[];
  /** The cut pieces by which half-rectangles know their diagonal. */
  readonly pieces?: readonly CutPiece[];
  /** With it the map is as long as what is cut from the bolt, and begins with what straightening takes. */
  readonly allowance?: WasteAllowance;
  readonly system: MeasureSystem;
  /** Pixels. */
  readonly width: number;
  readonly mostHeight?: number;
  readonly cloth?: ClothTile | null;
  /** The fabric, as the sentence names it. */
  readonly name: string;
}

/** How strips and sub-cuts lie on the cloth: both ways at one scale, from the cut edge, selvage above and below. */
export function CutMap(props: CutMapProps) {
  const id = `map-${useId().replaceAll(/[^A-Za-z0-9_-]/g, "")}`;
  const { plan, blanks, allowance, width, mostHeight = 460, cloth } = props;
  const map = mapScale(plan, allowance, width, mostHeight);
  const runs = stripRuns(plan, blanks);
  return (
    <svg className="cut-map" id={id} width={map.width} height={map.height} viewBox={`0 0 ${map.width} ${map.height}`} role="img" aria-label={mapSentence(props, runs)} style={{ overflow: "visible" }}>
      <MapTapes map={map} system={props.system} usableWidth={plan.usableWidth} />
      <rect data-mark="cloth" x={MAP_LEFT} y={MAP_TOP} width={px(map.along)} height={px(map.across)} fill={PAPER} />
      {plan.strips.map((strip, index) => (
        <MapStrip key={strip.startsAt} strip={strip} index={index} map={map} fill={tileFill(cloth)} {...props} />
      ))}
      <StripNumbers runs={runs} plan={plan} map={map} />
      {runs.map((run) => (
        <Over key={run.first} run={run} plan={plan} map={map} system={props.system} />
      ))}
      <rect x={MAP_LEFT} y={MAP_TOP} width={px(map.along)} height={px(map.across)} fill="none" stroke={INK} strokeWidth="1.5" />
      <path data-mark="cut-edge" d={`M${MAP_LEFT} ${MAP_TOP - 20}V${px(MAP_TOP + map.across + 3)}M${px(MAP_LEFT + map.along)} ${MAP_TOP - 20}V${px(MAP_TOP + map.across + 3)}`} stroke={INK} strokeWidth="3" />
      <FootDims runs={runs} plan={plan} map={map} system={props.system} />
    </svg>
  );
}

function MapTapes({ map, system, usableWidth }: { readonly map: MapScale; readonly system: MeasureSystem; readonly usableWidth: number }) {
  const along = alongTicks(map.cutLength, map.scale, system);
  const across = acrossTicks(usableWidth, map.scale, system);
  const x = (at: number) => px(MAP_LEFT + at * map.scale);
  const y = (at: number) => px(MAP_TOP + at * map.scale);
  const last = along.filter((tick) => tick.figure !== null).at(-1);
  const unit = system === "yards" ? "yd" : "cm";
  return (
    <g data-mark="tape">
      <rect x={MAP_LEFT} y={MAP_TOP - 20} width={px(map.along)} height="20" fill={WELD} />
      <rect x={MAP_LEFT - 30} y={MAP_TOP} width="30" height={px(map.across)} fill={WELD} />
      <path d={along.map(({ at, reach }) => `M${x(at)} ${MAP_TOP}v-${reach}`).join("") + across.map(({ at, reach }) => `M${MAP_LEFT} ${y(at)}h-${reach}`).join("")} stroke={INK} strokeWidth=".8" />
      {along.map((tick) =>
        tick.figure === null ? null : (
          <text key={tick.at} x={px(x(tick.at) - 4)} y={MAP_TOP - 8} textAnchor="end" style={figureStyle(11)}>
            {tick === last ? `${tick.figure} ${unit}` : tick.figure}
          </text>
        ),
      )}
      {across.map((tick) =>
        tick.figure === null ? null : (
          <text key={tick.at} x={MAP_LEFT - 14} y={px(Math.min(y(tick.at) + 4, MAP_TOP + map.across))} textAnchor="end" style={figureStyle(11, 560)}>
            {tick.figure}
          </text>
        ),
      )}
    </g>
  );
}

interface MapStripProps extends CutMapProps {
  readonly strip: Strip;
  readonly index: number;
  readonly map: MapScale;
  readonly fill: string;
}

/** Cloth, veiled so that the cuts are seen on a dark print, under the sub-cuts; the rest of the strip bare; letters where a run of equal pieces begins. */
function MapStrip({ strip, index, map, fill, blanks, pieces = [] }: MapStripProps) {
  const boxes = strip.cuts.map((cut) => ({ cut, x: map.x(strip.startsAt), y: map.y(cut.at), width: cut.along * map.scale, height: cut.across * map.scale }));
  const lines = boxes.map(({ cut, x, y, width, height }) => {
    const blank = blanks.find((each) => each.key === cut.blank);
    if (!blank) return "";
    const { rises, falls } = diagonalsOf(blank, pieces.find((each) => each.key === blank.pieceKey), cut.turned);
    const slant = blank.mark === "slant" ? `M${px(x)} ${px(y + height * 0.7)}L${px(x + width)} ${px(y + height * 0.3)}` : "";
    return (falls ? `M${px(x)} ${px(y)}L${px(x + width)} ${px(y + height)}` : "") + (rises ? `M${px(x)} ${px(y + height)}L${px(x + width)} ${px(y)}` : "") + slant;
  });
  return (
    <g data-strip={index + 1}>
      {boxes.map(({ cut, x, y, width, height }) => (
        <rect key={cut.at} data-cut={cut.blank} x={px(x)} y={px(y)} width={px(width)} height={px(height)} fill={fill} />
      ))}
      {boxes.map(({ cut, x, y, width, height }) => (
        <rect key={cut.at} x={px(x)} y={px(y)} width={px(width)} height={px(height)} fill={PAPER} fillOpacity=".45" stroke={INK} strokeWidth=".9" />
      ))}
      <path d={lines.join("")} stroke={INK} strokeWidth=".9" fill="none" />
      <path data-mark="strip-edge" d={`M${px(map.x(strip.startsAt + strip.width))} ${MAP_TOP}V${px(MAP_TOP + map.across)}${index === 0 && map.start > 0 ? `M${px(map.x(0))} ${MAP_TOP}V${px(MAP_TOP + map.across)}` : ""}`} stroke={INK} strokeWidth="1.5" />
      {boxes.map(({ cut, x, y, width, height }, at) => {
        const blank = blanks.find((each) => each.key === cut.blank);
        const begins = strip.cuts[at - 1]?.blank !== cut.blank;
        return blank && begins ? <PieceLetter key={cut.at} text={blank.label} x={x + width / 2} y={y + height / 2} width={width} height={height} /> : null;
      })}
    </g>
  );
}

/** On a plate, upright in a narrow strip; left out where it would cover its piece. */
function PieceLetter({ text, x, y, width, height }: { readonly text: string; readonly x: number; readonly y: number; readonly width: number; readonly height: number }) {
  const upright = text.length > 2 && width < height;
  const [along, over] = upright ? [height, width] : [width, height];
  const size = Math.min(12, over - 4);
  const room = textWidth(text, size) + 6;
  if (size < 8 || room > along - 2) return null;
  return (
    <g data-mark="letter" transform={upright ? `rotate(-90 ${px(x)} ${px(y)})` : undefined}>
      <rect x={px(x - room / 2)} y={px(y - size * 0.62)} width={px(room)} height={px(size * 1.24)} fill={PAPER} />
      <text x={px(x)} y={px(y + size * 0.36)} textAnchor="middle" style={figureStyle(px(size), 640)}>
        {text}
      </text>
    </g>
  );
}

/** Every strip's number where it has room; otherwise the first and the last of a run. */
function StripNumbers({ runs, plan, map }: { readonly runs: readonly StripRun[]; readonly plan: StripPlan; readonly map: MapScale }) {
  const text = (key: number, x: number, words: string) => (
    <text key={key} x={px(x)} y={MAP_TOP - 25} textAnchor="middle" style={figureStyle(12, 640)}>
      {words}
    </text>
  );
  return runs.map((run) => {
    const each = run.width * map.scale;
    const last = run.first + run.count;
    if (each >= textWidth(String(last), 12) + 2) return plan.strips.slice(run.first, last).map((strip, at) => text(run.first + at, map.x(strip.startsAt + strip.width / 2), String(run.first + at + 1)));
    const words = run.count === 1 ? String(last) : `${run.first + 1}\u2013${last}`;
    return (run.to - run.from) * map.scale >= textWidth(words, 12) ? text(run.first, map.x((run.from + run.to) / 2), words) : null;
  });
}

function Over({ run, plan, map, system }: { readonly run: StripRun; readonly plan: StripPlan; readonly map: MapScale; readonly system: MeasureSystem }) {
  const which = run.count === 1 ? `strip ${run.first + 1}` : `strips ${run.first + 1} to ${run.first + run.count}`;
  const words = `${displayMeasure(run.over, system)} over, ${which}`;
  const [width, height] = [(run.to - run.from) * map.scale, run.over * map.scale];
  if (height < 16 || width < textWidth(words, 13) + 8) return null;
  const [x, y] = [map.x((run.from + run.to) / 2), map.y(plan.usableWidth) - height / 2];
  const room = textWidth(words, 13) + 8;
  return (
    <g data-mark="over">
      <rect x={px(x - room / 2)} y={px(y - 8)} width={px(room)} height="16" fill={PAPER} />
      <text x={px(x)} y={px(y + 4.6)} textAnchor="middle" style={figureStyle(13, 500, "var(--walnut-2)")}>
        {words}
      </text>
    </g>
  );
}

function FootDims({ runs, plan, map, system }: { readonly runs: readonly StripRun[]; readonly plan: StripPlan; readonly map: MapScale; readonly system: MeasureSystem }) {
  const y = MAP_TOP + map.across + 15;
  const rest = map.cutLength - map.start - plan.length;
  const end = MAP_LEFT + map.along;
  const restWords = system === "yards" ? displayInches(rest) : formatCentimetres(rest);
  return (
    <g data-mark="dims">
      {runs.map((run, index) => {
        const words = `${run.count === 1 ? "" : `${run.count} `}${index === 0 && run.count > 1 ? "strips " : ""}${run.count === 1 ? "" : "of "}${displayMeasure(run.width, system)}`;
        const [from, to] = [map.x(run.from), map.x(run.to)];
        return to - from >= textWidth(words, 13) ? (
          <Dimension key={run.first} from={from} to={to} y={y} size={13}>
            {words}
          </Dimension>
        ) : null;
      })}
      {rest > 0 && rest * map.scale >= textWidth(restWords, 13) + 4 ? (
        <text x={px(end)} y={px(y + 4.6)} textAnchor="end" style={figureStyle(13)}>
          {restWords}
        </text>
      ) : null}
    </g>
  );
}

function mapSentence({ name, plan, allowance, system }: CutMapProps, runs: readonly StripRun[]): string {
  const small = (units: number) => (system === "yards" ? wordsOfInches(units) : `${Number((units / PER_CENTIMETRE).toFixed(1))} centimetres`);
  const cutLength = Math.max(allowance?.cutLength ?? 0, plan.length);
  const rest = cutLength - (allowance?.straightening ?? 0) - plan.length;
  const parts = runs.map((run) => `${run.count === 1 ? `strip ${run.first + 1} is` : `strips ${run.first + 1} to ${run.first + run.count} are`} ${small(run.width)} wide`);
  const said = [
    allowance && allowance.straightening > 0 ? `${small(allowance.straightening)} squares the end` : "",
    parts.length > 0 ? listed(parts) : "there is nothing to cut",
    rest > 0 ? `${small(rest)} stays spare` : "",
  ].filter(Boolean);
  return `Cut map of ${wordsOfLength(cutLength, system)} of ${name}, ${small(plan.usableWidth)} wide, both ways at one scale: ${said.join("; ")}.`;
}
