/** A column of a linear or integer programme; rows it does not name have coefficient zero. */
export interface SolverColumn {
  readonly cost: number;
  readonly rows: readonly number[];
  readonly values: readonly number[];
  readonly lower: number;
  readonly upper: number;
}

/** The two sides of a row; use -Infinity and Infinity for an open side. */
export interface SolverRow {
  readonly lower: number;
  readonly upper: number;
}

export type LinearAnswer =
  | {
      readonly status: "optimal";
      readonly objective: number;
      readonly values: Float64Array;
      /** One for each row: what one more unit of its right-hand side costs. */
      readonly duals: Float64Array;
    }
  | { readonly status: "infeasible" };

/** A linear programme, minimised, that is kept between solves so that the next one starts from the last basis. */
export interface LinearProgramme {
  addRows(rows: readonly SolverRow[]): void;
  addColumns(columns: readonly SolverColumn[]): void;
  setRow(index: number, row: SolverRow): void;
  setColumnBounds(index: number, lower: number, upper: number): void;
  /** Throws SolverBroken when the solver gives neither an optimum nor a proof that there is none. */
  solve(): LinearAnswer;
  /** Frees the solver's memory; must be called. */
  dispose(): void;
}

export interface IntegerQuestion {
  readonly rows: readonly SolverRow[];
  readonly columns: readonly SolverColumn[];
  /** Columns that must be whole; all when left out. */
  readonly whole?: readonly boolean[];
  /** A known answer, one value a column. */
  readonly start?: readonly number[];
  /** Nodes of the search, at most. Work, never seconds. */
  readonly nodes: number;
  /** Simplex iterations of the search, at most; looked at between its steps, so it may run over by one of them. */
  readonly iterations?: number;
  /** Stop when answer and bound are no further apart than this, in units of cost. */
  readonly gap: number;
  /** Asked now and then during the search. */
  readonly stopped?: () => boolean;
}

export interface IntegerAnswer {
  /** Limit: nodes ran out or the search was stopped; `values` is then the best found, or null. */
  readonly status: "optimal" | "limit" | "infeasible";
  readonly objective: number;
  /** No answer to this question costs less. */
  readonly bound: number;
  readonly values: Float64Array | null;
  readonly nodes: number;
  readonly iterations: number;
}

/** The solver of linear and integer programmes, passed in so that the core imports none. */
export interface Solver {
  openProgramme(rows: readonly SolverRow[]): Promise<LinearProgramme>;
  /** Minimises. Throws SolverBroken as LinearProgramme.solve does. */
  solveInteger(question: IntegerQuestion): Promise<IntegerAnswer>;
}

/** The solver failed in itself: the programme is neither solved nor proved impossible. */
export class SolverBroken extends Error {
  override readonly name = "SolverBroken";
}
