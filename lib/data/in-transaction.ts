import { Transaction } from "sequelize";
import type { Result } from "@/lib/core/result";
import { db } from "@/models/database";

const MOST_TRIES = 4;
const DEADLOCK = "40P01";
const SERIALIZATION_FAILURE = "40001";

/**
 * Runs a use case's writes in one READ COMMITTED transaction. A success commits; a returned failure rolls everything
 * back, so that a rule may be checked at any point. A deadlock or serialization failure is tried again, three times at
 * most; `work` may therefore run more than once and must touch nothing but the database.
 */
export async function inTransaction<Value, Code extends string>(
  work: (transaction: Transaction) => Promise<Result<Value, Code>>,
): Promise<Result<Value, Code>> {
  for (let tries = 1; ; tries += 1) {
    let refusal: Result<Value, Code> | null = null;
    try {
      return await db().sequelize.transaction({ isolationLevel: Transaction.ISOLATION_LEVELS.READ_COMMITTED }, async (transaction) => {
        const result = await work(transaction);
        if (result.ok) return result;
        refusal = result;
        throw new Error("rolled back: the use case refused");
      });
    } catch (error) {
      if (refusal) return refusal;
      if (tries >= MOST_TRIES || !mayBeTriedAgain(error)) throw error;
      await new Promise((resolve) => setTimeout(resolve, tries * 10 * (1 + Math.random())));
    }
  }
}

function mayBeTriedAgain(error: unknown): boolean {
  const code = (error as { parent?: { code?: string } }).parent?.code;
  return code === DEADLOCK || code === SERIALIZATION_FAILURE;
}
