import { randomUUID } from "node:crypto";
import { beforeAll, describe, expect, it } from "vitest";
import { inches } from "@/lib/core/measure/length";
import type { Actor } from "@/lib/core/policy/policy";
import { recordWasteCut } from "@/lib/data/stock/record-waste-cut";
import { db } from "@/models/database";
import { buildBolt, buildPerson, buildShop, must } from "./factories";
import { withTestDatabase } from "./test-database";

withTestDatabase();

const UNIQUE = "23505";
const FOREIGN_KEY = "23503";
const CHECK = "23514";
const REFUSED = "23000";

let owner: Actor;
let boltId: number;
let cuts: number[];

/** Three cuts of 9 in, one after the other. */
beforeAll(async () => {
  await buildShop();
  owner = await buildPerson();
  const bolt = await buildBolt(owner);
  boltId = bolt.id;
  cuts = [];
  for (let number = 0; number < 3; number += 1) {
    cuts.push(must(await recordWasteCut(owner, { requestId: randomUUID(), tag: bolt.tag, length: inches(9), kind: "sample" })).cutId);
  }
});

/** What PostgreSQL answers to a statement that goes past the data layer. */
async function answerTo(sql: string, bind: readonly unknown[] = []): Promise<string> {
  try {
    await db().sequelize.query(sql, { bind: [...bind] });
    return "done";
  } catch (error) {
    return (error as { parent?: { code?: string } }).parent?.code ?? "unknown";
  }
}

function insertCut(from: number, to: number): Promise<string> {
  return answerTo(`INSERT INTO cuts (bolt_id, starts_at, ends_at, purpose) VALUES ($1, $2, $3, 'sample')`, [boltId, inches(from), inches(to)]);
}

describe("PostgreSQL itself", () => {
  it("refuses a cut that begins where another one does", async () => {
    expect(await insertCut(0, 5)).toBe(UNIQUE);
    expect(await insertCut(9, 12)).toBe(UNIQUE);
  });

  it("refuses a cut that begins inside another one", async () => {
    expect(await insertCut(20, 30)).toBe(FOREIGN_KEY);
  });

  it("refuses a cut that leaves a gap", async () => {
    expect(await insertCut(28, 30)).toBe(FOREIGN_KEY);
  });

  it("refuses a cut that ends where another one does, and one of no length", async () => {
    expect(await insertCut(10, 18)).toBe(UNIQUE);
    expect(await insertCut(27, 27)).toBe(CHECK);
  });

  it("refuses the removal of any but the last", async () => {
    expect(await answerTo(`DELETE FROM cuts WHERE id = $1`, [cuts[0]])).toBe(FOREIGN_KEY);
    expect(await answerTo(`DELETE FROM cuts WHERE id = $1`, [cuts[1]])).toBe(FOREIGN_KEY);
    expect(await db().Cut.count({ where: { boltId } })).toBe(3);
  });

  it("refuses a change of length in the middle of the chain", async () => {
    expect(await answerTo(`UPDATE cuts SET ends_at = ends_at - 1 WHERE id = $1`, [cuts[1]])).toBe(FOREIGN_KEY);
  });

  it("refuses a cut edge past the core, and a put-up of nothing", async () => {
    expect(await answerTo(`UPDATE bolts SET cut_edge = put_up + 1 WHERE id = $1`, [boltId])).toBe(CHECK);
    expect(await answerTo(`UPDATE bolts SET cut_edge = 0, put_up = 0 WHERE id = $1`, [boltId])).toBe(CHECK);
  });

  it.each(["moves", "changes"])("changes and removes nothing in %s", async (table) => {
    expect(await answerTo(`UPDATE ${table} SET at = now() WHERE id = (SELECT MIN(id) FROM ${table})`)).toBe(REFUSED);
    expect(await answerTo(`DELETE FROM ${table} WHERE id = (SELECT MIN(id) FROM ${table})`)).toBe(REFUSED);
  });

  it("does not empty the ledger", async () => {
    expect(await answerTo(`TRUNCATE moves CASCADE`)).toBe(REFUSED);
  });

  it("refuses a move from a place to itself, of nothing, or of what it does not name", async () => {
    const insert = `INSERT INTO moves (item, fabric_id, quantity, from_place, from_id, to_place, to_id, reason) VALUES ($1, $2, $3, 'bolt', 1, $4, $5, 'test')`;
    expect(await answerTo(insert, ["fabric", 1, 10, "bolt", 1])).toBe(CHECK);
    expect(await answerTo(insert, ["fabric", 1, 0, "waste", null])).toBe(CHECK);
    expect(await answerTo(insert, ["notion", 1, 10, "waste", null])).toBe(CHECK);
    expect(await answerTo(insert, ["fabric", 1, 10, "bag", null])).toBe(CHECK);
  });

  it("reverses a move once", async () => {
    const insert = `INSERT INTO moves (item, fabric_id, quantity, from_place, to_place, to_id, reason, reverses_id)
      SELECT item, fabric_id, quantity, to_place, from_place, from_id, 'test', id FROM moves WHERE cut_id = $1 AND reverses_id IS NULL`;
    await db().sequelize.transaction(async (transaction) => {
      await db().sequelize.query(insert, { bind: [cuts[2]], transaction });
      await expect(db().sequelize.query(insert, { bind: [cuts[2]], transaction })).rejects.toMatchObject({ parent: { code: UNIQUE } });
      throw new Error("roll back");
    }).catch(() => undefined);
  });
});
