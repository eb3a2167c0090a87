import { QueryTypes, type Transaction } from "sequelize";
import { bumpRevision } from "@/lib/data/revisions";
import { db } from "@/models/database";
import type { RunKit } from "@/models/run-kit";
import type { RunLength } from "@/models/run-length";
import type { Run } from "@/models/run";

export type RunState = Run["state"] & string;
export type RunKitState = RunKit["state"] & string;
export type RunLengthState = RunLength["state"] & string;

/** A length of a run's list with its kit and run, the run locked. */
export interface LockedRunLength {
  readonly id: number;
  readonly runId: number;
  readonly runCode: string;
  readonly runState: RunState;
  readonly runKitId: number;
  readonly serial: string;
  readonly kitNumber: number;
  readonly kitState: RunKitState;
  readonly fabricId: number;
  readonly fabricName: string;
  /** The bolt that it is planned on; null when it must be planned again. */
  readonly boltId: number | null;
  readonly length: number;
  readonly plannedWidth: number;
  readonly state: RunLengthState;
  readonly cutId: number | null;
  readonly packedAt: Date | null;
}

/** Locks the run of a length (runs come before bolts) and reads the length as it then stands; null when there is none. */
export async function lockRunLength(transaction: Transaction, id: number): Promise<LockedRunLength | null> {
  await db().sequelize.query(`SELECT r.id FROM runs r JOIN run_lengths l ON l.run_id = r.id WHERE l.id = $1 FOR NO KEY UPDATE OF r`, {
    bind: [id],
    transaction,
  });
  const [row] = await db().sequelize.query<LockedRunLength>(
    `SELECT l.id, l.run_id AS "runId", r.code AS "runCode", r.state AS "runState", l.run_kit_id AS "runKitId", k.serial,
            k.number AS "kitNumber", k.state AS "kitState", l.fabric_id AS "fabricId", f.name AS "fabricName", l.bolt_id AS "boltId",
            l.length, l.planned_width AS "plannedWidth", l.state, l.cut_id AS "cutId", l.packed_at AS "packedAt"
       FROM run_lengths l JOIN runs r ON r.id = l.run_id JOIN run_kits k ON k.id = l.run_kit_id JOIN fabrics f ON f.id = l.fabric_id
      WHERE l.id = $1`,
    { bind: [id], type: QueryTypes.SELECT, transaction },
  );
  return row ?? null;
}

/**
 * Works out the states of a kit and of its run from their lengths, after one of them was cut or its cut undone. A kit is
 * cut when each of its lengths is; a run is when each length of each kit that is still to be made is.
 */
export async function advanceRun(transaction: Transaction, { runId, runKitId, runCode }: Pick<LockedRunLength, "runId" | "runKitId" | "runCode">): Promise<{ runState: RunState; kitState: RunKitState }> {
  const bind = { type: QueryTypes.SELECT, transaction } as const;
  const [kit] = await db().sequelize.query<{ state: RunKitState }>(
    `UPDATE run_kits SET state = CASE
        WHEN state NOT IN ('waiting','cut') THEN state
        WHEN EXISTS (SELECT 1 FROM run_lengths l WHERE l.run_kit_id = $1 AND l.state IN ('to-cut','short')) THEN 'waiting'
        ELSE 'cut' END
      WHERE id = $1 RETURNING state`,
    { bind: [runKitId], ...bind },
  );
  const [run] = await db().sequelize.query<{ state: RunState }>(
    `UPDATE runs SET state = CASE
        WHEN state NOT IN ('reserved','cutting','cut') THEN state
        WHEN NOT EXISTS (SELECT 1 FROM run_lengths l WHERE l.run_id = $1 AND l.state = 'cut') THEN 'reserved'
        WHEN EXISTS (SELECT 1 FROM run_lengths l WHERE l.run_id = $1 AND l.state IN ('to-cut','short')) THEN 'cutting'
        ELSE 'cut' END
      WHERE id = $1 RETURNING state`,
    { bind: [runId], ...bind },
  );
  if (!kit || !run) throw new Error(`Run ${runId} or its kit ${runKitId} vanished under its lock`);
  bumpRevision("runs", transaction);
  bumpRevision(`run:${runCode}`, transaction);
  return { runState: run.state, kitState: kit.state };
}
