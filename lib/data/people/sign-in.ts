import { Op } from "sequelize";
import { fail, ok, type Result } from "@/lib/core/result";
import { db } from "@/models/database";
import { checkPassword } from "./passwords";
import { startSession } from "./sessions";

export interface SignInInput {
  readonly email: string;
  readonly password: string;
  /** The caller's network address. */
  readonly address: string;
  readonly device: string;
}

const WINDOW_MINUTES = 15;
const MOST_PER_EMAIL = 8;
const MOST_PER_ADDRESS = 60;
/** Where no trusted proxy names the caller, all callers look alike, and one must not lock out the others. */
export const UNKNOWN_ADDRESS = "direct";

/**
 * Signs in by e-mail and password. Faults: `too-many` after 8 failures for one e-mail or 60 from one address in a
 * quarter of an hour; `wrong-sign-in` for everything else, without saying which part was wrong.
 */
export async function signIn(input: SignInInput): Promise<Result<{ personId: number; name: string; sessionId: string }, "too-many" | "wrong-sign-in">> {
  const email = input.email.trim().toLowerCase().slice(0, 254);
  if (await tooMany(email, input.address)) {
    return fail("too-many", `Too many tries. Wait ${WINDOW_MINUTES} minutes, or ask the owner for a new password link.`);
  }
  const person = await db().Person.findOne({ where: { email, active: true } });
  const right = await checkPassword(person?.passwordHash ?? null, input.password.slice(0, 1000));
  await db().SignInAttempt.create({ email, address: input.address, succeeded: right });
  if (!person || !right) return fail("wrong-sign-in", "That e-mail and password do not go together.");
  return ok({ personId: person.id, name: person.name, sessionId: await startSession(person.id, input.device) });
}

async function tooMany(email: string, address: string): Promise<boolean> {
  const since = { [Op.gt]: new Date(Date.now() - WINDOW_MINUTES * 60_000) };
  const [byEmail, byAddress] = await Promise.all([
    db().SignInAttempt.count({ where: { email, succeeded: false, at: since } }),
    address === UNKNOWN_ADDRESS ? 0 : db().SignInAttempt.count({ where: { address, succeeded: false, at: since } }),
  ]);
  return byEmail >= MOST_PER_EMAIL || byAddress >= MOST_PER_ADDRESS;
}
