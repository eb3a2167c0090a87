import { centimetres, inches, length, PER_MILLIMETRE, type Length } from "../measure/length";
import type { AllowanceRules, Blank, Budget, StripPlan, WasteAllowance } from "../piece/strip-plan";
import { planStrips } from "./plan-strips";
import type { Solver } from "./solver";

const WHOLE = 10_000;

/** Along the bolt; across, both are half the fabric. */
const FAT_SIZES = {
  yards: { quarter: inches(18), eighth: inches(9) },
  metres: { quarter: centimetres(50), eighth: centimetres(25) },
} as const;

/**
 * From a plan's net length to the length that is cut from the bolt, a line for each thing added. The lines add up to
 * `cutLength` exactly: straightening, the reserve for mis-cuts, what prewashing takes (length / (1 - shrinkage)), the
 * end of the bolt, and rounding up to the selling step and the least cut. Nothing is added to an empty plan.
 *
 * @param fits what `fitsFatQuarter` found, handed through.
 */
export function allowWaste(plan: StripPlan, rules: AllowanceRules, fits: WasteAllowance["fits"] = null): WasteAllowance {
  const net = plan.length;
  if (net === 0) {
    const none = length(0);
    return { net, straightening: none, misCuts: none, prewash: none, endOfBolt: none, rounding: none, cutLength: none, fits: null };
  }
  const misCuts = misCutReserve(plan, rules);
  const cut = net + rules.straightening + misCuts;
  const washed = beforeShrinkage(length(cut), rules.shrinkAlong);
  const wanted = washed + rules.endOfBolt;
  const cutLength = soldLength(wanted, rules);
  return {
    net,
    straightening: rules.straightening,
    misCuts,
    prewash: length(washed - cut),
    endOfBolt: rules.endOfBolt,
    rounding: length(cutLength - wanted),
    cutLength: length(cutLength),
    fits,
  };
}

/** The usable width that is left after prewashing; what is planned on. */
export function widthAfterShrinkage(usableWidth: Length, rules: Pick<AllowanceRules, "shrinkAcross">): Length {
  return afterShrinkage(usableWidth, rules.shrinkAcross);
}

/**
 * Whether everything of one fabric comes out of a fat quarter or a fat eighth, by planning it anew at half the width.
 * A shop that sells in whole millimetres has metric ones (50 and 25 cm along the bolt), any other 18 and 9 in.
 *
 * @param usableWidth what the fabric was planned on, after shrinkage across.
 * @returns the smaller of the two that is enough, or null.
 */
export async function fitsFatQuarter(blanks: readonly Blank[], usableWidth: Length, rules: AllowanceRules, budget: Budget, solver: Solver): Promise<WasteAllowance["fits"]> {
  const metric = rules.sellingStep > 0 && rules.sellingStep % PER_MILLIMETRE === 0;
  const sizes = FAT_SIZES[metric ? "metres" : "yards"];
  const quarter = afterShrinkage(sizes.quarter, rules.shrinkAlong);
  const half = length(Math.floor(usableWidth / 2));
  const area = blanks.reduce((total, blank) => total + blank.count * blank.along * blank.across, 0);
  if (area === 0 || area > half * quarter) return null;
  const plan = await planStrips(blanks, half, budget, solver);
  if (!plan.ok) return null;
  if (plan.value.length <= afterShrinkage(sizes.eighth, rules.shrinkAlong)) return "fat-eighth";
  return plan.value.length <= quarter ? "fat-quarter" : null;
}

function afterShrinkage(cut: Length, shrinkage: number): Length {
  return length(Math.floor((cut * (WHOLE - checked(shrinkage))) / WHOLE));
}

/** The length to cut so that `wanted` is left after shrinking. Shrinkage in basis points, below the whole. */
export function beforeShrinkage(wanted: Length, shrinkAlong: number): Length {
  return length(Math.ceil((wanted * WHOLE) / (WHOLE - checked(shrinkAlong))));
}

function misCutReserve(plan: StripPlan, rules: AllowanceRules): Length {
  if (rules.misCut.kind === "spare-strip") return commonestWidth(plan);
  return length(Math.ceil((plan.length * rules.misCut.basisPoints) / WHOLE));
}

/** The width of most strips; of equally common ones the widest, from which the others can be cut. */
function commonestWidth(plan: StripPlan): Length {
  const counts = new Map<Length, number>();
  for (const strip of plan.strips) counts.set(strip.width, (counts.get(strip.width) ?? 0) + 1);
  const [commonest] = [...counts].sort(([a, timesA], [b, timesB]) => timesB - timesA || b - a);
  return commonest?.[0] ?? length(0);
}

/** The first multiple of the selling step that is enough and no less than the least cut. */
function soldLength(wanted: number, rules: AllowanceRules): number {
  const least = Math.max(wanted, rules.leastCut);
  return rules.sellingStep > 0 ? Math.ceil(least / rules.sellingStep) * rules.sellingStep : least;
}

function checked(shrinkage: number): number {
  if (!(shrinkage >= 0 && shrinkage < WHOLE)) throw new RangeError(`Shrinkage is 0 to ${WHOLE - 1} hundredths of a percent, not ${shrinkage}`);
  return shrinkage;
}
