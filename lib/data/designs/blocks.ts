import { QueryTypes, type Transaction } from "sequelize";
import type { Actor } from "@/lib/core/policy/policy";
import { db } from "@/models/database";
import type { BlockDraftView, BlockVersionView } from "./design-views";

const VERSION = `
  SELECT v.id AS "versionId", b.id AS "blockId", b.slug, b.name, v.version, b.traditional, v.drawing,
         jsonb_build_object('width', v.width, 'height', v.height) AS size, v.roles
    FROM blocks b JOIN block_versions v ON v.block_id = b.id`;
const NEWEST = `v.version = (SELECT max(version) FROM block_versions WHERE block_id = b.id)`;

/** The newest version of every block that is not put away, by name. */
export async function listBlocks(): Promise<BlockVersionView[]> {
  return db().sequelize.query<BlockVersionView>(`${VERSION} WHERE b.archived_at IS NULL AND ${NEWEST} ORDER BY b.name, b.id`, { type: QueryTypes.SELECT });
}

/** A block's version by number, or the newest; null when there is none. */
export async function getBlock(slug: string, version?: number): Promise<BlockVersionView | null> {
  const [row] = await db().sequelize.query<BlockVersionView>(
    `${VERSION} WHERE b.slug = $1 AND ${version === undefined ? NEWEST : "v.version = $2"}`,
    { bind: version === undefined ? [slug] : [slug, version], type: QueryTypes.SELECT },
  );
  return row ?? null;
}

/** Block versions by their ids, in no order; one query. */
export async function getBlockVersions(ids: readonly number[], transaction?: Transaction): Promise<BlockVersionView[]> {
  return db().sequelize.query<BlockVersionView>(`${VERSION} WHERE v.id = ANY($1)`, { bind: [[...ids]], type: QueryTypes.SELECT, transaction });
}

/** The person's own draft of a block, and who else is drafting it. */
export async function getBlockDraft(actor: Actor, blockId: number): Promise<{ own: BlockDraftView | null; others: readonly string[] }> {
  const rows = await db().sequelize.query<BlockDraftView & { personId: number; person: string }>(
    `SELECT d.person_id AS "personId", p.name AS person, d.revision, d.drawing,
            jsonb_build_object('width', d.width, 'height', d.height) AS size, d.roles, d.saved_at AS "savedAt"
       FROM block_drafts d JOIN people p ON p.id = d.person_id WHERE d.block_id = $1 ORDER BY p.name`,
    { bind: [blockId], type: QueryTypes.SELECT },
  );
  const own = rows.find((row) => row.personId === actor.personId);
  return {
    own: own ? { revision: own.revision, drawing: own.drawing, size: own.size, roles: own.roles, savedAt: own.savedAt } : null,
    others: rows.filter((row) => row.personId !== actor.personId).map((row) => row.person),
  };
}
