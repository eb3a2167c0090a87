import type { MeasureSystem } from "../measure/format";
import type { CutPiece, CuttingRules } from "../piece/cut-piece";
import type { BlockSize, Grain, RoleId } from "../piece/drawing";
import type { Patch, Polygon } from "../piece/patch";
import { hasBiasEdge, type BlockAnalysis } from "./analyse-block";
import { growthOf, methodOf, type MethodOfPatch } from "./cut-method";
import { sayQuarterSquare, sayShape } from "./name-shape";
import { offsetOutwards } from "./offset";
import { normalTurn, toOrigin, turned } from "./plane";

export interface CutListOptions {
  /** Blocks to cut for; 1 where nothing is said. */
  readonly copies?: number;
  /** Roles whose fabric has a direction: their pieces keep the turn they have in the block. */
  readonly oneWay?: ReadonlySet<RoleId>;
  readonly system?: MeasureSystem;
}

const BIAS_EDGE = "Bias lies on the outside edge of the block: handle it little, and stay-stitch it.";

/** How far the shape is turned so that its lengthwise grain runs up the page. */
const GRAIN_TURN: Readonly<Record<Grain, number>> = { any: 0, up: 0, across: 90, "down-right": 45, "down-left": -45 };

/**
 * The cut lines of a block: each letter in each role, and apart where grain or direction make another cut of it. Patches
 * without a role are left out. Keys are "letter/role/way". In letter order, then role order.
 */
export function blockCutList({ patches }: Pick<BlockAnalysis, "patches">, _size: BlockSize, rules: CuttingRules, options: CutListOptions = {}): CutPiece[] {
  const { copies = 1, oneWay = new Set<RoleId>(), system = "yards" } = options;
  const lines = new Map<string, CutPiece>();
  for (const patch of patches) {
    if (patch.role === null) continue;
    const directed = oneWay.has(patch.role);
    const lying = asCut(patch, directed);
    const made = methodOf(lying, rules);
    const key = `${patch.letter}/${patch.role}/${wayOf(patch, made, directed)}`;
    const known = lines.get(key);
    const line = known ? { ...known, count: known.count + copies } : pieceOf(patch, { key, role: patch.role, lying, made, rules, copies, directed, system });
    lines.set(key, hasBiasEdge(patch) ? { ...line, note: BIAS_EDGE } : line);
  }
  return [...lines.values()].sort((a, b) => byLetter(a.letter, b.letter) || (a.role < b.role ? -1 : a.role > b.role ? 1 : a.key < b.key ? -1 : 1));
}

/**
 * The finished shape with its grain up the page. Where neither direction nor grain matters, all patches of a letter are
 * shown in its model's pose, as long as that leaves the straight sides straight.
 */
function asCut({ corners, grain, turn }: Patch, directed: boolean): Polygon {
  const free = !directed && grain === "any" && normalTurn(turn) % 90 === 0;
  return toOrigin(turned(corners, free ? -turn : GRAIN_TURN[grain]));
}

interface Line {
  readonly key: string;
  readonly role: RoleId;
  readonly lying: Polygon;
  readonly made: MethodOfPatch;
  readonly rules: CuttingRules;
  readonly copies: number;
  readonly directed: boolean;
  readonly system: MeasureSystem;
}

function pieceOf(patch: Patch, { key, role, lying, made, rules, copies, directed, system }: Line): CutPiece {
  return {
    key,
    letter: patch.letter,
    name: made.method.kind === "quarter-square" ? sayQuarterSquare(lying, system) : sayShape(lying, system),
    role,
    count: copies,
    finished: lying,
    cut: offsetOutwards(lying, rules.seamAllowance),
    method: made.method,
    trimming: made.trimming,
    mayTurn: !directed && patch.grain === "any" && made.method.kind !== "angled-strip",
  };
}

/** What makes a cut line of its own: the way it is cut, a grain that was asked for, and in a directed fabric the turn. */
function wayOf(patch: Patch, { method }: MethodOfPatch, directed: boolean): string {
  const turn = directed ? `${normalTurn(patch.turn)}` : "";
  // A square cut in quarters gives all four turns, one cut in half two that lie opposite: those are one line.
  const turns = method.kind === "quarter-square" ? "" : method.kind === "half-square" && directed ? `${normalTurn(patch.turn) % 180}` : turn;
  return [method.kind, patch.grain === "any" ? "" : patch.grain, turns].filter(Boolean).join("-");
}

function byLetter(a: string, b: string): number {
  const bare = (letter: string) => letter.replace(/r$/, "");
  return bare(a).length - bare(b).length || (a < b ? -1 : a > b ? 1 : 0);
}

/**
 * How much the sewn block comes out larger than finished because its pieces go to the ruler's nearest mark: the largest
 * sum of growth over the patches that a line across the block, or down it, passes. In 1/160 mm; may be below zero.
 */
export function blockGrowth({ patches }: Pick<BlockAnalysis, "patches">, rules: CuttingRules): { across: number; down: number } {
  const grown = patches.map((patch) => ({ corners: patch.corners, ...growthOf(methodOf(toOrigin(patch.corners), rules)) }));
  return { across: widest(grown, 1, (each) => each.across), down: widest(grown, 0, (each) => each.along) };
}

/** Lines are laid between the corners, where the set of patches that they pass does not change. */
function widest<Each extends { readonly corners: Polygon }>(grown: readonly Each[], axis: 0 | 1, growth: (each: Each) => number): number {
  const stops = [...new Set(grown.flatMap((each) => each.corners.map((corner) => Math.round(corner[axis]))))].sort((a, b) => a - b);
  let most = 0;
  for (let index = 1; index < stops.length; index += 1) {
    const at = ((stops[index - 1] ?? 0) + (stops[index] ?? 0)) / 2;
    const passed = grown.filter((each) => {
      const places = each.corners.map((corner) => corner[axis]);
      return Math.min(...places) < at && at < Math.max(...places);
    });
    const sum = passed.reduce((total, each) => total + growth(each), 0);
    if (Math.abs(sum) > Math.abs(most)) most = sum;
  }
  return most;
}
