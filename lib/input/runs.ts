import { z } from "zod";
import { requestId } from "./people";

export const mostKits = 500;
const kits = z.coerce.number({ error: "Write how many kits." }).int("Kits are whole.").min(1, "A run has at least one kit.").max(mostKits, `A run has at most ${mostKits} kits.`);
const colourwayId = z.coerce.number().int().positive();

export const planRunInput = z.object({ colourwayId, kits });
export const startRunInput = z.object({
  requestId,
  colourwayId,
  kits,
  purpose: z.enum(["shelf", "class", "orders"]).default("shelf"),
  due: z.union([z.literal("").transform(() => null), z.iso.date("Write the day as year, month and day."), z.null()]).default(null),
});
export const runCode = z.object({ code: z.string().trim().toUpperCase().min(1).max(40) });
export const serial = z.string().trim().toUpperCase().min(1, "Scan the tag on the bag.").max(40, "A serial is at most 40 characters.");
export const serialOnly = z.object({ serial });
export const packScanInput = z.object({ requestId, serial, scan: z.string().trim().min(1, "Scan a cut tag or a notion.").max(80, "That is longer than any tag.") });
export const finishKitInput = z.object({ requestId, serial, shelf: z.string().trim().max(40, "A shelf's name is at most 40 characters.").default("") });
export const cancelRunInput = z.object({ requestId, code: z.string().trim().toUpperCase().max(40), reason: z.string().trim().min(1, "Say in a few words why.").max(200) });
