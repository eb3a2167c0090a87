import { QueryTypes, type Transaction } from "sequelize";
import { db } from "@/models/database";

/** Places without a number are one for the whole shop; a bag and a kit have the run kit's id. */
export type Place =
  | { readonly place: "bolt" | "piece" | "bag" | "kit"; readonly id: number }
  | { readonly place: "supplier" | "bench" | "shelf" | "customer" | "waste" | "sample" | "found-or-lost"; readonly id?: number };

/** Fabric in 1/160 mm of bolt length, notions and kits in counts. */
export type MovedItem =
  | { readonly item: "fabric"; readonly fabricId: number }
  | { readonly item: "notion"; readonly notionId: number }
  | { readonly item: "kit"; readonly runKitId: number };

export interface MoveInput {
  readonly what: MovedItem;
  /** Above zero: 1/160 mm of bolt length, or a count. */
  readonly quantity: number;
  readonly from: Place;
  readonly to: Place;
  /** A few words for the trail; at most 200 characters are kept. */
  readonly reason: string;
  readonly personId: number | null;
  readonly requestId?: string | null;
  readonly cutId?: number | null;
}

/** Posts one double-entry move. Returns its id. A notion's cached count at the shelf follows. */
export async function postMove(transaction: Transaction, move: MoveInput): Promise<number> {
  const row = await db().Move.create(
    {
      item: move.what.item,
      fabricId: move.what.item === "fabric" ? move.what.fabricId : null,
      notionId: move.what.item === "notion" ? move.what.notionId : null,
      runKitId: move.what.item === "kit" ? move.what.runKitId : null,
      quantity: move.quantity,
      fromPlace: move.from.place,
      fromId: move.from.id ?? null,
      toPlace: move.to.place,
      toId: move.to.id ?? null,
      reason: move.reason.slice(0, 200),
      personId: move.personId,
      requestId: move.requestId ?? null,
      cutId: move.cutId ?? null,
    },
    { transaction },
  );
  if (move.what.item === "notion") await countAtShelf(transaction, move.what.notionId, move);
  return row.id;
}

async function countAtShelf(transaction: Transaction, notionId: number, { from, to, quantity }: MoveInput): Promise<void> {
  const change = (to.place === "shelf" ? quantity : 0) - (from.place === "shelf" ? quantity : 0);
  if (change !== 0) await db().Notion.increment({ onHand: change }, { where: { id: notionId }, transaction });
}

/**
 * Posts the reversing move of every move of a cut that is not itself a reversal and not yet reversed. The first
 * entries stay: the ledger is append-only. Returns how much cloth the cut had found (found-or-lost to its bolt) and
 * that has now gone back, in 1/160 mm.
 */
export async function reverseMovesOfCut(
  transaction: Transaction,
  { cutId, personId, requestId, reason }: { cutId: number; personId: number | null; requestId: string | null; reason: string },
): Promise<{ foundTakenBack: number }> {
  const reversed = await db().sequelize.query<{ quantity: number; fromPlace: string; toPlace: string }>(
    `INSERT INTO moves (item, fabric_id, notion_id, run_kit_id, quantity, from_place, from_id, to_place, to_id, reason, cut_id, person_id, request_id, reverses_id)
     SELECT item, fabric_id, notion_id, run_kit_id, quantity, to_place, to_id, from_place, from_id, $2, cut_id, $3, $4, id
       FROM moves m
      WHERE cut_id = $1 AND reverses_id IS NULL AND NOT EXISTS (SELECT 1 FROM moves r WHERE r.reverses_id = m.id)
      ORDER BY id
     RETURNING quantity, from_place AS "fromPlace", to_place AS "toPlace"`,
    { bind: [cutId, reason.slice(0, 200), personId, requestId], type: QueryTypes.SELECT, transaction },
  );
  const found = reversed.filter((move) => move.fromPlace === "bolt" && move.toPlace === "found-or-lost");
  return { foundTakenBack: found.reduce((sum, move) => sum + move.quantity, 0) };
}
