import type { Length } from "../measure/length";
import { length } from "../measure/length";
import type { Blank, PlanStatus, Strip, StripPlan, SubCut } from "../piece/strip-plan";
import type { Layout, StripGroup } from "./strip-layout";
import type { StripProblem } from "./strip-problem";
import type { SearchOutcome } from "./strip-search";

/** Writes a layout out in 1/160 mm: every strip at its place, every piece at its place, each blank's pieces together. */
export function writeStripPlan(problem: StripProblem, usableWidth: Length, layout: Layout, outcome: SearchOutcome): StripPlan {
  const waiting = problem.kinds.map((kind) => kind.blanks.map((blank) => ({ blank, left: blank.count })));
  const strips: Strip[] = [];
  let at = 0;
  for (const group of layout.groups) {
    const width = (problem.heights[group.height] ?? 0) * problem.alongUnit;
    for (let time = 0; time < group.times; time++) {
      strips.push({ startsAt: length(at), width: length(width), cuts: writeCuts(problem, group, waiting) });
      at += width;
    }
  }
  const { meter } = outcome;
  const stripsBound = Math.min(layout.length, outcome.stripsBound) * problem.alongUnit;
  const status: PlanStatus = at <= stripsBound ? "optimal" : meter.stopped ? "stopped" : "feasible";
  return {
    status,
    usableWidth,
    strips,
    length: length(at),
    bounds: { strips: length(stripsBound), anyLayout: length(Math.min(stripsBound, outcome.anyLayoutBound * problem.alongUnit)) },
    work: { patterns: meter.patterns, programmes: meter.programmes, nodes: meter.nodes },
  };
}

interface Waiting {
  readonly blank: Blank;
  left: number;
}

/** From the near selvage, the widest piece first; slanting ends lie behind the last piece of their kind. */
function writeCuts(problem: StripProblem, group: StripGroup, waiting: readonly (readonly Waiting[])[]): SubCut[] {
  const cuts: SubCut[] = [];
  let at = 0;
  for (const { kind, across } of kindsAcross(problem, group)) {
    const { ways, endWaste } = problem.kinds[kind] ?? { ways: [], endWaste: 0 };
    const along = Math.min(...ways.filter((way) => way.across === across).map((way) => way.along));
    const laid = { across: length(across * problem.acrossUnit), along: length(along * problem.alongUnit) };
    for (let piece = 0; piece < (group.counts[kind] ?? 0); piece++) {
      const next = waiting[kind]?.find((each) => each.left > 0);
      if (!next) throw new Error("The layout holds more pieces than are wanted.");
      next.left -= 1;
      const turned = next.blank.across !== laid.across || next.blank.along !== laid.along;
      cuts.push({ blank: next.blank.key, at: length(at * problem.acrossUnit), ...laid, turned });
      at += across;
    }
    at += endWaste;
  }
  return cuts;
}

function kindsAcross(problem: StripProblem, group: StripGroup): { kind: number; across: number }[] {
  return group.counts
    .map((count, kind) => ({ count, kind, across: problem.across[group.height]?.[kind] ?? 0 }))
    .filter(({ count }) => count > 0)
    .sort((a, b) => b.across - a.across || a.kind - b.kind);
}
