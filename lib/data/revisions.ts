import { QueryTypes, type Transaction } from "sequelize";
import { db } from "@/models/database";

/** The channel that `lib/server/events` listens on. */
const CHANNEL = "ellwand";

/**
 * What can change under a live view: "bolts" (any), "bolt:TAG", "runs" (any), "run:CODE", "exceptions", and whatever
 * other rooms name in the same way.
 */
export type Topic = string;

const topicsOf = new WeakMap<Transaction, Set<Topic>>();

/**
 * Says that what `topic` names changes with this transaction. After the commit its revision goes up by one and a
 * hint goes out. Neither happens inside the transaction: a hot topic's row would make all writers wait for each other,
 * and pg_notify in a busy transaction costs a factor of five. A server that dies in between loses the hint, which is
 * why live views poll as well.
 */
export function bumpRevision(topic: Topic, transaction: Transaction): void {
  const known = topicsOf.get(transaction);
  if (known) {
    known.add(topic);
    return;
  }
  const topics = new Set([topic]);
  topicsOf.set(transaction, topics);
  afterCommit(transaction, () => announce(topics));
}

/** Runs `work` once the transaction is committed; its failure is logged and never undoes or fails what was committed. */
export function afterCommit(transaction: Transaction, work: () => Promise<void>): void {
  transaction.afterCommit(async () => {
    try {
      await work();
    } catch (error) {
      console.warn("After a commit:", (error as Error).message);
    }
  });
}

let waiting: { readonly topics: Set<Topic>; readonly sent: Promise<void> } | null = null;
let lastSent: Promise<void> = Promise.resolve();

/** Under load, hints of many commits go out together: one statement at a time, with all that came in meanwhile. */
function announce(topics: ReadonlySet<Topic>): Promise<void> {
  if (!waiting) {
    const batch = new Set<Topic>();
    const sent = lastSent.then(() => {
      waiting = null;
      return send([...batch].sort());
    });
    lastSent = sent.catch(() => undefined);
    waiting = { topics: batch, sent };
  }
  for (const topic of topics) waiting.topics.add(topic);
  return waiting.sent;
}

async function send(topics: readonly Topic[]): Promise<void> {
  await db().sequelize.query(
    `WITH bumped AS (
       INSERT INTO revisions (topic) SELECT unnest($1::text[])
       ON CONFLICT (topic) DO UPDATE SET revision = revisions.revision + 1
       RETURNING topic, revision)
     SELECT pg_notify($2, json_build_object('topic', topic, 'revision', revision)::text) FROM bumped`,
    { bind: [topics, CHANNEL], type: QueryTypes.SELECT },
  );
}

/** The revision of a topic; 0 when nothing it names has changed yet. */
export async function readRevision(topic: Topic): Promise<number> {
  const row = await db().Revision.findByPk(topic, { raw: true });
  return row?.revision ?? 0;
}
