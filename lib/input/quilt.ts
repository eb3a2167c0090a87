import { z } from "zod";
import { lengthInput, lengthOrZero, roleId, rolesInput } from "./drawing";

const cell = z.discriminatedUnion("kind", [
  z.object({ kind: z.literal("block"), block: z.number().int().min(0).max(40), turn: z.union([z.literal(0), z.literal(90), z.literal(180), z.literal(270)]) }),
  z.object({ kind: z.literal("plain"), role: roleId }),
]);

/** A quilt as it is stored: its blocks are named by the ids of immutable versions. */
export const storedQuiltInput = z.object({
  setting: z.enum(["straight", "on-point"]),
  rows: z.number().int().min(1, "A quilt has at least one row.").max(40, "A quilt has at most 40 rows."),
  columns: z.number().int().min(1, "A quilt has at least one column.").max(40, "A quilt has at most 40 columns."),
  blocks: z.array(z.object({ blockVersionId: z.number().int().positive(), roles: z.record(roleId, roleId) })).min(1).max(41).readonly(),
  cells: z.array(cell).min(1).max(4000).readonly(),
  settingRole: roleId.optional(),
  sashing: z.object({ width: lengthInput, role: roleId, cornerstones: roleId.nullable(), allRound: z.boolean() }).nullable(),
  borders: z.array(z.object({ width: lengthInput, role: roleId, corners: roleId.nullable() })).max(12).readonly(),
  binding: z.object({ stripWidth: lengthInput, role: roleId, extra: lengthOrZero }).nullable(),
  backing: z.object({ role: roleId, overhang: lengthOrZero }).nullable(),
  roles: rolesInput,
});

export type StoredQuilt = z.output<typeof storedQuiltInput>;
