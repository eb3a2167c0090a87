import { z } from "zod";

const jobId = z.coerce.number({ error: "A print job has a number." }).int("A print job has a whole number.").positive("A print job has a number.").max(2_147_483_647, "There is no print job with so high a number.");

export const printJobOnly = z.object({ id: jobId });
export const takePrintInput = z.object({ printer: z.enum(["label-4x6", "label-small", "receipt", "sheet"], { error: "Name one of the shop's printers." }) });
export const settlePrintInput = z
  .object({ id: jobId, state: z.enum(["printed", "failed", "withdrawn", "waiting"]), error: z.string().trim().max(200, "Say it in at most 200 characters.").optional() })
  .refine(({ state, error }) => state !== "failed" || Boolean(error), { path: ["error"], error: "Say what went wrong." });
