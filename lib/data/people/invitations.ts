import { createHash, randomBytes } from "node:crypto";
import { Op, type Transaction } from "sequelize";
import { fail, ok, type Result } from "@/lib/core/result";
import { inTransaction } from "@/lib/data/in-transaction";
import { queueMail } from "@/lib/data/mail/outbox";
import { db } from "@/models/database";
import { hashPassword } from "./passwords";
import { endSessionsOf } from "./sessions";

const DAYS = 7;
export const LEAST_PASSWORD = 10;
export const MOST_PASSWORD = 200;

interface Letter {
  readonly personId: number;
  readonly purpose: "join" | "new-password";
  readonly madeBy: number;
  /** The shop's own address, such as https://shop.example. */
  readonly address: string;
}

/** Makes a link that sets a password once, and queues the letter that carries it. The database keeps only the token's hash. */
export async function sendLink(transaction: Transaction, { personId, purpose, madeBy, address }: Letter): Promise<void> {
  const person = await db().Person.findByPk(personId, { transaction, rejectOnEmpty: true });
  const shop = await db().Shop.findByPk(1, { transaction });
  const token = randomBytes(24).toString("base64url");
  await db().Invitation.update({ usedAt: new Date() }, { where: { personId, usedAt: null }, transaction });
  await db().Invitation.create(
    { personId, purpose, madeBy, tokenHash: hashOf(token), expiresAt: new Date(Date.now() + DAYS * 86_400_000) },
    { transaction },
  );
  const shopName = shop?.name ?? "the shop";
  const link = `${address}/join?token=${token}`;
  const joining = purpose === "join";
  await queueMail(transaction, {
    kind: joining ? "invitation" : "new-password",
    to: person.email,
    subject: joining ? `Your place at ${shopName}` : `A new password for ${shopName}`,
    body: joining
      ? `${person.name},\n\n${shopName} has made a place for you in Ellwand. Choose a password here:\n\n${link}\n\nThe link works once, for ${DAYS} days.\n`
      : `${person.name},\n\nChoose a new password here:\n\n${link}\n\nThe link works once, for ${DAYS} days. If you did not ask for it, tell the owner.\n`,
  });
}

export interface OpenInvitation {
  readonly name: string;
  readonly email: string;
  readonly purpose: "join" | "new-password";
}

/** Whom a token still works for, or null. */
export async function getInvitation(token: string): Promise<OpenInvitation | null> {
  const found = await openInvitation(token);
  return found ? { name: found.person.name, email: found.person.email, purpose: found.invitation.purpose as OpenInvitation["purpose"] } : null;
}

/** Sets the password, uses the link up and ends every session of that person. Faults: `link-over`. */
export async function acceptInvitation({ token, password }: { token: string; password: string }): Promise<Result<{ email: string }, "link-over">> {
  const passwordHash = await hashPassword(password);
  return inTransaction(async (transaction) => {
    const found = await openInvitation(token, transaction);
    if (!found) return fail("link-over", "This link has been used or is more than a week old. Ask the owner to send another.");
    const [used] = await db().Invitation.update({ usedAt: new Date() }, { where: { id: found.invitation.id, usedAt: null }, transaction });
    if (used === 0) return fail("link-over", "This link has just been used. Sign in with the password that was chosen.");
    await db().Person.update({ passwordHash }, { where: { id: found.person.id }, transaction });
    await endSessionsOf(found.person.id, transaction);
    return ok({ email: found.person.email });
  });
}

async function openInvitation(token: string, transaction?: Transaction) {
  const invitation = await db().Invitation.findOne({ where: { tokenHash: hashOf(token), usedAt: null, expiresAt: { [Op.gt]: new Date() } }, transaction });
  const person = invitation && (await db().Person.findOne({ where: { id: invitation.personId, active: true }, transaction }));
  return invitation && person ? { invitation, person } : null;
}

function hashOf(token: string): string {
  return createHash("sha256").update(token).digest("hex");
}
