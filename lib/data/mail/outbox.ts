import { QueryTypes, type Transaction } from "sequelize";
import { db } from "@/models/database";

export interface Mail {
  readonly kind: string;
  readonly to: string;
  readonly subject: string;
  readonly body: string;
}

export interface WaitingMail extends Mail {
  readonly id: number;
  readonly attempts: number;
}

const MOST_ATTEMPTS = 8;

/** Writes a letter in the transaction that causes it; it is sent after the commit, at least once. */
export async function queueMail(transaction: Transaction, mail: Mail): Promise<void> {
  await db().OutboxMessage.create({ kind: mail.kind, toAddress: mail.to, subject: mail.subject, body: mail.body }, { transaction });
}

/**
 * Takes one letter that is due and hands it to `send`, holding its row so that no other server sends it too. Returns
 * false when none was due. A failure is tried again after 1, 2, 4 … minutes, eight times at most.
 */
export async function sendNextMail(send: (mail: WaitingMail) => Promise<void>): Promise<boolean> {
  return db().sequelize.transaction(async (transaction) => {
    const [mail] = await db().sequelize.query<WaitingMail>(
      `SELECT id, kind, to_address AS "to", subject, body, attempts FROM outbox_messages
        WHERE state = 'waiting' AND next_attempt_at <= now() ORDER BY next_attempt_at, id LIMIT 1 FOR UPDATE SKIP LOCKED`,
      { type: QueryTypes.SELECT, transaction },
    );
    if (!mail) return false;
    const attempts = mail.attempts + 1;
    try {
      await send(mail);
      await db().OutboxMessage.update({ state: "sent", attempts, sentAt: new Date(), error: null }, { where: { id: mail.id }, transaction });
    } catch (error) {
      const nextAttemptAt = new Date(Date.now() + 60_000 * 2 ** mail.attempts);
      const state = attempts >= MOST_ATTEMPTS ? "failed" : "waiting";
      await db().OutboxMessage.update({ state, attempts, nextAttemptAt, error: String((error as Error).message).slice(0, 500) }, { where: { id: mail.id }, transaction });
    }
    return true;
  });
}
