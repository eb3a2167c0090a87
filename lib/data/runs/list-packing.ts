import { QueryTypes } from "sequelize";
import { db } from "@/models/database";

export interface PackingListing {
  readonly serial: string;
  readonly number: number;
  readonly run: string;
  readonly kit: string;
  readonly colourway: string;
  /** ISO date, or null. */
  readonly due: string | null;
  readonly lengths: number;
  readonly cut: number;
  readonly packed: number;
}

/** Kits that wait to be packed: those wholly cut first, then by the day they are due. One query; at most `most`. */
export async function listPacking(most = 200): Promise<PackingListing[]> {
  return db().sequelize.query<PackingListing>(
    `SELECT x.serial, x.number, r.code AS run, k.name AS kit, c.name AS colourway, r.due::text AS due, count(l.id)::int AS lengths,
            count(l.id) FILTER (WHERE l.state = 'cut')::int AS cut, count(l.id) FILTER (WHERE l.packed_at IS NOT NULL)::int AS packed
       FROM run_kits x JOIN runs r ON r.id = x.run_id JOIN colourways c ON c.id = r.colourway_id
       JOIN kit_versions v ON v.id = c.kit_version_id JOIN kit_designs k ON k.id = v.kit_design_id
       LEFT JOIN run_lengths l ON l.run_kit_id = x.id AND l.state <> 'cancelled'
      WHERE x.state IN ('waiting','cut') AND r.state <> 'cancelled'
      GROUP BY x.id, r.id, k.name, c.name
      ORDER BY (count(l.id) FILTER (WHERE l.state = 'cut') = count(l.id)) DESC, r.due NULLS LAST, r.id, x.number LIMIT $1`,
    { bind: [most], type: QueryTypes.SELECT },
  );
}
