import type { KitLength } from "../piece/bolt-plan";
import type { KitFabricPlan } from "./kit-plan";

/**
 * What one kit takes from the bolts: a length of every fabric that it needs any of. A bolt is offered for it when it is as wide
 * as the fabric's usable width that the plan was made on.
 */
export function kitLengths(fabrics: readonly Pick<KitFabricPlan, "fabric" | "name" | "usableWidth" | "allowance">[]): KitLength[] {
  return fabrics.filter(({ allowance }) => allowance.cutLength > 0).map(({ fabric, name, usableWidth, allowance }) => ({ fabric, name, length: allowance.cutLength, plannedWidth: usableWidth }));
}
