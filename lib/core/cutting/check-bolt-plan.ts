import type { BoltPlan, BoltPlanInput, PlanBolt, PlannedCut } from "../piece/bolt-plan";
import type { CutAlready } from "./bolt-fabric";

/**
 * Judges a bolt plan without any of the planner's code: returns a sentence for every rule that it breaks, none when it
 * is good. Cuts of a bolt form a chain from its cut edge; a kit's length or a piece crosses no flaw; nothing that could be
 * sold is called waste; every kit made has each of its lengths once, a fabric's all from one lot and from wide enough bolts;
 * promises still fit; scrap and bolts touched are what is said.
 *
 * @param already what was cut for the run before this plan.
 */
export function checkBoltPlan(plan: BoltPlan, input: BoltPlanInput, already: readonly CutAlready[] = []): string[] {
  const faults: string[] = [];
  let scrap = 0;
  for (const bolt of input.bolts) {
    const cuts = plan.cuts.filter((cut) => cut.bolt === bolt.tag);
    if (cuts.length === 0) continue;
    faults.push(...checkChain(cuts, bolt), ...cuts.flatMap((cut) => checkCut(cut, bolt, input)));
    const edge = cuts.at(-1)?.endsAt ?? 0;
    const rest = stretches(bolt, edge, bolt.endsAt);
    if (!promisesFit(rest, bolt)) faults.push(`Bolt ${bolt.tag}: what is promised no longer fits behind ${edge}.`);
    scrap += scrapOf(cuts, bolt, rest, input);
  }
  const known = new Set(input.bolts.map((bolt) => bolt.tag));
  for (const cut of plan.cuts) if (!known.has(cut.bolt)) faults.push(`Bolt ${cut.bolt} is not among the bolts.`);
  const touched = new Set(plan.cuts.map((cut) => cut.bolt)).size;
  if (touched !== plan.boltsTouched) faults.push(`${touched} bolts are touched, ${plan.boltsTouched} are said.`);
  if (scrap !== plan.scrap) faults.push(`${scrap} are scrap, ${plan.scrap} are said.`);
  if (plan.kits > input.kits || plan.kits > plan.mostKits) faults.push(`${plan.kits} kits of ${input.kits} asked for and ${plan.mostKits} possible.`);
  return [...faults, ...checkKits(plan, input, already)];
}

function checkChain(cuts: readonly PlannedCut[], bolt: PlanBolt): string[] {
  const faults: string[] = [];
  let at: number = bolt.cutEdge;
  for (const cut of cuts) {
    if (cut.startsAt !== at) faults.push(`Bolt ${bolt.tag}: a cut begins at ${cut.startsAt}, the one before ended at ${at}.`);
    if (cut.endsAt <= cut.startsAt || cut.endsAt > bolt.endsAt) faults.push(`Bolt ${bolt.tag}: a cut from ${cut.startsAt} ends at ${cut.endsAt}.`);
    if (cut.fabric !== bolt.fabric) faults.push(`Bolt ${bolt.tag} is of fabric ${bolt.fabric}, not ${cut.fabric}.`);
    at = cut.endsAt;
  }
  if (cuts.at(-1)?.purpose !== "kit") faults.push(`Bolt ${bolt.tag}: the last cut makes no kit's length.`);
  return faults;
}

function checkCut(cut: PlannedCut, bolt: PlanBolt, input: BoltPlanInput): string[] {
  const faults: string[] = [];
  const long = cut.endsAt - cut.startsAt;
  if (cut.purpose === "waste") {
    const sellable = wasted(cut, bolt, input).some((stretch) => stretch > 0 && stretch >= input.saleableRemnant);
    return sellable ? [`Bolt ${bolt.tag}: the waste from ${cut.startsAt} holds a stretch that could be sold.`] : [];
  }
  const flaw = bolt.flaws.find((each) => each.startsAt < cut.endsAt && cut.startsAt < each.endsAt && each.endsAt > each.startsAt);
  if (flaw) faults.push(`Bolt ${bolt.tag}: the ${cut.purpose} from ${cut.startsAt} has the flaw at ${flaw.startsAt} in it.`);
  if (bolt.cutEdge === 0 && cut.startsAt < Math.min(input.straightening, bolt.endsAt)) faults.push(`Bolt ${bolt.tag} is cut before it is straightened.`);
  if (cut.purpose === "piece") return long < input.saleableRemnant ? [...faults, `Bolt ${bolt.tag}: a piece of ${long} cannot be sold.`] : faults;
  const wants = input.lengths.filter((want) => want.fabric === cut.fabric && want.length === long);
  if (wants.length === 0) faults.push(`Kit ${cut.kit} gets ${long} of ${cut.fabric}, which nobody wants.`);
  else if (wants.some((want) => want.plannedWidth > bolt.usableWidth)) faults.push(`Bolt ${bolt.tag} is narrower than the plan.`);
  return faults;
}

