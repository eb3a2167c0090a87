import type { Length } from "../measure/length";
import type { BoltPlanInput, KitLength, PlanBolt, PlannedCut } from "../piece/bolt-plan";
import { addCosts, BoltTable, CountGrid, isCheaper, NO_COST, type Cost, type LaidBolt } from "./bolt-counts";
import { cutsOf, laysOf, type LayRules } from "./bolt-lay";
import { segmentLength, segmentsOf } from "./segments";

/** A length that was cut for a kit before this plan. */
export interface CutAlready {
  readonly kit: number;
  readonly fabric: string;
  readonly length: Length;
  readonly lot: string;
}

/** The bolts that a kit's lengths of one fabric may come from together: those of one lot, or all where it is one length. */
interface Group {
  readonly lot: string | null;
  readonly table: BoltTable;
  /** Kits that these bolts serve from the start to the end, at the most. */
  readonly most: number;
}

/** One fabric of a run: what each kit wants of it, what it has already, and all that the bolts can give. */
export interface FabricStock {
  readonly fabric: string;
  readonly name: string;
  /** Bolts of the fabric, and how many of them are wide enough for any of its lengths. */
  readonly bolts: number;
  readonly wideEnough: number;
  readonly rules: LayRules;
  /** How many of each length a kit takes. */
  readonly perKit: readonly number[];
  readonly groups: readonly Group[];
  /** What is missing of kits that were begun: nothing missing for the finished ones. */
  readonly begun: ReadonlyMap<number, { readonly missing: readonly number[]; readonly lot: string }>;
  /** Kits that this fabric alone allows, begun ones with them; a bound where the work ran out. */
  readonly allows: number;
  /** The work ran out: `allows` may be more than can be had. */
  readonly isBound: boolean;
}

/** Above this many counts of one fabric's lengths the tables would take too long, whatever the budget says. */
const MOST_COUNTS = 6_000;

/** Gathers the entries of one fabric and finds all that its bolts can give. */
export function stockOf(wants: readonly KitLength[], input: BoltPlanInput, already: readonly CutAlready[], nodes: number): FabricStock {
  const [first] = wants;
  if (!first) throw new Error("A fabric without lengths is no fabric of a kit.");
  const lengths = [...new Set(wants.map((want) => want.length))].sort((a, b) => b - a);
  const perKit = lengths.map((each) => wants.filter((want) => want.length === each).length);
  const widths = lengths.map((each) => Math.max(...wants.filter((want) => want.length === each).map((want) => want.plannedWidth)));
  const rules: LayRules = { lengths, straightening: input.straightening, saleableRemnant: input.saleableRemnant };
  const begun = begunKits(first.fabric, lengths, perKit, already, input.kits);
  const bolts = input.bolts.filter((bolt) => bolt.fabric === first.fabric).sort((a, b) => a.shelfOrder - b.shelfOrder);
  const wide = bolts.filter((bolt) => widths.some((width) => bolt.usableWidth >= width));
  const lots = wants.length === 1 ? [null] : [...new Set(wide.map((bolt) => bolt.lot))];
  const made = lots.map((lot) => {
    const ofLot = wide.filter((bolt) => lot === null || bolt.lot === lot);
    const waiting = [...begun.values()].filter((each) => each.lot === lot).length;
    return makeGroup({ lot, bolts: ofLot, rules, perKit, widths, waiting, kits: input.kits, nodes });
  });
  return {
    fabric: first.fabric,
    name: wants.find((want) => want.name)?.name ?? first.fabric,
    bolts: bolts.length,
    wideEnough: wide.length,
    rules,
    perKit,
    groups: made.map((each) => each.group),
    begun,
    allows: begun.size + made.reduce((sum, each) => sum + each.bound, 0),
    isBound: made.some((each) => each.bound > each.group.most) || [...begun.values()].some((each) => each.missing.some((count) => count > 0)),
  };
}

function begunKits(fabric: string, lengths: readonly Length[], perKit: readonly number[], already: readonly CutAlready[], kits: number): Map<number, { missing: number[]; lot: string }> {
  const begun = new Map<number, { missing: number[]; lot: string }>();
  for (const cut of already) {
    const kind = lengths.indexOf(cut.length);
    if (cut.fabric !== fabric || kind < 0 || cut.kit < 1 || cut.kit > kits) continue;
    const { missing, lot } = begun.get(cut.kit) ?? { missing: [...perKit], lot: cut.lot };
    missing[kind] = Math.max(0, (missing[kind] ?? 0) - 1);
    begun.set(cut.kit, { missing, lot });
  }
  return begun;
}

