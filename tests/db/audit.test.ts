import { randomUUID } from "node:crypto";
import { beforeAll, describe, expect, it } from "vitest";
import { inches, yards } from "@/lib/core/measure/length";
import type { Actor } from "@/lib/core/policy/policy";
import type { BoltView } from "@/lib/data/bolt-view";
import { auditStock } from "@/lib/data/stock/audit-stock";
import { recordCut } from "@/lib/data/stock/record-cut";
import { db } from "@/models/database";
import { buildBolt, buildPerson, buildRun, buildShop, must, type BuiltRun } from "./factories";
import { withTestDatabase } from "./test-database";

withTestDatabase();

let owner: Actor;
let bolt: BoltView;
let run: BuiltRun;
let cutId: number;

/** One bolt with a run of two kits, the first of them cut, a notion, and a closed till. */
beforeAll(async () => {
  await buildShop();
  owner = await buildPerson();
  bolt = await buildBolt(owner);
  run = await buildRun(owner, { kits: 2, lengths: [{ fabricId: bolt.fabric.id, boltId: bolt.id, length: yards(1) }] });
  cutId = must(await recordCut(owner, { requestId: randomUUID(), runLengthId: run.lengths[0]!.id, tag: bolt.tag, length: yards(1) })).cutId;
  await db().Notion.create({ number: "N1", name: "Thread", price: 100, cost: 50 });
  const till = await db().Till.create({ name: "Till 1" });
  const session = await db().TillSession.create({ tillId: till.id, openedBy: owner.personId, closedBy: owner.personId, closedAt: new Date(), counted: 1000, expected: 1000 });
  await db().CashMove.create({ tillSessionId: session.id, amount: 1000, kind: "float", reason: "float", personId: owner.personId });
});

/** What the auditor says after statements that no use case would run; all of it is rolled back. */
async function heardAfter(...statements: readonly string[]): Promise<string[]> {
  const heard: string[] = [];
  const url = db().sequelize;
  await url
    .transaction(async (transaction) => {
      for (const sql of statements) await url.query(sql, { transaction });
      heard.push(...new Set((await auditStock(transaction)).map((row) => row.check)));
      throw new Error("roll back");
    })
    .catch((error: Error) => {
      if (error.message !== "roll back") throw error;
    });
  return heard;
}

describe("the auditor", () => {
  it("is silent when all is well", async () => {
    expect(await auditStock()).toEqual([]);
    expect(await heardAfter()).toEqual([]);
  });

  it("says what it found and what it wanted", async () => {
    await db().sequelize.transaction(async (transaction) => {
      await db().sequelize.query(`UPDATE bolts SET reserved = 0`, { transaction });
      expect(await auditStock(transaction)).toEqual([{ check: "reserved on the bolt equals what is held", subject: `bolt ${bolt.tag}`, found: 0, wanted: yards(1) }]);
      await db().sequelize.query(`UPDATE bolts SET reserved = ${yards(1)}`, { transaction });
    });
  });

  it.each<[string, () => string[]]>([
    ["left on the bolt equals its ledger", () => [`UPDATE bolts SET put_up = put_up + 1`]],
    ["the chain of cuts ends at the cut edge", () => [`UPDATE bolts SET cut_edge = cut_edge + 1, put_up = put_up + 1`]],
    ["the chain of cuts has no gap and no overlap", () => [`UPDATE cuts SET ends_at = ends_at + 1`]],
    ["each cut moved its cloth", () => [`INSERT INTO cuts (bolt_id, starts_at, ends_at, purpose) VALUES (${bolt.id}, ${yards(1)}, ${yards(2)}, 'sample')`]],
    ["what is held is not more than what is left", () => [`UPDATE bolts SET reserved = ${yards(20)}`]],
    ["a bolt is put away when nothing is left", () => [`UPDATE bolts SET retired_at = now()`]],
    ["lengths that wait have their promise", () => [`UPDATE run_lengths SET bolt_id = NULL WHERE id = ${run.lengths[1]!.id}`]],
    ["lengths that wait have their promise", () => [`DELETE FROM reservations`]],
    ["a length is cut when it has a cut", () => [`UPDATE run_lengths SET state = 'cut' WHERE id = ${run.lengths[1]!.id}`]],
    ["a length and its cut name each other", () => [`UPDATE cuts SET run_length_id = NULL WHERE id = ${cutId}`]],
    ["bag and kit hold what was cut for them", () => [`UPDATE run_lengths SET state = 'to-cut', cut_id = NULL WHERE id = ${run.lengths[0]!.id}`]],
    ["nothing is left in the bag of a packed kit", () => [`UPDATE run_kits SET state = 'packed' WHERE id = ${run.lengths[0]!.runKitId}`]],
    ["packed kits stand on the shelf", () => [`UPDATE run_kits SET state = 'packed' WHERE id = ${run.lengths[0]!.runKitId}`]],
    ["bag and kit hold the notions that were packed", () => [`INSERT INTO packed_notions SELECT ${run.lengths[0]!.runKitId}, id, 1, 1 FROM notions`]],
    ["notions on hand equal their ledger", () => [`UPDATE notions SET on_hand = 1`]],
    ["expected in the drawer equals its moves", () => [`UPDATE till_sessions SET expected = 999`]],
    ["pieces on the shelf equal their ledger", () => [`INSERT INTO pieces (tag, fabric_id, lot, kind, length, width) VALUES ('P1', ${bolt.fabric.id}, 'L1', 'remnant', ${inches(9)}, ${inches(40)})`]],
  ])("hears when it is not so that %s", async (check, statements) => {
    expect(await heardAfter(...statements())).toContain(check);
  });

  it("hears of a sale whose tenders, cash or cut do not agree", async () => {
    const sale = `INSERT INTO sales (receipt, till_session_id, person_id, request_id, goods, tax, total, currency)
      VALUES ('R1', (SELECT MIN(id) FROM till_sessions), ${owner.personId}, gen_random_uuid(), 500, 0, 500, 'USD')`;
    const line = `INSERT INTO sale_lines (sale_id, position, item, description, bolt_id, cut_id, length, unit_price, amount, tax)
      VALUES ((SELECT MAX(id) FROM sales), 1, 'fabric', 'dots', ${bolt.id}, ${cutId}, ${yards(2)}, 100, 500, 0)`;
    const tender = `INSERT INTO tenders (sale_id, kind, amount, given) VALUES ((SELECT MAX(id) FROM sales), 'cash', 400, 400)`;
    expect(await heardAfter(sale, line, tender)).toEqual(["cash of a sale went into the drawer", "sold lengths were cut", "tenders pay the sale"]);
  });
});
