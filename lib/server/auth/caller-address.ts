type SentHeaders = Readonly<Record<string, string | string[] | undefined>>;

/** The caller's network address for the sign-in limit; X-Forwarded-For counts only behind a proxy of our own. */
export function callerAddress(headers: SentHeaders, behindProxy: boolean): string {
  const forwarded = headers["x-forwarded-for"];
  const first = (Array.isArray(forwarded) ? forwarded[0] : forwarded)?.split(",")[0]?.trim();
  return behindProxy && first ? first.slice(0, 60) : "direct";
}