interface GroupInput {
  readonly lot: string | null;
  readonly bolts: readonly PlanBolt[];
  readonly rules: LayRules;
  readonly perKit: readonly number[];
  readonly widths: readonly number[];
  /** Kits of this lot that were begun and may want more. */
  readonly waiting: number;
  readonly kits: number;
  readonly nodes: number;
}

function makeGroup(given: GroupInput): { readonly group: Group; readonly bound: number } {
  return given.perKit.length === 1 && given.perKit[0] === 1 ? makePlainGroup(given) : makePairedGroup(given);
}

/** One length a kit: every bolt's most adds up, and the table is needed up to the kits asked for only. */
function makePlainGroup({ lot, bolts, rules, kits }: GroupInput): { group: Group; bound: number } {
  const laid = bolts.map((bolt) => ({ bolt, lays: laysOf(bolt, rules, new CountGrid([Math.floor((bolt.endsAt - bolt.cutEdge) / (rules.lengths[0] ?? 1))])) }));
  const most = laid.reduce((sum, { lays }) => sum + (lays.at(-1)?.index ?? 0), 0);
  const grid = new CountGrid([Math.min(kits, most)]);
  const useful = laid.map(({ bolt, lays }) => ({ bolt, lays: lays.filter((lay) => lay.index < grid.size) }));
  return { group: { lot, table: new BoltTable(useful, grid), most }, bound: most };
}

/** Several lengths a kit: the table holds whole kits up to what the cloth could give by its sum, as far as the work allows. */
function makePairedGroup({ lot, bolts, rules, perKit, widths, waiting, nodes }: GroupInput): { group: Group; bound: number } {
  const room = bolts.reduce((sum, bolt) => sum + segmentsOf(bolt).reduce((all, segment) => all + segmentLength(segment), 0), 0);
  const bound = Math.floor(room / perKit.reduce((sum, count, kind) => sum + count * (rules.lengths[kind] ?? 0), 0));
  const limit = Math.min(MOST_COUNTS, nodes / Math.max(1, bolts.length));
  let kits = bound;
  while (kits > 1 && gridFor(perKit, kits + waiting).size > limit) kits -= 1;
  const grid = gridFor(perKit, kits + waiting);
  const laid = bolts.map((bolt): LaidBolt => ({ bolt, lays: laysOnWideEnough(bolt, rules, grid, widths) }));
  const table = new BoltTable(laid, grid);
  const most = mostWhole(table, perKit, perKit.map(() => 0));
  return { group: { lot, table, most }, bound: kits < bound ? bound : most };
}

function gridFor(perKit: readonly number[], kits: number): CountGrid {
  return new CountGrid(perKit.map((count) => count * kits));
}

/** A bolt may be wide enough for one of the lengths only. */
function laysOnWideEnough(bolt: PlanBolt, rules: LayRules, grid: CountGrid, widths: readonly number[]) {
  const lays = laysOf(bolt, rules, grid);
  return lays.filter((lay) => grid.countsOf(lay.index).every((count, kind) => count === 0 || bolt.usableWidth >= (widths[kind] ?? 0)));
}

/** How many whole kits come out of the bolts beside some lengths; -1 when even those do not. Fewer never fail where more go. */
function mostWhole(table: BoltTable, perKit: readonly number[], beside: readonly number[]): number {
  let kits = -1;
  while (table.costOf(beside.map((count, kind) => count + (kits + 1) * (perKit[kind] ?? 0)))) kits += 1;
  return kits;
}

/** Lengths that the begun kits among `served` still want of each group. */
function wantedBeside(stock: FabricStock, served: ReadonlySet<number>): number[][] {
  return stock.groups.map(({ lot }) => {
    const begun = [...stock.begun].filter(([kit, each]) => served.has(kit) && (lot === null || each.lot === lot));
    return stock.perKit.map((_, kind) => begun.reduce((sum, [, each]) => sum + (each.missing[kind] ?? 0), 0));
  });
}

