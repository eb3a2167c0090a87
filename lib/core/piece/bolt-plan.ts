import type { Length } from "../measure/length";

/** A stretch of a bolt with no flaw in it, counted from the bolt's first free end (where cutting began). */
export interface Segment {
  readonly startsAt: Length;
  readonly endsAt: Length;
}

/** A bolt as the planner sees it. */
export interface PlanBolt {
  readonly tag: string;
  readonly fabric: string;
  readonly lot: string;
  readonly usableWidth: Length;
  /** Where the next cut begins. */
  readonly cutEdge: Length;
  /** Where the cloth ends at the core. */
  readonly endsAt: Length;
  readonly flaws: readonly Segment[];
  /** Lengths already promised from this bolt to others; they keep fitting. */
  readonly reserved: readonly { readonly length: Length; readonly count: number }[];
  /** Position in shelf order. */
  readonly shelfOrder: number;
}

/** Every kit wants `length` of `fabric` once per entry, planned on `plannedWidth`. */
export interface KitLength {
  readonly fabric: string;
  /** What people call it; the fabric's number where nothing is said. */
  readonly name?: string;
  readonly length: Length;
  readonly plannedWidth: Length;
}

export interface BoltPlanInput {
  readonly kits: number;
  readonly lengths: readonly KitLength[];
  readonly bolts: readonly PlanBolt[];
  /** Straightening lost once a bolt when it is first cut. */
  readonly straightening: Length;
  /** A remnant of this and up can be sold; less is scrap. */
  readonly saleableRemnant: Length;
}

export interface PlannedCut {
  readonly bolt: string;
  readonly startsAt: Length;
  readonly endsAt: Length;
  /** For a kit's length: its number from 1; else null. */
  readonly kit: number | null;
  readonly fabric: string;
  /** Waste: straightening, a flaw and the scrap before it. Piece: a saleable rest before a flaw. */
  readonly purpose: "kit" | "waste" | "piece";
}

/** Objective in this order: kits made, scrap under a saleable remnant, bolts touched. */
export interface BoltPlan {
  readonly status: PlanOutcome;
  readonly kits: number;
  /** In shelf order of bolts, then in cutting order on the bolt. */
  readonly cuts: readonly PlannedCut[];
  readonly scrap: Length;
  readonly boltsTouched: number;
  /** No plan makes more kits than this. */
  readonly mostKits: number;
  /** Per fabric: how many kits it alone allows. */
  readonly allows: readonly { readonly fabric: string; readonly kits: number }[];
  /** The fabric that allows the fewest, when it holds the run below what was asked or could be. */
  readonly limiting: string | null;
  /** Why not one more kit, as a sentence. */
  readonly reason: string;
}

export type PlanOutcome = "optimal" | "feasible" | "stopped";
