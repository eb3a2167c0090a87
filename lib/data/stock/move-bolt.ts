import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import { answerOnce, type OnceInput } from "@/lib/data/answer-once";
import type { BoltView } from "@/lib/data/bolt-view";
import { recordChange } from "@/lib/data/record-change";
import { bumpRevision } from "@/lib/data/revisions";
import { db } from "@/models/database";
import { loadBolt } from "./load-bolts";
import { lockBoltByTag } from "./lock-bolts";

const LONGEST_SHELF = 40;

/** Puts a bolt on another shelf (a name of up to 40 characters; "" for none). Faults: `forbidden`, `unknown-bolt`, `shelf-too-long`, `request-reused`. */
export async function moveBolt(
  actor: Actor,
  input: OnceInput & { readonly tag: string; readonly shelf: string },
): Promise<Result<BoltView, "forbidden" | "unknown-bolt" | "shelf-too-long" | "request-reused">> {
  if (!can(actor, "bolt.move")) return fail("forbidden", "Bolts are moved by the people who handle them.");
  const shelf = input.shelf.trim();
  if (shelf.length > LONGEST_SHELF) return fail("shelf-too-long", `A shelf's name has at most ${LONGEST_SHELF} characters, not ${shelf.length}.`, { fields: { shelf: "Write a shorter name." } });
  return answerOnce(actor, "bolt.move", input, async (transaction) => {
    const bolt = await lockBoltByTag(transaction, input.tag);
    if (!bolt) return fail("unknown-bolt", `No bolt has the tag ${input.tag}. Scan the tag on the bolt's end.`);
    if (bolt.shelf !== shelf) {
      await db().Bolt.update({ shelf }, { where: { id: bolt.id }, transaction });
      await recordChange(transaction, actor, { subject: "bolt", subjectId: bolt.id, act: "moved", details: { from: bolt.shelf, to: shelf } });
      bumpRevision("bolts", transaction);
      bumpRevision(`bolt:${bolt.tag}`, transaction);
    }
    return ok(await loadBolt(bolt.id, transaction));
  });
}
