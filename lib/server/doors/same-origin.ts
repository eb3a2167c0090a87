/**
 * Whether a writing request comes from our own pages. Next lets a server action without an Origin run, and believes
 * X-Forwarded-Host, so each door asks for itself: Sec-Fetch-Site same-origin, or an Origin that names our own address.
 */
export function isSameOrigin(headers: Headers, ownAddress: string): boolean {
  const site = headers.get("sec-fetch-site");
  if (site) return site === "same-origin";
  const origin = headers.get("origin");
  if (!origin || origin === "null") return false;
  try {
    const said = new URL(origin).host;
    return said === new URL(ownAddress).host || said === headers.get("host");
  } catch {
    return false;
  }
}
