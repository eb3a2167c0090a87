import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import { answerOnce } from "@/lib/data/answer-once";
import { recordChange } from "@/lib/data/record-change";
import { bumpRevision } from "@/lib/data/revisions";
import { releaseRun } from "@/lib/data/stock/release-reservation";
import { db } from "@/models/database";

/**
 * Cancels a run that nobody has begun to cut, and gives its cloth back. Faults: `unknown-run`, `run-begun` (its cuts
 * are undone at the table first), `run-over`.
 */
export async function cancelRun(actor: Actor, input: { requestId: string; code: string; reason: string }): Promise<Result<{ code: string }>> {
  if (!can(actor, "run.cancel")) return fail("forbidden", "Runs are cancelled by managers and owners.");
  return answerOnce(actor, "run.cancel", input, async (transaction) => {
    const run = await db().Run.findOne({ where: { code: input.code }, lock: transaction.LOCK.NO_KEY_UPDATE, transaction });
    if (!run) return fail("unknown-run", `No run has the code ${input.code}.`);
    if (run.state === "cancelled" || run.state === "packed") return fail("run-over", `Run ${run.code} is ${run.state} already.`);
    const cut = await db().RunLength.count({ where: { runId: run.id, state: "cut" }, transaction });
    if (cut > 0) return fail("run-begun", `${cut} lengths of run ${run.code} are cut. Undo them at the table first, or finish the run.`);
    await releaseRun(transaction, actor, run.id);
    await db().RunLength.update({ state: "cancelled" }, { where: { runId: run.id, state: ["to-cut", "short"] }, transaction });
    await db().RunKit.update({ state: "cancelled" }, { where: { runId: run.id }, transaction });
    await run.update({ state: "cancelled" }, { transaction });
    await recordChange(transaction, actor, { subject: "run", subjectId: run.id, act: "cancelled", details: { reason: input.reason } });
    bumpRevision("runs", transaction);
    bumpRevision("bolts", transaction);
    bumpRevision(`run:${run.code}`, transaction);
    return ok({ code: run.code });
  });
}
