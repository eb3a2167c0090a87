import { QueryTypes, type Transaction } from "sequelize";
import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import { answerOnce } from "@/lib/data/answer-once";
import { recordChange } from "@/lib/data/record-change";
import { bumpRevision } from "@/lib/data/revisions";
import { db } from "@/models/database";

export interface TillView {
  readonly id: number;
  readonly name: string;
  /** The open session, or null while the till is closed. */
  readonly session: { readonly id: number; readonly openedBy: string; readonly openedAt: string; readonly sales: number } | null;
}

type TillFault = "forbidden" | "unknown-till" | "already-open" | "not-open" | "request-reused";

export async function listTills(): Promise<TillView[]> {
  return db().sequelize.query<TillView>(
    `SELECT t.id, t.name, CASE WHEN s.id IS NULL THEN NULL ELSE jsonb_build_object('id', s.id, 'openedBy', p.name, 'openedAt', s.opened_at,
            'sales', (SELECT count(*) FROM sales x WHERE x.till_session_id = s.id)) END AS session
       FROM tills t LEFT JOIN till_sessions s ON s.till_id = t.id AND s.closed_at IS NULL LEFT JOIN people p ON p.id = s.opened_by
      ORDER BY t.name`,
    { type: QueryTypes.SELECT },
  );
}

/** Opens a till with the float that lies in its drawer (minor units). Faults: `already-open` names who has it. */
export async function openTill(actor: Actor, input: { requestId: string; tillId: number; float: number }): Promise<Result<{ sessionId: number }, TillFault>> {
  if (!can(actor, "till.open")) return forbidden();
  return answerOnce(actor, "till.open", input, async (transaction) => {
    const till = await db().Till.findByPk(input.tillId, { transaction, lock: transaction.LOCK.NO_KEY_UPDATE });
    if (!till) return fail("unknown-till", "There is no such till.");
    if (await openSession(transaction, till.id)) return fail("already-open", `${till.name} is open already. Close it first, or use another till.`);
    const session = await db().TillSession.create({ tillId: till.id, openedBy: actor.personId }, { transaction });
    if (input.float > 0) {
      await db().CashMove.create(
        { tillSessionId: session.id, amount: input.float, kind: "float", reason: "Float at opening", personId: actor.personId, requestId: input.requestId },
        { transaction },
      );
    }
    await recordChange(transaction, actor, { subject: "till", subjectId: till.id, act: "opened", details: { float: input.float } });
    bumpRevision("tills", transaction);
    return ok({ sessionId: session.id });
  });
}

/** Cash put in or taken out with a reason; positive goes into the drawer (minor units). */
export async function moveCash(actor: Actor, input: { requestId: string; sessionId: number; amount: number; reason: string }): Promise<Result<{ sessionId: number }, TillFault>> {
  if (!can(actor, "till.open")) return forbidden();
  return answerOnce(actor, "till.cash", input, async (transaction) => {
    const session = await lockOpen(transaction, input.sessionId);
    if (!session) return notOpen();
    await db().CashMove.create(
      { tillSessionId: session.id, amount: input.amount, kind: input.amount > 0 ? "pay-in" : "pay-out", reason: input.reason, personId: actor.personId, requestId: input.requestId },
      { transaction },
    );
    return ok({ sessionId: session.id });
  });
}

/**
 * Closes a till on a blind count (minor units): what should be there is worked out only now, and the difference is
 * written down, not corrected. Only those who may see it get the expected sum back.
 */
export async function closeTill(
  actor: Actor,
  input: { requestId: string; sessionId: number; counted: number },
): Promise<Result<{ counted: number; expected: number | null; difference: number | null }, TillFault>> {
  if (!can(actor, "till.open")) return forbidden();
  return answerOnce(actor, "till.close", input, async (transaction) => {
    const session = await lockOpen(transaction, input.sessionId);
    if (!session) return notOpen();
    const expected = Number((await db().CashMove.sum("amount", { where: { tillSessionId: session.id }, transaction })) ?? 0);
    await session.update({ closedBy: actor.personId, closedAt: new Date(), counted: input.counted, expected }, { transaction });
    await recordChange(transaction, actor, { subject: "till", subjectId: session.tillId, act: "closed", details: { counted: input.counted, expected } });
    bumpRevision("tills", transaction);
    const sees = can(actor, "till.see-expected");
    return ok({ counted: input.counted, expected: sees ? expected : null, difference: sees ? input.counted - expected : null });
  });
}

async function openSession(transaction: Transaction, tillId: number) {
  return db().TillSession.findOne({ where: { tillId, closedAt: null }, transaction });
}

async function lockOpen(transaction: Transaction, id: number) {
  return db().TillSession.findOne({ where: { id, closedAt: null }, transaction, lock: transaction.LOCK.NO_KEY_UPDATE });
}

function notOpen() {
  return fail("not-open", "This till has been closed. Open it again with a counted float.");
}

function forbidden() {
  return fail("forbidden", "Tills are worked by the counter, managers and owners.");
}
