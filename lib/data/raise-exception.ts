import type { Transaction } from "sequelize";
import { db } from "@/models/database";
import type { Exception } from "@/models/exception";
import { bumpRevision } from "./revisions";

export type ExceptionKind = Exception["kind"];

export interface ExceptionInput {
  readonly kind: ExceptionKind;
  /** What the manager reads: what was found and what was wanted. */
  readonly sentence: string;
  readonly boltId?: number | null;
  readonly runId?: number | null;
  /** Figures for the screen; lengths as integers of 1/160 mm. */
  readonly facts?: object;
}

/** Puts what a fact upset on the manager's list, in the transaction that records the fact. Returns the row's id. */
export async function raiseException(transaction: Transaction, { kind, sentence, boltId, runId, facts }: ExceptionInput): Promise<number> {
  const row = await db().Exception.create({ kind, sentence, boltId: boltId ?? null, runId: runId ?? null, facts: facts ?? {} }, { transaction });
  bumpRevision("exceptions", transaction);
  return row.id;
}
