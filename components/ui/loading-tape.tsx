import type { ReactNode } from "react";

interface LoadingTapeProps {
  /** What is being worked out: "Working out 12 cut maps for the spring kits". */
  readonly title: ReactNode;
  /** Things done; null where it is not known yet how many there are. */
  readonly done: number | null;
  readonly of: number;
  /** "8 of 12 done, now Lantern Yard. You can leave this page." */
  readonly children?: ReactNode;
  /** The Stop button, or its form. */
  readonly stop?: ReactNode;
  readonly label: string;
}

const WIDTH = 555;
/** More ticks than this would run together. */
const MOST_TICKS = 60;

/** Long work is a tape being drawn out from the core: one tick is one thing done. */
export function LoadingTape({ title, done: told, of, children, stop, label }: LoadingTapeProps) {
  const done = told === null || of <= 0 ? null : Math.min(Math.max(told, 0), of);
  const part = done === null ? 0 : done / of;
  const each = Math.max(1, Math.ceil(of / MOST_TICKS));
  const ticks = done === null ? [] : Array.from({ length: Math.floor(done / each) + 1 }, (_, index) => index * each);
  const figures = done === null ? [] : [...new Set([0, Math.round(of / 3), Math.round((of * 2) / 3), of])];
  return (
    <div className="work">
      <h3>{title}</h3>
      <svg
        className="work-tape"
        viewBox="0 0 560 52"
        role="progressbar"
        aria-label={label}
        aria-valuemin={0}
        aria-valuemax={100}
        aria-valuenow={done === null ? undefined : Math.round(part * 100)}
      >
        <rect x="2" y="2.5" width={WIDTH} height="31" fill="none" stroke="var(--line-2)" strokeDasharray="3 4" />
        <path d="M1.5 0v36" stroke="var(--walnut)" strokeWidth="3" />
        {done === null ? null : (
          <>
            <rect className="work-cloth" x="1.5" y="20" width={WIDTH} height="14" fill="var(--weld)" stroke="var(--walnut)" vectorEffect="non-scaling-stroke" style={{ transform: `scaleX(${part})` }} />
            <path d={ticks.map((tick) => `M${(1.5 + (tick / of) * WIDTH).toFixed(1)} ${tick % (each * 4) === 0 ? 20 : 26}V34`).join("")} stroke="var(--walnut)" strokeWidth=".9" />
            <path d={`M${1.5 + part * WIDTH} 0v36`} stroke="var(--walnut)" strokeWidth="3" />
          </>
        )}
        {figures.map((figure) => (
          <text key={figure} x={1.5 + (figure / of) * WIDTH} y="49" textAnchor={figure === 0 ? "start" : figure === of ? "end" : "middle"} className="tick-figure" style={{ fontSize: 13 }}>
            {figure}
          </text>
        ))}
      </svg>
      <div className="work-foot">
        <span role="status">{children}</span>
        {stop}
      </div>
    </div>
  );
}
