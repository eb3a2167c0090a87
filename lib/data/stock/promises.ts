import { QueryTypes, type Transaction } from "sequelize";
import { db } from "@/models/database";

/**
 * What is promised on a bolt: so many pieces of a length for a run (or, without a run, put aside for a person). Of one
 * promise there is at most one held and one short row; all of it is read and written under the bolt's lock.
 */
export interface BoltPromise {
  readonly runId: number | null;
  readonly runCode: string | null;
  readonly purpose: "shelf" | "class" | "orders" | null;
  readonly length: number;
  /** Pieces that fit. */
  readonly held: number;
  /** Pieces that no longer do. */
  readonly short: number;
}

/** The promises on a bolt, those that are kept longest first: orders and classes before shelf runs, older before newer. */
export async function readPromises(transaction: Transaction, boltId: number): Promise<BoltPromise[]> {
  return db().sequelize.query<BoltPromise>(
    `SELECT v.run_id AS "runId", r.code AS "runCode", r.purpose, v.length,
            COALESCE(SUM(v.count) FILTER (WHERE v.state = 'held'), 0)::int AS held,
            COALESCE(SUM(v.count) FILTER (WHERE v.state = 'short'), 0)::int AS short
       FROM reservations v LEFT JOIN runs r ON r.id = v.run_id
      WHERE v.bolt_id = $1 AND v.state <> 'ended'
      GROUP BY v.run_id, r.code, r.purpose, v.length
      ORDER BY (r.purpose IS NOT DISTINCT FROM 'shelf'), MIN(v.made_at), MIN(v.id)`,
    { bind: [boltId], type: QueryTypes.SELECT, transaction },
  );
}

export interface PromiseKey {
  readonly boltId: number;
  readonly runId: number | null;
  /** Of one piece, in 1/160 mm. */
  readonly length: number;
}

/** Writes how many pieces of a promise are held and short from now on. A promise that comes back keeps its place in the queue. */
export async function writePromise(transaction: Transaction, key: PromiseKey, counts: { held: number; short: number }, personId: number | null): Promise<void> {
  for (const state of ["held", "short"] as const) {
    const count = counts[state];
    const [rows] = await db().sequelize.query(
      `UPDATE reservations v
          SET count = CASE WHEN v.id = first.id THEN $4::int ELSE 0 END,
              state = CASE WHEN v.id = first.id AND $4::int > 0 THEN v.state ELSE 'ended' END
         FROM (SELECT MIN(id) AS id FROM reservations
                WHERE bolt_id = $1 AND run_id IS NOT DISTINCT FROM $2 AND length = $3 AND state = $5) first
        WHERE v.bolt_id = $1 AND v.run_id IS NOT DISTINCT FROM $2 AND v.length = $3 AND v.state = $5 RETURNING v.id`,
      { bind: [key.boltId, key.runId, key.length, count, state], transaction },
    );
    if (rows.length > 0 || count === 0) continue;
    await db().sequelize.query(
      `INSERT INTO reservations (bolt_id, run_id, length, count, state, made_by, made_at)
       SELECT $1::int, $2::int, $3::int, $4::int, $5::text, $6::int, COALESCE(MIN(made_at), now()) FROM reservations
        WHERE bolt_id = $1 AND run_id = $2 AND length = $3`,
      { bind: [key.boltId, key.runId, key.length, count, state, personId], transaction },
    );
  }
}

/** Adds pieces (or, below zero, takes pieces away: short ones last) without asking whether they fit; `settleBolt` does. */
export async function changePromise(transaction: Transaction, key: PromiseKey, pieces: number, personId: number | null): Promise<void> {
  const [now] = await db().sequelize.query<{ held: number; short: number }>(
    `SELECT COALESCE(SUM(count) FILTER (WHERE state = 'held'), 0)::int AS held, COALESCE(SUM(count) FILTER (WHERE state = 'short'), 0)::int AS short
       FROM reservations WHERE bolt_id = $1 AND run_id IS NOT DISTINCT FROM $2 AND length = $3 AND state <> 'ended'`,
    { bind: [key.boltId, key.runId, key.length], type: QueryTypes.SELECT, transaction },
  );
  const { held, short } = now ?? { held: 0, short: 0 };
  if (pieces >= 0) return writePromise(transaction, key, { held: held + pieces, short }, personId);
  const fromHeld = Math.min(held, -pieces);
  const fromShort = Math.min(short, -pieces - fromHeld);
  return writePromise(transaction, key, { held: held - fromHeld, short: short - fromShort }, personId);
}