/** Whether the bolts can finish all these kits. */
export function canServe(stock: FabricStock, served: ReadonlySet<number>): boolean {
  const whole = [...served].filter((kit) => !stock.begun.has(kit)).length;
  const begun = [...stock.begun].filter(([kit, each]) => served.has(kit) && each.missing.some((count) => count > 0));
  if (begun.length === 0) return whole <= stock.groups.reduce((sum, group) => sum + group.most, 0);
  if (begun.some(([, each]) => !stock.groups.some((group) => group.lot === each.lot))) return false;
  const beside = wantedBeside(stock, served);
  const most = stock.groups.map((group, at) => mostWhole(group.table, stock.perKit, beside[at] ?? []));
  return most.every((kits) => kits >= 0) && whole <= most.reduce((sum, kits) => sum + kits, 0);
}

export interface FabricChoice extends Cost {
  readonly cuts: readonly PlannedCut[];
}

/** The cheapest way to serve the kits: which lots give how many, then which bolts. Only for kits that `canServe`. */
export function serve(stock: FabricStock, served: ReadonlySet<number>): FabricChoice {
  const beside = wantedBeside(stock, served);
  const fresh = [...served].filter((kit) => !stock.begun.has(kit)).sort((a, b) => a - b);
  const shares = shareAmongGroups(stock, beside, fresh.length);
  const cuts: PlannedCut[] = [];
  let cost = NO_COST;
  let handed = 0;
  for (const [at, group] of stock.groups.entries()) {
    const share = shares[at] ?? 0;
    const kits = fresh.slice(handed, handed + share);
    handed += share;
    const counts = countsWith(beside[at] ?? [], stock.perKit, share);
    cost = addCosts(cost, group.table.costOf(counts) ?? NO_COST);
    cuts.push(...layCuts(stock, group, counts, queues(stock, group, served, kits)));
  }
  return { ...cost, cuts };
}

function countsWith(beside: readonly number[], perKit: readonly number[], kits: number): number[] {
  return perKit.map((each, kind) => (beside[kind] ?? 0) + kits * each);
}

/** How many whole kits each lot gives, by dynamic programming over the lots. */
function shareAmongGroups(stock: FabricStock, beside: readonly (readonly number[])[], kits: number): number[] {
  let best: (Cost | null)[] = [NO_COST, ...new Array<null>(kits).fill(null)];
  const steps: number[][] = [];
  for (const [at, { table }] of stock.groups.entries()) {
    const next = new Array<Cost | null>(kits + 1).fill(null);
    const step = new Array<number>(kits + 1).fill(0);
    for (let share = 0; share <= kits; share += 1) {
      const own = table.costOf(countsWith(beside[at] ?? [], stock.perKit, share));
      if (!own) break;
      for (let before = 0; before + share <= kits; before += 1) {
        const sofar = best[before];
        const cost = sofar ? addCosts(sofar, own) : null;
        if (!cost || !isCheaper(cost, next[before + share])) continue;
        next[before + share] = cost;
        step[before + share] = share;
      }
    }
    best = next;
    steps.push(step);
  }
  if (!best[kits]) throw new Error("More kits were laid out than the bolts allow.");
  const shares: number[] = [];
  for (let at = steps.length - 1, left = kits; at >= 0; at -= 1) {
    shares.unshift(steps[at]?.[left] ?? 0);
    left -= shares[0] ?? 0;
  }
  return shares;
}

/** Per kind of length the kits that wait for one, begun ones first. */
function queues(stock: FabricStock, { lot }: Group, served: ReadonlySet<number>, fresh: readonly number[]): number[][] {
  return stock.perKit.map((each, kind) => {
    const begun = [...stock.begun].filter(([kit, { lot: of }]) => served.has(kit) && (lot === null || of === lot)).sort(([a], [b]) => a - b);
    return [...begun.flatMap(([kit, { missing }]) => new Array<number>(missing[kind] ?? 0).fill(kit)), ...fresh.flatMap((kit) => new Array<number>(each).fill(kit))];
  });
}

function layCuts(stock: FabricStock, { table }: Group, counts: readonly number[], waiting: number[][]): PlannedCut[] {
  const lays = table.laysFor(counts);
  return table.bolts.flatMap(({ bolt }, at) => {
    const lay = lays[at];
    if (!lay || lay.index === 0) return [];
    return cutsOf(bolt, stock.rules, lay, table.grid, (kind) => {
      const kit = waiting[kind]?.shift();
      if (kit === undefined) throw new Error("More lengths were laid out than kits wait for.");
      return kit;
    });
  });
}
