import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import { answerOnce, type OnceInput } from "@/lib/data/answer-once";
import { recordChange } from "@/lib/data/record-change";
import { bumpRevision } from "@/lib/data/revisions";
import { db } from "@/models/database";

export interface SettleInput extends OnceInput {
  readonly exceptionId: number;
  /** What was done about it, 1 to 400 characters. */
  readonly settlement: string;
}

type SettleFault = "forbidden" | "unknown-exception" | "already-settled" | "settlement-missing" | "request-reused";

/** Ticks an exception off with what was done about it. Faults: `forbidden`, `unknown-exception`, `already-settled`, `settlement-missing`, `request-reused`. */
export async function settleException(actor: Actor, input: SettleInput): Promise<Result<{ readonly id: number }, SettleFault>> {
  if (!can(actor, "exception.settle")) return fail("forbidden", "These are settled by managers and owners.");
  const settlement = input.settlement.trim().slice(0, 400);
  if (settlement === "") return fail("settlement-missing", "Say what was done about it.", { fields: { settlement: "Write what was done." } });
  return answerOnce<{ readonly id: number }, SettleFault>(actor, "exception.settle", input, async (transaction) => {
    const exception = await db().Exception.findByPk(input.exceptionId, { lock: transaction.LOCK.UPDATE, transaction });
    if (!exception) return fail("unknown-exception", "That entry is not on the list.");
    if (exception.settledAt !== null) return fail("already-settled", `Somebody settled this already: ${exception.settlement ?? "nothing was written"}`);
    await exception.update({ settledAt: new Date(), settledBy: actor.personId, settlement }, { transaction });
    await recordChange(transaction, actor, { subject: "exception", subjectId: exception.id, act: "settled", details: { settlement } });
    bumpRevision("exceptions", transaction);
    return ok({ id: exception.id });
  });
}
