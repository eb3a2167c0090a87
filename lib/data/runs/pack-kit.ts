import { Op, QueryTypes, type Transaction } from "sequelize";
import { makeCode, parseCode } from "@/lib/core/codes/code";
import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import { answerOnce } from "@/lib/data/answer-once";
import { postMove } from "@/lib/data/ledger";
import { recordChange } from "@/lib/data/record-change";
import { bumpRevision } from "@/lib/data/revisions";
import { db } from "@/models/database";
import type { RunKit } from "@/models/run-kit";
import { queueKitPapers } from "./kit-papers";

/** What a kit's bag holds and still wants. */
export interface PackingView {
  readonly runKitId: number;
  readonly serial: string;
  readonly number: number;
  readonly run: string;
  readonly kit: string;
  readonly colourway: string;
  readonly state: RunKit["state"];
  readonly shelf: string;
  readonly lengths: readonly {
    readonly id: number;
    readonly fabric: string;
    readonly tile: string;
    readonly colour: string;
    /** 1/160 mm: as cut, or as planned while it is not cut. */
    readonly length: number;
    readonly cutTag: string | null;
    readonly state: "to-cut" | "cut" | "short";
    readonly packed: boolean;
  }[];
  readonly notions: readonly { readonly id: number; readonly number: string; readonly name: string; readonly wanted: number; readonly count: number }[];
}

type PackFault = "forbidden" | "unknown-kit" | "unknown-scan" | "wrong-kit" | "twice" | "not-cut" | "not-complete" | "already-packed" | "not-enough-notions" | "request-reused";

/** A kit by its serial with all that goes into its bag; null when there is none. */
export async function getPacking(serial: string, transaction?: Transaction): Promise<PackingView | null> {
  const [kit] = await db().sequelize.query<Omit<PackingView, "lengths" | "notions">>(
    `SELECT x.id AS "runKitId", x.serial, x.number, r.code AS run, k.name AS kit, c.name AS colourway, x.state, x.shelf
       FROM run_kits x JOIN runs r ON r.id = x.run_id JOIN colourways c ON c.id = r.colourway_id
       JOIN kit_versions v ON v.id = c.kit_version_id JOIN kit_designs k ON k.id = v.kit_design_id WHERE x.serial = $1`,
    { bind: [serial], type: QueryTypes.SELECT, transaction },
  );
  if (!kit) return null;
  const lengths = await db().sequelize.query<Omit<PackingView["lengths"][number], "cutTag">>(
    `SELECT l.id, f.name AS fabric, f.tile, f.colour, COALESCE(c.ends_at - c.starts_at, l.length) AS length, l.state,
            l.packed_at IS NOT NULL AS packed
       FROM run_lengths l JOIN fabrics f ON f.id = l.fabric_id LEFT JOIN cuts c ON c.id = l.cut_id
      WHERE l.run_kit_id = $1 AND l.state <> 'cancelled' ORDER BY f.name, l.id`,
    { bind: [kit.runKitId], type: QueryTypes.SELECT, transaction },
  );
  const notions = await db().sequelize.query<PackingView["notions"][number]>(
    `SELECT n.id, n.number, n.name, p.wanted, p.count FROM packed_notions p JOIN notions n ON n.id = p.notion_id WHERE p.run_kit_id = $1 ORDER BY n.name`,
    { bind: [kit.runKitId], type: QueryTypes.SELECT, transaction },
  );
  return { ...kit, lengths: lengths.map((each) => ({ ...each, cutTag: each.state === "cut" ? makeCode("cut", each.id) : null })), notions };
}

/**
 * Takes what was scanned into a kit's bag: a cut tag, or a notion's number or GTIN. Says when it is the wrong kit's,
 * was scanned before, or is not wanted.
 */
export async function packScan(actor: Actor, input: { requestId: string; serial: string; scan: string }): Promise<Result<PackingView, PackFault>> {
  if (!can(actor, "kit.pack")) return forbidden();
  return answerOnce(actor, "kit.pack-scan", input, async (transaction) => {
    const kit = await openKit(transaction, input.serial);
    if (!kit.ok) return kit;
    const code = parseCode(input.scan);
    const taken =
      code.ok && code.value.kind === "cut" ? await packLength(transaction, actor, kit.value, code.value.number) : await packNotion(transaction, actor, kit.value, input.scan.trim());
    if (!taken.ok) return taken;
    bumpRevision("packing", transaction);
    return view(transaction, input.serial);
  });
}

/**
 * Closes a complete bag: the kit goes on its shelf, its label and sheet on the print queue. Faults: `not-complete`
 * names what is missing.
 */
export async function finishKit(actor: Actor, input: { requestId: string; serial: string; shelf: string }): Promise<Result<PackingView, PackFault>> {
  if (!can(actor, "kit.pack")) return forbidden();
  return answerOnce(actor, "kit.finish", input, async (transaction) => {
    const kit = await openKit(transaction, input.serial);
    if (!kit.ok) return kit;
    const before = await view(transaction, input.serial);
    if (!before.ok) return before;
    const missing = missingFrom(before.value);
    if (missing.length) return fail("not-complete", `Still missing: ${missing.join(", ")}.`);
    await kit.value.update({ state: "packed", shelf: input.shelf, packedBy: actor.personId, packedAt: new Date() }, { transaction });
    await closeBag(transaction, actor, kit.value.id, input.requestId);
    await postMove(transaction, {
      what: { item: "kit", runKitId: kit.value.id },
      quantity: 1,
      from: { place: "bench" },
      to: { place: "shelf" },
      reason: "packed",
      personId: actor.personId,
      requestId: input.requestId,
    });
    await closeRunWhenPacked(transaction, kit.value.runId);
    await queueKitPapers(transaction, actor, kit.value.id);
    await recordChange(transaction, actor, { subject: "kit", subjectId: kit.value.serial, act: "packed" });
    bumpRevision("packing", transaction);
    bumpRevision("runs", transaction);
    return view(transaction, input.serial);
  });
}

