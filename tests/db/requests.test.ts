import { randomUUID } from "node:crypto";
import { afterEach, beforeAll, describe, expect, it } from "vitest";
import { inches, yards } from "@/lib/core/measure/length";
import type { Actor } from "@/lib/core/policy/policy";
import { answerOnce } from "@/lib/data/answer-once";
import { inTransaction } from "@/lib/data/in-transaction";
import { ok } from "@/lib/core/result";
import { auditStock } from "@/lib/data/stock/audit-stock";
import { claimBolt, releaseClaim } from "@/lib/data/stock/claim-bolt";
import { listExceptions } from "@/lib/data/stock/list-exceptions";
import { measureBolt } from "@/lib/data/stock/measure-bolt";
import { moveBolt } from "@/lib/data/stock/move-bolt";
import { receiveBolt } from "@/lib/data/stock/receive-bolt";
import { recordWasteCut } from "@/lib/data/stock/record-waste-cut";
import { releaseReservation, releaseRun } from "@/lib/data/stock/release-reservation";
import { reserveLengths, type RefusedDemand } from "@/lib/data/stock/reserve-lengths";
import { sellFromBolt, type SellFromBoltInput } from "@/lib/data/stock/sell-yardage";
import { settleException } from "@/lib/data/stock/settle-exception";
import { db } from "@/models/database";
import { buildBolt, buildFabric, buildPerson, buildRun, buildShop, codeOf, must, startRun } from "./factories";
import { withTestDatabase } from "./test-database";

withTestDatabase();

let owner: Actor;
let till: Actor;
beforeAll(async () => {
  await buildShop({ straightening: inches(1) });
  owner = await buildPerson();
  till = await buildPerson({ roles: ["counter"] });
});
afterEach(async () => {
  expect(await auditStock()).toEqual([]);
});

const once = () => ({ requestId: randomUUID() });

function sell(actor: Actor, input: Omit<SellFromBoltInput, "requestId">) {
  const { requestId } = once();
  return answerOnce(actor, "test.sale", { requestId }, (transaction) => sellFromBolt(transaction, actor, { requestId, ...input }));
}

describe("reserving lengths", () => {
  it("counts straightening once a bolt, not once a length", async () => {
    const bolt = await buildBolt(owner, { putUp: yards(3) });
    const demand = (inch: number) => startRun(owner, { kits: 2, lengths: [{ fabricId: bolt.fabric.id, boltId: bolt.id, length: inches(inch) }] });
    // 108 in less 1 in to straighten hold two of 53 1/2 in, not two of 54 in.
    expect(codeOf(await demand(54))).toBe("does-not-fit");
    expect(codeOf(await demand(53.5))).toBe("ok");
  });

  it("is refused with figures and writes nothing, on any bolt", async () => {
    const [full, free] = [await buildBolt(owner, { putUp: yards(2) }), await buildBolt(owner)];
    const refused = await reserveLengths(owner, { ...once(), runId: null, demands: [{ boltId: free.id, length: yards(1), count: 2 }, { boltId: full.id, length: yards(1), count: 2 }] });
    expect(refused).toMatchObject({ ok: false, fault: { code: "does-not-fit" } });
    const figures = refused.ok ? [] : (refused.fault.facts?.["refused"] as RefusedDemand[]);
    expect(figures).toEqual([{ tag: full.tag, left: yards(2), reserved: 0, wanted: [{ length: yards(1), count: 2 }] }]);
    expect(await db().Reservation.count({ where: { boltId: [full.id, free.id] } })).toBe(0);
  });

  it("sees that lengths fit the sum but not the stretches between flaws", async () => {
    const bolt = await buildBolt(owner, { putUp: yards(4), flaws: [{ startsAt: yards(2), endsAt: yards(2) + inches(1) }] });
    const demand = (count: number) => reserveLengths(owner, { ...once(), runId: null, demands: [{ boltId: bolt.id, length: yards(1.25), count }] });
    expect(codeOf(await demand(3))).toBe("does-not-fit");
    const [view] = must(await demand(2));
    expect(view).toMatchObject({ reserved: yards(2.5) });
    // What can still go on one piece lies in what is left of the second stretch, less nothing of the first.
    expect(view?.toSell).toBe(yards(0.75) - inches(1));
  });

  it("of the last cloth is granted to one of many who ask at once", async () => {
    const bolt = await buildBolt(owner, { putUp: yards(1) + inches(1) });
    const answers = await Promise.all(Array.from({ length: 12 }, () => startRun(owner, { kits: 1, lengths: [{ fabricId: bolt.fabric.id, boltId: bolt.id, length: yards(1) }] })));
    expect(answers.filter((answer) => answer.ok)).toHaveLength(1);
    expect(answers.filter((answer) => codeOf(answer) === "does-not-fit")).toHaveLength(11);
  });

  it("gives bolts to the lengths of a run that have none, and releasing takes them away", async () => {
    const bolt = await buildBolt(owner);
    const run = await buildRun(owner, { kits: 3, lengths: [{ fabricId: bolt.fabric.id, boltId: null, length: yards(1) }] });
    const ask = (count: number) => reserveLengths(owner, { ...once(), runId: run.id, demands: [{ boltId: bolt.id, length: yards(1), count }] });
    expect(codeOf(await ask(4))).toBe("no-such-lengths");
    must(await ask(3));
    const rows = await db().Reservation.findAll({ where: { runId: run.id }, raw: true });
    expect(rows).toMatchObject([{ count: 3, state: "held" }]);
    const after = must(await releaseReservation(owner, { ...once(), reservationId: rows[0]!.id, count: 1 }));
    expect(after.reserved).toBe(yards(2));
    expect(await db().RunLength.count({ where: { runId: run.id, boltId: null } })).toBe(1);
    expect(codeOf(await releaseReservation(owner, { ...once(), reservationId: rows[0]!.id, count: 3 }))).toBe("too-many");
    must(await inTransaction(async (transaction) => ok(await releaseRun(transaction, owner, run.id))));
    expect(await db().RunLength.count({ where: { runId: run.id, boltId: null } })).toBe(3);
    expect((await db().Bolt.findByPk(bolt.id, { raw: true }))?.reserved).toBe(0);
  });

  it("on a bolt narrower than the plan, or of nothing, is refused", async () => {
    const bolt = await buildBolt(owner, { usableWidth: inches(38) });
    expect(codeOf(await reserveLengths(owner, { ...once(), runId: null, demands: [{ boltId: bolt.id, length: yards(1), count: 1, plannedWidth: inches(40) }] }))).toBe("too-narrow");
    expect(codeOf(await reserveLengths(owner, { ...once(), runId: null, demands: [{ boltId: bolt.id, length: 0, count: 1 }] }))).toBe("bad-demand");
    expect(codeOf(await reserveLengths(owner, { ...once(), runId: null, demands: [{ boltId: 999_999, length: 1, count: 1 }] }))).toBe("unknown-bolt");
    expect(codeOf(await reserveLengths(till, { ...once(), runId: null, demands: [] }))).toBe("forbidden");
  });
});

