import { QueryTypes, type Transaction } from "sequelize";
import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import { answerOnce, type OnceInput } from "@/lib/data/answer-once";
import type { BoltChange, CutPurpose } from "@/lib/data/bolt-view";
import { reverseMovesOfCut } from "@/lib/data/ledger";
import { recordChange } from "@/lib/data/record-change";
import { db } from "@/models/database";
import { loadBolt } from "./load-bolts";
import { boltIdOf, lockBolts, type LockedBolt } from "./lock-bolts";
import { changePromise } from "./promises";
import { advanceRun, lockRunLength, type LockedRunLength } from "./run-length";
import { settleBolt } from "./settle-bolt";

export interface UndoCutInput extends OnceInput {
  readonly tag: string;
  /** The cut that the person saw as the last; another one is never undone in its place. */
  readonly cutId: number;
  /** Why, in a few words. */
  readonly reason: string;
}

export type UndoFault = "forbidden" | "unknown-bolt" | "unknown-cut" | "not-last" | "cut-sold" | "cut-packed" | "reason-missing" | "request-reused";

/**
 * Undoes the last cut of a bolt: takes it off the chain, posts the reversing moves, and puts a kit's length back on the
 * list with its promise on the bolt it was planned on (short, where it no longer fits). What the cut made the book
 * find is taken back with it. Sold cloth (`cut-sold`) and packed kits (`cut-packed`) are undone there first.
 */
export async function undoLastCut(actor: Actor, input: UndoCutInput): Promise<Result<BoltChange, UndoFault>> {
  if (!can(actor, "run.cut") && !can(actor, "till.sell")) return fail("forbidden", "Cuts are undone by the people who cut.");
  if (input.reason.trim() === "") return fail("reason-missing", "Say in a few words why the cut is undone.", { fields: { reason: "Write a reason." } });
  return answerOnce<BoltChange, UndoFault>(actor, "bolt.undo", input, async (transaction) => {
    const boltId = await boltIdOf(transaction, input.tag);
    if (boltId === null) return fail("unknown-bolt", `No bolt has the tag ${input.tag}. Scan the tag on the bolt's end.`);
    const cutOf = await db().RunLength.findOne({ where: { cutId: input.cutId }, attributes: ["id"], transaction, raw: true });
    const runLength = cutOf ? await lockRunLength(transaction, cutOf.id) : null;
    const bolts = await lockBolts(transaction, [boltId, ...(runLength && runLength.boltId !== null ? [runLength.boltId] : [])]);
    const bolt = bolts.get(boltId);
    if (!bolt) throw new Error(`Bolt ${boltId} vanished under its lock`);
    const cut = await readCut(transaction, boltId, input.cutId);
    if (!cut) return fail("unknown-cut", `Bolt ${bolt.tag} has no such cut; it may have been undone already.`);
    if (cut.endsAt !== bolt.cutEdge) return fail("not-last", `Bolt ${bolt.tag} was cut again since. Only its last cut can be undone.`);
    if (cut.purpose === "sale") return fail("cut-sold", "This cut was sold. Take the sale back at the counter instead.");
    // The length is put back only if this is its cut, now that both are locked.
    const ours = runLength?.cutId === input.cutId ? runLength : null;
    if (ours && (ours.packedAt !== null || !["waiting", "cut", "cancelled"].includes(ours.kitState))) {
      return fail("cut-packed", `Kit ${ours.serial} already holds this length. Take it out of the kit first.`);
    }
    if (ours) await putBack(transaction, actor, ours);
    const after = await takeOff(transaction, actor, bolt, cut, input);
    const short = await settleBolt(transaction, actor, after);
    if (ours) {
      const other = ours.boltId !== null && ours.boltId !== boltId ? bolts.get(ours.boltId) : undefined;
      if (other) short.push(...(await settleBolt(transaction, actor, other)));
      await advanceRun(transaction, ours);
    }
    await recordChange(transaction, actor, {
      subject: "bolt",
      subjectId: boltId,
      act: "cut undone",
      details: { cutId: cut.id, length: cut.endsAt - cut.startsAt, purpose: cut.purpose, kit: ours?.serial ?? null, reason: input.reason },
    });
    return ok({ bolt: await loadBolt(boltId, transaction), short });
  });
}

interface LastCut {
  readonly id: number;
  readonly startsAt: number;
  readonly endsAt: number;
  readonly purpose: CutPurpose;
}

async function readCut(transaction: Transaction, boltId: number, cutId: number): Promise<LastCut | null> {
  const [cut] = await db().sequelize.query<LastCut>(
    `SELECT id, starts_at AS "startsAt", ends_at AS "endsAt", purpose FROM cuts WHERE bolt_id = $1 AND id = $2`,
    { bind: [boltId, cutId], type: QueryTypes.SELECT, transaction },
  );
  return cut ?? null;
}

async function putBack(transaction: Transaction, actor: Actor, runLength: LockedRunLength): Promise<void> {
  const wanted = runLength.runState !== "cancelled" && runLength.kitState !== "cancelled";
  await db().RunLength.update({ state: wanted ? "to-cut" : "cancelled", cutId: null }, { where: { id: runLength.id }, transaction });
  if (wanted && runLength.boltId !== null) {
    await changePromise(transaction, { boltId: runLength.boltId, runId: runLength.runId, length: runLength.length }, 1, actor.personId);
  }
}

async function takeOff(transaction: Transaction, actor: Actor, bolt: LockedBolt, cut: LastCut, { requestId, reason }: UndoCutInput): Promise<LockedBolt> {
  const { foundTakenBack } = await reverseMovesOfCut(transaction, { cutId: cut.id, personId: actor.personId, requestId, reason: `cut undone: ${reason}` });
  await db().sequelize.query(`DELETE FROM cuts WHERE id = $1`, { bind: [cut.id], transaction });
  return { ...bolt, cutEdge: cut.startsAt, putUp: bolt.putUp - foundTakenBack };
}
