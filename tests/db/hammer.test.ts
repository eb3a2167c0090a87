import { randomUUID } from "node:crypto";
import { QueryTypes } from "sequelize";
import { beforeAll, describe, expect, it } from "vitest";
import { inches, yards } from "@/lib/core/measure/length";
import type { Actor } from "@/lib/core/policy/policy";
import { answerOnce } from "@/lib/data/answer-once";
import type { BoltView } from "@/lib/data/bolt-view";
import { auditStock } from "@/lib/data/stock/audit-stock";
import { measureBolt } from "@/lib/data/stock/measure-bolt";
import { noteFlaw } from "@/lib/data/stock/note-flaw";
import { recordCut } from "@/lib/data/stock/record-cut";
import { recordWasteCut } from "@/lib/data/stock/record-waste-cut";
import { releaseReservation } from "@/lib/data/stock/release-reservation";
import { sellFromBolt } from "@/lib/data/stock/sell-yardage";
import { undoLastCut } from "@/lib/data/stock/undo-last-cut";
import { db } from "@/models/database";
import { buildBolt, buildFabric, buildPerson, buildShop, startRun, type BuiltLength } from "./factories";
import { withTestDatabase } from "./test-database";

/** Refusals are part of the work; anything else that comes back is a fault of ours. */
const EXPECTED = new Set([
  "ok", "does-not-fit", "already-cut", "wrong-lot", "wrong-fabric", "too-short", "takes-reserved", "reason-missing",
  "unknown-cut", "not-last", "cut-sold", "off-the-bolt", "unknown-reservation", "too-many",
]);
const BOLTS = 20;

/** Mulberry32: small, seeded, good enough to choose what a client does next. */
function seeded(seed: number): (below: number) => number {
  let state = seed;
  return (below) => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) % below;
  };
}

interface Shop {
  readonly actor: Actor;
  readonly bolts: readonly BoltView[];
  readonly lengths: BuiltLength[];
  readonly seen: Map<string, number>;
}

/** 20 bolts of 5 fabrics in 2 lots. */
async function openShop(): Promise<Shop> {
  await buildShop();
  const actor = await buildPerson();
  const fabrics = [];
  for (let number = 0; number < 5; number += 1) fabrics.push(await buildFabric());
  const bolts: BoltView[] = [];
  for (let number = 0; number < BOLTS; number += 1) {
    bolts.push(await buildBolt(actor, { fabricId: fabrics[number % 5]!.id, lot: number < 10 ? "L1" : "L2", putUp: yards(12), shelf: `S${number}` }));
  }
  return { actor, bolts, lengths: [], seen: new Map() };
}

async function act(shop: Shop, random: (below: number) => number): Promise<string> {
  const { actor, lengths } = shop;
  const requestId = randomUUID();
  const bolt = shop.bolts[random(BOLTS)]!;
  const some = inches(1 + random(40));
  const at = random(100);
  if (at < 12) {
    const demand = (each: BoltView) => ({ fabricId: each.fabric.id, boltId: each.id, length: inches(9 + random(27)) });
    const run = await startRun(actor, { kits: 1 + random(3), purpose: random(2) ? "shelf" : "orders", lengths: [demand(bolt), demand(shop.bolts[random(BOLTS)]!)] });
    if (run.ok) lengths.push(...run.value.lengths);
    return run.ok ? "ok" : run.fault.code;
  }
  if (at < 50 && lengths.length > 0) {
    const wanted = lengths[random(lengths.length)]!;
    const row = await db().RunLength.findByPk(wanted.id, { raw: true, rejectOnEmpty: true });
    const planned = shop.bolts.find((each) => each.id === row.boltId) ?? bolt;
    // Mostly the planned bolt and length; now and then another bolt, a longer cut, or one that comes from a queue.
    const tag = random(5) === 0 ? bolt.tag : planned.tag;
    const input = { requestId, runLengthId: wanted.id, tag, length: wanted.length + (random(4) === 0 ? inches(random(3)) : 0), asFact: random(6) === 0 };
    const [first, again] = await Promise.all([recordCut(actor, input), random(8) === 0 ? recordCut(actor, input) : null]);
    if (first.ok && again?.ok) expect(again.value.cutId).toBe(first.value.cutId);
    return first.ok ? "ok" : first.fault.code;
  }
  const result =
    at < 65
      ? await answerOnce(actor, "sale", { requestId }, (transaction) =>
          sellFromBolt(transaction, actor, { requestId, tag: bolt.tag, length: some, asFact: random(5) === 0, ...(random(4) === 0 ? { takeReservedBecause: "a customer insists" } : {}) }),
        )
      : at < 72
        ? await measureBolt(actor, { requestId, tag: bolt.tag, left: Math.max(0, (await leftOf(bolt.id)) + inches(random(40)) - inches(20)), where: random(2) ? "edge" : "core", reason: "measured" })
        : at < 85
          ? await undoLastCut(actor, { requestId, tag: bolt.tag, cutId: await lastCutOf(bolt.id), reason: "wrong" })
          : at < 92
            ? await recordWasteCut(actor, { requestId, tag: bolt.tag, length: inches(1 + random(4)), kind: random(2) ? "straightening" : "sample" })
            : at < 96
              ? await noteFlaw(actor, { requestId, tag: bolt.tag, fromEdge: inches(random(100)), toEdge: inches(101 + random(4)) })
              : await releaseReservation(actor, { requestId, reservationId: 1 + random(200), count: 1 });
  return result.ok ? "ok" : result.fault.code;
}