describe("selling off a bolt", () => {
  it("goes to the last thread when nothing is promised", async () => {
    const bolt = await buildBolt(owner, { putUp: yards(2) });
    expect(bolt.toSell).toBe(yards(2));
    const sold = must(await sell(till, { tag: bolt.tag, length: yards(2) }));
    expect(sold).toMatchObject({ left: 0, found: 0, short: [] });
    expect(codeOf(await sell(till, { tag: bolt.tag, length: yards(1) }))).toBe("too-short");
  });

  it("is refused where promised lengths would no longer fit, with what can be sold", async () => {
    const bolt = await buildBolt(owner, { putUp: yards(4) });
    await buildRun(owner, { kits: 2, lengths: [{ fabricId: bolt.fabric.id, boltId: bolt.id, length: yards(1) }] });
    const refused = await sell(till, { tag: bolt.tag, length: yards(2.5) });
    expect(refused).toMatchObject({ ok: false, fault: { code: "takes-reserved", facts: { left: yards(4), reserved: yards(2), toSell: yards(2) - inches(1), mayTake: false } } });
    expect(codeOf(await sell(till, { tag: bolt.tag, length: yards(2.5), takeReservedBecause: "please" }))).toBe("takes-reserved");
    must(await sell(till, { tag: bolt.tag, length: yards(2) - inches(1) }));
  });

  it("takes promised fabric for a person who may and who says why; the run is told", async () => {
    const bolt = await buildBolt(owner, { putUp: yards(4) });
    const run = await buildRun(owner, { kits: 2, lengths: [{ fabricId: bolt.fabric.id, boltId: bolt.id, length: yards(1) }] });
    expect(codeOf(await sell(owner, { tag: bolt.tag, length: yards(2.5), takeReservedBecause: " " }))).toBe("reason-missing");
    const sold = must(await sell(owner, { tag: bolt.tag, length: yards(2.5), takeReservedBecause: "the last of her backing" }));
    expect(sold.short).toMatchObject([{ runId: run.id, count: 1 }]);
    const list = must(await listExceptions(owner));
    expect(list.exceptions[0]).toMatchObject({ kind: "reservation-short", boltTag: bolt.tag, run: { id: run.id } });
  });

  it("that happened at an offline till is recorded whatever the book says", async () => {
    const bolt = await buildBolt(owner, { putUp: yards(2) });
    await buildRun(owner, { kits: 1, lengths: [{ fabricId: bolt.fabric.id, boltId: bolt.id, length: yards(1) }] });
    const sold = must(await sell(till, { tag: bolt.tag, length: yards(3), asFact: true }));
    expect(sold).toMatchObject({ left: 0, found: yards(1), short: [{ count: 1 }] });
  });
});

