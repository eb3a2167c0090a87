import { readFileSync } from "node:fs";
import path from "node:path";

/** A published value with its source, as the collections in `tests/fixtures` keep it. */
export interface PublishedRow<Kind extends string, Expected> {
  readonly id: string;
  readonly kind: Kind;
  readonly inputs: Readonly<Record<string, unknown>>;
  readonly expected: Expected;
  readonly tolerance: number;
  readonly source: string;
  /** True: it follows from the rule. False: it does not, and `reason` says why. "n/a": there is nothing to compute. */
  readonly recomputed: boolean | "n/a";
  readonly reason?: string;
}

export function readRows<Kind extends string, Expected>(name: string): PublishedRow<Kind, Expected>[] {
  const file = path.join(import.meta.dirname, "../fixtures", `${name}.json`);
  return (JSON.parse(readFileSync(file, "utf8")) as { rows: PublishedRow<Kind, Expected>[] }).rows;
}

/** A figure among a row's inputs. Throws when it is not there. */
export function figure(row: PublishedRow<string, unknown>, name: string): number {
  const value = row.inputs[name];
  if (typeof value !== "number") throw new Error(`Row ${row.id} has no figure ${name}.`);
  return value;
}
