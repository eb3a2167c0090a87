export type Posted<Value> = { readonly ok: true; readonly value: Value } | { readonly ok: false; readonly sentence: string };

/** Sends a write to one of our routes and hands back its value or its sentence; a lost network is a sentence too. */
export async function postJson<Value = unknown>(path: string, body: object): Promise<Posted<Value>> {
  try {
    const response = await fetch(path, { method: "POST", headers: { "content-type": "application/json" }, body: JSON.stringify(body), credentials: "same-origin" });
    const answer = (await response.json()) as { fault?: { message: string } } & Value;
    return response.ok ? { ok: true, value: answer } : { ok: false, sentence: answer.fault?.message ?? "The server did not take it. Try again." };
  } catch {
    return { ok: false, sentence: "There is no connection to the shop’s server. What you wrote is still here; try again." };
  }
}
