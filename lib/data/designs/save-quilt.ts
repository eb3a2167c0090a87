import { CORE_VERSION } from "@/lib/core/core-version";
import { layQuilt } from "@/lib/core/patchwork/quilt-layout";
import { can, type Actor } from "@/lib/core/policy/policy";
import { length } from "@/lib/core/measure/length";
import { fail, ok, type Result } from "@/lib/core/result";
import { answerOnce } from "@/lib/data/answer-once";
import { recordChange } from "@/lib/data/record-change";
import type { StoredQuilt } from "@/lib/input/quilt";
import { db } from "@/models/database";
import { freeSlug } from "./free-slug";
import { resolveQuilt } from "./quilts";

type SaveFault = "forbidden" | "unknown-block" | "unknown-quilt" | "bad-quilt" | "request-reused";

export interface KeepQuiltInput {
  readonly requestId: string;
  /** Null starts a new quilt. */
  readonly quiltId: number | null;
  readonly name: string;
  readonly quilt: StoredQuilt;
}

/** Keeps a quilt's next version. Faults: `bad-quilt` with the sentence of what does not fit together. */
export async function keepQuiltVersion(actor: Actor, input: KeepQuiltInput): Promise<Result<{ quiltId: number; slug: string; versionId: number; version: number }, SaveFault>> {
  if (!can(actor, "quilt.save")) return fail("forbidden", "Quilts are laid out by designers, managers and owners.");
  const design = await resolveQuilt(input.quilt);
  if (!design) return fail("unknown-block", "A block version that the quilt uses does not exist. Choose its block again.");
  const laid = layQuilt(design);
  if (!laid.ok) return fail("bad-quilt", laid.fault.message);
  const size = { width: length(Math.round(laid.value.width)), height: length(Math.round(laid.value.height)) };
  return answerOnce(actor, "quilt.keep", input, async (transaction) => {
    const quilt =
      input.quiltId === null
        ? await db().Quilt.create({ slug: await freeSlug(transaction, "quilts", input.name), name: input.name, madeBy: actor.personId }, { transaction })
        : await db().Quilt.findByPk(input.quiltId, { transaction, lock: transaction.LOCK.NO_KEY_UPDATE });
    if (!quilt) return fail("unknown-quilt", "There is no such quilt; it may have been put away.");
    if (quilt.name !== input.name) await quilt.update({ name: input.name }, { transaction });
    const version = 1 + ((await db().QuiltVersion.max<number, InstanceType<ReturnType<typeof db>["QuiltVersion"]>>("version", { where: { quiltId: quilt.id }, transaction })) ?? 0);
    const row = await db().QuiltVersion.create(
      {
        quiltId: quilt.id,
        version,
        name: input.name,
        design: input.quilt,
        blockVersionIds: input.quilt.blocks.map((block) => block.blockVersionId),
        width: size.width,
        height: size.height,
        coreVersion: CORE_VERSION,
        madeBy: actor.personId,
      },
      { transaction },
    );
    await recordChange(transaction, actor, { subject: "quilt", subjectId: quilt.id, act: "version kept", details: { version } });
    return ok({ quiltId: quilt.id, slug: quilt.slug, versionId: row.id, version });
  });
}
