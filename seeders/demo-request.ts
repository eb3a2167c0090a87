import { createHash } from "node:crypto";

/** A request id that is always the same for the same name, so that a second seeding is answered from the first. */
export function demoRequestId(name: string): string {
  const hex = createHash("sha256").update(`ellwand demo: ${name}`).digest("hex");
  return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-4${hex.slice(13, 16)}-8${hex.slice(17, 20)}-${hex.slice(20, 32)}`;
}

/** The value of a use case that must not be refused while seeding. */
export function must<Value>(what: string, result: { readonly ok: true; readonly value: Value } | { readonly ok: false; readonly fault: { readonly code: string; readonly message: string } }): Value {
  if (!result.ok) throw new Error(`The demo shop could not be seeded: ${what}: ${result.fault.code}: ${result.fault.message}`);
  return result.value;
}
