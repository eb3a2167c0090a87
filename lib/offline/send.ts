import type { Answer, Entry } from "./entry";

/** Sends one entry to its route. Only an answer of the shop's own server counts as one. */
export async function sendEntry(entry: Entry, request: typeof fetch = fetch): Promise<Answer> {
  let response: Response;
  try {
    response = await request(entry.path, {
      method: "POST",
      headers: { "content-type": "application/json" },
      body: JSON.stringify({ ...entry.body, requestId: entry.id }),
      credentials: "same-origin",
    });
  } catch {
    return { kind: "later", reason: "no-network" };
  }
  if (response.ok) return { kind: "taken", value: await response.json().catch(() => null) };
  if (response.status === 401) return { kind: "later", reason: "signed-out" };
  if (response.status >= 500 || response.status === 429 || response.status === 408) return { kind: "later", reason: "server-down" };
  const answer = (await response.json().catch(() => null)) as { fault?: { message?: string } } | null;
  // A page of somebody else's (a hotel's sign-in page, a proxy) is no refusal: only our own sentence is.
  return answer?.fault?.message ? { kind: "refused", sentence: answer.fault.message } : { kind: "later", reason: "server-down" };
}
