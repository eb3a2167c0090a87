import { randomUUID } from "node:crypto";
import { QueryTypes, type Transaction } from "sequelize";
import { isRole, type Actor } from "@/lib/core/policy/policy";
import { db } from "@/models/database";

const HOURS = 12;

/** Opens a session for a person who has just proved who they are. Returns its id (a UUID). */
export async function startSession(personId: number, device: string): Promise<string> {
  const id = randomUUID();
  const expiresAt = new Date(Date.now() + HOURS * 3_600_000);
  await db().Session.create({ id, personId, expiresAt, device });
  return id;
}

/** The actor of a live session of an active person, or null. One query. */
export async function readSession(id: string): Promise<Actor | null> {
  const [row] = await db().sequelize.query<{ personId: number; name: string; roles: string[]; place: string | null }>(
    `SELECT p.id AS "personId", p.name, p.roles, p.place
       FROM sessions s JOIN people p ON p.id = s.person_id
      WHERE s.id = $1 AND s.revoked_at IS NULL AND s.expires_at > now() AND p.active`,
    { bind: [id], type: QueryTypes.SELECT },
  );
  return row ? { personId: row.personId, sessionId: id, name: row.name, roles: row.roles.filter(isRole), place: row.place } : null;
}

export async function endSession(id: string): Promise<void> {
  await db().Session.update({ revokedAt: new Date() }, { where: { id, revokedAt: null } });
}

/** Ends every session of a person at once; used when they leave, change their password or lose a role. */
export async function endSessionsOf(personId: number, transaction?: Transaction): Promise<void> {
  await db().Session.update({ revokedAt: new Date() }, { where: { personId, revokedAt: null }, transaction });
}
