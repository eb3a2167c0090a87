import { createHash, randomUUID } from "node:crypto";
import { QueryTypes } from "sequelize";
import { CORE_VERSION } from "@/lib/core/core-version";
import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import { canonicalJson } from "@/lib/data/canonical-json";
import { db } from "@/models/database";

export type PlanKind = "kit" | "bolts";
export type JobState = "waiting" | "running" | "done" | "stopped" | "failed";

export interface JobView {
  readonly id: string;
  readonly kind: PlanKind;
  readonly state: JobState;
  /** 0 to 1. */
  readonly progress: number;
  readonly sentence: string;
  readonly result: unknown;
}

/** A job whose worker has been silent for this long is taken over by another. */
const SILENT_SECONDS = 30;

export function hashOfPlan(kind: PlanKind, input: unknown): string {
  return createHash("sha256").update(canonicalJson({ kind, input })).digest("hex");
}

/**
 * Asks for a plan. One that the same core made of the same input is handed back at once as a job that is done; one
 * that is being made is joined. Faults: `forbidden`.
 */
export async function askPlan(actor: Actor, kind: PlanKind, input: object): Promise<Result<JobView, "forbidden">> {
  if (!can(actor, "plan.ask")) return fail("forbidden", "Plans are made by designers, managers and owners.");
  const inputHash = hashOfPlan(kind, input);
  const kept = await keptPlan(inputHash);
  if (kept !== null) return ok({ id: inputHash, kind, state: "done", progress: 1, sentence: "", result: kept });
  const [running] = await db().PlanningJob.findAll({ where: { inputHash, coreVersion: CORE_VERSION, state: ["waiting", "running"], stopAsked: false }, limit: 1 });
  const job = running ?? (await db().PlanningJob.create({ id: randomUUID(), kind, input, inputHash, coreVersion: CORE_VERSION, askedBy: actor.personId, sentence: "Waiting for its turn." }));
  return ok(viewOf(job));
}

/** The plan kept under an input's hash for this version of the core, or null. */
export async function keptPlan(inputHash: string): Promise<unknown> {
  const plan = await db().Plan.findOne({ where: { inputHash, coreVersion: CORE_VERSION }, raw: true });
  return plan?.result ?? null;
}

export async function getJob(id: string): Promise<JobView | null> {
  const job = await db().PlanningJob.findByPk(id);
  return job ? viewOf(job) : null;
}

/** Asks the worker to stop; the best plan so far is kept as the job's result, but not among the kept plans. */
export async function stopJob(actor: Actor, id: string): Promise<Result<JobView, "forbidden" | "unknown-job">> {
  if (!can(actor, "plan.ask")) return fail("forbidden", "Plans are stopped by designers, managers and owners.");
  await db().PlanningJob.update({ stopAsked: true }, { where: { id, state: ["waiting", "running"] } });
  const job = await db().PlanningJob.findByPk(id);
  return job ? ok(viewOf(job)) : fail("unknown-job", "There is no such planning job; it may have been cleared away.");
}

export interface TakenJob {
  readonly id: string;
  readonly kind: PlanKind;
  readonly input: object;
  readonly inputHash: string;
}

/** Takes the oldest waiting job, or one whose worker has gone silent. */
export async function takeJob(worker: string): Promise<TakenJob | null> {
  const [job] = await db().sequelize.query<TakenJob>(
    `UPDATE planning_jobs SET state = 'running', worker = $1, heartbeat_at = now()
      WHERE id = (SELECT id FROM planning_jobs
                   WHERE state = 'waiting' OR (state = 'running' AND heartbeat_at < now() - make_interval(secs => $2))
                   ORDER BY created_at LIMIT 1 FOR UPDATE SKIP LOCKED)
      RETURNING id, kind, input, input_hash AS "inputHash"`,
    { bind: [worker, SILENT_SECONDS], type: QueryTypes.SELECT },
  );
  return job ?? null;
}

/** Writes how far a job is and answers whether a person asked it to stop. */
export async function reportProgress(id: string, progress: number, sentence: string): Promise<{ stopAsked: boolean }> {
  const [row] = await db().sequelize.query<{ stopAsked: boolean }>(
    `UPDATE planning_jobs SET progress = $2, sentence = $3, heartbeat_at = now() WHERE id = $1 RETURNING stop_asked AS "stopAsked"`,
    { bind: [id, Math.round(Math.min(1, Math.max(0, progress)) * 10_000), sentence.slice(0, 300)], type: QueryTypes.SELECT },
  );
  return { stopAsked: row?.stopAsked ?? true };
}

/** Ends a job. A finished plan is kept under its input's hash; a stopped one is only the job's own. */
export async function endJob(job: TakenJob, end: { state: "done" | "stopped" | "failed"; result: unknown; sentence: string }): Promise<void> {
  await db().sequelize.transaction(async (transaction) => {
    await db().PlanningJob.update({ state: end.state, result: end.result as object, sentence: end.sentence, progress: 10_000, endedAt: new Date() }, { where: { id: job.id }, transaction });
    if (end.state !== "done") return;
    await db().sequelize.query(
      `INSERT INTO plans (input_hash, core_version, kind, input, result) VALUES ($1, $2, $3, $4, $5) ON CONFLICT DO NOTHING`,
      { bind: [job.inputHash, CORE_VERSION, job.kind, JSON.stringify(job.input), JSON.stringify(end.result)], transaction },
    );
  });
}

function viewOf(job: { id: string; kind: string; state: string; progress: number; sentence: string; result: unknown }): JobView {
  return { id: job.id, kind: job.kind as PlanKind, state: job.state as JobState, progress: job.progress / 10_000, sentence: job.sentence, result: job.result };
}
