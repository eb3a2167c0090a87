import type { Blank, Strip, StripPlan, SubCut } from "../piece/strip-plan";

/**
 * Checks a plan against the blanks it was made for, from the definition alone; it shares no code with the planner.
 *
 * @returns one sentence for each thing that is wrong; empty when the plan is good. Lengths in the sentences are counts
 * of 1/160 mm.
 */
export function checkStripPlan(plan: StripPlan, blanks: readonly Blank[]): string[] {
  const byKey = new Map(blanks.map((blank) => [blank.key, blank]));
  const faults = [...checkStripsEndToEnd(plan), ...plan.strips.flatMap((strip, index) => checkStrip(strip, `Strip ${index + 1}`, plan.usableWidth, byKey))];
  if (byKey.size !== blanks.length) faults.push("Two blanks share a key.");
  faults.push(...checkDemand(plan, blanks), ...checkBounds(plan));
  return faults;
}

/** A cut right across at every strip's start and end: strips touch, none overlaps, their sum is the length. */
function checkStripsEndToEnd(plan: StripPlan): string[] {
  const faults: string[] = [];
  let end = 0;
  let previous = Infinity;
  plan.strips.forEach((strip, index) => {
    if (strip.startsAt !== end) faults.push(`Strip ${index + 1} starts at ${strip.startsAt}, the one before it ends at ${end}.`);
    if (strip.width <= 0) faults.push(`Strip ${index + 1} has no width.`);
    if (strip.width > previous) faults.push(`Strip ${index + 1} is wider than the one before it.`);
    previous = strip.width;
    end = strip.startsAt + strip.width;
  });
  if (end !== plan.length) faults.push(`The strips end at ${end}, the plan says ${plan.length}.`);
  return faults;
}

/** Sub-cuts run straight across the strip, so its pieces lie side by side; each is trimmed from the strip's edge. */
function checkStrip(strip: Strip, name: string, usableWidth: number, blanks: ReadonlyMap<string, Blank>): string[] {
  const faults: string[] = [];
  if (strip.cuts.length === 0) faults.push(`${name} holds nothing.`);
  const ordered = [...strip.cuts].sort((a, b) => a.at - b.at);
  ordered.forEach((cut, index) => {
    const blank = blanks.get(cut.blank);
    if (!blank) {
      faults.push(`${name} holds ${cut.blank}, which is not wanted.`);
      return;
    }
    faults.push(...checkLie(cut, blank, name));
    if (cut.at < 0) faults.push(`${name} holds ${cut.blank} before the near selvage.`);
    if (cut.along > strip.width) faults.push(`${name} is narrower than ${cut.blank}.`);
    const next = ordered[index + 1];
    const groupEnds = next?.blank !== cut.blank;
    const end = cut.at + cut.across + (groupEnds ? blank.endWaste : 0);
    if (next && next.at < end) faults.push(`${name}: ${cut.blank} at ${cut.at} reaches ${end}, ${next.blank} starts at ${next.at}.`);
    if (!next && end > usableWidth) faults.push(`${name}: ${cut.blank} reaches ${end}, the usable width is ${usableWidth}.`);
  });
  return faults;
}

function checkLie(cut: SubCut, blank: Blank, name: string): string[] {
  const [along, across] = cut.turned ? [blank.across, blank.along] : [blank.along, blank.across];
  const faults: string[] = [];
  if (cut.turned && !blank.mayTurn) faults.push(`${name} turns ${cut.blank}, which may not be turned.`);
  if (cut.along !== along || cut.across !== across) faults.push(`${name} cuts ${cut.blank} ${cut.along} x ${cut.across}, wanted ${along} x ${across}.`);
  return faults;
}

function checkDemand(plan: StripPlan, blanks: readonly Blank[]): string[] {
  const cut = new Map<string, number>();
  for (const strip of plan.strips) for (const each of strip.cuts) cut.set(each.blank, (cut.get(each.blank) ?? 0) + 1);
  return blanks
    .filter((blank) => (cut.get(blank.key) ?? 0) !== blank.count)
    .map((blank) => `${blank.key} is cut ${cut.get(blank.key) ?? 0} times, wanted ${blank.count}.`);
}

function checkBounds(plan: StripPlan): string[] {
  const faults: string[] = [];
  const { strips, anyLayout } = plan.bounds;
  if (anyLayout > strips) faults.push(`The bound of any layout, ${anyLayout}, is above that of strips, ${strips}.`);
  if (strips > plan.length) faults.push(`The bound ${strips} is above the length ${plan.length}.`);
  if (plan.status === "optimal" && strips !== plan.length) faults.push(`The plan is called optimal at ${plan.length} with the bound ${strips}.`);
  return faults;
}
