import { holders, type Permission } from "@/lib/core/policy/policy";
import { fail } from "@/lib/core/result";

export function notSignedIn() {
  return fail("not-signed-in", "Nobody is signed in here any more. Sign in again; what you typed is still on the page.");
}

export function notAllowed(permission: Permission) {
  return fail("forbidden", `This is for ${listed(holders(permission))}. Ask one of them, or ask the owner to add the role to you.`);
}

export function foreignOrigin() {
  return fail("foreign-origin", "The request did not come from this shop's own pages, so nothing was done.");
}

function listed(words: readonly string[]): string {
  return words.length < 2 ? (words[0] ?? "nobody") : `${words.slice(0, -1).join(", ")} and ${words.at(-1)}`;
}
