import type { CutPiece } from "@/lib/core/piece/cut-piece";
import type { Blank, Strip, StripPlan } from "@/lib/core/piece/strip-plan";

/** Strips of one width that lie side by side, in cutting order from 0. */
export interface StripRun {
  readonly first: number;
  readonly count: number;
  readonly width: number;
  /** From the straightened end, 1/160 mm. */
  readonly from: number;
  readonly to: number;
  /** The least that is left over at the far selvage of any of them. */
  readonly over: number;
}

/** Runs of equal strips, as the foot of a cut map names them. */
export function stripRuns(plan: StripPlan, blanks: readonly Blank[]): StripRun[] {
  const runs: StripRun[] = [];
  plan.strips.forEach((strip, index) => {
    const over = plan.usableWidth - usedAcross(strip, blanks);
    const last = runs[runs.length - 1];
    if (last && last.width === strip.width) runs[runs.length - 1] = { ...last, count: last.count + 1, to: strip.startsAt + strip.width, over: Math.min(last.over, over) };
    else runs.push({ first: index, count: 1, width: strip.width, from: strip.startsAt, to: strip.startsAt + strip.width, over });
  });
  return runs;
}

/** How far the sub-cuts of a strip reach from the near selvage, with what is lost at slanting ends. */
export function usedAcross({ cuts }: Strip, blanks: readonly Blank[]): number {
  return cuts.reduce((most, cut) => Math.max(most, cut.at + cut.across + (blanks.find((blank) => blank.key === cut.blank)?.endWaste ?? 0)), 0);
}

/** The straight lines that are cut inside of a sub-cut: which diagonals of its rectangle. */
export function diagonalsOf(blank: Blank, piece: CutPiece | undefined, turned: boolean): { readonly rises: boolean; readonly falls: boolean } {
  if (blank.mark === "both-diagonals") return { rises: true, falls: true };
  if (blank.mark !== "diagonal") return { rises: false, falls: false };
  const rises = diagonalRises(piece, turned);
  return { rises, falls: !rises };
}

/**
 * Which diagonal a half-rectangle is cut along, with the right side of the cloth up: the patch is turned, never
 * mirrored, from its own pose to the way it lies on the map. For squares both give the same patches.
 */
function diagonalRises(piece: CutPiece | undefined, turned: boolean): boolean {
  if (piece?.method.kind !== "half-rectangle") return false;
  const corners = piece.finished;
  let [longest, risesInPose] = [0, true];
  corners.forEach(([x, y], index) => {
    const [nextX, nextY] = corners[(index + 1) % corners.length] ?? [x, y];
    const side = Math.hypot(nextX - x, nextY - y);
    if (side > longest) [longest, risesInPose] = [side, (nextX - x) * (nextY - y) < 0];
  });
  const span = (axis: 0 | 1) => Math.max(...corners.map((corner) => corner[axis])) - Math.min(...corners.map((corner) => corner[axis]));
  const quarterTurn = span(1) >= span(0) === piece.method.along.exact >= piece.method.across.exact;
  return risesInPose !== (quarterTurn !== turned);
}
