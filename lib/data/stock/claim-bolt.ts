import { QueryTypes, type Transaction } from "sequelize";
import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import type { BoltView, ClaimView } from "@/lib/data/bolt-view";
import { inTransaction } from "@/lib/data/in-transaction";
import { bumpRevision } from "@/lib/data/revisions";
import { db } from "@/models/database";
import { loadBolt } from "./load-bolts";
import { lockBoltByTag, type LockedBolt } from "./lock-bolts";

export interface ClaimInput {
  readonly tag: string;
  /** The table or till that has the bolt in hand, up to 60 characters. */
  readonly station: string;
  readonly runId?: number | null;
  /** Take it over from another station. */
  readonly takeOver?: boolean;
}

/** A claim of yesterday binds nobody. */
const CLAIM_HOURS = 12;

/**
 * Claims a bolt for a station, as its scan does; claiming again is nothing new. Faults: `forbidden`, `unknown-bolt`, and
 * `claimed-elsewhere` with the station and person in `facts`.
 */
export async function claimBolt(actor: Actor, input: ClaimInput): Promise<Result<BoltView, "forbidden" | "unknown-bolt" | "claimed-elsewhere">> {
  if (!can(actor, "bolt.move")) return fail("forbidden", "Bolts are claimed by the people who handle them.");
  return inTransaction<BoltView, "forbidden" | "unknown-bolt" | "claimed-elsewhere">(async (transaction) => {
    const bolt = await lockBoltByTag(transaction, input.tag);
    if (!bolt) return fail("unknown-bolt", `No bolt has the tag ${input.tag}. Scan the tag on the bolt's end.`);
    const claim = await liveClaim(transaction, bolt);
    if (claim && claim.station !== input.station && !input.takeOver) {
      return fail("claimed-elsewhere", `Bolt ${bolt.tag} is at ${claim.station}, with ${claim.person}.`, { facts: { ...claim } });
    }
    await db().sequelize.query(
      `INSERT INTO claims (bolt_id, station, person_id, run_id) VALUES ($1, $2, $3, $4)
       ON CONFLICT (bolt_id) DO UPDATE SET station = $2, person_id = $3, run_id = $4, claimed_at = now()`,
      { bind: [bolt.id, input.station.slice(0, 60), actor.personId, input.runId ?? null], transaction },
    );
    tell(transaction, bolt);
    return ok(await loadBolt(bolt.id, transaction));
  });
}

/** Gives a bolt back. Only the station that has it can; for any other it stays as it is. Faults: `forbidden`, `unknown-bolt`. */
export async function releaseClaim(actor: Actor, input: { readonly tag: string; readonly station: string }): Promise<Result<BoltView, "forbidden" | "unknown-bolt">> {
  if (!can(actor, "bolt.move")) return fail("forbidden", "Bolts are given back by the people who handle them.");
  return inTransaction<BoltView, "forbidden" | "unknown-bolt">(async (transaction) => {
    const bolt = await lockBoltByTag(transaction, input.tag);
    if (!bolt) return fail("unknown-bolt", `No bolt has the tag ${input.tag}. Scan the tag on the bolt's end.`);
    const released = await db().Claim.destroy({ where: { boltId: bolt.id, station: input.station }, transaction });
    if (released > 0) tell(transaction, bolt);
    return ok(await loadBolt(bolt.id, transaction));
  });
}

async function liveClaim(transaction: Transaction, bolt: LockedBolt): Promise<Omit<ClaimView, "claimedAt" | "runId"> | null> {
  const [claim] = await db().sequelize.query<Omit<ClaimView, "claimedAt" | "runId">>(
    `SELECT c.station, c.person_id AS "personId", p.name AS person FROM claims c JOIN people p ON p.id = c.person_id
      WHERE c.bolt_id = $1 AND c.claimed_at > now() - make_interval(hours => ${CLAIM_HOURS})`,
    { bind: [bolt.id], type: QueryTypes.SELECT, transaction },
  );
  return claim ?? null;
}

function tell(transaction: Transaction, bolt: LockedBolt): void {
  bumpRevision("bolts", transaction);
  bumpRevision(`bolt:${bolt.tag}`, transaction);
}
