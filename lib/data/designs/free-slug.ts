import { QueryTypes, type Transaction } from "sequelize";
import { db } from "@/models/database";

/** The name as it stands in an address, with a number behind it when it is taken: "weir-pool", "weir-pool-2". */
export async function freeSlug(transaction: Transaction, table: "blocks" | "quilts" | "kit_designs" | "fabrics", name: string): Promise<string> {
  const stem = slugOf(name);
  const taken = await db().sequelize.query<{ slug: string }>(`SELECT slug FROM ${table} WHERE slug = $1 OR slug LIKE $1 || '-%'`, { bind: [stem], type: QueryTypes.SELECT, transaction });
  const used = new Set(taken.map((row) => row.slug));
  if (!used.has(stem)) return stem;
  let number = 2;
  while (used.has(`${stem}-${number}`)) number += 1;
  return `${stem}-${number}`;
}

export function slugOf(name: string): string {
  const plain = name.normalize("NFKD").replace(/[\u0300-\u036f’']/g, "").toLowerCase();
  return plain.replace(/[^a-z0-9]+/g, "-").replace(/^-+|-+$/g, "").slice(0, 70) || "unnamed";
}
