import { QueryTypes, type Transaction } from "sequelize";
import { formatCentimetres, formatInches } from "@/lib/core/measure/format";
import { fail, type Fault } from "@/lib/core/result";
import { db } from "@/models/database";
import type { LockedBolt } from "./lock-bolts";
import type { LockedRunLength } from "./run-length";
import { readShopRules } from "./shop-rules";

export type CutObjection = "wrong-fabric" | "wrong-lot" | "too-narrow" | "already-cut" | "length-cancelled";

/** Why a length should not be cut from a bolt, with a sentence; null when it may. Both are locked. */
export async function objectionTo(
  transaction: Transaction,
  runLength: LockedRunLength,
  bolt: LockedBolt,
): Promise<{ readonly ok: false; readonly fault: Fault<CutObjection> } | null> {
  const kit = `kit ${runLength.kitNumber} of run ${runLength.runCode}`;
  if (runLength.state === "cut") return fail("already-cut", `This length for ${kit} was already cut${await cutBy(transaction, runLength.cutId)}.`);
  if (runLength.state === "cancelled" || runLength.runState === "cancelled") return fail("length-cancelled", `This length for ${kit} was cancelled, so it is not to be cut.`);
  if (bolt.fabricId !== runLength.fabricId) {
    return fail("wrong-fabric", `Bolt ${bolt.tag} is ${bolt.fabricName}; ${kit} wants ${runLength.fabricName}.`, { facts: { found: bolt.fabricName, wanted: runLength.fabricName } });
  }
  if (bolt.usableWidth < runLength.plannedWidth) {
    const { system } = await readShopRules(transaction);
    const [found, wanted] = [sayWidth(bolt.usableWidth, system), sayWidth(runLength.plannedWidth, system)];
    return fail("too-narrow", `Bolt ${bolt.tag} is ${found} wide; the length for ${kit} was planned on ${wanted}. Plan it again for this bolt.`, {
      facts: { found: bolt.usableWidth, wanted: runLength.plannedWidth },
    });
  }
  const lot = await lotOfKit(transaction, runLength);
  if (lot !== null && lot !== bolt.lot) {
    return fail("wrong-lot", `Bolt ${bolt.tag} is of lot ${bolt.lot}; the other ${runLength.fabricName} of ${kit} is of lot ${lot}, and a kit holds one lot.`, {
      facts: { found: bolt.lot, wanted: lot },
    });
  }
  return null;
}

/** The dye lot that the kit's other lengths of the same fabric were cut from or are planned on; null when it has no other. */
async function lotOfKit(transaction: Transaction, { id, runKitId, fabricId }: LockedRunLength): Promise<string | null> {
  const [row] = await db().sequelize.query<{ lot: string }>(
    `SELECT b.lot FROM run_lengths l LEFT JOIN cuts c ON c.id = l.cut_id JOIN bolts b ON b.id = COALESCE(c.bolt_id, l.bolt_id)
      WHERE l.run_kit_id = $1 AND l.fabric_id = $2 AND l.id <> $3 AND l.state IN ('cut','to-cut')
      ORDER BY (c.id IS NULL), l.id LIMIT 1`,
    { bind: [runKitId, fabricId, id], type: QueryTypes.SELECT, transaction },
  );
  return row?.lot ?? null;
}

async function cutBy(transaction: Transaction, cutId: number | null): Promise<string> {
  const [row] = await db().sequelize.query<{ tag: string; person: string | null }>(
    `SELECT b.tag, p.name AS person FROM cuts c JOIN bolts b ON b.id = c.bolt_id LEFT JOIN people p ON p.id = c.person_id WHERE c.id = $1`,
    { bind: [cutId], type: QueryTypes.SELECT, transaction },
  );
  return row ? ` from bolt ${row.tag}${row.person ? ` by ${row.person}` : ""}` : "";
}

/** Widths are said in inches or centimetres, never in yards. */
function sayWidth(width: number, system: "yards" | "metres"): string {
  return system === "metres" ? `${formatCentimetres(width)} cm` : `${formatInches(width)} in`;
}
