import { QueryTypes } from "sequelize";
import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import type { ExceptionKind } from "@/lib/data/raise-exception";
import { db } from "@/models/database";

export interface ExceptionView {
  readonly id: number;
  readonly kind: ExceptionKind;
  readonly sentence: string;
  readonly boltTag: string | null;
  readonly run: { readonly id: number; readonly code: string } | null;
  readonly facts: Readonly<Record<string, unknown>>;
  readonly raisedAt: string;
  readonly settledAt: string | null;
  readonly settledBy: string | null;
  readonly settlement: string | null;
}

export interface ExceptionPage {
  readonly exceptions: readonly ExceptionView[];
  /** How many wait altogether. */
  readonly open: number;
  /** Hand it back as `before` for the page that follows. */
  readonly next: number | null;
}

const A_PAGE = 50;

/** What facts upset, newest first: those that wait, or (`settled`) those that were settled. Faults: `forbidden`. */
export async function listExceptions(actor: Actor, { settled = false, before = null }: { settled?: boolean; before?: number | null } = {}): Promise<Result<ExceptionPage, "forbidden">> {
  if (!can(actor, "exception.see")) return fail("forbidden", "This list is for managers and owners.");
  const rows = await db().sequelize.query<Omit<ExceptionView, "raisedAt" | "settledAt"> & { raisedAt: Date; settledAt: Date | null }>(
    `SELECT e.id, e.kind, e.sentence, b.tag AS "boltTag", e.facts, e.raised_at AS "raisedAt", e.settled_at AS "settledAt",
            p.name AS "settledBy", e.settlement,
            CASE WHEN r.id IS NULL THEN NULL ELSE json_build_object('id', r.id, 'code', r.code) END AS run
       FROM exceptions e LEFT JOIN bolts b ON b.id = e.bolt_id LEFT JOIN runs r ON r.id = e.run_id LEFT JOIN people p ON p.id = e.settled_by
      WHERE (e.settled_at IS NOT NULL) = $1 AND ($2::int IS NULL OR e.id < $2) ORDER BY e.id DESC LIMIT ${A_PAGE + 1}`,
    { bind: [settled, before], type: QueryTypes.SELECT },
  );
  const exceptions = rows.slice(0, A_PAGE).map((row) => ({ ...row, raisedAt: row.raisedAt.toISOString(), settledAt: row.settledAt?.toISOString() ?? null }));
  const open = await db().Exception.count({ where: { settledAt: null } });
  return ok({ exceptions, open, next: rows.length > A_PAGE ? (exceptions.at(-1)?.id ?? null) : null });
}