async function leftOf(id: number): Promise<number> {
  const bolt = await db().Bolt.findByPk(id, { raw: true, rejectOnEmpty: true });
  return bolt.putUp - bolt.cutEdge;
}

async function lastCutOf(boltId: number): Promise<number> {
  const cut = await db().Cut.findOne({ where: { boltId }, order: [["startsAt", "DESC"]], raw: true });
  return cut?.id ?? 1;
}

async function hammer(shop: Shop, { clients, steps, seed }: { clients: number; steps: number; seed: number }): Promise<void> {
  const client = async (number: number) => {
    const random = seeded(seed * 1000 + number);
    for (let step = 0; step < steps; step += 1) {
      const code = await act(shop, random);
      expect(EXPECTED, `client ${number}, step ${step}`).toContain(code);
      shop.seen.set(code, (shop.seen.get(code) ?? 0) + 1);
    }
  };
  await Promise.all(Array.from({ length: clients }, (_, number) => client(number)));
}

/**
 * Cloth by the tables of bolts and cuts against what the ledger says came from the supplier and was found or lost: one
 * row for each fabric of which some vanished or appeared.
 */
async function vanished(): Promise<{ fabricId: number; there: number; came: number }[]> {
  return db().sequelize.query(
    `WITH there AS (
       SELECT b.fabric_id, SUM(b.put_up - b.cut_edge + COALESCE((SELECT SUM(c.ends_at - c.starts_at) FROM cuts c WHERE c.bolt_id = b.id AND c.purpose <> 'correction'), 0)) AS sum
         FROM bolts b GROUP BY b.fabric_id),
     came AS (
       SELECT fabric_id, SUM(CASE WHEN from_place IN ('supplier','found-or-lost') THEN quantity ELSE 0 END - CASE WHEN to_place IN ('supplier','found-or-lost') THEN quantity ELSE 0 END) AS sum
         FROM moves WHERE item = 'fabric' GROUP BY fabric_id)
     SELECT t.fabric_id AS "fabricId", t.sum::bigint AS there, c.sum::bigint AS came FROM there t JOIN came c USING (fabric_id) WHERE t.sum <> c.sum`,
    { type: QueryTypes.SELECT },
  );
}

describe("64 clients on 20 bolts", () => {
  withTestDatabase({ pool: 16 });
  let shop: Shop;
  beforeAll(async () => {
    shop = await openShop();
  });

  it("leave a book that adds up", async () => {
    await hammer(shop, { clients: 64, steps: 20, seed: 1 });
    expect(await auditStock()).toEqual([]);
    expect(await vanished()).toEqual([]);
    // The mixture is of use only when it met the cases that hurt.
    for (const code of ["ok", "already-cut", "takes-reserved"]) expect(shop.seen.get(code) ?? 0, code).toBeGreaterThan(0);
    expect(await db().Exception.count({ where: { kind: "reservation-short" } })).toBeGreaterThan(0);
  }, 240_000);
});

describe("clients that share one connection", () => {
  withTestDatabase({ pool: 1 });

  it("never wait for a second one", async () => {
    const shop = await openShop();
    await hammer(shop, { clients: 8, steps: 15, seed: 2 });
    expect(await auditStock()).toEqual([]);
    expect(await vanished()).toEqual([]);
  }, 120_000);
});
