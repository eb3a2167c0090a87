import type { Length } from "../measure/length";
import { length } from "../measure/length";
import type { Blank, Budget, PlanControl, StripPlan } from "../piece/strip-plan";
import { fail, ok, type Result } from "../result";
import type { Solver } from "./solver";
import { makeStripProblem, waysToLie } from "./strip-problem";
import { StripSearch } from "./strip-search";
import { tidyLayout } from "./tidy-layout";
import { writeStripPlan } from "./write-strip-plan";

/** About a second's work for the load of one fabric. */
export const STRIP_BUDGET: Budget = { patterns: 50_000, nodes: 300 };

/** More sizes or pieces than any cutting day holds; beyond it a plan would not fit a page or a memory. */
export const MOST_KINDS = 400;
export const MOST_PIECES = 100_000;

/**
 * Plans the strips of one fabric: cuts across the usable width, then cuts across each strip, pieces narrower than
 * their strip trimmed (two-stage guillotine, non-exact). Column generation over strips (Gilmore and Gomory 1961, 1965),
 * rounded by diving and finished by an integer programme over the strips that can still matter.
 *
 * @param usableWidth across the fabric, selvages already off.
 * @param budget work, not time: the same blanks, budget and version give the same plan.
 * @returns optimal when the length equals `bounds.strips`, else feasible, or stopped by a person. `piece-too-wide`
 * names the first piece that fits no way round (facts: `blank`, `across`, `usableWidth`, `turnedAcross`);
 * `too-many-pieces` gives the numbers.
 */
export async function planStrips(
  blanks: readonly Blank[],
  usableWidth: Length,
  budget: Budget,
  solver: Solver,
  control?: PlanControl,
): Promise<Result<StripPlan, "piece-too-wide" | "too-many-pieces">> {
  const wide = blanks.find((blank) => blank.count > 0 && waysToLie(blank, usableWidth).length === 0);
  if (wide) return tooWide(wide, usableWidth);
  const pieces = blanks.reduce((total, blank) => total + blank.count, 0);
  if (pieces > MOST_PIECES || blanks.length > MOST_KINDS) {
    return fail(
      "too-many-pieces",
      `The list holds ${pieces} pieces in ${blanks.length} lines; one plan takes up to ${MOST_PIECES} pieces in ${MOST_KINDS} lines. Plan it in parts.`,
      { facts: { pieces, lines: blanks.length } },
    );
  }
  const problem = makeStripProblem(blanks, usableWidth);
  if (problem.kinds.length === 0) return ok(emptyPlan(usableWidth));
  const outcome = await new StripSearch(problem, solver, budget, control).run();
  const layout = tidyLayout(problem, outcome.layout);
  control?.progress?.({ done: 1, sentence: "Planned." });
  return ok(writeStripPlan(problem, usableWidth, layout, outcome));
}

function tooWide(blank: Blank, usableWidth: Length) {
  const needed = blank.across + blank.endWaste;
  const turned = blank.along <= usableWidth && blank.endWaste === 0;
  return fail(
    "piece-too-wide",
    turned
      ? `${blank.label} is wider than the fabric's usable width. It would fit turned along the bolt, but it may not be turned.`
      : `${blank.label} is wider than the fabric's usable width. It needs a wider fabric, or a seam.`,
    { facts: { blank: blank.key, piece: blank.pieceKey, across: needed, usableWidth, turnedAcross: turned ? blank.along : null } },
  );
}

function emptyPlan(usableWidth: Length): StripPlan {
  return {
    status: "optimal",
    usableWidth,
    strips: [],
    length: length(0),
    bounds: { strips: length(0), anyLayout: length(0) },
    work: { patterns: 0, programmes: 0, nodes: 0 },
  };
}
