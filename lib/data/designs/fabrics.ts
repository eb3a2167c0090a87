import { QueryTypes, type Transaction } from "sequelize";
import type { Length } from "@/lib/core/measure/length";
import { db } from "@/models/database";

/** A fabric as pages see it. Lengths in 1/160 mm, prices in 1/10 000 of the major unit per yard or metre. */
export interface FabricView {
  readonly id: number;
  readonly slug: string;
  readonly name: string;
  readonly reference: string;
  readonly description: string;
  readonly supplier: string | null;
  readonly width: Length;
  readonly usableWidth: Length;
  readonly fibre: string;
  readonly origin: string;
  readonly oneWay: boolean;
  /** Address of the drawn tile, such as /fabrics/ferry.svg; empty for a plain colour. */
  readonly tile: string;
  readonly colour: string;
  readonly value: "light" | "medium" | "dark";
  readonly price: number;
  readonly cost: number;
  readonly lowMark: Length;
  readonly inPrint: boolean;
}

const SELECT = `
  SELECT f.id, f.slug, f.name, f.reference, f.description, s.name AS supplier, f.width, f.usable_width AS "usableWidth", f.fibre,
         f.origin, f.one_way AS "oneWay", f.tile, f.colour, f.value, f.price, f.cost, f.low_mark AS "lowMark", f.in_print AS "inPrint"
    FROM fabrics f LEFT JOIN suppliers s ON s.id = f.supplier_id`;

/** Fabrics by name; at most `most`. */
export async function listFabrics(most = 1000): Promise<FabricView[]> {
  return db().sequelize.query<FabricView>(`${SELECT} ORDER BY f.name, f.id LIMIT $1`, { bind: [most], type: QueryTypes.SELECT });
}

export async function getFabrics(ids: readonly number[], transaction?: Transaction): Promise<FabricView[]> {
  if (ids.length === 0) return [];
  return db().sequelize.query<FabricView>(`${SELECT} WHERE f.id = ANY($1)`, { bind: [[...ids]], type: QueryTypes.SELECT, transaction });
}

export async function getFabric(slug: string): Promise<FabricView | null> {
  const [fabric] = await db().sequelize.query<FabricView>(`${SELECT} WHERE f.slug = $1`, { bind: [slug], type: QueryTypes.SELECT });
  return fabric ?? null;
}
