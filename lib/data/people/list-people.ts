import { QueryTypes } from "sequelize";
import { isRole, type RoleName } from "@/lib/core/policy/policy";
import { db } from "@/models/database";

export interface PersonView {
  readonly id: number;
  readonly name: string;
  readonly email: string;
  readonly roles: readonly RoleName[];
  readonly place: string | null;
  readonly active: boolean;
  /** False until the invitation has been accepted. */
  readonly joined: boolean;
  /** Sessions that are open now. */
  readonly sessions: number;
  /** ISO time of the last request, or null. */
  readonly lastSeen: string | null;
}

/** Everybody who works or worked here, active people first, by name. */
export async function listPeople(): Promise<PersonView[]> {
  const rows = await db().sequelize.query<Omit<PersonView, "roles"> & { roles: string[] }>(
    `SELECT p.id, p.name, p.email, p.roles, p.place, p.active, p.password_hash IS NOT NULL AS joined,
            count(s.id)::int AS sessions, max(s.last_seen_at) AS "lastSeen"
       FROM people p LEFT JOIN sessions s ON s.person_id = p.id AND s.revoked_at IS NULL AND s.expires_at > now()
      GROUP BY p.id ORDER BY p.active DESC, p.name, p.id`,
    { type: QueryTypes.SELECT },
  );
  return rows.map((row) => ({ ...row, roles: row.roles.filter(isRole) }));
}
