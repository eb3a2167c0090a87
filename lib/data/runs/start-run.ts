import type { Transaction } from "sequelize";
import { makeCode } from "@/lib/core/codes/code";
import type { BoltPlan, PlannedCut } from "@/lib/core/piece/bolt-plan";
import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import { answerOnce } from "@/lib/data/answer-once";
import { getColourway } from "@/lib/data/designs/kits";
import { queuePrint } from "@/lib/data/print/queue";
import { recordChange } from "@/lib/data/record-change";
import { bumpRevision } from "@/lib/data/revisions";
import { requireShop } from "@/lib/data/shop";
import { reserveInside } from "@/lib/data/stock/reserve-lengths";
import { db } from "@/models/database";
import { planOnBolts } from "./plan-run";

export interface StartRunInput {
  readonly requestId: string;
  readonly colourwayId: number;
  readonly kits: number;
  readonly purpose: "shelf" | "class" | "orders";
  /** ISO date, or null. */
  readonly due: string | null;
}

interface Started {
  readonly runId: number;
  readonly code: string;
  readonly kits: number;
}

/**
 * Starts a run: plans it on the bolts as they stand under their locks, reserves every length, gives each kit its serial
 * and puts the bag tags on the print queue. A request: refused with figures when the bolts do not allow so many kits.
 */
export async function startRun(actor: Actor, input: StartRunInput): Promise<Result<Started>> {
  if (!can(actor, "run.start")) return fail("forbidden", "Runs are started by managers and owners.");
  const shop = await requireShop();
  const found = await getColourway(input.colourwayId);
  return answerOnce<Started, string>(actor, "run.start", input, async (transaction) => {
    if (!found) return fail("unknown-colourway", "There is no such colourway; it may have been put away.");
    const planned = await planOnBolts(found.colourway.lengths, input.kits, shop, transaction);
    if (!planned.ok) return planned;
    const { plan } = planned.value;
    if (plan.kits < input.kits) {
      return fail("not-enough-cloth", `${input.kits} kits were asked for; the bolts allow ${plan.kits}. ${plan.reason}`, { facts: { kits: plan.kits, limiting: plan.limiting } });
    }
    const run = await db().Run.create(
      { code: input.requestId, colourwayId: input.colourwayId, kits: input.kits, purpose: input.purpose, due: input.due, boltPlan: plan, madeBy: actor.personId },
      { transaction },
    );
    const code = makeCode("run", run.id);
    await run.update({ code }, { transaction });
    const kits = await makeKits(transaction, run.id, input.kits, found.kit.notions);
    await layLengths(transaction, { runId: run.id, plan, lengths: found.colourway.lengths, kits });
    await reserve(transaction, actor, run.id, plan);
    await queueBagTags(transaction, actor, { code, kit: found.kit.name, colourway: found.colourway.name, kits });
    await recordChange(transaction, actor, { subject: "run", subjectId: run.id, act: "started", details: { kits: input.kits } });
    bumpRevision("runs", transaction);
    bumpRevision("bolts", transaction);
    return ok({ runId: run.id, code, kits: input.kits });
  });
}

interface KitRow {
  readonly id: number;
  readonly number: number;
  readonly serial: string;
}

async function makeKits(transaction: Transaction, runId: number, count: number, notions: readonly { notionId: number; count: number }[]): Promise<KitRow[]> {
  const kits: KitRow[] = [];
  for (let number = 1; number <= count; number += 1) {
    const kit = await db().RunKit.create({ runId, number, serial: `new-${runId}-${number}` }, { transaction });
    const serial = makeCode("kit", kit.id);
    await kit.update({ serial }, { transaction });
    kits.push({ id: kit.id, number, serial });
  }
  const packing = kits.flatMap((kit) => notions.map((notion) => ({ runKitId: kit.id, notionId: notion.notionId, wanted: notion.count })));
  if (packing.length) await db().PackedNotion.bulkCreate(packing, { transaction });
  return kits;
}

interface Lengths {
  readonly runId: number;
  readonly plan: BoltPlan;
  readonly lengths: readonly { fabricId: number; plannedWidth: number }[];
  readonly kits: readonly KitRow[];
}

/** The bolt-length list: the plan's cuts in its own order, which is shelf order and then cutting order. */
async function layLengths(transaction: Transaction, { runId, plan, lengths, kits }: Lengths): Promise<void> {
  const boltIds = await boltIdsOf(transaction, plan);
  const kitOf = new Map(kits.map((kit) => [kit.number, kit.id]));
  const widthOf = new Map(lengths.map((each) => [String(each.fabricId), each.plannedWidth]));
  const rows = kitCuts(plan).map((cut, sequence) => ({
    runId,
    runKitId: need(kitOf.get(cut.kit ?? 0)),
    fabricId: Number(cut.fabric),
    boltId: need(boltIds.get(cut.bolt)),
    length: cut.endsAt - cut.startsAt,
    plannedWidth: need(widthOf.get(cut.fabric)),
    sequence,
  }));
  await db().RunLength.bulkCreate(rows, { transaction });
}

/** The plan was made under the bolts' locks, so every promise fits; one that does not is a fault of the planner. */
async function reserve(transaction: Transaction, actor: Actor, runId: number, plan: BoltPlan): Promise<void> {
  const boltIds = await boltIdsOf(transaction, plan);
  const demands = promisesOf(plan).map(({ bolt, length, count }) => ({ boltId: need(boltIds.get(bolt)), length, count }));
  const reserved = await reserveInside(transaction, actor, { runId, demands });
  if (!reserved.ok) throw new Error(`The bolt plan does not fit its own bolts: ${reserved.fault.message}`);
}

function promisesOf(plan: BoltPlan): { bolt: string; length: number; count: number }[] {
  const promises = new Map<string, { bolt: string; length: number; count: number }>();
  for (const cut of kitCuts(plan)) {
    const length = cut.endsAt - cut.startsAt;
    const key = `${cut.bolt}/${length}`;
    promises.set(key, { bolt: cut.bolt, length, count: 1 + (promises.get(key)?.count ?? 0) });
  }
  return [...promises.values()];
}

interface BagTags {
  readonly code: string;
  readonly kit: string;
  readonly colourway: string;
  readonly kits: readonly KitRow[];
}

async function queueBagTags(transaction: Transaction, actor: Actor, { code, kit, colourway, kits }: BagTags): Promise<void> {
  const content = kits.map((each) => ({ run: `Run ${code}`, kitName: kit, colourway, bag: each.number, of: kits.length, serial: each.serial }));
  await queuePrint(transaction, actor, { printer: "label-small", title: `Bag tags, ${kit}, ${code}`, document: { kind: "bag-tag", content }, copies: 1 });
}

function kitCuts(plan: BoltPlan): PlannedCut[] {
  return plan.cuts.filter((cut) => cut.purpose === "kit");
}

async function boltIdsOf(transaction: Transaction, plan: BoltPlan): Promise<Map<string, number>> {
  const tags = [...new Set(kitCuts(plan).map((cut) => cut.bolt))];
  const bolts = await db().Bolt.findAll({ where: { tag: tags }, attributes: ["id", "tag"], transaction, raw: true });
  return new Map(bolts.map((bolt) => [bolt.tag, bolt.id]));
}

function need<T>(value: T | undefined): T {
  if (value === undefined) throw new Error("The bolt plan names something that was not asked for.");
  return value;
}
