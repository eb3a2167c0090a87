import { headers } from "next/headers";
import type { z } from "zod";
import { can, type Actor, type Permission } from "@/lib/core/policy/policy";
import { type Result } from "@/lib/core/result";
import { currentActor } from "@/lib/server/auth/current-actor";
import { environment } from "@/lib/server/environment";
import { formToObject, parseInput } from "./parse-input";
import { foreignOrigin, notAllowed, notSignedIn } from "./refusals";
import { isSameOrigin } from "./same-origin";

/**
 * The door of every server action: origin, sign-in, parse, authorise, then the use case. `tests/unit/doors` lists every
 * exported action with the permission it names here.
 */
export function action<Schema extends z.ZodType, Value>(
  schema: Schema,
  permission: Permission,
  work: (actor: Actor, input: z.output<Schema>) => Promise<Result<Value>>,
): (input: z.input<Schema> | FormData) => Promise<Result<Value>> {
  return async (input) => {
    if (!(await fromOurPages())) return foreignOrigin();
    const actor = await currentActor();
    if (!actor) return notSignedIn();
    if (!can(actor, permission)) return notAllowed(permission);
    const parsed = parseInput(schema, input instanceof FormData ? formToObject(input) : input);
    return parsed.ok ? work(actor, parsed.value) : parsed;
  };
}

/** The door of the few actions that need no sign-in (signing in by invitation, the first-run page). */
export function openAction<Schema extends z.ZodType, Value>(
  schema: Schema,
  work: (input: z.output<Schema>) => Promise<Result<Value>>,
): (input: z.input<Schema> | FormData) => Promise<Result<Value>> {
  return async (input) => {
    if (!(await fromOurPages())) return foreignOrigin();
    const parsed = parseInput(schema, input instanceof FormData ? formToObject(input) : input);
    return parsed.ok ? work(parsed.value) : parsed;
  };
}

async function fromOurPages(): Promise<boolean> {
  return isSameOrigin(await headers(), environment().NEXTAUTH_URL);
}
