import { QueryTypes, type Transaction } from "sequelize";
import type { KitPlan } from "@/lib/core/kit/kit-plan";
import type { ColourwayView, KitVersionView, QuiltVersionView } from "@/lib/data/designs/design-views";
import { getFabrics, type FabricView } from "@/lib/data/designs/fabrics";
import { getColourway } from "@/lib/data/designs/kits";
import { getQuiltVersion } from "@/lib/data/designs/quilts";
import { requireShop, type ShopView } from "@/lib/data/shop";
import { db } from "@/models/database";
import { hatchOfFabric, type InkOfRole } from "./quilt-pictures";

/** All that a kit's papers are written from. */
export interface KitFacts {
  readonly kit: KitVersionView;
  readonly colourway: ColourwayView;
  readonly quilt: QuiltVersionView;
  /** As planned when the colourway was made: the papers must agree with the lengths in the bag. */
  readonly plan: KitPlan;
  /** Longest length first, as the colourway lists them. */
  readonly fabrics: readonly FabricView[];
  readonly notions: readonly { readonly id: number; readonly name: string; readonly count: number }[];
  readonly shop: ShopView;
  readonly ink: InkOfRole;
}

/** Reads them within the transaction where there is one. Null when no colourway has the id; throws where a kept version is torn. */
export async function readKitFacts(colourwayId: number, transaction?: Transaction): Promise<KitFacts | null> {
  const found = await getColourway(colourwayId, transaction);
  if (!found) return null;
  const { kit, colourway } = found;
  const quilt = await getQuiltVersion(kit.quiltVersionId, transaction);
  if (!quilt) throw new Error(`Kit version ${kit.versionId} names a quilt version that is not there.`);
  const plan = await readPlan(colourwayId, transaction);
  const order = [...new Set([...colourway.lengths.map((each) => each.fabricId), ...Object.values(colourway.fabrics)])];
  const byId = new Map((await getFabrics(order, transaction)).map((fabric) => [fabric.id, fabric]));
  const fabrics = order.flatMap((id) => byId.get(id) ?? []);
  const ink: InkOfRole = (role) => {
    const index = fabrics.findIndex((fabric) => fabric.id === colourway.fabrics[role]);
    return { colour: fabrics[index]?.colour ?? "#ffffff", hatch: index < 0 ? "blank" : hatchOfFabric(index) };
  };
  return { kit, colourway, quilt, plan, fabrics, notions: await readNotions(kit, transaction), shop: await requireShop(transaction), ink };
}

async function readPlan(colourwayId: number, transaction?: Transaction): Promise<KitPlan> {
  const [row] = await db().sequelize.query<{ result: KitPlan }>(
    `SELECT p.result FROM colourways c JOIN plans p ON p.input_hash = c.plan_hash AND p.core_version = c.core_version WHERE c.id = $1`,
    { bind: [colourwayId], type: QueryTypes.SELECT, transaction },
  );
  if (!row) throw new Error(`Colourway ${colourwayId} has no kept plan.`);
  return row.result;
}

async function readNotions(kit: KitVersionView, transaction?: Transaction): Promise<KitFacts["notions"]> {
  if (kit.notions.length === 0) return [];
  const rows = await db().sequelize.query<{ id: number; name: string }>(`SELECT id, name FROM notions WHERE id = ANY($1) ORDER BY name, id`, {
    bind: [kit.notions.map((each) => each.notionId)],
    type: QueryTypes.SELECT,
    transaction,
  });
  return rows.map((row) => ({ ...row, count: kit.notions.find((each) => each.notionId === row.id)?.count ?? 0 }));
}
