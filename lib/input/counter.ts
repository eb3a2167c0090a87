import { z } from "zod";
import { lengthInput } from "./drawing";
import { requestId } from "./people";

/** What a till sends. Money in minor units, lengths in 1/160 mm. */
const money = z.number({ error: "Write an amount." }).int("Money is a whole number of minor units.").min(0, "An amount is not below nothing.").max(100_000_000, "That is more than a till takes.");
const tillId = z.number().int().positive();

export const openTillInput = z.object({ requestId, tillId, float: money });
export const closeTillInput = z.object({ requestId, sessionId: z.number().int().positive(), counted: money });

const saleLine = z.discriminatedUnion("item", [
  z.object({ item: z.literal("fabric"), tag: z.string().trim().toUpperCase().min(1).max(40), length: lengthInput }),
  z.object({ item: z.literal("kit"), serial: z.string().trim().toUpperCase().min(1).max(40) }),
  z.object({ item: z.literal("notion"), number: z.string().trim().min(1).max(40), count: z.number().int().min(1).max(999) }),
]);

export const saleInput = z.object({
  requestId,
  tillSessionId: z.number().int().positive(),
  lines: z.array(saleLine).min(1, "The basket is empty.").max(100, "A basket holds at most 100 lines.").readonly(),
  cash: money,
});

export type SaleLineInput = z.output<typeof saleLine>;
export type SaleInput = z.output<typeof saleInput>;
