import { widthAfterShrinkage } from "@/lib/core/cutting/waste-allowance";
import { STRIP_BUDGET } from "@/lib/core/cutting/plan-strips";
import { fabricsOf } from "@/lib/core/kit/kit-fabrics";
import type { KitPlanInput } from "@/lib/core/kit/kit-plan";
import type { MeasureSystem } from "@/lib/core/measure/format";
import { quiltCutList } from "@/lib/core/patchwork/quilt-cut-list";
import type { CuttingRules } from "@/lib/core/piece/cut-piece";
import type { RoleId } from "@/lib/core/piece/drawing";
import type { QuiltDesign } from "@/lib/core/piece/quilt-design";
import type { AllowanceRules } from "@/lib/core/piece/strip-plan";
import { ok, type Result } from "@/lib/core/result";
import type { FabricView } from "./fabrics";

export interface KitPlanAsk {
  readonly quilt: QuiltDesign;
  /** The fabric that each of the quilt's roles is put to. */
  readonly fabrics: Readonly<Record<RoleId, FabricView>>;
  readonly rules: CuttingRules;
  readonly allowance: AllowanceRules;
  readonly system: MeasureSystem;
}

/** What the planner is asked for one kit: every cut piece of the quilt, gathered by fabric. The same ask gives the same input, so its hash finds the kept plan. */
export function kitPlanInput({ quilt, fabrics, rules, allowance, system }: KitPlanAsk): Result<KitPlanInput> {
  const widthOf = (role: RoleId) => fabrics[role]?.usableWidth ?? rules.seamAllowance;
  const pieces = quiltCutList(quilt, rules, {
    oneWay: Object.entries(fabrics).flatMap(([role, fabric]) => (fabric.oneWay ? [role] : [])),
    usableWidth: (role) => widthAfterShrinkage(widthOf(role), allowance),
    system,
  });
  if (!pieces.ok) return pieces;
  const fabricOf = Object.fromEntries(Object.entries(fabrics).map(([role, fabric]) => [role, String(fabric.id)]));
  const choices = Object.values(fabrics).map((fabric) => ({ fabric: String(fabric.id), name: fabric.name, usableWidth: fabric.usableWidth }));
  const gathered = fabricsOf(pieces.value, fabricOf, choices);
  return gathered.ok ? ok({ fabrics: gathered.value, allowance, budget: STRIP_BUDGET, system }) : gathered;
}
