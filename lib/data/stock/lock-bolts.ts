import { QueryTypes, type Transaction } from "sequelize";
import { db } from "@/models/database";

/** A bolt's row under its lock; lengths in 1/160 mm from the first free end. */
export interface LockedBolt {
  readonly id: number;
  readonly tag: string;
  readonly fabricId: number;
  readonly fabricName: string;
  readonly lot: string;
  readonly shelf: string;
  readonly usableWidth: number;
  readonly putUp: number;
  readonly cutEdge: number;
  readonly reserved: number;
}

/**
 * Locks bolts in id order until the transaction ends, which is what keeps two of us from deadlock. A transaction that
 * locks a run too locks the run first. The lock is NO KEY UPDATE: rows that only point at a bolt need not wait for it.
 */
export async function lockBolts(transaction: Transaction, ids: readonly number[]): Promise<Map<number, LockedBolt>> {
  const rows = await db().sequelize.query<LockedBolt>(
    `SELECT b.id, b.tag, b.fabric_id AS "fabricId", f.name AS "fabricName", b.lot, b.shelf,
            COALESCE(b.usable_width, f.usable_width) AS "usableWidth", b.put_up AS "putUp", b.cut_edge AS "cutEdge", b.reserved
       FROM bolts b JOIN fabrics f ON f.id = b.fabric_id
      WHERE b.id = ANY($1::int[]) ORDER BY b.id FOR NO KEY UPDATE OF b`,
    { bind: [[...new Set(ids)]], type: QueryTypes.SELECT, transaction },
  );
  return new Map(rows.map((row) => [row.id, row]));
}

/** Locks the one bolt with a tag; null when there is none. */
export async function lockBoltByTag(transaction: Transaction, tag: string): Promise<LockedBolt | null> {
  const id = await boltIdOf(transaction, tag);
  return id === null ? null : ((await lockBolts(transaction, [id])).get(id) ?? null);
}

/** A bolt's id by its tag, without a lock; tags never change. */
export async function boltIdOf(transaction: Transaction, tag: string): Promise<number | null> {
  const row = await db().Bolt.findOne({ where: { tag: asTag(tag) }, attributes: ["id"], transaction, raw: true });
  return row?.id ?? null;
}

/** A tag as it stands in the book, from one that was typed with small letters, spaces or hyphens. */
export function asTag(typed: string): string {
  return typed.slice(0, 60).toUpperCase().replaceAll(/[\s-]/g, "");
}
