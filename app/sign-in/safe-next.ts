/** Where to go after signing in: only a path of our own, never an address that somebody put into a link. */
export function safeNext(next: unknown): string {
  if (typeof next !== "string" || !next.startsWith("/") || next.startsWith("//") || next.includes("\\")) return "/staff";
  return next.startsWith("/sign-in") ? "/staff" : next;
}
