import { headers } from "next/headers";
import { forbidden, redirect } from "next/navigation";
import { can, type Actor, type Permission } from "@/lib/core/policy/policy";
import { currentActor } from "./current-actor";

/** The first line of every staff page: sends to the sign-in page, or answers 403, or hands back who asks. */
export async function requireActor(permission: Permission): Promise<Actor> {
  const actor = await currentActor();
  if (!actor) redirect(`/sign-in?next=${encodeURIComponent((await headers()).get("x-ellwand-path") ?? "/staff")}`);
  if (!can(actor, permission)) forbidden();
  return actor;
}
