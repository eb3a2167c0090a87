import { QueryTypes, type Transaction } from "sequelize";
import { formatLength } from "@/lib/core/measure/format";
import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Fault, type Result } from "@/lib/core/result";
import { answerOnce, type OnceInput } from "@/lib/data/answer-once";
import type { BoltView } from "@/lib/data/bolt-view";
import { recordChange } from "@/lib/data/record-change";
import { bumpRevision } from "@/lib/data/revisions";
import { db } from "@/models/database";
import { clothHolds } from "./cloth";
import { loadBolts } from "./load-bolts";
import { lockBolts, type LockedBolt } from "./lock-bolts";
import { changePromise, readPromises } from "./promises";
import { settleBolt } from "./settle-bolt";
import { readShopRules } from "./shop-rules";

/** So many pieces of a length on one bolt; 1/160 mm. */
export interface ReserveDemand {
  readonly boltId: number;
  readonly length: number;
  readonly count: number;
  /** The width that the length was planned on; a narrower bolt is refused. */
  readonly plannedWidth?: number;
}

export type ReserveFault = "unknown-bolt" | "does-not-fit" | "too-narrow" | "bad-demand";

/** A demand that did not fit, in `facts.refused` of `does-not-fit`. */
export interface RefusedDemand {
  readonly tag: string;
  readonly left: number;
  readonly reserved: number;
  readonly wanted: readonly { readonly length: number; readonly count: number }[];
}

/**
 * Promises lengths on bolts inside a transaction of the caller's, all of them or none. The bolts are locked in id order
 * (lock the run before). Each bolt must hold what it has promised and the new pieces between its flaws at once;
 * straightening is counted once a bolt. A refusal writes nothing.
 *
 * The caller keeps run_lengths in step: each that waits to be cut and has a bolt is one promised piece.
 */
export async function reserveInside(
  transaction: Transaction,
  actor: Pick<Actor, "personId">,
  { runId, demands }: { readonly runId: number | null; readonly demands: readonly ReserveDemand[] },
): Promise<Result<null, ReserveFault>> {
  if (demands.some(({ length, count }) => !Number.isSafeInteger(length) || !Number.isSafeInteger(count) || length <= 0 || count <= 0)) {
    return fail("bad-demand", "A length that is promised is longer than nothing, and so is the number of pieces.");
  }
  const bolts = await lockBolts(transaction, demands.map((demand) => demand.boltId));
  const refusal = await refuse(transaction, bolts, demands);
  if (refusal) return refusal;
  for (const { boltId, length, count } of demands) await changePromise(transaction, { boltId, runId, length }, count, actor.personId);
  for (const bolt of bolts.values()) {
    await settleBolt(transaction, actor, bolt);
    const here = demands.filter((demand) => demand.boltId === bolt.id).map(({ length, count }) => ({ length, count }));
    await recordChange(transaction, actor, { subject: "bolt", subjectId: bolt.id, act: "reserved", details: { runId, demands: here } });
  }
  return ok(null);
}

