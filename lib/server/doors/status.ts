import type { Fault } from "@/lib/core/result";

/** Fault code to HTTP status. A code that is not here is a conflict with how things stand: 409. */
const STATUS: Readonly<Record<string, number>> = {
  "not-signed-in": 401,
  forbidden: 403,
  "foreign-origin": 403,
  "bad-input": 422,
  "not-json": 400,
  "too-large": 413,
  "too-many": 429,
};

export function statusOf(fault: Fault): number {
  if (fault.code.startsWith("unknown-")) return 404;
  return STATUS[fault.code] ?? 409;
}
