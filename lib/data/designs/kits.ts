import { QueryTypes, type Transaction } from "sequelize";
import { db } from "@/models/database";
import type { ColourwayView, KitVersionView } from "./design-views";

const VERSION = `
  SELECT v.id AS "versionId", k.id AS "kitDesignId", k.slug, k.name, v.version, v.quilt_version_id AS "quiltVersionId",
         v.format, v.allowance, v.rules, v.notions, v.labour_minutes AS "labourMinutes", v.sheet_cost AS "sheetCost",
         v.small_parts AS "smallParts"
    FROM kit_designs k JOIN kit_versions v ON v.kit_design_id = k.id`;
const NEWEST = `v.version = (SELECT max(version) FROM kit_versions WHERE kit_design_id = k.id)`;

const COLOURWAY = `
  SELECT c.id, c.kit_version_id AS "kitVersionId", c.name, c.fabrics, c.price, c.on_sale AS "onSale", c.plan_hash AS "planHash",
         COALESCE((SELECT jsonb_agg(jsonb_build_object('fabricId', l.fabric_id, 'cutLength', l.cut_length, 'plannedWidth', l.planned_width)
                                    ORDER BY l.cut_length DESC, l.fabric_id)
                     FROM colourway_lengths l WHERE l.colourway_id = c.id), '[]') AS lengths
    FROM colourways c`;

export interface KitListing extends KitVersionView {
  readonly colourways: readonly ColourwayView[];
}

/** The newest version of every kit that is not put away, by name, with its colourways. Two queries. */
export async function listKits(): Promise<KitListing[]> {
  const kits = await db().sequelize.query<KitVersionView>(`${VERSION} WHERE k.archived_at IS NULL AND ${NEWEST} ORDER BY k.name, k.id`, { type: QueryTypes.SELECT });
  return withColourways(kits);
}

/** A kit's version by number, or the newest; null when there is none. */
export async function getKit(slug: string, version?: number): Promise<KitListing | null> {
  const kits = await db().sequelize.query<KitVersionView>(`${VERSION} WHERE k.slug = $1 AND ${version === undefined ? NEWEST : "v.version = $2"}`, {
    bind: version === undefined ? [slug] : [slug, version],
    type: QueryTypes.SELECT,
  });
  return (await withColourways(kits))[0] ?? null;
}

/** A colourway with its kit version; null when there is none. */
export async function getColourway(id: number, transaction?: Transaction): Promise<{ kit: KitVersionView; colourway: ColourwayView } | null> {
  const [colourway] = await db().sequelize.query<ColourwayView>(`${COLOURWAY} WHERE c.id = $1`, { bind: [id], type: QueryTypes.SELECT, transaction });
  if (!colourway) return null;
  const [kit] = await db().sequelize.query<KitVersionView>(`${VERSION} WHERE v.id = $1`, { bind: [colourway.kitVersionId], type: QueryTypes.SELECT, transaction });
  return kit ? { kit, colourway } : null;
}

async function withColourways(kits: readonly KitVersionView[]): Promise<KitListing[]> {
  const ids = kits.map((kit) => kit.versionId);
  const colourways = ids.length
    ? await db().sequelize.query<ColourwayView>(`${COLOURWAY} WHERE c.kit_version_id = ANY($1) ORDER BY c.name, c.id`, { bind: [ids], type: QueryTypes.SELECT })
    : [];
  return kits.map((kit) => ({ ...kit, colourways: colourways.filter((each) => each.kitVersionId === kit.versionId) }));
}
