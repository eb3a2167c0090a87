/**
 * The plain shapes that pages, the table and the counter get of stock. Every length is an integer of 1/160 mm of bolt
 * length; every date is ISO text. `startsAt`/`endsAt` count from the bolt's first free end (where cutting began);
 * screens draw a bolt from its core, with `fromCore`.
 */

export interface FabricBrief {
  readonly id: number;
  readonly slug: string;
  readonly name: string;
  readonly reference: string;
  /** The drawn tile under public/fabrics, "" when there is none. */
  readonly tile: string;
  /** #rrggbb */
  readonly colour: string;
  readonly value: "light" | "medium" | "dark";
  readonly oneWay: boolean;
}

export interface FlawView {
  readonly id: number;
  readonly startsAt: number;
  readonly endsAt: number;
  /** Measured from the core: the nearer end is `coreTo`. For drawing. */
  readonly coreFrom: number;
  readonly coreTo: number;
  readonly note: string;
}

export interface ClaimView {
  readonly station: string;
  readonly personId: number;
  readonly person: string;
  readonly runId: number | null;
  readonly claimedAt: string;
}

export interface BoltView {
  readonly id: number;
  readonly tag: string;
  readonly fabric: FabricBrief;
  readonly lot: string;
  readonly shelf: string;
  /** Across the bolt: its own where it was corrected, else the fabric's. */
  readonly usableWidth: number;
  /** The core end, from the first free end. */
  readonly putUp: number;
  /** Where the next cut begins, from the first free end. */
  readonly cutEdge: number;
  /** putUp − cutEdge. */
  readonly left: number;
  /** The sum of what is held for runs and people. */
  readonly reserved: number;
  /** The longest single piece without a flaw that can go while everything held still fits between the flaws. */
  readonly toSell: number;
  /** The longest stretch without a flaw, held or not. */
  readonly longestPiece: number;
  /** Those that are still on the bolt, from its first free end. */
  readonly flaws: readonly FlawView[];
  /** The fabric's mark: below it, it is low. */
  readonly lowMark: number;
  /** What is left of the fabric on all its bolts together. */
  readonly fabricLeft: number;
  /** 1/10 000 of the major unit per yard or metre, as the shop measures. */
  readonly price: number;
  readonly claim: ClaimView | null;
  readonly receivedAt: string;
  readonly retiredAt: string | null;
}

export type CutPurpose = "kit" | "sale" | "waste" | "mis-cut" | "sample" | "correction" | "piece";

export interface CutView {
  readonly id: number;
  readonly startsAt: number;
  readonly endsAt: number;
  readonly coreFrom: number;
  readonly coreTo: number;
  readonly length: number;
  readonly purpose: CutPurpose;
  /** What the plan asked for, when the cut is a kit's. */
  readonly planned: number | null;
  readonly kit: { readonly runId: number; readonly runCode: string; readonly number: number; readonly serial: string } | null;
  readonly person: string | null;
  readonly at: string;
  readonly note: string;
  /** Only the last cut of a bolt can be undone, and not one that was sold or packed. */
  readonly canUndo: boolean;
}

export interface ReservationView {
  readonly id: number;
  readonly length: number;
  readonly count: number;
  /** A held one fits on the bolt; a short one no longer does. */
  readonly state: "held" | "short";
  readonly run: { readonly id: number; readonly code: string; readonly purpose: "shelf" | "class" | "orders" } | null;
  readonly madeAt: string;
}

export interface HistoryView {
  readonly id: number;
  readonly at: string;
  readonly person: string | null;
  /** The shop's verb in the past: "received", "cut", "measured", "moved" … */
  readonly act: string;
  readonly details: Readonly<Record<string, unknown>>;
}

export interface BoltDetail extends BoltView {
  /** In cutting order, from the first free end. */
  readonly cuts: readonly CutView[];
  readonly reservations: readonly ReservationView[];
  /** Newest first, the last 100. */
  readonly history: readonly HistoryView[];
}

/** One page of bolts in shelf order; hand `next` back as `after` for the page that follows. */
export interface BoltPage {
  readonly bolts: readonly BoltView[];
  readonly next: string | null;
}

/** A promise that a fact made impossible. */
export interface ShortView {
  readonly runId: number | null;
  readonly runCode: string | null;
  readonly length: number;
  /** How many pieces no longer fit. */
  readonly count: number;
}

/** What every change of a bolt answers with. */
export interface BoltChange {
  readonly bolt: BoltView;
  /** Promises that this change made impossible; empty as a rule. */
  readonly short: readonly ShortView[];
}

/** A place on a bolt, counted from its first free end, seen from its core. */
export function fromCore(putUp: number, at: number): number {
  return Math.max(0, putUp - at);
}