/** The stretches of a waste cut that are neither straightening nor flaw. */
function wasted(cut: PlannedCut, bolt: PlanBolt, { straightening }: BoltPlanInput): number[] {
  const from = bolt.cutEdge === 0 ? Math.max(cut.startsAt, Math.min(straightening, cut.endsAt)) : cut.startsAt;
  return stretches(bolt, from, cut.endsAt);
}

/** Lengths of what no flaw touches between two places. */
function stretches(bolt: PlanBolt, from: number, to: number): number[] {
  const marks = [from, to, ...bolt.flaws.flatMap((flaw) => [flaw.startsAt, flaw.endsAt])].filter((mark) => mark >= from && mark <= to).sort((a, b) => a - b);
  const found: number[] = [];
  let isOpen = false;
  for (const [at, mark] of marks.entries()) {
    const next = marks[at + 1] ?? mark;
    if (next === mark) continue;
    const isFree = !bolt.flaws.some((flaw) => flaw.startsAt < next && mark < flaw.endsAt);
    if (isFree && isOpen) found.push((found.pop() ?? 0) + next - mark);
    else if (isFree) found.push(next - mark);
    isOpen = isFree;
  }
  return found;
}

/** Tries every place for every promise, the longest first. */
function promisesFit(rooms: readonly number[], bolt: PlanBolt): boolean {
  const promised = bolt.reserved.flatMap((each) => new Array<number>(Math.max(0, each.count)).fill(each.length)).sort((a, b) => b - a);
  const place = (left: readonly number[], at: number): boolean => {
    const piece = promised[at];
    if (piece === undefined) return true;
    return left.some((room, index) => room >= piece && left.indexOf(room) === index && place(left.map((each, other) => (other === index ? each - piece : each)), at + 1));
  };
  return place(rooms, 0);
}

function scrapOf(cuts: readonly PlannedCut[], bolt: PlanBolt, rest: readonly number[], input: BoltPlanInput): number {
  const cutAway = cuts.filter((cut) => cut.purpose === "waste").flatMap((cut) => wasted(cut, bolt, input)).reduce((sum, each) => sum + each, 0);
  const edge = cuts.at(-1)?.endsAt ?? 0;
  const touchesEdge = edge < bolt.endsAt && !bolt.flaws.some((flaw) => flaw.startsAt <= edge && edge < flaw.endsAt);
  const tail = touchesEdge ? (rest[0] ?? 0) : 0;
  const promised = bolt.reserved.filter((each) => each.count > 0);
  const over = rest.reduce((sum, each) => sum + each, 0) - promised.reduce((sum, each) => sum + each.length * each.count, 0);
  if (promised.length > 0 && over < input.saleableRemnant) return cutAway + over;
  const isUseless = tail < input.saleableRemnant && promised.every((each) => each.length > tail);
  return cutAway + (isUseless ? tail : 0);
}

function checkKits(plan: BoltPlan, input: BoltPlanInput, already: readonly CutAlready[]): string[] {
  const faults: string[] = [];
  const lotOf = new Map(input.bolts.map((bolt) => [bolt.tag, bolt.lot]));
  const planned = plan.cuts.filter((cut) => cut.purpose === "kit").map((cut) => ({ kit: cut.kit ?? 0, fabric: cut.fabric, length: cut.endsAt - cut.startsAt, lot: lotOf.get(cut.bolt) ?? "" }));
  const fabrics = [...new Set(input.lengths.map((each) => each.fabric))];
  const wanted = (fabric: string) => input.lengths.filter((each) => each.fabric === fabric).map((each) => each.length as number).sort((a, b) => a - b).join();
  let made = 0;
  for (let kit = 1; kit <= input.kits; kit += 1) {
    const has = [...planned, ...already].filter((each) => each.kit === kit);
    const isWhole = fabrics.every((fabric) => has.filter((each) => each.fabric === fabric).map((each) => each.length as number).sort((a, b) => a - b).join() === wanted(fabric));
    if (isWhole) made += 1;
    else if (planned.some((each) => each.kit === kit)) faults.push(`Kit ${kit} gets lengths and is still not whole.`);
    for (const fabric of fabrics) {
      if (new Set(has.filter((each) => each.fabric === fabric).map((each) => each.lot)).size > 1 && wanted(fabric).includes(",")) faults.push(`Kit ${kit} has fabric ${fabric} of several lots.`);
    }
  }
  if (planned.some((each) => each.kit < 1 || each.kit > input.kits)) faults.push("A length is for a kit outside the run.");
  if (made !== plan.kits) faults.push(`${made} kits are whole, ${plan.kits} are said.`);
  return faults;
}
