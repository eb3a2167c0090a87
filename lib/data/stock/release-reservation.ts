import { QueryTypes, type Transaction } from "sequelize";
import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import { answerOnce, type OnceInput } from "@/lib/data/answer-once";
import type { BoltView } from "@/lib/data/bolt-view";
import { recordChange } from "@/lib/data/record-change";
import { bumpRevision } from "@/lib/data/revisions";
import { db } from "@/models/database";
import { loadBolt } from "./load-bolts";
import { lockBolts } from "./lock-bolts";
import { changePromise } from "./promises";
import { settleBolt } from "./settle-bolt";

/**
 * Lets go of everything that a run still has promised, and takes the bolts off its waiting lengths, inside a
 * transaction of the caller's that has locked the run. Lets a run be cancelled or planned again. Returns how many
 * pieces were let go.
 */
export async function releaseRun(transaction: Transaction, actor: Pick<Actor, "personId">, runId: number): Promise<number> {
  const promised = await db().sequelize.query<{ boltId: number; length: number; count: number }>(
    `SELECT bolt_id AS "boltId", length, SUM(count)::int AS count FROM reservations WHERE run_id = $1 AND state <> 'ended' GROUP BY bolt_id, length ORDER BY bolt_id`,
    { bind: [runId], type: QueryTypes.SELECT, transaction },
  );
  const bolts = await lockBolts(transaction, promised.map((each) => each.boltId));
  for (const { boltId, length, count } of promised) await changePromise(transaction, { boltId, runId, length }, -count, actor.personId);
  await db().RunLength.update({ boltId: null }, { where: { runId, state: "to-cut" }, transaction });
  for (const bolt of bolts.values()) {
    await settleBolt(transaction, actor, bolt);
    const here = promised.filter((each) => each.boltId === bolt.id).map(({ length, count }) => ({ length, count }));
    await recordChange(transaction, actor, { subject: "bolt", subjectId: bolt.id, act: "released", details: { runId, demands: here } });
  }
  return promised.reduce((sum, each) => sum + each.count, 0);
}

export interface ReleaseInput extends OnceInput {
  readonly reservationId: number;
  /** How many pieces; all of them when not said. */
  readonly count?: number;
}

type ReleaseFault = "forbidden" | "unknown-reservation" | "too-many" | "request-reused";

/**
 * Lets go of pieces of one promise. A run's lengths lose their bolt with it (the last on the list first) and must be
 * planned again. Faults: `forbidden`, `unknown-reservation`, `too-many` (more pieces than are promised), `request-reused`.
 */
export async function releaseReservation(actor: Actor, input: ReleaseInput): Promise<Result<BoltView, ReleaseFault>> {
  if (!can(actor, "run.start")) return fail("forbidden", "Promises are let go by managers and owners.");
  return answerOnce<BoltView, ReleaseFault>(actor, "bolt.release", input, async (transaction) => {
    const seen = await db().Reservation.findByPk(input.reservationId, { transaction, raw: true });
    if (!seen) return fail("unknown-reservation", "That promise is not in the book.");
    if (seen.runId !== null) await db().Run.findByPk(seen.runId, { lock: transaction.LOCK.NO_KEY_UPDATE, transaction, raw: true });
    const bolt = (await lockBolts(transaction, [seen.boltId])).get(seen.boltId);
    const now = await db().Reservation.findByPk(input.reservationId, { transaction, raw: true });
    if (!bolt || !now || now.state === "ended") return fail("unknown-reservation", "That promise has ended already.");
    const count = input.count ?? now.count;
    if (!(count > 0 && count <= now.count)) return fail("too-many", `${now.count} pieces are promised; ${count} cannot be let go.`, { facts: { promised: now.count } });
    await changePromise(transaction, { boltId: bolt.id, runId: now.runId, length: now.length }, -count, actor.personId);
    if (now.runId !== null) await takeBolts(transaction, now.runId, bolt.id, now.length, count);
    await settleBolt(transaction, actor, bolt);
    await recordChange(transaction, actor, { subject: "bolt", subjectId: bolt.id, act: "released", details: { runId: now.runId, demands: [{ length: now.length, count }] } });
    return ok(await loadBolt(bolt.id, transaction));
  });
}

async function takeBolts(transaction: Transaction, runId: number, boltId: number, length: number, count: number): Promise<void> {
  await db().sequelize.query(
    `UPDATE run_lengths SET bolt_id = NULL
      WHERE id IN (SELECT id FROM run_lengths WHERE run_id = $1 AND bolt_id = $2 AND length = $3 AND state = 'to-cut' ORDER BY sequence DESC, id DESC LIMIT $4)`,
    { bind: [runId, boltId, length, count], transaction },
  );
  bumpRevision("runs", transaction);
}
