import type { Highs, Model, ModelData } from "highs";
import type {
  IntegerAnswer,
  IntegerQuestion,
  LinearAnswer,
  LinearProgramme,
  Solver,
  SolverColumn,
  SolverRow,
} from "./solver";
import { SolverBroken } from "./solver";

const OPTIMAL = 7;
const INFEASIBLE = 8;
const UNBOUNDED_OR_INFEASIBLE = 9;
const SOLUTION_LIMIT = 16;
const INTERRUPTED = 17;
const MIP_INTERRUPT = 6;

/** Loads a fresh HiGHS; says where its wasm lies when the bundle has moved it. */
export type LoadHighs = () => Promise<Highs>;

/**
 * HiGHS (Huangfu and Hall 2018) through its wasm build, as the planner's solver.
 *
 * The module is loaded at the first question and again after it has broken: an aborted wasm keeps failing, so it is
 * never asked twice. Give the caller's loader the wasm's place, for instance
 * `createHighsSolver(() => loadHighs({ locateFile: (file) => join(folder, file) }))`.
 */
export function createHighsSolver(loadHighs: LoadHighs): Solver {
  let loading: Promise<Highs> | null = null;
  const forget = () => {
    loading = null;
  };
  const ready = () => (loading ??= loadHighs().catch((error: unknown) => {
    forget();
    throw new SolverBroken("The solver could not be loaded.", { cause: error });
  }));
  return {
    async openProgramme(rows) {
      const highs = await ready();
      return guarded(forget, () => new HighsProgramme(highs, rows, forget));
    },
    async solveInteger(question) {
      const highs = await ready();
      return guarded(forget, () => solveInteger(highs, question));
    },
  };
}

/** Turns whatever the wasm throws into SolverBroken, and drops the module with it. */
function guarded<Value>(forget: () => void, work: () => Value): Value {
  try {
    return work();
  } catch (error) {
    forget();
    if (error instanceof SolverBroken) throw error;
    throw new SolverBroken("The solver broke off.", { cause: error });
  }
}

class HighsProgramme implements LinearProgramme {
  private readonly model: Model;

  constructor(
    highs: Highs,
    rows: readonly SolverRow[],
    private readonly forget: () => void,
  ) {
    this.model = highs.createModel();
    this.model.options.set({ output_flag: false, random_seed: 1 });
    this.addRows(rows);
  }

  addRows(rows: readonly SolverRow[]): void {
    guarded(this.forget, () => {
      for (const row of rows) this.model.addRow(row.lower, row.upper, { indices: [], values: [] });
    });
  }

  addColumns(columns: readonly SolverColumn[]): void {
    guarded(this.forget, () => {
      for (const column of columns) {
        this.model.addCol(column.cost, column.lower, column.upper, { indices: column.rows, values: column.values });
      }
    });
  }

  setRow(index: number, row: SolverRow): void {
    guarded(this.forget, () => this.model.changeRowBounds(index, row.lower, row.upper));
  }

  setColumnBounds(index: number, lower: number, upper: number): void {
    guarded(this.forget, () => this.model.changeColBounds(index, lower, upper));
  }

  solve(): LinearAnswer {
    return guarded(this.forget, () => {
      const { modelStatus } = this.model.run();
      if (modelStatus === INFEASIBLE || modelStatus === UNBOUNDED_OR_INFEASIBLE) return { status: "infeasible" };
      if (modelStatus !== OPTIMAL) throw new SolverBroken(`The solver ended a linear programme with status ${modelStatus}.`);
      const solution = this.model.getSolution();
      return {
        status: "optimal",
        objective: this.model.getObjectiveValue(),
        values: solution.colValue,
        duals: solution.rowDual,
      };
    });
  }

  dispose(): void {
    try {
      this.model.dispose();
    } catch {
      // The module broke; its memory goes with it.
      this.forget();
    }
  }
}

function solveInteger(highs: Highs, question: IntegerQuestion): IntegerAnswer {
  return highs.withModel(modelOf(question), (model) => {
    model.options.set({
      output_flag: false,
      random_seed: 1,
      mip_max_nodes: question.nodes,
      mip_abs_gap: question.gap,
      mip_rel_gap: 0,
      // Measured on strip masters of a few hundred to a few thousand columns: presolve and restarts cost several times
      // what they save.
      presolve: "off",
      mip_allow_restart: false,
      mip_detect_symmetry: false,
      mip_heuristic_effort: 0.3,
    });
    if (question.start) model.setSolution({ colValue: [...question.start] });
    const most = question.iterations ?? Infinity;
    let iterations = 0;
    const { modelStatus } = model.run({
      [MIP_INTERRUPT](event) {
        iterations = Number(event.data.mip_total_lp_iterations ?? 0);
        if (iterations >= most || question.stopped?.()) event.interrupt();
      },
    });
    return readAnswer(model, modelStatus, iterations);
  });
}

function readAnswer(model: Model, modelStatus: number, iterations: number): IntegerAnswer {
  if (modelStatus === INFEASIBLE || modelStatus === UNBOUNDED_OR_INFEASIBLE) {
    return { status: "infeasible", objective: Infinity, bound: Infinity, values: null, nodes: 0, iterations };
  }
  if (modelStatus !== OPTIMAL && modelStatus !== SOLUTION_LIMIT && modelStatus !== INTERRUPTED) {
    throw new SolverBroken(`The solver ended an integer programme with status ${modelStatus}.`);
  }
  const objective = model.getObjectiveValue();
  const found = Number.isFinite(objective) && Number(model.info.get("primal_solution_status")) === 2;
  return {
    status: modelStatus === OPTIMAL ? "optimal" : "limit",
    objective: found ? objective : Infinity,
    bound: Number(model.info.get("mip_dual_bound")),
    values: found ? model.getSolution().colValue : null,
    nodes: Math.max(0, Number(model.info.get("mip_node_count"))),
    iterations: Math.max(iterations, Number(model.info.get("simplex_iteration_count"))),
  };
}

function modelOf(question: IntegerQuestion): ModelData {
  const starts: number[] = [0];
  const indices: number[] = [];
  const values: number[] = [];
  for (const column of question.columns) {
    indices.push(...column.rows);
    values.push(...column.values);
    starts.push(indices.length);
  }
  const count = question.columns.length;
  return {
    numCols: count,
    numRows: question.rows.length,
    colCost: question.columns.map((column) => column.cost),
    colLower: question.columns.map((column) => column.lower),
    colUpper: question.columns.map((column) => column.upper),
    rowLower: question.rows.map((row) => row.lower),
    rowUpper: question.rows.map((row) => row.upper),
    matrix: { format: "csc", numRows: question.rows.length, numCols: count, starts, indices, values },
    integrality: question.columns.map((_, index) => (question.whole?.[index] === false ? 0 : 1)),
  };
}
