/**
 * What a use case hands back. Expected failures are returned with a stable code and a sentence for the person;
 * programmer errors are thrown.
 */
export type Result<Value, Code extends string = string> =
  | { readonly ok: true; readonly value: Value }
  | { readonly ok: false; readonly fault: Fault<Code> };

export interface Fault<Code extends string = string> {
  readonly code: Code;
  /** A full sentence: what was found and what was wanted. */
  readonly message: string;
  /** Field name to sentence, for forms. */
  readonly fields?: Readonly<Record<string, string>>;
  /** Figures the screen may draw (lengths as integers). */
  readonly facts?: Readonly<Record<string, unknown>>;
}

export function ok<Value>(value: Value): { readonly ok: true; readonly value: Value } {
  return { ok: true, value };
}

export function fail<Code extends string>(
  code: Code,
  message: string,
  more: Omit<Fault, "code" | "message"> = {},
): { readonly ok: false; readonly fault: Fault<Code> } {
  return { ok: false, fault: { code, message, ...more } };
}