async function refuse(transaction: Transaction, bolts: ReadonlyMap<number, LockedBolt>, demands: readonly ReserveDemand[]): Promise<{ ok: false; fault: Fault<ReserveFault> } | null> {
  const { system, straightening } = await readShopRules(transaction);
  const refused: RefusedDemand[] = [];
  for (const demand of demands) {
    const bolt = bolts.get(demand.boltId);
    if (!bolt) return fail("unknown-bolt", "One of the bolts is not in the book any more. Plan again.", { facts: { boltId: demand.boltId } });
    if (demand.plannedWidth !== undefined && bolt.usableWidth < demand.plannedWidth) {
      return fail("too-narrow", `Bolt ${bolt.tag} is narrower than the length was planned on. Plan again for this bolt.`, { facts: { tag: bolt.tag, found: bolt.usableWidth, wanted: demand.plannedWidth } });
    }
  }
  for (const bolt of bolts.values()) {
    const wanted = demands.filter((demand) => demand.boltId === bolt.id).map(({ length, count }) => ({ length, count }));
    const held = (await readPromises(transaction, bolt.id)).map((promise) => ({ length: promise.length, count: promise.held }));
    const flaws = await db().Flaw.findAll({ where: { boltId: bolt.id }, attributes: ["startsAt", "endsAt"], transaction, raw: true });
    const cloth = { cutEdge: bolt.cutEdge, putUp: bolt.putUp, flaws };
    if (!clothHolds(cloth, [...held, ...wanted], straightening)) refused.push({ tag: bolt.tag, left: bolt.putUp - bolt.cutEdge, reserved: bolt.reserved, wanted });
  }
  if (refused.length === 0) return null;
  const sentences = refused.map(({ tag, left, reserved, wanted }) => {
    const pieces = wanted.map(({ length, count }) => `${count} of ${formatLength(length, system)}`).join(" and ");
    return `Bolt ${tag} has ${formatLength(left, system)} left, of which ${formatLength(reserved, system)} are promised; ${pieces} do not fit beside that.`;
  });
  return fail("does-not-fit", sentences.slice(0, 3).join(" "), { facts: { refused } });
}

export interface ReserveInput extends OnceInput {
  /** Null: put aside for a person. */
  readonly runId: number | null;
  readonly demands: readonly ReserveDemand[];
}

/**
 * Promises lengths on bolts, all or none: a request, refused with figures (`does-not-fit`, each bolt in `facts.refused`).
 * For a run, lengths of its list that have no bolt yet go to the bolts in the list's order; `no-such-lengths` when
 * there are too few. Further faults: `forbidden`, `unknown-run`, `unknown-bolt`, `too-narrow`, `bad-demand`, `request-reused`.
 */
export async function reserveLengths(
  actor: Actor,
  input: ReserveInput,
): Promise<Result<readonly BoltView[], ReserveFault | "forbidden" | "unknown-run" | "no-such-lengths" | "request-reused">> {
  if (!can(actor, "run.start")) return fail("forbidden", "Lengths are promised by managers and owners.");
  return answerOnce<readonly BoltView[], ReserveFault | "unknown-run" | "no-such-lengths">(actor, "bolt.reserve", input, async (transaction) => {
    if (input.runId !== null) {
      const run = await db().Run.findByPk(input.runId, { lock: transaction.LOCK.NO_KEY_UPDATE, transaction, raw: true });
      if (!run || run.state === "cancelled") return fail("unknown-run", "That run is not in the book, or it was cancelled.");
    }
    const reserved = await reserveInside(transaction, actor, input);
    if (!reserved.ok) return reserved;
    if (input.runId !== null) {
      for (const demand of input.demands) {
        if (!(await giveBolts(transaction, input.runId, demand))) {
          return fail("no-such-lengths", "The run's list has fewer lengths without a bolt than were asked for. Load the list again.");
        }
      }
      bumpRevision("runs", transaction);
    }
    return ok(await loadBolts({ where: "b.id = ANY($1::int[])", bind: [input.demands.map((demand) => demand.boltId)] }, transaction));
  });
}

/** Puts the bolt to as many waiting lengths as were promised on it; false when the list has fewer. */
async function giveBolts(transaction: Transaction, runId: number, { boltId, length, count }: ReserveDemand): Promise<boolean> {
  const given = await db().sequelize.query(
    `UPDATE run_lengths SET bolt_id = $1
      WHERE id IN (SELECT l.id FROM run_lengths l JOIN bolts b ON b.id = $1 AND b.fabric_id = l.fabric_id
                    WHERE l.run_id = $2 AND l.length = $3 AND l.bolt_id IS NULL AND l.state = 'to-cut' ORDER BY l.sequence, l.id LIMIT $4)
      RETURNING id`,
    { bind: [boltId, runId, length, count], type: QueryTypes.SELECT, transaction },
  );
  return given.length === count;
}
