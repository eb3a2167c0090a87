import { QueryTypes, type Transaction } from "sequelize";
import { planBolts } from "@/lib/core/cutting/bolt-plan";
import type { Length } from "@/lib/core/measure/length";
import type { BoltPlan, BoltPlanInput, PlanBolt } from "@/lib/core/piece/bolt-plan";
import type { Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import { getColourway } from "@/lib/data/designs/kits";
import { requireShop, type ShopView } from "@/lib/data/shop";
import { db } from "@/models/database";

/** Nodes of the bolt plan's search: enough to prove the demo shop's runs, little enough to answer at once. */
const BUDGET = { nodes: 200_000 };
export const MOST_KITS = 500;

export interface RunPlan {
  readonly input: BoltPlanInput;
  readonly plan: BoltPlan;
}

/**
 * Plans `kits` kits of a colourway on the bolts as they stand now; nothing is reserved. Faults: `unknown-colourway`,
 * and those of the planner.
 */
export async function planRun(_actor: Actor, { colourwayId, kits }: { colourwayId: number; kits: number }): Promise<Result<RunPlan>> {
  const found = await getColourway(colourwayId);
  if (!found) return fail("unknown-colourway", "There is no such colourway; it may have been put away.");
  return planOnBolts(found.colourway.lengths, kits, await requireShop());
}

/**
 * The same inside a transaction, with the bolts of the fabrics locked in id order. The shop's rules are handed in, so
 * that a transaction never waits for a second connection.
 */
export async function planOnBolts(
  lengths: readonly { fabricId: number; cutLength: number; plannedWidth: number }[],
  kits: number,
  shop: Pick<ShopView, "straightening" | "saleableRemnant">,
  transaction?: Transaction,
): Promise<Result<RunPlan>> {
  const fabricIds = [...new Set(lengths.map((each) => each.fabricId))];
  const names = await readFabricNames(fabricIds, transaction);
  const input: BoltPlanInput = {
    kits,
    lengths: lengths.map((each) => ({
      fabric: String(each.fabricId),
      name: names.get(each.fabricId),
      length: each.cutLength as Length,
      plannedWidth: each.plannedWidth as Length,
    })),
    bolts: await listPlanBolts(fabricIds, transaction),
    straightening: shop.straightening,
    saleableRemnant: shop.saleableRemnant,
  };
  const planned = await planBolts(input, BUDGET);
  return planned.ok ? ok({ input, plan: planned.value }) : planned;
}

async function readFabricNames(fabricIds: readonly number[], transaction?: Transaction): Promise<Map<number, string>> {
  const fabrics = await db().Fabric.findAll({ where: { id: [...fabricIds] }, attributes: ["id", "name"], raw: true, transaction });
  return new Map(fabrics.map((fabric) => [fabric.id, fabric.name]));
}

interface Row {
  id: number;
  tag: string;
  fabricId: number;
  lot: string;
  shelf: string;
  usableWidth: Length;
  cutEdge: Length;
  putUp: Length;
}

/** The bolts of some fabrics as the planner sees them, in shelf order. Locks them when a transaction is given. */
export async function listPlanBolts(fabricIds: readonly number[], transaction?: Transaction): Promise<PlanBolt[]> {
  if (fabricIds.length === 0) return [];
  const bolts = await db().sequelize.query<Row>(
    `SELECT b.id, b.tag, b.fabric_id AS "fabricId", b.lot, b.shelf, COALESCE(b.usable_width, f.usable_width) AS "usableWidth",
            b.cut_edge AS "cutEdge", b.put_up AS "putUp"
       FROM bolts b JOIN fabrics f ON f.id = b.fabric_id
      WHERE b.fabric_id = ANY($1) AND b.retired_at IS NULL AND b.cut_edge < b.put_up
      ORDER BY b.id ${transaction ? "FOR NO KEY UPDATE OF b" : ""}`,
    { bind: [[...fabricIds]], type: QueryTypes.SELECT, transaction },
  );
  const ids = bolts.map((bolt) => bolt.id);
  const [flaws, reserved] = ids.length
    ? await Promise.all([
        db().sequelize.query<{ boltId: number; startsAt: Length; endsAt: Length }>(
          `SELECT bolt_id AS "boltId", starts_at AS "startsAt", ends_at AS "endsAt" FROM flaws WHERE bolt_id = ANY($1) ORDER BY starts_at`,
          { bind: [ids], type: QueryTypes.SELECT, transaction },
        ),
        db().sequelize.query<{ boltId: number; length: Length; count: number }>(
          `SELECT bolt_id AS "boltId", length, sum(count)::int AS count FROM reservations
            WHERE bolt_id = ANY($1) AND state = 'held' GROUP BY bolt_id, length ORDER BY length DESC`,
          { bind: [ids], type: QueryTypes.SELECT, transaction },
        ),
      ])
    : [[], []];
  return [...bolts].sort(byShelf).map((bolt, shelfOrder) => ({
    tag: bolt.tag,
    fabric: String(bolt.fabricId),
    lot: bolt.lot,
    usableWidth: bolt.usableWidth,
    cutEdge: bolt.cutEdge,
    endsAt: bolt.putUp,
    flaws: flaws.filter((flaw) => flaw.boltId === bolt.id && flaw.endsAt > bolt.cutEdge),
    reserved: reserved.filter((row) => row.boltId === bolt.id),
    shelfOrder,
  }));
}

/** Shelf places as a person walks them: W2 before W10. */
function byShelf(a: Row, b: Row): number {
  return a.shelf.localeCompare(b.shelf, "en", { numeric: true }) || a.id - b.id;
}