describe("receiving a bolt", () => {
  it("gives it a tag, its flaws and its move from the supplier", async () => {
    const bolt = await buildBolt(owner, { putUp: yards(12), invoiced: yards(12.5), shelf: "B2", flaws: [{ startsAt: inches(40), endsAt: inches(41), note: "knot" }] });
    expect(bolt.tag).toMatch(/^B/);
    expect(bolt).toMatchObject({ left: yards(12), shelf: "B2", flaws: [{ note: "knot" }] });
    expect(bolt.longestPiece).toBe(yards(12) - inches(41));
  });

  it("refuses what cannot be a bolt, with the field", async () => {
    const { id: fabricId } = await buildFabric();
    const receive = (over: object) => receiveBolt(owner, { ...once(), fabricId, lot: "L1", putUp: yards(10), ...over });
    expect(codeOf(await receive({ putUp: 0 }))).toBe("absurd-length");
    expect(codeOf(await receive({ putUp: 2 ** 31 }))).toBe("absurd-length");
    expect(codeOf(await receive({ lot: "  " }))).toBe("bad-lot");
    expect(codeOf(await receive({ fabricId: 999_999 }))).toBe("unknown-fabric");
    expect(codeOf(await receive({ flaws: [{ startsAt: yards(9), endsAt: yards(11) }] }))).toBe("bad-range");
    expect(codeOf(await receiveBolt(till, { ...once(), fabricId, lot: "L1", putUp: yards(10) }))).toBe("forbidden");
  });
});

describe("a bolt in hand", () => {
  it("is claimed by one station; the other is told who has it, and may take it over", async () => {
    const bolt = await buildBolt(owner);
    const claim = (actor: Actor, station: string, takeOver = false) => claimBolt(actor, { tag: bolt.tag, station, takeOver });
    expect(must(await claim(owner, "Table 1")).claim).toMatchObject({ station: "Table 1", person: owner.name });
    expect(codeOf(await claim(owner, "Table 1"))).toBe("ok");
    expect(await claim(till, "Till 1")).toMatchObject({ ok: false, fault: { code: "claimed-elsewhere", facts: { station: "Table 1", person: owner.name } } });
    expect(must(await claim(till, "Till 1", true)).claim?.station).toBe("Till 1");
    expect(must(await releaseClaim(owner, { tag: bolt.tag, station: "Table 1" })).claim?.station).toBe("Till 1");
    expect(must(await releaseClaim(till, { tag: bolt.tag, station: "Till 1" })).claim).toBeNull();
  });

  it("is won by one of many scans at once", async () => {
    const bolt = await buildBolt(owner);
    const answers = await Promise.all(Array.from({ length: 8 }, (_, number) => claimBolt(owner, { tag: bolt.tag, station: `Table ${number}` })));
    expect(answers.filter((answer) => answer.ok)).toHaveLength(1);
  });

  it("goes to another shelf, typed with spaces and small letters", async () => {
    const bolt = await buildBolt(owner);
    const typed = `${bolt.tag.slice(0, 3)} ${bolt.tag.slice(3)}`.toLowerCase();
    expect(must(await moveBolt(till, { ...once(), tag: typed, shelf: " W10 " })).shelf).toBe("W10");
    expect(codeOf(await moveBolt(till, { ...once(), tag: bolt.tag, shelf: "x".repeat(41) }))).toBe("shelf-too-long");
  });
});

describe("the exception list", () => {
  it("is settled once, with what was done", async () => {
    const bolt = await buildBolt(owner, { putUp: yards(2) });
    must(await recordWasteCut(owner, { ...once(), tag: bolt.tag, length: yards(3), kind: "sample" }));
    const before = must(await listExceptions(owner));
    const exception = before.exceptions[0]!;
    expect(exception).toMatchObject({ kind: "book-corrected", boltTag: bolt.tag, settledAt: null });
    expect(exception.sentence).toContain("3 yd");
    expect(codeOf(await settleException(till, { ...once(), exceptionId: exception.id, settlement: "seen" }))).toBe("forbidden");
    expect(codeOf(await settleException(owner, { ...once(), exceptionId: exception.id, settlement: " " }))).toBe("settlement-missing");
    must(await settleException(owner, { ...once(), exceptionId: exception.id, settlement: "Supplier sent more." }));
    expect(codeOf(await settleException(owner, { ...once(), exceptionId: exception.id, settlement: "again" }))).toBe("already-settled");
    const after = must(await listExceptions(owner));
    expect(after.open).toBe(before.open - 1);
    expect(must(await listExceptions(owner, { settled: true })).exceptions[0]).toMatchObject({ id: exception.id, settlement: "Supplier sent more.", settledBy: owner.name });
    expect(codeOf(await listExceptions(till))).toBe("forbidden");
  });

  it("gets a line for each run that a measure made short", async () => {
    const bolt = await buildBolt(owner, { putUp: yards(4) });
    const length = { fabricId: bolt.fabric.id, boltId: bolt.id, length: yards(1) };
    const runs = [await buildRun(owner, { kits: 1, lengths: [length] }), await buildRun(owner, { kits: 1, lengths: [length] })];
    must(await measureBolt(owner, { ...once(), tag: bolt.tag, left: inches(10), where: "core", reason: "measured" }));
    const rows = await db().Exception.findAll({ where: { boltId: bolt.id }, raw: true });
    expect(rows.map((row) => row.runId).sort()).toEqual(runs.map((run) => run.id).sort());
  });
});
