import { QueryTypes } from "sequelize";
import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import { fromCore, type BoltDetail, type BoltView, type CutView, type HistoryView, type ReservationView } from "@/lib/data/bolt-view";
import { db } from "@/models/database";
import { loadBolts } from "./load-bolts";
import { asTag } from "./lock-bolts";

const MOST_HISTORY = 100;

/** One bolt with its chain of cuts, its flaws, what is promised on it and its trail. Faults: `forbidden`, `unknown-bolt`. */
export async function getBolt(actor: Actor, { tag }: { tag: string }): Promise<Result<BoltDetail, "forbidden" | "unknown-bolt">> {
  if (!can(actor, "bolt.see")) return fail("forbidden", "Bolts are shown to people who work here.");
  const [bolt] = await loadBolts({ where: "b.tag = $1", bind: [asTag(tag)] });
  if (!bolt) return fail("unknown-bolt", `No bolt has the tag ${tag}. Scan the tag on the bolt's end, or find the bolt by its fabric.`);
  const [cuts, reservations, history] = await Promise.all([readCuts(bolt), readReservations(bolt.id), readHistory(bolt.id)]);
  return ok({ ...bolt, cuts, reservations, history });
}

interface CutRow {
  readonly id: number;
  readonly startsAt: number;
  readonly endsAt: number;
  readonly purpose: CutView["purpose"];
  readonly planned: number | null;
  readonly runId: number | null;
  readonly runCode: string | null;
  readonly number: number | null;
  readonly serial: string | null;
  readonly kitState: string | null;
  readonly packed: boolean;
  readonly person: string | null;
  readonly at: Date;
  readonly note: string;
}

async function readCuts(bolt: BoltView): Promise<CutView[]> {
  const rows = await db().sequelize.query<CutRow>(
    `SELECT c.id, c.starts_at AS "startsAt", c.ends_at AS "endsAt", c.purpose, l.length AS planned, r.id AS "runId", r.code AS "runCode",
            k.number, k.serial, k.state AS "kitState", l.packed_at IS NOT NULL AS packed, p.name AS person, c.at, c.note
       FROM cuts c LEFT JOIN people p ON p.id = c.person_id
       LEFT JOIN run_lengths l ON l.id = c.run_length_id LEFT JOIN runs r ON r.id = l.run_id LEFT JOIN run_kits k ON k.id = l.run_kit_id
      WHERE c.bolt_id = $1 ORDER BY c.starts_at`,
    { bind: [bolt.id], type: QueryTypes.SELECT },
  );
  return rows.map((row) => ({
    id: row.id,
    startsAt: row.startsAt,
    endsAt: row.endsAt,
    coreFrom: fromCore(bolt.putUp, row.startsAt),
    coreTo: fromCore(bolt.putUp, row.endsAt),
    length: row.endsAt - row.startsAt,
    purpose: row.purpose,
    planned: row.purpose === "kit" ? row.planned : null,
    kit: row.runId !== null && row.runCode !== null && row.number !== null && row.serial !== null ? { runId: row.runId, runCode: row.runCode, number: row.number, serial: row.serial } : null,
    person: row.person,
    at: row.at.toISOString(),
    note: row.note,
    canUndo: row.endsAt === bolt.cutEdge && row.purpose !== "sale" && !row.packed && (row.kitState === null || ["waiting", "cut", "cancelled"].includes(row.kitState)),
  }));
}

async function readReservations(boltId: number): Promise<ReservationView[]> {
  const rows = await db().sequelize.query<Omit<ReservationView, "madeAt"> & { madeAt: Date }>(
    `SELECT v.id, v.length, v.count, v.state, v.made_at AS "madeAt",
            CASE WHEN r.id IS NULL THEN NULL ELSE json_build_object('id', r.id, 'code', r.code, 'purpose', r.purpose) END AS run
       FROM reservations v LEFT JOIN runs r ON r.id = v.run_id
      WHERE v.bolt_id = $1 AND v.state <> 'ended' ORDER BY v.made_at, v.id`,
    { bind: [boltId], type: QueryTypes.SELECT },
  );
  return rows.map((row) => ({ ...row, madeAt: row.madeAt.toISOString() }));
}

async function readHistory(boltId: number): Promise<HistoryView[]> {
  const rows = await db().sequelize.query<Omit<HistoryView, "at"> & { at: Date }>(
    `SELECT h.id, h.at, p.name AS person, h.act, h.details FROM changes h LEFT JOIN people p ON p.id = h.person_id
      WHERE h.subject = 'bolt' AND h.subject_id = $1 ORDER BY h.id DESC LIMIT ${MOST_HISTORY}`,
    { bind: [String(boltId)], type: QueryTypes.SELECT },
  );
  return rows.map((row) => ({ ...row, at: row.at.toISOString() }));
}
