import type { Transaction } from "sequelize";
import { formatLength } from "@/lib/core/measure/format";
import { MAX_LENGTH, PER_YARD } from "@/lib/core/measure/length";
import type { Actor } from "@/lib/core/policy/policy";
import type { CutPurpose } from "@/lib/data/bolt-view";
import { postMove, type Place } from "@/lib/data/ledger";
import { raiseException } from "@/lib/data/raise-exception";
import { db } from "@/models/database";
import type { LockedBolt } from "./lock-bolts";
import { readShopRules } from "./shop-rules";

export interface NewCut {
  /** 1/160 mm along the bolt, above zero. */
  readonly length: number;
  readonly purpose: CutPurpose;
  readonly to: Place;
  readonly reason: string;
  readonly requestId: string | null;
  readonly runLengthId?: number | null;
  /** ISO text; when it was cut, where that was before it reached the book. */
  readonly at?: string;
  readonly note?: string;
}

export interface AppendedCut {
  readonly cutId: number;
  /** As it stands after the cut; hand it to `settleBolt`. */
  readonly bolt: LockedBolt;
  /** What the book had to find because the cut was longer than what it thought was left; 0 as a rule. */
  readonly found: number;
}

/**
 * Adds a cut at the bolt's cut edge, under the bolt's lock, and moves its cloth. A cut is a fact: where the book thought
 * that less was left, the book is corrected (found-or-lost, a longer put-up) and the manager is told.
 */
export async function appendCut(transaction: Transaction, actor: Pick<Actor, "personId">, bolt: LockedBolt, cut: NewCut): Promise<AppendedCut> {
  const startsAt = bolt.cutEdge;
  const endsAt = startsAt + cut.length;
  const found = Math.max(0, endsAt - bolt.putUp);
  const row = await db().Cut.create(
    {
      boltId: bolt.id,
      startsAt,
      endsAt,
      purpose: cut.purpose,
      runLengthId: cut.runLengthId ?? null,
      personId: actor.personId,
      requestId: cut.requestId,
      note: (cut.note ?? "").slice(0, 200),
      ...(cut.at ? { at: new Date(cut.at) } : {}),
    },
    { transaction },
  );
  const what = { item: "fabric", fabricId: bolt.fabricId } as const;
  const common = { what, personId: actor.personId, requestId: cut.requestId, cutId: row.id };
  const here: Place = { place: "bolt", id: bolt.id };
  if (found > 0) {
    await postMove(transaction, { ...common, quantity: found, from: { place: "found-or-lost" }, to: here, reason: "the cut was longer than what the book said was left" });
    await tellCorrection(transaction, bolt, cut.length, found);
  }
  await postMove(transaction, { ...common, quantity: cut.length, from: here, to: cut.to, reason: cut.reason });
  return { cutId: row.id, bolt: { ...bolt, cutEdge: endsAt, putUp: Math.max(bolt.putUp, endsAt) }, found };
}

/** No table cuts more at once; a longer one is a slip of the fingers and the one cut that cannot be a fact. */
const LONGEST_CUT = 1000 * PER_YARD;
export const ABSURD_CUT = "A cut is longer than nothing and at most 1000 yd.";

export function isAbsurdCut(bolt: LockedBolt, length: number): boolean {
  return !Number.isSafeInteger(length) || length <= 0 || length > LONGEST_CUT || bolt.cutEdge + length > MAX_LENGTH;
}

async function tellCorrection(transaction: Transaction, bolt: LockedBolt, length: number, found: number): Promise<void> {
  const { system } = await readShopRules(transaction);
  await raiseException(transaction, {
    kind: "book-corrected",
    sentence: `${formatLength(length, system)} were cut from bolt ${bolt.tag} (${bolt.fabricName}), but the book said that only ${formatLength(bolt.putUp - bolt.cutEdge, system)} were left. The book now follows the cut.`,
    boltId: bolt.id,
    facts: { tag: bolt.tag, length, left: bolt.putUp - bolt.cutEdge, found },
  });
}
