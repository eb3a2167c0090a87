import { QueryTypes } from "sequelize";
import type { Length } from "@/lib/core/measure/length";
import { db } from "@/models/database";

export type RunState = "reserved" | "cutting" | "cut" | "packed" | "cancelled";
export type RunKitState = "waiting" | "cut" | "packed" | "sold" | "broken-down" | "cancelled";

export interface RunListing {
  readonly id: number;
  readonly code: string;
  readonly kit: string;
  readonly kitSlug: string;
  readonly colourway: string;
  readonly kits: number;
  readonly purpose: "shelf" | "class" | "orders";
  /** ISO date, or null. */
  readonly due: string | null;
  readonly state: RunState;
  readonly lengths: number;
  readonly cut: number;
  /** Lengths promised to the run that no longer fit on their bolts. */
  readonly short: number;
  readonly packed: number;
  readonly madeAt: string;
}

export interface RunLengthView {
  readonly id: number;
  readonly kitNumber: number;
  readonly serial: string;
  readonly fabricId: number;
  readonly fabric: string;
  readonly tile: string;
  readonly colour: string;
  readonly boltTag: string | null;
  readonly lot: string | null;
  readonly shelf: string | null;
  readonly length: Length;
  /** What was really cut, or null. */
  readonly actual: Length | null;
  readonly cutId: number | null;
  readonly sequence: number;
  readonly state: "to-cut" | "cut" | "short" | "cancelled";
  readonly packed: boolean;
}

export interface RunKitView {
  readonly id: number;
  readonly number: number;
  readonly serial: string;
  readonly state: RunKitState;
  readonly shelf: string;
  readonly lengths: number;
  readonly cut: number;
  readonly packedLengths: number;
}

export interface RunView extends RunListing {
  readonly colourwayId: number;
  readonly runLengths: readonly RunLengthView[];
  readonly runKits: readonly RunKitView[];
}

const LISTING = `
  SELECT r.id, r.code, k.name AS kit, k.slug AS "kitSlug", c.name AS colourway, c.id AS "colourwayId", r.kits, r.purpose, r.due::text, r.state, r.made_at AS "madeAt",
         (SELECT count(*)::int FROM run_lengths l WHERE l.run_id = r.id AND l.state <> 'cancelled') AS lengths,
         (SELECT count(*)::int FROM run_lengths l WHERE l.run_id = r.id AND l.state = 'cut') AS cut,
         (SELECT COALESCE(SUM(v.count), 0)::int FROM reservations v WHERE v.run_id = r.id AND v.state = 'short') AS short,
         (SELECT count(*)::int FROM run_kits x WHERE x.run_id = r.id AND x.state IN ('packed','sold')) AS packed
    FROM runs r JOIN colourways c ON c.id = r.colourway_id
    JOIN kit_versions v ON v.id = c.kit_version_id JOIN kit_designs k ON k.id = v.kit_design_id`;

/** Runs, the newest first; only those under way, or all. At most `most`. */
export async function listRuns({ open, most = 200 }: { open: boolean; most?: number }): Promise<RunListing[]> {
  return db().sequelize.query<RunListing>(`${LISTING} ${open ? "WHERE r.state NOT IN ('packed','cancelled')" : ""} ORDER BY r.id DESC LIMIT $1`, {
    bind: [most],
    type: QueryTypes.SELECT,
  });
}

/** A run by its code with every length in cutting order and every kit; null when there is none. Three queries. */
export async function getRun(code: string): Promise<RunView | null> {
  const [run] = await db().sequelize.query<RunListing & { colourwayId: number }>(`${LISTING} WHERE r.code = $1`, { bind: [code], type: QueryTypes.SELECT });
  if (!run) return null;
  const [runLengths, runKits] = await Promise.all([listRunLengths(run.id), listRunKits(run.id)]);
  return { ...run, runLengths, runKits };
}

export async function listRunLengths(runId: number): Promise<RunLengthView[]> {
  return db().sequelize.query<RunLengthView>(
    `SELECT l.id, k.number AS "kitNumber", k.serial, l.fabric_id AS "fabricId", f.name AS fabric, f.tile, f.colour,
            b.tag AS "boltTag", b.lot, b.shelf, l.length, x.ends_at - x.starts_at AS actual, l.cut_id AS "cutId",
            l.sequence, l.state, l.packed_at IS NOT NULL AS packed
       FROM run_lengths l JOIN run_kits k ON k.id = l.run_kit_id JOIN fabrics f ON f.id = l.fabric_id
       LEFT JOIN bolts b ON b.id = l.bolt_id LEFT JOIN cuts x ON x.id = l.cut_id
      WHERE l.run_id = $1 ORDER BY l.sequence, l.id`,
    { bind: [runId], type: QueryTypes.SELECT },
  );
}

async function listRunKits(runId: number): Promise<RunKitView[]> {
  return db().sequelize.query<RunKitView>(
    `SELECT k.id, k.number, k.serial, k.state, k.shelf, count(l.id)::int AS lengths,
            count(l.id) FILTER (WHERE l.state = 'cut')::int AS cut, count(l.id) FILTER (WHERE l.packed_at IS NOT NULL)::int AS "packedLengths"
       FROM run_kits k LEFT JOIN run_lengths l ON l.run_kit_id = k.id AND l.state <> 'cancelled'
      WHERE k.run_id = $1 GROUP BY k.id ORDER BY k.number`,
    { bind: [runId], type: QueryTypes.SELECT },
  );
}
