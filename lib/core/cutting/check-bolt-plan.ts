import type { BoltPlan, BoltPlanInput, PlannedCut } from "../piece/bolt-plan";

/**
 * Judges a bolt plan without any of the planner's code: returns a sentence for every rule that it breaks, none when it
 * is good. Cuts of a bolt form a chain from its cut edge; a kit's length crosses no flaw; every kit has each of its
 * lengths once, from a wide enough bolt of its fabric; what is promised still has room by its sum.
 */
export function checkBoltPlan(plan: BoltPlan, input: BoltPlanInput): string[] {
  const faults: string[] = [];
  for (const bolt of input.bolts) {
    const cuts = plan.cuts.filter((cut) => cut.bolt === bolt.tag);
    let at: number = bolt.cutEdge;
    for (const cut of cuts) {
      if (cut.startsAt !== at) faults.push(`Bolt ${bolt.tag}: a cut begins at ${cut.startsAt}, the one before ended at ${at}.`);
      if (cut.endsAt <= cut.startsAt || cut.endsAt > bolt.endsAt) faults.push(`Bolt ${bolt.tag}: a cut ends at ${cut.endsAt}.`);
      if (cut.fabric !== bolt.fabric) faults.push(`Bolt ${bolt.tag} is of fabric ${bolt.fabric}, not ${cut.fabric}.`);
      if (cut.purpose === "kit") faults.push(...checkKitCut(cut, input));
      if (cut.purpose === "piece" && cut.endsAt - cut.startsAt < input.saleableRemnant) faults.push(`Bolt ${bolt.tag}: a piece of ${cut.endsAt - cut.startsAt} cannot be sold.`);
      at = cut.endsAt;
    }
    const promised = bolt.reserved.reduce((sum, each) => sum + each.length * each.count, 0);
    if (cuts.length && promised > bolt.endsAt - at) faults.push(`Bolt ${bolt.tag}: ${promised} are promised, ${bolt.endsAt - at} are left.`);
  }
  for (const { fabric } of input.lengths) {
    const kits = plan.cuts.filter((cut) => cut.fabric === fabric && cut.purpose === "kit").map((cut) => cut.kit);
    const wanted = Array.from({ length: plan.kits }, (_, index) => index + 1);
    if (kits.length !== wanted.length || wanted.some((kit) => !kits.includes(kit))) faults.push(`Fabric ${fabric}: kits ${kits.join(", ")} have a length; 1 to ${plan.kits} should.`);
  }
  const touched = new Set(plan.cuts.map((cut) => cut.bolt)).size;
  if (touched !== plan.boltsTouched) faults.push(`${touched} bolts are touched, ${plan.boltsTouched} are said.`);
  if (plan.kits > input.kits || plan.kits > plan.mostKits) faults.push(`${plan.kits} kits of ${input.kits} asked for and ${plan.mostKits} possible.`);
  return faults;
}

function checkKitCut(cut: PlannedCut, input: BoltPlanInput): string[] {
  const faults: string[] = [];
  const bolt = input.bolts.find((each) => each.tag === cut.bolt);
  const want = input.lengths.find((each) => each.fabric === cut.fabric);
  if (!bolt || !want) return [`A cut for kit ${cut.kit} is of a bolt or fabric that was not asked for.`];
  if (cut.endsAt - cut.startsAt !== want.length) faults.push(`Kit ${cut.kit} gets ${cut.endsAt - cut.startsAt} of ${cut.fabric} instead of ${want.length}.`);
  if (bolt.usableWidth < want.plannedWidth) faults.push(`Bolt ${bolt.tag} is narrower than the plan.`);
  for (const flaw of bolt.flaws) {
    if (flaw.startsAt < cut.endsAt && cut.startsAt < flaw.endsAt) faults.push(`Kit ${cut.kit}'s length of ${cut.fabric} has the flaw at ${flaw.startsAt} in it.`);
  }
  return faults;
}
