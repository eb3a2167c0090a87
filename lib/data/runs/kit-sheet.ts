import type { Transaction } from "sequelize";
import type { InstructionSheetInput } from "@/labels/sheet/sheet-input";
import { readKitFacts } from "./sheet/kit-facts";
import { sheetContentOf } from "./sheet/sheet-content";

/** The instruction sheet of a colourway as plain data for the print queue; null when there is no such colourway. */
export async function kitSheetContent(colourwayId: number, transaction?: Transaction): Promise<InstructionSheetInput | null> {
  const facts = await readKitFacts(colourwayId, transaction);
  return facts && sheetContentOf(facts);
}
