import type { Transaction } from "sequelize";
import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import { answerOnce, type OnceInput } from "@/lib/data/answer-once";
import type { BoltChange } from "@/lib/data/bolt-view";
import { raiseException } from "@/lib/data/raise-exception";
import { recordChange } from "@/lib/data/record-change";
import { bumpRevision } from "@/lib/data/revisions";
import { db } from "@/models/database";
import { ABSURD_CUT, appendCut, isAbsurdCut } from "./append-cut";
import { objectionTo, type CutObjection } from "./cut-objections";
import { loadBolt } from "./load-bolts";
import { boltIdOf, lockBolts, type LockedBolt } from "./lock-bolts";
import { changePromise } from "./promises";
import { advanceRun, lockRunLength, type LockedRunLength, type RunKitState, type RunState } from "./run-length";
import { settleBolt } from "./settle-bolt";

export interface RecordCutInput extends OnceInput {
  readonly runLengthId: number;
  /** Of the bolt that was scanned. */
  readonly tag: string;
  /** What was really cut, in 1/160 mm; it may differ from the plan. */
  readonly length: number;
  /** It came from an offline queue: the cloth is cut, so nothing that the book thinks can refuse it. */
  readonly asFact?: boolean;
  /** ISO text: when it was cut; now when not said. */
  readonly at?: string;
  readonly note?: string;
}

export interface RecordedCut extends BoltChange {
  readonly cutId: number;
  /** "mis-cut": the cloth is booked, but the length still waits (or was cut by somebody else). */
  readonly recordedAs: "kit" | "mis-cut";
  /** Why it is a mis-cut, as a sentence. */
  readonly because: string | null;
  readonly runLengthId: number;
  readonly runState: RunState;
  readonly kitState: RunKitState;
  /** How much the book had to find, in 1/160 mm; 0 as a rule. */
  readonly found: number;
}

export type CutFault = "forbidden" | "unknown-bolt" | "unknown-length" | "absurd-length" | "request-reused" | CutObjection;

/**
 * Records a length that was cut for a kit, once per `requestId`. A wrong bolt, a wrong dye lot, too narrow a bolt, a
 * length that was already cut or cancelled is refused with a sentence (`wrong-fabric`, `wrong-lot`, `too-narrow`,
 * `already-cut`, `length-cancelled`); with `asFact` the cloth is booked all the same, as a mis-cut that the manager
 * sees. A cut that is longer than what the book says is left always counts, and corrects the book.
 */
export async function recordCut(actor: Actor, input: RecordCutInput): Promise<Result<RecordedCut, CutFault>> {
  if (!can(actor, "run.cut")) return fail("forbidden", "Lengths for kits are cut by cutters, managers and owners.");
  return answerOnce<RecordedCut, CutFault>(actor, "bolt.cut", input, async (transaction) => {
    const found = await lockForCut(transaction, input);
    if (!found.ok) return found;
    const { bolt, runLength } = found.value;
    if (isAbsurdCut(bolt, input.length)) return fail("absurd-length", ABSURD_CUT);
    const objection = await objectionTo(transaction, runLength, bolt);
    if (objection && !input.asFact) return objection;
    return ok(objection ? await bookMisCut(transaction, actor, input, bolt, runLength, objection.fault.message) : await bookKitCut(transaction, actor, input, bolt, runLength));
  });
}

/** Locks the run, then the length, then the bolt that was scanned and the one that was planned, in id order. */
async function lockForCut(transaction: Transaction, { runLengthId, tag }: RecordCutInput): Promise<Result<{ bolt: LockedBolt; runLength: LockedRunLength }, CutFault>> {
  const runLength = await lockRunLength(transaction, runLengthId);
  if (!runLength) return fail("unknown-length", "That length is not on any run's list. Load the list again.");
  const boltId = await boltIdOf(transaction, tag);
  if (boltId === null) return fail("unknown-bolt", `No bolt has the tag ${tag}. Scan the tag on the bolt's end.`);
  const bolts = await lockBolts(transaction, runLength.boltId === null ? [boltId] : [boltId, runLength.boltId]);
  const bolt = bolts.get(boltId);
  if (!bolt) throw new Error(`Bolt ${boltId} vanished under its lock`);
  return ok({ bolt, runLength });
}

async function bookKitCut(transaction: Transaction, actor: Actor, input: RecordCutInput, before: LockedBolt, runLength: LockedRunLength): Promise<RecordedCut> {
  const cut = await appendCut(transaction, actor, before, {
    length: input.length,
    purpose: "kit",
    to: { place: "bag", id: runLength.runKitId },
    reason: `cut for kit ${runLength.serial}`,
    requestId: input.requestId,
    runLengthId: runLength.id,
    at: input.at,
    note: input.note,
  });
  await db().RunLength.update({ state: "cut", cutId: cut.cutId }, { where: { id: runLength.id }, transaction });
  const planned = runLength.state === "to-cut" ? runLength.boltId : null;
  if (planned !== null) await changePromise(transaction, { boltId: planned, runId: runLength.runId, length: runLength.length }, -1, actor.personId);
  const short = await settleBolt(transaction, actor, cut.bolt);
  if (planned !== null && planned !== cut.bolt.id) {
    const other = (await lockBolts(transaction, [planned])).get(planned);
    if (other) short.push(...(await settleBolt(transaction, actor, other)));
  }
  const states = await advanceRun(transaction, runLength);
  await recordChange(transaction, actor, {
    subject: "bolt",
    subjectId: before.id,
    act: "cut",
    details: { cutId: cut.cutId, length: input.length, planned: runLength.length, kit: runLength.serial, run: runLength.runCode, found: cut.found },
  });
  const bolt = await loadBolt(before.id, transaction);
  return { cutId: cut.cutId, recordedAs: "kit", because: null, runLengthId: runLength.id, ...states, bolt, short, found: cut.found };
}

async function bookMisCut(transaction: Transaction, actor: Actor, input: RecordCutInput, before: LockedBolt, runLength: LockedRunLength, because: string): Promise<RecordedCut> {
  const cut = await appendCut(transaction, actor, before, {
    length: input.length,
    purpose: "mis-cut",
    to: { place: "waste" },
    reason: `cut for kit ${runLength.serial}, but not usable for it`,
    requestId: input.requestId,
    runLengthId: runLength.id,
    at: input.at,
    note: input.note,
  });
  const short = await settleBolt(transaction, actor, cut.bolt);
  await raiseException(transaction, {
    kind: "cut-elsewhere",
    sentence: `${because} It was cut from bolt ${before.tag} all the same, for kit ${runLength.serial}, and is booked as a mis-cut.`,
    boltId: before.id,
    runId: runLength.runId,
    facts: { tag: before.tag, cutId: cut.cutId, runLengthId: runLength.id, length: input.length },
  });
  await recordChange(transaction, actor, { subject: "bolt", subjectId: before.id, act: "mis-cut", details: { cutId: cut.cutId, length: input.length, kit: runLength.serial, because } });
  bumpRevision(`run:${runLength.runCode}`, transaction);
  const bolt = await loadBolt(before.id, transaction);
  return { cutId: cut.cutId, recordedAs: "mis-cut", because, runLengthId: runLength.id, runState: runLength.runState, kitState: runLength.kitState, bolt, short, found: cut.found };
}
