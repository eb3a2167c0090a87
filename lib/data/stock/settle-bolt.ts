import { QueryTypes, type Transaction } from "sequelize";
import { formatLength } from "@/lib/core/measure/format";
import type { Actor } from "@/lib/core/policy/policy";
import type { ShortView } from "@/lib/data/bolt-view";
import { raiseException } from "@/lib/data/raise-exception";
import { bumpRevision } from "@/lib/data/revisions";
import { db } from "@/models/database";
import { clothHolds, howManyFit, type Cloth, type Demand } from "./cloth";
import type { LockedBolt } from "./lock-bolts";
import { readPromises, writePromise, type BoltPromise } from "./promises";
import { readShopRules, type ShopRules } from "./shop-rules";

/**
 * Ends every change of a bolt: asks again what is promised on it and still fits, writes the cached figures, and puts
 * promises that no longer fit on the manager's list. What was held stays held where it can; shelf runs give way first,
 * then the newest. Cloth that was found makes short promises held again.
 *
 * @param bolt under its lock, with the cut edge and put-up as they shall be.
 * @returns what became short by this change.
 */
export async function settleBolt(transaction: Transaction, actor: Pick<Actor, "personId">, bolt: LockedBolt): Promise<ShortView[]> {
  const [rules, promises, flaws] = [await readShopRules(transaction), await readPromises(transaction, bolt.id), await readFlaws(transaction, bolt.id)];
  const cloth: Cloth = { cutEdge: bolt.cutEdge, putUp: bolt.putUp, flaws };
  const kept = keepPromises(cloth, promises, rules.straightening);
  for (const [index, promise] of promises.entries()) {
    const held = kept[index] ?? 0;
    if (held !== promise.held) {
      await writePromise(transaction, { boltId: bolt.id, runId: promise.runId, length: promise.length }, { held, short: promise.held + promise.short - held }, actor.personId);
    }
  }
  const reserved = promises.reduce((sum, promise, index) => sum + promise.length * (kept[index] ?? 0), 0);
  await db().sequelize.query(
    `UPDATE bolts SET cut_edge = $2, put_up = $3, reserved = $4,
            retired_at = CASE WHEN $2::int < $3::int THEN NULL ELSE COALESCE(retired_at, now()) END WHERE id = $1`,
    { bind: [bolt.id, bolt.cutEdge, bolt.putUp, reserved], transaction },
  );
  bumpRevision("bolts", transaction);
  bumpRevision(`bolt:${bolt.tag}`, transaction);
  return tellShort(transaction, bolt, promises, kept, rules);
}

/** How many pieces of each promise fit: first of those held, in order, then of the short ones. */
function keepPromises(cloth: Cloth, promises: readonly BoltPromise[], straightening: number): number[] {
  const heldNow = promises.map((promise) => ({ length: promise.length, count: promise.held }));
  let kept: Demand[] = heldNow;
  if (!clothHolds(cloth, heldNow, straightening)) {
    kept = [];
    for (const demand of heldNow) kept.push({ length: demand.length, count: howManyFit(cloth, kept, demand, straightening) });
  }
  const counts = kept.map((demand) => demand.count);
  for (const [index, promise] of promises.entries()) {
    const missing = promise.held + promise.short - (counts[index] ?? 0);
    if (missing <= 0 || promise.short === 0) continue;
    const all = promises.map((each, at) => ({ length: each.length, count: counts[at] ?? 0 }));
    counts[index] = (counts[index] ?? 0) + howManyFit(cloth, all, { length: promise.length, count: missing }, straightening);
  }
  return counts;
}

async function readFlaws(transaction: Transaction, boltId: number): Promise<{ startsAt: number; endsAt: number }[]> {
  return db().sequelize.query(`SELECT starts_at AS "startsAt", ends_at AS "endsAt" FROM flaws WHERE bolt_id = $1 ORDER BY starts_at, id`, {
    bind: [boltId],
    type: QueryTypes.SELECT,
    transaction,
  });
}

async function tellShort(transaction: Transaction, bolt: LockedBolt, promises: readonly BoltPromise[], kept: readonly number[], { system }: ShopRules): Promise<ShortView[]> {
  // Listed as they gave way: the last to be kept first.
  const short = promises
    .map((promise, index) => ({ runId: promise.runId, runCode: promise.runCode, length: promise.length, count: promise.held - (kept[index] ?? 0) }))
    .filter((each) => each.count > 0)
    .reverse();
  for (const each of short) {
    const whom = each.runCode ? `for run ${each.runCode}` : "put aside";
    const pieces = each.count === 1 ? "1 piece" : `${each.count} pieces`;
    await raiseException(transaction, {
      kind: "reservation-short",
      sentence: `${pieces} of ${formatLength(each.length, system)} ${bolt.fabricName} ${whom} no longer fit on bolt ${bolt.tag}: ${formatLength(bolt.putUp - bolt.cutEdge, system)} are left on it.`,
      boltId: bolt.id,
      runId: each.runId,
      facts: { tag: bolt.tag, length: each.length, count: each.count, left: bolt.putUp - bolt.cutEdge },
    });
    if (each.runCode) bumpRevision(`run:${each.runCode}`, transaction);
  }
  if (short.length > 0) bumpRevision("runs", transaction);
  return short;
}
