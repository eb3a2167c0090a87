import type { z } from "zod";
import { fail, ok, type Result } from "@/lib/core/result";

/** Parses what came in; the fault holds a sentence for each field, so that a form keeps what was typed and says what is wrong. */
export function parseInput<Schema extends z.ZodType>(schema: Schema, input: unknown): Result<z.output<Schema>, "bad-input"> {
  const parsed = schema.safeParse(input);
  if (parsed.success) return ok(parsed.data);
  const fields: Record<string, string> = {};
  for (const issue of parsed.error.issues) fields[issue.path.join(".") || "form"] ??= issue.message;
  const sentences = Object.entries(fields).map(([field, sentence]) => (field === "form" ? sentence : `${field}: ${sentence}`));
  return fail("bad-input", sentences.slice(0, 5).join(" ") || "That could not be read.", { fields });
}

/** A form's fields as an object; a name that occurs more than once, or ends in [], becomes a list. */
export function formToObject(form: FormData): Record<string, unknown> {
  const out: Record<string, unknown> = {};
  for (const name of new Set(form.keys())) {
    if (name.startsWith("$ACTION")) continue;
    const values = form.getAll(name);
    if (name.endsWith("[]")) out[name.slice(0, -2)] = values;
    else out[name] = values.length > 1 ? values : values[0];
  }
  return out;
}
