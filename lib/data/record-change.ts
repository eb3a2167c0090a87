import type { Transaction } from "sequelize";
import type { Actor } from "@/lib/core/policy/policy";
import { db } from "@/models/database";

export interface ChangeInput {
  /** A table's singular: "bolt", "run", "fabric" … */
  readonly subject: string;
  readonly subjectId: number | string;
  /** The shop's verb in the past: "received", "measured", "cut" … */
  readonly act: string;
  /** Figures before and after; lengths as integers of 1/160 mm. */
  readonly details?: object;
}

/** Writes who changed what into the trail, in the transaction that changes it. */
export async function recordChange(transaction: Transaction, actor: Pick<Actor, "personId"> | null, change: ChangeInput): Promise<void> {
  await db().Change.create(
    { personId: actor?.personId ?? null, subject: change.subject, subjectId: String(change.subjectId), act: change.act, details: change.details ?? {} },
    { transaction },
  );
}
