import { z } from "zod";
import { lengthInput, lengthOrZero } from "./drawing";
import { requestId } from "./people";

/** What tables, tills and the office send about bolts. */
export const tag = z.string().trim().toUpperCase().min(1, "Scan or type the bolt's tag.").max(40, "A tag is at most 40 characters.");
const note = z.string().trim().max(200, "A note is at most 200 characters.").optional();
const at = z.iso.datetime({ offset: true }).optional();
const asFact = z.boolean().optional();
export const station = z.string().trim().min(1).max(60);
export const tagOnly = z.object({ tag });

export const cutInput = z.object({ requestId, tag, runLengthId: z.number().int().positive(), length: lengthInput, asFact, at, note });
export const wasteInput = z.object({ requestId, tag, length: lengthInput, kind: z.enum(["straightening", "flaw", "mis-cut", "sample"]), at, note });
export const undoInput = z.object({ requestId, tag, cutId: z.number().int().positive(), reason: z.string().trim().min(1, "Say in a few words why.").max(200) });
export const measureInput = z.object({
  requestId,
  tag,
  left: lengthOrZero,
  where: z.enum(["core", "edge"]),
  reason: z.string().trim().min(1, "Say in a few words why the measure differs.").max(200),
  at,
});
export const flawInput = z.object({ requestId, tag, fromEdge: lengthOrZero, toEdge: lengthInput, note });
export const removeFlawInput = z.object({ requestId, tag, flawId: z.number().int().positive() });
export const moveBoltInput = z.object({ requestId, tag, shelf: z.string().trim().max(40, "A shelf's name is at most 40 characters.") });
export const claimInput = z.object({ tag, station, runId: z.number().int().positive().nullish(), takeOver: z.boolean().optional() });
export const releaseInput = z.object({ tag, station });
export const boltFilterInput = z.object({
  text: z.string().trim().max(80).optional().catch(undefined),
  shelf: z.string().trim().max(40).optional().catch(undefined),
  fabricId: z.coerce.number().int().positive().optional().catch(undefined),
  atLeast: z.coerce.number().int().positive().optional().catch(undefined),
  belowMark: z.stringbool().optional().catch(undefined),
  after: z.string().max(400).nullish().catch(undefined),
});
