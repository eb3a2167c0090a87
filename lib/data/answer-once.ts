import { createHash } from "node:crypto";
import { QueryTypes, type Transaction } from "sequelize";
import type { Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import { canonicalJson } from "@/lib/data/canonical-json";
import { db } from "@/models/database";
import { inTransaction } from "./in-transaction";

/** What every request that is answered once carries: a UUID that the client makes before it sends. */
export interface OnceInput {
  readonly requestId: string;
}

/**
 * Answers a request once. The request's row is inserted first, so that a repeat that runs at the same time waits for
 * this one and then gets the stored answer; later repeats get it at once. Only successes are stored: a failure rolls
 * everything back, the request's row too, and the same request may be tried again when things have changed.
 *
 * `work` runs at READ COMMITTED, is run again after a deadlock (see `inTransaction`), and returns plain JSON: what a
 * repeat gets has been through JSON, so dates are text.
 *
 * @param kind names the use case; the same id for another kind is refused.
 * @returns `request-reused` when the id was answered with other content or to another person.
 */
export async function answerOnce<Value, Code extends string>(
  actor: Pick<Actor, "personId">,
  kind: string,
  { requestId, ...content }: OnceInput,
  work: (transaction: Transaction) => Promise<Result<Value, Code>>,
): Promise<Result<Value, Code | "request-reused">> {
  const hash = contentHash(kind, content);
  return inTransaction<Value, Code | "request-reused">(async (transaction) => {
    const inserted = await db().sequelize.query<{ id: string }>(
      `INSERT INTO requests (id, actor_id, kind, content_hash) VALUES ($1, $2, $3, $4) ON CONFLICT (id) DO NOTHING RETURNING id`,
      { bind: [requestId, actor.personId, kind, hash], type: QueryTypes.SELECT, transaction },
    );
    if (inserted.length === 0) return storedAnswer<Value>(transaction, requestId, actor.personId, hash);
    const result = await work(transaction);
    if (!result.ok) return result;
    await db().sequelize.query(`UPDATE requests SET result = $2 WHERE id = $1`, {
      bind: [requestId, JSON.stringify(result.value ?? null)],
      transaction,
    });
    return result;
  });
}

async function storedAnswer<Value>(transaction: Transaction, id: string, personId: number, hash: string): Promise<Result<Value, "request-reused">> {
  const [row] = await db().sequelize.query<{ actorId: number; hash: string; result: Value }>(
    `SELECT actor_id AS "actorId", content_hash AS hash, result FROM requests WHERE id = $1`,
    { bind: [id], type: QueryTypes.SELECT, transaction },
  );
  if (row && row.actorId === personId && row.hash === hash) return ok(row.result);
  return fail("request-reused", "This request's number was already used for something else, so nothing was done. Reload the page and try again.");
}

function contentHash(kind: string, content: object): string {
  return createHash("sha256").update(canonicalJson({ kind, content })).digest("hex");
}
