import { z } from "zod";
import type { BlockSize, Drawing, Role } from "../core/piece/drawing";
import type { Length } from "../core/measure/length";

/** What may come in from a browser. Limits are far above any real block and far below what would tire the server. */
const exactText = z
  .string()
  .max(60, "A coordinate is at most 60 characters.")
  .regex(/^[-+0-9/r]+$/, "A coordinate is written as a fraction, such as 1/4.");
const exactPoint = z.tuple([exactText, exactText]).readonly();

export const roleId = z.string().regex(/^[a-z0-9-]{1,40}$/, "A role is named with small letters, digits and hyphens.");

export const lengthInput = z
  .number({ error: "A length is missing." })
  .int("A length is a whole number of 1/160 mm.")
  .min(1, "A length is more than nothing.")
  .max(2_147_483_647, "That is longer than any bolt.")
  .transform((value) => value as Length);

export const lengthOrZero = z.number().int().min(0).max(2_147_483_647).transform((value) => value as Length);

export const drawingInput = z.object({
  outline: z.literal("rectangle"),
  grid: z.object({ columns: z.number().int().min(1).max(64), rows: z.number().int().min(1).max(64) }),
  seams: z.array(z.object({ kind: z.literal("straight"), from: exactPoint, to: exactPoint })).max(2000, "A block has at most 2 000 seams.").readonly(),
  paints: z
    .array(z.object({ at: exactPoint, role: roleId, grain: z.enum(["any", "up", "across", "down-right", "down-left"]).optional() }))
    .max(2000)
    .readonly(),
}) satisfies z.ZodType<Drawing>;

export const blockSizeInput = z.object({ width: lengthInput, height: lengthInput }) satisfies z.ZodType<BlockSize>;

export const rolesInput = z
  .array(z.object({ id: roleId, name: z.string().trim().min(1, "Give the role a name.").max(60), value: z.enum(["light", "medium", "dark"]) }))
  .max(60)
  .readonly() satisfies z.ZodType<readonly Role[]>;
