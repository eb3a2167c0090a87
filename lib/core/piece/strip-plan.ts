import type { Length } from "../measure/length";

/** A rectangle the planner lays on the cloth; one blank gives `gives` patches of its piece. */
export interface Blank {
  readonly key: string;
  /** Keys of the cut pieces that come out of it. */
  readonly pieceKey: string;
  readonly label: string;
  /** Along the bolt, before any turning. */
  readonly along: Length;
  /** From selvage to selvage, before any turning. */
  readonly across: Length;
  /** Blanks wanted. */
  readonly count: number;
  readonly gives: number;
  readonly mayTurn: boolean;
  /** For angled strips: lost once in each strip that holds any of this blank, measured across. */
  readonly endWaste: Length;
  /** What is drawn inside the rectangle on the cut map. */
  readonly mark: "plain" | "diagonal" | "both-diagonals" | "slant" | "template" | "long";
}

/** Stage two: a cut across a strip. `at` counts from the near selvage. */
export interface SubCut {
  readonly blank: string;
  readonly at: Length;
  /** As it lies: `across` runs along the strip. */
  readonly across: Length;
  readonly along: Length;
  readonly turned: boolean;
}

/** Stage one: a strip across the usable width. `startsAt` counts along the cloth from the straightened end. */
export interface Strip {
  readonly startsAt: Length;
  readonly width: Length;
  readonly cuts: readonly SubCut[];
}

/**
 * Optimal: `length` equals the bound of this way of cutting. Feasible: within the two bounds.
 * Stopped: a person stopped it, the best so far is kept.
 */
export type PlanStatus = "optimal" | "feasible" | "stopped";

export interface StripPlan {
  readonly status: PlanStatus;
  readonly usableWidth: Length;
  /** In cutting order: widest strips first, equal strips together. */
  readonly strips: readonly Strip[];
  /** Net length of cloth, no allowance in it. */
  readonly length: Length;
  readonly bounds: {
    /** No plan of strips and sub-cuts can take less. */
    readonly strips: Length;
    /** No layout of any kind can take less. */
    readonly anyLayout: Length;
  };
  /** Work done: patterns made, linear programmes solved, nodes searched. */
  readonly work: { readonly patterns: number; readonly programmes: number; readonly nodes: number };
}

/** Counts work, never seconds: the same input, budget and version give the same plan. */
export interface Budget {
  readonly patterns: number;
  readonly nodes: number;
}

export interface PlanProgress {
  /** 0 to 1. */
  readonly done: number;
  readonly sentence: string;
}

/** Passed in, so that the browser, the server and the worker run the same code. */
export interface PlanControl {
  readonly progress?: (progress: PlanProgress) => void;
  readonly stopped?: () => boolean;
}

/** One line each of what is added to the net length, in the order it is added. */
export interface WasteAllowance {
  readonly net: Length;
  readonly straightening: Length;
  readonly misCuts: Length;
  readonly prewash: Length;
  readonly endOfBolt: Length;
  readonly rounding: Length;
  /** What is cut from the bolt for one kit. */
  readonly cutLength: Length;
  /** Set when everything of the fabric fits one. */
  readonly fits: "fat-quarter" | "fat-eighth" | null;
}

export interface AllowanceRules {
  readonly straightening: Length;
  /** Reserve for mis-cuts: hundredths of a percent (200 is 2 %), or one spare strip of the commonest width. */
  readonly misCut: { readonly kind: "percent"; readonly basisPoints: number } | { readonly kind: "spare-strip" };
  /** Shrinkage in basis points; zero where the sheet does not ask for prewashing. */
  readonly shrinkAlong: number;
  readonly shrinkAcross: number;
  readonly endOfBolt: Length;
  readonly sellingStep: Length;
  readonly leastCut: Length;
}