async function openKit(transaction: Transaction, serial: string): Promise<Result<RunKit, PackFault>> {
  const kit = await db().RunKit.findOne({ where: { serial }, lock: transaction.LOCK.NO_KEY_UPDATE, transaction });
  if (!kit) return fail("unknown-kit", `No kit has the serial ${serial}. Scan the tag on the bag.`);
  if (kit.state === "packed" || kit.state === "sold") return fail("already-packed", `Kit ${serial} is packed already.`);
  if (kit.state === "cancelled" || kit.state === "broken-down") return fail("unknown-kit", `Kit ${serial} was ${kit.state === "cancelled" ? "cancelled" : "broken down"}.`);
  return ok(kit);
}

async function packLength(transaction: Transaction, actor: Actor, kit: RunKit, runLengthId: number): Promise<Result<null, PackFault>> {
  const length = await db().RunLength.findByPk(runLengthId, { transaction, lock: transaction.LOCK.NO_KEY_UPDATE });
  if (!length) return fail("unknown-scan", "No length has this tag.");
  if (length.runKitId !== kit.id) {
    const owner = await db().RunKit.findByPk(length.runKitId, { transaction, rejectOnEmpty: true });
    return fail("wrong-kit", `This length belongs to ${owner.serial}, bag ${owner.number}. Wanted: a length for ${kit.serial}, bag ${kit.number}.`);
  }
  if (length.state !== "cut") return fail("not-cut", "The book does not have this length as cut. Record the cut at the table first.");
  if (length.packedAt) return fail("twice", "This length is in the bag already.");
  await length.update({ packedAt: new Date(), packedBy: actor.personId }, { transaction });
  return ok(null);
}

async function packNotion(transaction: Transaction, actor: Actor, kit: RunKit, scan: string): Promise<Result<null, PackFault>> {
  const notion = await db().Notion.findOne({ where: { [Op.or]: [{ number: scan }, { gtin: scan }] }, lock: transaction.LOCK.NO_KEY_UPDATE, transaction });
  if (!notion) return fail("unknown-scan", `“${scan.slice(0, 40)}” is neither a cut tag nor a notion of this shop.`);
  const wanted = await db().PackedNotion.findOne({ where: { runKitId: kit.id, notionId: notion.id }, lock: transaction.LOCK.NO_KEY_UPDATE, transaction });
  if (!wanted) return fail("wrong-kit", `${notion.name} does not go into this kit.`);
  if (wanted.count >= wanted.wanted) return fail("twice", `${notion.name} is in the bag already, ${wanted.wanted} of ${wanted.wanted}.`);
  if (notion.onHand < 1) return fail("not-enough-notions", `The book has no ${notion.name} on the shelf. Count the shelf, then scan again.`);
  await wanted.update({ count: wanted.count + 1 }, { transaction });
  await postMove(transaction, { what: { item: "notion", notionId: notion.id }, quantity: 1, from: { place: "shelf" }, to: { place: "bag", id: kit.id }, reason: "packed", personId: actor.personId });
  return ok(null);
}

/** Everything in the bag becomes the kit's: the ledger moves it from bag to kit. */
async function closeBag(transaction: Transaction, actor: Actor, runKitId: number, requestId: string): Promise<void> {
  const inBag = await db().sequelize.query<{ item: "fabric" | "notion"; fabricId: number | null; notionId: number | null; quantity: number }>(
    `SELECT item, fabric_id AS "fabricId", notion_id AS "notionId", sum(CASE WHEN to_place = 'bag' AND to_id = $1 THEN quantity ELSE -quantity END)::int AS quantity
       FROM moves WHERE (to_place = 'bag' AND to_id = $1) OR (from_place = 'bag' AND from_id = $1)
      GROUP BY item, fabric_id, notion_id HAVING sum(CASE WHEN to_place = 'bag' AND to_id = $1 THEN quantity ELSE -quantity END) > 0`,
    { bind: [runKitId], type: QueryTypes.SELECT, transaction },
  );
  for (const row of inBag) {
    const what = row.item === "fabric" ? { item: "fabric" as const, fabricId: Number(row.fabricId) } : { item: "notion" as const, notionId: Number(row.notionId) };
    await postMove(transaction, { what, quantity: row.quantity, from: { place: "bag", id: runKitId }, to: { place: "kit", id: runKitId }, reason: "packed", personId: actor.personId, requestId });
  }
}

async function closeRunWhenPacked(transaction: Transaction, runId: number): Promise<void> {
  const waiting = await db().RunKit.count({ where: { runId, state: ["waiting", "cut"] }, transaction });
  if (waiting === 0) await db().Run.update({ state: "packed" }, { where: { id: runId }, transaction });
}

function missingFrom(view: PackingView): string[] {
  return [
    ...view.lengths.filter((length) => !length.packed).map((length) => length.fabric),
    ...view.notions.filter((notion) => notion.count < notion.wanted).map((notion) => (notion.wanted - notion.count > 1 ? `${notion.wanted - notion.count} ${notion.name}` : notion.name)),
  ];
}

async function view(transaction: Transaction, serial: string): Promise<Result<PackingView, PackFault>> {
  const found = await getPacking(serial, transaction);
  return found ? ok(found) : fail("unknown-kit", `No kit has the serial ${serial}.`);
}

function forbidden() {
  return fail("forbidden", "Kits are packed by packers, managers and owners.");
}
