import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import { answerOnce, type OnceInput } from "@/lib/data/answer-once";
import type { BoltChange } from "@/lib/data/bolt-view";
import { recordChange } from "@/lib/data/record-change";
import { db } from "@/models/database";
import { loadBolt } from "./load-bolts";
import { lockBoltByTag } from "./lock-bolts";
import { settleBolt } from "./settle-bolt";

/** Takes back a flaw that is none; short promises that fit again are held again. Faults: `forbidden`, `unknown-bolt`, `unknown-flaw`, `request-reused`. */
export async function removeFlaw(
  actor: Actor,
  input: OnceInput & { readonly tag: string; readonly flawId: number },
): Promise<Result<BoltChange, "forbidden" | "unknown-bolt" | "unknown-flaw" | "request-reused">> {
  if (!can(actor, "bolt.flaw")) return fail("forbidden", "Flaws are noted by the people who handle bolts.");
  return answerOnce(actor, "bolt.remove-flaw", input, async (transaction) => {
    const bolt = await lockBoltByTag(transaction, input.tag);
    if (!bolt) return fail("unknown-bolt", `No bolt has the tag ${input.tag}. Scan the tag on the bolt's end.`);
    const flaw = await db().Flaw.findOne({ where: { id: input.flawId, boltId: bolt.id }, transaction });
    if (!flaw) return fail("unknown-flaw", `Bolt ${bolt.tag} has no such flaw; it may have been removed already.`);
    await flaw.destroy({ transaction });
    const short = await settleBolt(transaction, actor, bolt);
    await recordChange(transaction, actor, { subject: "bolt", subjectId: bolt.id, act: "flaw removed", details: { startsAt: flaw.startsAt, endsAt: flaw.endsAt, note: flaw.note } });
    return ok({ short, bolt: await loadBolt(bolt.id, transaction) });
  });
}
