import { Op, type Transaction } from "sequelize";
import { can, type Actor, type RoleName } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import { answerOnce } from "@/lib/data/answer-once";
import { recordChange } from "@/lib/data/record-change";
import { db } from "@/models/database";
import { sendLink } from "./invitations";
import { endSessionsOf } from "./sessions";

type Fault = "forbidden" | "email-taken" | "unknown-person" | "last-owner" | "request-reused" | "no-role";

export interface InviteInput {
  readonly requestId: string;
  readonly name: string;
  readonly email: string;
  readonly roles: readonly RoleName[];
  readonly place: string | null;
  readonly address: string;
}

/** Makes a person without a password and sends the link that sets one. */
export async function invitePerson(actor: Actor, input: InviteInput): Promise<Result<{ personId: number }, Fault>> {
  if (!can(actor, "people.manage")) return forbidden();
  return answerOnce(actor, "people.invite", input, async (transaction) => {
    const email = input.email.toLowerCase();
    if (input.roles.length === 0) return fail("no-role", "Nothing is ticked. Tick at least one role.", { fields: { roles: "Tick at least one role." } });
    if (await db().Person.count({ where: { email }, transaction })) {
      return fail("email-taken", `${email} already has a place here.`, { fields: { email: `${email} already has a place here.` } });
    }
    const person = await db().Person.create({ name: input.name, email, roles: [...input.roles], place: input.place }, { transaction });
    await sendLink(transaction, { personId: person.id, purpose: "join", madeBy: actor.personId, address: input.address });
    await recordChange(transaction, actor, { subject: "person", subjectId: person.id, act: "invited", details: { roles: input.roles } });
    return ok({ personId: person.id });
  });
}

/** Sends a fresh link to somebody who has forgotten the password or has not joined yet. */
export async function resendLink(actor: Actor, input: { requestId: string; personId: number; address: string }): Promise<Result<{ email: string }, Fault>> {
  if (!can(actor, "people.manage")) return forbidden();
  return answerOnce(actor, "people.link", input, async (transaction) => {
    const person = await db().Person.findOne({ where: { id: input.personId, active: true }, transaction });
    if (!person) return unknown();
    await sendLink(transaction, { personId: person.id, purpose: person.passwordHash ? "new-password" : "join", madeBy: actor.personId, address: input.address });
    return ok({ email: person.email });
  });
}

export interface ChangeInput {
  readonly requestId: string;
  readonly personId: number;
  readonly name: string;
  readonly roles: readonly RoleName[];
  readonly place: string | null;
  readonly active: boolean;
}

/** Changes name, roles and place, or lets somebody go. Roles count from the next request; who is let go is signed out at once. */
export async function changePerson(actor: Actor, input: ChangeInput): Promise<Result<{ personId: number }, Fault>> {
  if (!can(actor, "people.manage")) return forbidden();
  return answerOnce(actor, "people.change", input, async (transaction) => {
    const person = await db().Person.findByPk(input.personId, { transaction, lock: transaction.LOCK.NO_KEY_UPDATE });
    if (!person) return unknown();
    const staysOwner = input.active && input.roles.includes("owner");
    if (!staysOwner && (await isLastOwner(transaction, person.id))) {
      return fail("last-owner", "This is the only owner. Make somebody else an owner first.");
    }
    if (input.active && input.roles.length === 0) return fail("no-role", "Nothing is ticked. Tick at least one role.", { fields: { roles: "Tick at least one role." } });
    const before = { name: person.name, roles: person.roles, place: person.place, active: person.active };
    await person.update({ name: input.name, roles: [...input.roles], place: input.place, active: input.active }, { transaction });
    if (!input.active) await endSessionsOf(person.id, transaction);
    await recordChange(transaction, actor, { subject: "person", subjectId: person.id, act: "changed", details: { before, after: { name: input.name, roles: input.roles, place: input.place, active: input.active } } });
    return ok({ personId: person.id });
  });
}

/** Ends every session of a person at once. */
export async function signOutEverywhere(actor: Actor, input: { requestId: string; personId: number }): Promise<Result<{ personId: number }, Fault>> {
  if (!can(actor, "people.manage") && actor.personId !== input.personId) return forbidden();
  return answerOnce(actor, "people.sign-out", input, async (transaction) => {
    await endSessionsOf(input.personId, transaction);
    await recordChange(transaction, actor, { subject: "person", subjectId: input.personId, act: "signed out everywhere", details: {} });
    return ok({ personId: input.personId });
  });
}

/** Owners are locked in id order, so that two owners cannot let each other go at the same moment. */
async function isLastOwner(transaction: Transaction, personId: number): Promise<boolean> {
  const owners = await db().Person.findAll({
    where: { active: true, roles: { [Op.contains]: ["owner"] } },
    order: [["id", "ASC"]],
    lock: transaction.LOCK.NO_KEY_UPDATE,
    transaction,
  });
  return owners.length === 1 && owners[0]?.id === personId;
}

function forbidden() {
  return fail("forbidden", "Only an owner can do this.");
}

function unknown() {
  return fail("unknown-person", "There is nobody of that number here any more.");
}
