import type { Transaction } from "sequelize";
import { MAX_LENGTH } from "@/lib/core/measure/length";
import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import { answerOnce, type OnceInput } from "@/lib/data/answer-once";
import type { BoltChange } from "@/lib/data/bolt-view";
import { postMove } from "@/lib/data/ledger";
import { recordChange } from "@/lib/data/record-change";
import { db } from "@/models/database";
import { appendCut } from "./append-cut";
import { loadBolt } from "./load-bolts";
import { lockBoltByTag, type LockedBolt } from "./lock-bolts";
import { settleBolt } from "./settle-bolt";

export interface MeasureInput extends OnceInput {
  readonly tag: string;
  /** What the tape says is left on the bolt, in 1/160 mm; 0 when it is empty. */
  readonly left: number;
  /**
   * Where the difference lies. "core": the put-up was wrong, so the core end moves and the flaws keep their distance
   * from the cut edge. "edge": earlier cuts were longer or shorter than written, so the flaws keep their distance from the core.
   */
  readonly where: "core" | "edge";
  readonly reason: string;
  readonly at?: string;
}

export interface MeasuredBolt extends BoltChange {
  /** What the tape says minus what the book said, in 1/160 mm. */
  readonly difference: number;
}

export type MeasureFault = "forbidden" | "unknown-bolt" | "absurd-length" | "request-reused";

/**
 * Records what was measured to be left on a bolt. A fact: the book follows the tape, the difference goes to or comes
 * from found-or-lost with the reason, and promises that no longer fit go on the manager's list.
 */
export async function measureBolt(actor: Actor, input: MeasureInput): Promise<Result<MeasuredBolt, MeasureFault>> {
  if (!can(actor, "bolt.measure")) return fail("forbidden", "Bolts are measured by cutters, managers and owners.");
  return answerOnce<MeasuredBolt, MeasureFault>(actor, "bolt.measure", input, async (transaction) => {
    const before = await lockBoltByTag(transaction, input.tag);
    if (!before) return fail("unknown-bolt", `No bolt has the tag ${input.tag}. Scan the tag on the bolt's end.`);
    if (!Number.isSafeInteger(input.left) || input.left < 0 || before.cutEdge + input.left > MAX_LENGTH) {
      return fail("absurd-length", "What is left on a bolt is nothing or more, and shorter than 14 000 yd.");
    }
    const left = before.putUp - before.cutEdge;
    const difference = input.left - left;
    const after = await correct(transaction, actor, before, difference, input);
    const short = await settleBolt(transaction, actor, after);
    await recordChange(transaction, actor, { subject: "bolt", subjectId: before.id, act: "measured", details: { said: left, found: input.left, where: input.where, reason: input.reason } });
    return ok({ difference, short, bolt: await loadBolt(before.id, transaction) });
  });
}

async function correct(transaction: Transaction, actor: Actor, bolt: LockedBolt, difference: number, input: MeasureInput): Promise<LockedBolt> {
  const reason = input.reason.trim() || "measured";
  const common = { what: { item: "fabric", fabricId: bolt.fabricId }, personId: actor.personId, requestId: input.requestId, reason } as const;
  const here = { place: "bolt", id: bolt.id } as const;
  if (difference === 0) return bolt;
  if (difference > 0) {
    await postMove(transaction, { ...common, quantity: difference, from: { place: "found-or-lost" }, to: here });
    if (input.where === "edge") await shiftFlaws(transaction, bolt, difference);
    return { ...bolt, putUp: bolt.putUp + difference };
  }
  const lost = -difference;
  // A bolt that was never cut and has nothing left has no core end to move to: its cloth goes at the edge.
  if (input.where === "edge" || bolt.putUp - lost === 0) {
    const cut = await appendCut(transaction, actor, bolt, { length: lost, purpose: "correction", to: { place: "found-or-lost" }, reason, requestId: input.requestId, at: input.at, note: reason });
    return cut.bolt;
  }
  await postMove(transaction, { ...common, quantity: lost, from: here, to: { place: "found-or-lost" } });
  return { ...bolt, putUp: bolt.putUp - lost };
}

/** The cloth between edge and core is longer than thought at the edge, so what lies on it lies further from the edge. */
async function shiftFlaws(transaction: Transaction, bolt: LockedBolt, by: number): Promise<void> {
  await db().sequelize.query(
    `UPDATE flaws SET starts_at = starts_at + $3, ends_at = ends_at + $3 WHERE bolt_id = $1 AND ends_at > $2`,
    { bind: [bolt.id, bolt.cutEdge, by], transaction },
  );
}
