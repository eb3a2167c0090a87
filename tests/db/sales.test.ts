import { randomUUID } from "node:crypto";
import { beforeAll, describe, expect, it } from "vitest";
import { isPrintDocument } from "@/labels/documents";
import { yards, type Length } from "@/lib/core/measure/length";
import type { Actor } from "@/lib/core/policy/policy";
import type { BoltView } from "@/lib/data/bolt-view";
import { recordSale } from "@/lib/data/counter/record-sale";
import { closeTill, openTill } from "@/lib/data/counter/tills";
import { auditStock } from "@/lib/data/stock/audit-stock";
import { db } from "@/models/database";
import { buildBolt, buildFabric, buildPerson, buildRun, buildShop, codeOf, must } from "./factories";
import { withTestDatabase } from "./test-database";

withTestDatabase();

let owner: Actor;
let counter: Actor;
let bolt: BoltView;
let sessionId: number;

beforeAll(async () => {
  await buildShop();
  owner = await buildPerson();
  counter = await buildPerson({ roles: ["counter"] });
  const fabric = await buildFabric({ price: 146_000 });
  bolt = await buildBolt(owner, { fabricId: fabric.id, putUp: yards(8) });
  await db().TaxRate.create({ name: "Sales tax", goods: "fabric", rate: 65_000, validFrom: "2000-01-01" });
  const till = await db().Till.create({ name: "Till 1" });
  sessionId = must(await openTill(counter, { requestId: randomUUID(), tillId: till.id, float: 10_000 })).sessionId;
});

function sell(length: Length, cash: number, requestId = randomUUID()) {
  return recordSale(counter, { requestId, tillSessionId: sessionId, lines: [{ item: "fabric", tag: bolt.tag, length }], cash });
}

describe("a sale", () => {
  it("cuts the length off its bolt, taxes it, gives change and queues the receipt, once", async () => {
    const requestId = randomUUID();
    // 2 3/8 yd at 14.60 is 34.675, so 34.68; 6.5 % of it 2.25.
    const answers = await Promise.all(Array.from({ length: 5 }, () => sell(yards(2.375), 4000, requestId)));
    for (const answer of answers) expect(must(answer)).toMatchObject({ goods: 3468, tax: 225, total: 3693, change: 307 });
    expect((await db().Bolt.findByPk(bolt.id, { raw: true }))?.cutEdge).toBe(yards(2.375));
    expect(await db().Sale.count()).toBe(1);
    const [receipt] = await db().PrintJob.findAll({ where: { printer: "receipt" }, raw: true });
    expect(isPrintDocument(receipt?.document)).toBe(true);
    expect(await auditStock()).toEqual([]);
  });

  it("is refused whole when the cash, the cloth or the till does not reach", async () => {
    expect(codeOf(await sell(yards(1), 100))).toBe("not-enough");
    expect(codeOf(await sell(yards(50), 100_000))).toBe("too-short");
    expect(codeOf(await recordSale(counter, { requestId: randomUUID(), tillSessionId: 9999, lines: [{ item: "fabric", tag: bolt.tag, length: yards(1) }], cash: 5000 }))).toBe("not-open");
    expect(codeOf(await recordSale(await buildPerson({ roles: ["cutter"] }), { requestId: randomUUID(), tillSessionId: sessionId, lines: [{ item: "fabric", tag: bolt.tag, length: yards(1) }], cash: 5000 }))).toBe("forbidden");
    expect(await db().Sale.count()).toBe(1);
    expect(await auditStock()).toEqual([]);
  });

  it("does not touch what is promised to a run", async () => {
    await buildRun(owner, { kits: 2, lengths: [{ fabricId: bolt.fabric.id, boltId: bolt.id, length: yards(2.5) }] });
    expect(codeOf(await sell(yards(2), 10_000))).toBe("takes-reserved");
    must(await sell(yards(0.5), 10_000));
    expect(await auditStock()).toEqual([]);
  });
});

describe("a till", () => {
  it("is closed on a blind count: the counter is not told what should be there, and the difference is written down", async () => {
    const closed = must(await closeTill(counter, { requestId: randomUUID(), sessionId, counted: 14_000 }));
    expect(closed).toEqual({ counted: 14_000, expected: null, difference: null });
    const session = await db().TillSession.findByPk(sessionId, { raw: true });
    // The float, 36.93, and half a yard: 7.30 with 0.47 tax.
    expect(session).toMatchObject({ counted: 14_000, expected: 10_000 + 3693 + 777 });
    expect(codeOf(await sell(yards(0.25), 5000))).toBe("not-open");
  });
});
