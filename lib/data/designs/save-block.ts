import { QueryTypes, type Transaction } from "sequelize";
import { CORE_VERSION } from "@/lib/core/core-version";
import { analyseBlock } from "@/lib/core/patchwork/analyse-block";
import type { BlockSize, Drawing, Role } from "@/lib/core/piece/drawing";
import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import { answerOnce } from "@/lib/data/answer-once";
import { recordChange } from "@/lib/data/record-change";
import { db } from "@/models/database";
import { freeSlug } from "./free-slug";

interface Content {
  readonly drawing: Drawing;
  readonly size: BlockSize;
  readonly roles: readonly Role[];
}

type SaveFault = "forbidden" | "unknown-block" | "draft-moved-on" | "bad-drawing" | "open-seams" | "no-role" | "request-reused";

/**
 * Keeps the person's draft. `revision` is the one the page started from: when another tab has saved since, the draft
 * is not overwritten and `draft-moved-on` is answered.
 */
export async function saveBlockDraft(actor: Actor, input: Content & { blockId: number; revision: number; basedOn: number }): Promise<Result<{ revision: number }, SaveFault>> {
  if (!can(actor, "block.save")) return forbidden();
  const [row] = await db().sequelize.query<{ revision: number }>(
    `INSERT INTO block_drafts AS d (block_id, person_id, revision, drawing, width, height, roles, based_on)
     SELECT b.id, $2, 1, $4::jsonb, $5, $6, $7::jsonb, $8 FROM blocks b WHERE b.id = $1
     ON CONFLICT (block_id, person_id) DO UPDATE
        SET revision = d.revision + 1, drawing = excluded.drawing, width = excluded.width, height = excluded.height,
            roles = excluded.roles, based_on = excluded.based_on, saved_at = now()
      WHERE d.revision = $3
     RETURNING revision`,
    {
      bind: [input.blockId, actor.personId, input.revision, JSON.stringify(input.drawing), input.size.width, input.size.height, JSON.stringify(input.roles), input.basedOn],
      type: QueryTypes.SELECT,
    },
  );
  if (row) return ok({ revision: row.revision });
  return (await db().Block.count({ where: { id: input.blockId } }))
    ? fail("draft-moved-on", "This block was changed in another window since. Load the page again to see that draft, or keep yours as a new version.")
    : unknownBlock();
}

/** Keeps a drawing as the block's next version, lettered afresh, and ends the person's draft of it. Faults name what is wrong in the drawing. */
export async function keepBlockVersion(actor: Actor, input: Content & { requestId: string; blockId: number }): Promise<Result<{ versionId: number; version: number }, SaveFault>> {
  if (!can(actor, "block.save")) return forbidden();
  const fault = faultOf(input);
  if (fault) return fault;
  return answerOnce(actor, "block.keep", input, async (transaction) => {
    const block = await db().Block.findByPk(input.blockId, { transaction, lock: transaction.LOCK.NO_KEY_UPDATE });
    if (!block) return unknownBlock();
    const version = await insertVersion(transaction, actor, block.id, block.name, input);
    await db().BlockDraft.destroy({ where: { blockId: block.id, personId: actor.personId }, transaction });
    return ok(version);
  });
}

/** Starts a block of one's own: empty, or from another block's drawing. Returns its slug. */
export async function startBlock(actor: Actor, input: Content & { requestId: string; name: string }): Promise<Result<{ blockId: number; slug: string }, SaveFault>> {
  if (!can(actor, "block.save")) return forbidden();
  const fault = faultOf(input);
  if (fault) return fault;
  return answerOnce(actor, "block.start", input, async (transaction) => {
    const slug = await freeSlug(transaction, "blocks", input.name);
    const block = await db().Block.create({ slug, name: input.name, madeBy: actor.personId }, { transaction });
    await insertVersion(transaction, actor, block.id, block.name, input);
    return ok({ blockId: block.id, slug });
  });
}

async function insertVersion(transaction: Transaction, actor: Actor, blockId: number, name: string, content: Content) {
  const last = await db().BlockVersion.max<number, InstanceType<ReturnType<typeof db>["BlockVersion"]>>("version", { where: { blockId }, transaction });
  const version = (last ?? 0) + 1;
  const row = await db().BlockVersion.create(
    {
      blockId,
      version,
      name,
      drawing: content.drawing,
      width: content.size.width,
      height: content.size.height,
      roles: content.roles,
      coreVersion: CORE_VERSION,
      madeBy: actor.personId,
    },
    { transaction },
  );
  await recordChange(transaction, actor, { subject: "block", subjectId: blockId, act: "version kept", details: { version } });
  return { versionId: row.id, version };
}

/** A version must be sewable: no open seam ends, every patch painted with a role that is listed. */
function faultOf({ drawing, size, roles }: Content) {
  const analysis = analyseBlock(drawing, size);
  if (!analysis.ok) return fail("bad-drawing", analysis.fault.message);
  const open = analysis.value.complaints.find((complaint) => complaint.code === "open-seam" || complaint.code === "island");
  if (open) return fail("open-seams", open.sentence);
  const known = new Set(roles.map((role) => role.id));
  const bare = analysis.value.patches.find((patch) => patch.role === null || !known.has(patch.role));
  if (bare) return fail("no-role", `Patch ${bare.letter} has no fabric yet. Lay a fabric on every patch before keeping the version.`);
  return null;
}

function forbidden() {
  return fail("forbidden", "Blocks are drawn by designers, managers and owners.");
}

function unknownBlock() {
  return fail("unknown-block", "There is no such block; it may have been put away.");
}
