import type { Length } from "../measure/length";
import { formatMeasure, type MeasureSystem } from "../measure/format";
import type { CutPiece } from "../piece/cut-piece";
import type { RoleId } from "../piece/drawing";
import type { AllowanceRules, Blank, Budget, PlanControl, StripPlan, WasteAllowance } from "../piece/strip-plan";
import type { Solver } from "../cutting/solver";
import { blanksOf } from "../cutting/blanks";
import { planStrips } from "../cutting/plan-strips";
import { allowWaste, fitsFatQuarter, widthAfterShrinkage } from "../cutting/waste-allowance";
import { ok, type Result } from "../result";

/** One fabric of a kit, with every piece that is cut from it. */
export interface KitFabric {
  /** The shop's number of the fabric, as text. */
  readonly fabric: string;
  readonly name: string;
  readonly usableWidth: Length;
  readonly pieces: readonly CutPiece[];
  /** The quilt's roles that the fabric is put to, where that is known. */
  readonly roles?: readonly RoleId[];
}

/** What a kit's plan is made of. Equal input, budget and core version give the same plan. */
export interface KitPlanInput {
  readonly fabrics: readonly KitFabric[];
  readonly allowance: AllowanceRules;
  readonly budget: Budget;
  /** How lengths are said in sentences; without it they are left out. */
  readonly system?: MeasureSystem;
}

export interface KitFabricPlan {
  readonly fabric: string;
  readonly name: string;
  readonly roles: readonly RoleId[];
  /** As on the bolt, before any shrinkage: what a bolt must have to be offered for the length. */
  readonly usableWidth: Length;
  readonly pieces: readonly CutPiece[];
  readonly blanks: readonly Blank[];
  readonly plan: StripPlan;
  readonly allowance: WasteAllowance;
}

export interface KitPlan {
  readonly fabrics: readonly KitFabricPlan[];
  /** A person stopped the planning; some plans may be longer than they need be. */
  readonly stopped: boolean;
}

/**
 * Plans the cloth of one kit, fabric by fabric: pieces to blanks, blanks to strips, strips to a length with its
 * allowances. Faults are those of the fabric that cannot be planned, with its name before the sentence.
 */
export async function planKit(input: KitPlanInput, solver: Solver, control?: PlanControl): Promise<Result<KitPlan>> {
  const fabrics: KitFabricPlan[] = [];
  for (const [index, fabric] of input.fabrics.entries()) {
    const planned = await planFabric(fabric, input, solver, partOf(control, index, input.fabrics.length, fabric.name));
    if (!planned.ok) return { ok: false, fault: { ...planned.fault, message: `${fabric.name}: ${planned.fault.message}` } };
    fabrics.push(planned.value);
  }
  return ok({ fabrics, stopped: fabrics.some((each) => each.plan.status === "stopped") });
}

async function planFabric(fabric: KitFabric, { allowance, budget, system }: KitPlanInput, solver: Solver, control: PlanControl): Promise<Result<KitFabricPlan>> {
  const width = widthAfterShrinkage(fabric.usableWidth, allowance);
  const blanks = blanksOf(fabric.pieces, width, system && ((value) => formatMeasure(value, system)));
  if (!blanks.ok) return blanks;
  const plan = await planStrips(blanks.value, width, budget, solver, control);
  if (!plan.ok) return plan;
  const fits = await fitsFatQuarter(blanks.value, width, allowance, budget, solver);
  const { roles = [...new Set(fabric.pieces.map((piece) => piece.role))] } = fabric;
  return ok({ ...fabric, roles, blanks: blanks.value, plan: plan.value, allowance: allowWaste(plan.value, allowance, fits) });
}

/** Each fabric draws its share of the progress. */
function partOf(control: PlanControl | undefined, index: number, count: number, name: string): PlanControl {
  return {
    stopped: control?.stopped,
    progress: ({ done }) => control?.progress?.({ done: (index + done) / count, sentence: `${index} of ${count} fabrics planned, now ${name}.` }),
  };
}
