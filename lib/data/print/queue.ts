import { QueryTypes, type Transaction } from "sequelize";
import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import { db } from "@/models/database";

export type Printer = "label-4x6" | "label-small" | "receipt" | "sheet";

export interface PrintRequest {
  readonly printer: Printer;
  readonly title: string;
  /** A PrintDocument of labels/documents. */
  readonly document: object;
  readonly copies: number;
}

export interface PrintJobView {
  readonly id: number;
  readonly printer: Printer;
  readonly title: string;
  readonly copies: number;
  readonly state: "waiting" | "printing" | "printed" | "failed" | "withdrawn";
  readonly attempts: number;
  readonly error: string | null;
  readonly askedBy: string | null;
  readonly askedAt: string;
}

/** A page that took a job and was closed gives it back after this long. */
const TAKEN_SECONDS = 60;

/** Puts a document on the queue, in the transaction that makes it necessary. Returns the job's id. */
export async function queuePrint(transaction: Transaction, actor: Actor, request: PrintRequest): Promise<number> {
  const job = await db().PrintJob.create({ ...request, askedBy: actor.personId }, { transaction });
  return job.id;
}

/** The newest jobs, at most `most`. */
export async function listPrintJobs(most = 100): Promise<PrintJobView[]> {
  return db().sequelize.query<PrintJobView>(
    `SELECT j.id, j.printer, j.title, j.copies, j.state, j.attempts, j.error, p.name AS "askedBy", j.asked_at AS "askedAt"
       FROM print_jobs j LEFT JOIN people p ON p.id = j.asked_by ORDER BY j.id DESC LIMIT $1`,
    { bind: [most], type: QueryTypes.SELECT },
  );
}

/** Takes the oldest waiting job of a printer for the page that stands beside it. */
export async function takePrintJob(printer: Printer): Promise<{ id: number; title: string } | null> {
  const [job] = await db().sequelize.query<{ id: number; title: string }>(
    `UPDATE print_jobs SET state = 'printing', taken_at = now(), attempts = attempts + 1
      WHERE id = (SELECT id FROM print_jobs
                   WHERE printer = $1 AND (state = 'waiting' OR (state = 'printing' AND taken_at < now() - make_interval(secs => $2)))
                   ORDER BY id LIMIT 1 FOR UPDATE SKIP LOCKED)
      RETURNING id, title`,
    { bind: [printer, TAKEN_SECONDS], type: QueryTypes.SELECT },
  );
  return job ?? null;
}

export async function getPrintDocument(id: number): Promise<{ title: string; document: object; copies: number } | null> {
  const job = await db().PrintJob.findByPk(id, { raw: true });
  return job ? { title: job.title, document: job.document as object, copies: job.copies } : null;
}

/** What became of a job: printed, failed with a reason, withdrawn, or waiting again (a reprint). Faults: `forbidden`, `unknown-job`. */
export async function settlePrintJob(
  actor: Actor,
  { id, state, error }: { id: number; state: "printed" | "failed" | "withdrawn" | "waiting"; error?: string },
): Promise<Result<{ id: number; state: string }, "forbidden" | "unknown-job">> {
  if (!can(actor, "print.ask")) return fail("forbidden", "Sign in to print.");
  const printedAt = state === "printed" ? new Date() : null;
  const [changed] = await db().PrintJob.update({ state, error: error ?? null, printedAt }, { where: { id } });
  return changed ? ok({ id, state }) : fail("unknown-job", `There is no print job ${id}; it may have been cleared away.`);
}
