import { QueryTypes, type Transaction } from "sequelize";
import type { BlockSize } from "@/lib/core/piece/drawing";
import type { QuiltDesign } from "@/lib/core/piece/quilt-design";
import type { StoredQuilt } from "@/lib/input/quilt";
import { db } from "@/models/database";
import { getBlockVersions } from "./blocks";
import type { QuiltVersionView } from "./design-views";

type Row = Omit<QuiltVersionView, "design">;

const VERSION = `
  SELECT v.id AS "versionId", q.id AS "quiltId", q.slug, q.name, v.version, v.design AS stored,
         jsonb_build_object('width', v.width, 'height', v.height) AS size
    FROM quilts q JOIN quilt_versions v ON v.quilt_id = q.id`;
const NEWEST = `v.version = (SELECT max(version) FROM quilt_versions WHERE quilt_id = q.id)`;

/** The newest version of every quilt that is not put away, by name, with the drawings of its blocks. Two queries. */
export async function listQuilts(): Promise<QuiltVersionView[]> {
  const rows = await db().sequelize.query<Row>(`${VERSION} WHERE q.archived_at IS NULL AND ${NEWEST} ORDER BY q.name, q.id`, { type: QueryTypes.SELECT });
  return withDesigns(rows);
}

/** A quilt's version by number, or the newest; null when there is none. */
export async function getQuilt(slug: string, version?: number): Promise<QuiltVersionView | null> {
  const rows = await db().sequelize.query<Row>(`${VERSION} WHERE q.slug = $1 AND ${version === undefined ? NEWEST : "v.version = $2"}`, {
    bind: version === undefined ? [slug] : [slug, version],
    type: QueryTypes.SELECT,
  });
  return (await withDesigns(rows))[0] ?? null;
}

export async function getQuiltVersion(versionId: number, transaction?: Transaction): Promise<QuiltVersionView | null> {
  const rows = await db().sequelize.query<Row>(`${VERSION} WHERE v.id = $1`, { bind: [versionId], type: QueryTypes.SELECT, transaction });
  return (await withDesigns(rows, transaction))[0] ?? null;
}

/** A stored quilt with the drawings of its block versions. Null when a version that it names does not exist. */
export async function resolveQuilt(stored: StoredQuilt): Promise<QuiltDesign | null> {
  const versions = new Map((await getBlockVersions(stored.blocks.map((block) => block.blockVersionId))).map((each) => [each.versionId, each]));
  return designOf(stored, (id) => versions.get(id));
}

async function withDesigns(rows: readonly Row[], transaction?: Transaction): Promise<QuiltVersionView[]> {
  const ids = [...new Set(rows.flatMap((row) => row.stored.blocks.map((block) => block.blockVersionId)))];
  const versions = new Map((ids.length ? await getBlockVersions(ids, transaction) : []).map((each) => [each.versionId, each]));
  return rows.flatMap((row) => {
    const design = designOf(row.stored, (id) => versions.get(id));
    return design ? [{ ...row, design }] : [];
  });
}

function designOf(
  stored: StoredQuilt,
  find: (id: number) => { name: string; drawing: QuiltDesign["blocks"][number]["drawing"]; size: BlockSize } | undefined,
): QuiltDesign | null {
  const blocks = stored.blocks.map(({ blockVersionId, roles }) => {
    const block = find(blockVersionId);
    return block && { name: block.name, drawing: block.drawing, size: block.size, roles };
  });
  return blocks.every((block) => block !== undefined) ? { ...stored, blocks } : null;
}
