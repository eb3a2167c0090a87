import type { ReactNode } from "react";

interface EmptyStateProps {
  /** What is not there: "No remnants in the drawer". */
  readonly title: ReactNode;
  /** What will lie here, and whence. */
  readonly children?: ReactNode;
  /** The first move; in a filtered list, the same sentence with one word let go. */
  readonly action?: ReactNode;
  /** The axis of the list, kept though nothing lies on it; a ghost of 0 to 1 yd unless given. */
  readonly tape?: ReactNode;
  readonly level?: 2 | 3;
}

/** An empty place says what will lie here and gives the first move. Its tape is a ghost. */
export function EmptyState({ title, children, action, tape, level = 2 }: EmptyStateProps) {
  const Heading = level === 2 ? "h2" : "h3";
  return (
    <div className="nothing">
      {tape === undefined ? <GhostTape /> : tape}
      <Heading>{title}</Heading>
      {children ? <p>{children}</p> : null}
      {action ? <div className="acts">{action}</div> : null}
    </div>
  );
}

interface GhostTapeProps {
  readonly to?: string;
}

/** The core and the outline of what is not there. */
export function GhostTape({ to = "1 yd" }: GhostTapeProps) {
  return (
    <svg className="work-tape" viewBox="0 0 420 38" style={{ maxWidth: 420 }} aria-hidden="true">
      <path d="M1.5 0v22" stroke="var(--walnut)" strokeWidth="3" />
      <rect x="2" y="2.5" width="412" height="17" fill="none" stroke="var(--line-2)" strokeDasharray="3 4" />
      <text x="1" y="36" className="tick-figure">
        0
      </text>
      <text x="413" y="36" textAnchor="end" className="tick-figure">
        {to}
      </text>
    </svg>
  );
}
