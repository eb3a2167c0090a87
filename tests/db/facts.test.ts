import { randomUUID } from "node:crypto";
import { afterEach, beforeAll, describe, expect, it } from "vitest";
import { inches, yards } from "@/lib/core/measure/length";
import type { Actor } from "@/lib/core/policy/policy";
import type { BoltView } from "@/lib/data/bolt-view";
import { auditStock } from "@/lib/data/stock/audit-stock";
import { measureBolt } from "@/lib/data/stock/measure-bolt";
import { noteFlaw } from "@/lib/data/stock/note-flaw";
import { recordCut } from "@/lib/data/stock/record-cut";
import { recordWasteCut } from "@/lib/data/stock/record-waste-cut";
import { removeFlaw } from "@/lib/data/stock/remove-flaw";
import { undoLastCut } from "@/lib/data/stock/undo-last-cut";
import { db } from "@/models/database";
import { buildBolt, buildFabric, buildPerson, buildRun, buildShop, codeOf, must } from "./factories";
import { withTestDatabase } from "./test-database";

withTestDatabase();

let owner: Actor;
beforeAll(async () => {
  await buildShop({ straightening: inches(1) });
  owner = await buildPerson({ name: "Ines" });
});
afterEach(async () => {
  expect(await auditStock()).toEqual([]);
});

const once = () => ({ requestId: randomUUID() });

/** A run of so many kits, each of one length, on a bolt. */
async function runOn(bolt: BoltView, kits: number, length: number, purpose: "shelf" | "class" | "orders" = "shelf") {
  return buildRun(owner, { kits, purpose, lengths: [{ fabricId: bolt.fabric.id, boltId: bolt.id, length }] });
}

async function exceptionsOf(boltId: number): Promise<string[]> {
  const rows = await db().Exception.findAll({ where: { boltId }, order: [["id", "ASC"]], raw: true });
  return rows.map((row) => row.kind);
}

async function promisesOn(boltId: number): Promise<string[]> {
  const rows = await db().Reservation.findAll({ where: { boltId, state: ["held", "short"] }, order: [["runId", "ASC"], ["state", "ASC"]], raw: true });
  return rows.map((row) => `${row.count} ${row.state}`);
}

describe("a cut for a kit", () => {
  it("takes its length off the promise, fills the bag and moves the run on", async () => {
    const bolt = await buildBolt(owner);
    const run = await runOn(bolt, 2, yards(1));
    const first = must(await recordCut(owner, { ...once(), runLengthId: run.lengths[0]!.id, tag: bolt.tag, length: yards(1) }));
    expect(first).toMatchObject({ recordedAs: "kit", runState: "cutting", kitState: "cut", found: 0, short: [] });
    expect(first.bolt).toMatchObject({ left: yards(9), reserved: yards(1), toSell: yards(8) });
    const second = must(await recordCut(owner, { ...once(), runLengthId: run.lengths[1]!.id, tag: bolt.tag, length: yards(1) }));
    expect(second).toMatchObject({ runState: "cut", kitState: "cut" });
    expect(second.bolt).toMatchObject({ left: yards(8), reserved: 0 });
    expect(await promisesOn(bolt.id)).toEqual([]);
  });

  it("may be longer than planned; the book follows the cut", async () => {
    const bolt = await buildBolt(owner);
    const run = await runOn(bolt, 1, yards(1));
    const cut = must(await recordCut(owner, { ...once(), runLengthId: run.lengths[0]!.id, tag: bolt.tag, length: inches(38) }));
    expect(cut.bolt.left).toBe(yards(10) - inches(38));
  });

  it("longer than what the book says is left corrects the book and tells the manager", async () => {
    const bolt = await buildBolt(owner, { putUp: yards(2) });
    const run = await runOn(bolt, 1, yards(1));
    const cut = must(await recordCut(owner, { ...once(), runLengthId: run.lengths[0]!.id, tag: bolt.tag, length: yards(2.5) }));
    expect(cut.found).toBe(yards(0.5));
    expect(cut.bolt).toMatchObject({ left: 0, putUp: yards(2.5) });
    expect(cut.bolt.retiredAt).not.toBeNull();
    expect(await exceptionsOf(bolt.id)).toEqual(["book-corrected"]);
  });

  it("from a bolt of another fabric, of another lot, or one too narrow is refused with what was found and wanted", async () => {
    const fabric = await buildFabric({ name: "Moss dots" });
    const bolt = await buildBolt(owner, { fabricId: fabric.id, lot: "L1" });
    const length = { fabricId: fabric.id, boltId: bolt.id, length: yards(1) };
    const run = await buildRun(owner, { kits: 1, lengths: [length, length] });
    const cut = (tag: string, asFact = false) => recordCut(owner, { ...once(), runLengthId: run.lengths[0]!.id, tag, length: yards(1), asFact });

    const other = await buildBolt(owner, { fabricId: (await buildFabric({ name: "Rust leaves" })).id });
    const wrong = await cut(other.tag);
    expect(wrong).toMatchObject({ ok: false, fault: { code: "wrong-fabric" } });
    expect(!wrong.ok && wrong.fault.message).toMatch(/Rust leaves.*Moss dots/);
    const lot2 = await buildBolt(owner, { fabricId: fabric.id, lot: "L2" });
    expect(await cut(lot2.tag)).toMatchObject({ ok: false, fault: { code: "wrong-lot", facts: { found: "L2", wanted: "L1" } } });
    const narrow = await buildBolt(owner, { fabricId: fabric.id, lot: "L1", usableWidth: inches(38) });
    expect(codeOf(await cut(narrow.tag))).toBe("too-narrow");
    expect(await db().Cut.count({ where: { boltId: [other.id, lot2.id, narrow.id] } })).toBe(0);
  });

  it("may come from another bolt of the same lot; the promise on the planned one ends", async () => {
    const fabric = await buildFabric();
    const [planned, taken] = [await buildBolt(owner, { fabricId: fabric.id }), await buildBolt(owner, { fabricId: fabric.id })];
    const run = await runOn(planned, 1, yards(1));
    const cut = must(await recordCut(owner, { ...once(), runLengthId: run.lengths[0]!.id, tag: taken.tag, length: yards(1) }));
    expect(cut.bolt).toMatchObject({ tag: taken.tag, left: yards(9) });
    expect(await promisesOn(planned.id)).toEqual([]);
    // Undone, it waits on the bolt that it was planned on.
    must(await undoLastCut(owner, { ...once(), tag: taken.tag, cutId: cut.cutId, reason: "wrong bolt" }));
    expect(await promisesOn(planned.id)).toEqual(["1 held"]);
  });

  it("that somebody else made first is refused online, and booked as a mis-cut from a queue", async () => {
    const bolt = await buildBolt(owner);
    const run = await runOn(bolt, 2, yards(1));
    const input = { runLengthId: run.lengths[0]!.id, tag: bolt.tag, length: yards(1) };
    must(await recordCut(owner, { ...once(), ...input }));
    const again = await recordCut(owner, { ...once(), ...input });
    expect(again).toMatchObject({ ok: false, fault: { code: "already-cut" } });
    expect(!again.ok && again.fault.message).toContain("Ines");
    const late = must(await recordCut(owner, { ...once(), ...input, asFact: true, at: "2026-11-30T10:00:00.000Z" }));
    expect(late).toMatchObject({ recordedAs: "mis-cut", runState: "cutting", kitState: "cut" });
    expect(late.bolt).toMatchObject({ left: yards(8), reserved: yards(1) });
    expect(await exceptionsOf(bolt.id)).toEqual(["cut-elsewhere"]);
    const row = await db().Cut.findByPk(late.cutId, { raw: true, rejectOnEmpty: true });
    expect(row).toMatchObject({ purpose: "mis-cut", at: new Date("2026-11-30T10:00:00.000Z") });
  });

  it("that eats into other promises makes the shelf run short first, then the newest", async () => {
    const bolt = await buildBolt(owner, { putUp: yards(6) });
    const orders = await runOn(bolt, 1, yards(1), "orders");
    const shelf = await runOn(bolt, 2, yards(1), "shelf");
    const newest = await runOn(bolt, 1, yards(1), "orders");
    // 6 yd hold 4 promised; after 3 yd are gone, 3 yd hold three of them.
    const cut = must(await recordWasteCut(owner, { ...once(), tag: bolt.tag, length: yards(3), kind: "mis-cut" }));
    expect(cut.short).toEqual([{ runId: shelf.id, runCode: shelf.code, length: yards(1), count: 1 }]);
    const next = must(await recordWasteCut(owner, { ...once(), tag: bolt.tag, length: yards(2), kind: "mis-cut" }));
    expect(next.short.map((each) => each.runId)).toEqual([shelf.id, newest.id]);
    expect(next.bolt).toMatchObject({ left: yards(1), reserved: yards(1), toSell: 0 });
    const held = await db().Reservation.findOne({ where: { boltId: bolt.id, state: "held" }, raw: true });
    expect(held?.runId).toBe(orders.id);
    expect(await exceptionsOf(bolt.id)).toEqual(["reservation-short", "reservation-short", "reservation-short"]);
  });

  it("needs the permission", async () => {
    const packer = await buildPerson({ roles: ["packer"] });
    expect(codeOf(await recordCut(packer, { ...once(), runLengthId: 1, tag: "B1", length: yards(1) }))).toBe("forbidden");
  });

  it("on nothing, or of an absurd length, is refused even from a queue", async () => {
    const bolt = await buildBolt(owner);
    const run = await runOn(bolt, 1, yards(1));
    const id = run.lengths[0]!.id;
    expect(codeOf(await recordCut(owner, { ...once(), runLengthId: id, tag: "none", length: yards(1), asFact: true }))).toBe("unknown-bolt");
    expect(codeOf(await recordCut(owner, { ...once(), runLengthId: 999_999, tag: bolt.tag, length: yards(1), asFact: true }))).toBe("unknown-length");
    for (const length of [0, -5, 1.5, 2_147_483_647]) {
      expect(codeOf(await recordCut(owner, { ...once(), runLengthId: id, tag: bolt.tag, length, asFact: true }))).toBe("absurd-length");
    }
  });
});

describe("undoing the last cut", () => {
  it("puts cloth, promise and run back as they were", async () => {
    const bolt = await buildBolt(owner);
    const run = await runOn(bolt, 1, yards(1));
    const cut = must(await recordCut(owner, { ...once(), runLengthId: run.lengths[0]!.id, tag: bolt.tag, length: inches(40) }));
    const undone = must(await undoLastCut(owner, { ...once(), tag: bolt.tag, cutId: cut.cutId, reason: "too long" }));
    expect(undone.bolt).toMatchObject({ left: yards(10), reserved: yards(1) });
    expect(await promisesOn(bolt.id)).toEqual(["1 held"]);
    const row = await db().Run.findByPk(run.id, { raw: true, rejectOnEmpty: true });
    expect(row.state).toBe("reserved");
    expect(await db().RunKit.count({ where: { runId: run.id, state: "waiting" } })).toBe(1);
  });

  it("takes back what the cut had made the book find", async () => {
    const bolt = await buildBolt(owner, { putUp: yards(2) });
    const cut = must(await recordWasteCut(owner, { ...once(), tag: bolt.tag, length: yards(20), kind: "sample" }));
    expect(cut.found).toBe(yards(18));
    const undone = must(await undoLastCut(owner, { ...once(), tag: bolt.tag, cutId: cut.cutId, reason: "meant 2 yd" }));
    expect(undone.bolt).toMatchObject({ left: yards(2), putUp: yards(2), retiredAt: null });
  });

  it("refuses any but the last, one that is gone, and one without a reason", async () => {
    const bolt = await buildBolt(owner);
    const waste = () => recordWasteCut(owner, { ...once(), tag: bolt.tag, length: yards(1), kind: "sample" });
    const [first, last] = [must(await waste()), must(await waste())];
    const undo = (cutId: number, reason = "wrong") => undoLastCut(owner, { ...once(), tag: bolt.tag, cutId, reason });
    expect(codeOf(await undo(first.cutId))).toBe("not-last");
    expect(codeOf(await undo(last.cutId, " "))).toBe("reason-missing");
    must(await undo(last.cutId));
    expect(codeOf(await undo(last.cutId))).toBe("unknown-cut");
    must(await undo(first.cutId));
  });

  it("refuses a length that lies in its kit already", async () => {
    const bolt = await buildBolt(owner);
    const run = await runOn(bolt, 1, yards(1));
    const cut = must(await recordCut(owner, { ...once(), runLengthId: run.lengths[0]!.id, tag: bolt.tag, length: yards(1) }));
    await db().RunLength.update({ packedAt: new Date(), packedBy: owner.personId }, { where: { id: run.lengths[0]!.id } });
    expect(codeOf(await undoLastCut(owner, { ...once(), tag: bolt.tag, cutId: cut.cutId, reason: "wrong" }))).toBe("cut-packed");
  });
});

describe("a measured bolt", () => {
  const measure = (tag: string, left: number, where: "core" | "edge") => measureBolt(owner, { ...once(), tag, left, where, reason: "measured after cutting" });

  it("with less at the core loses its end and keeps its flaws' distance from the edge", async () => {
    const bolt = await buildBolt(owner, { flaws: [{ startsAt: yards(2), endsAt: yards(2) + inches(2) }] });
    const measured = must(await measure(bolt.tag, yards(9), "core"));
    expect(measured).toMatchObject({ difference: -yards(1) });
    expect(measured.bolt).toMatchObject({ left: yards(9), putUp: yards(9), cutEdge: 0 });
    expect(measured.bolt.flaws[0]!.startsAt - measured.bolt.cutEdge).toBe(yards(2));
  });

  it("with less at the edge is cut further, and keeps its flaws' distance from the core", async () => {
    const bolt = await buildBolt(owner, { flaws: [{ startsAt: yards(2), endsAt: yards(2) + inches(2) }] });
    const measured = must(await measure(bolt.tag, yards(9), "edge"));
    expect(measured.bolt).toMatchObject({ left: yards(9), putUp: yards(10), cutEdge: yards(1) });
    expect(measured.bolt.flaws[0]!.coreFrom).toBe(bolt.flaws[0]!.coreFrom);
    expect(measured.bolt.flaws[0]!.startsAt - measured.bolt.cutEdge).toBe(yards(1));
  });

  it("with more at the edge keeps its flaws' distance from the core; with more at the core, from the edge", async () => {
    const edge = await buildBolt(owner, { flaws: [{ startsAt: yards(2), endsAt: yards(2) + inches(2) }] });
    const atEdge = must(await measure(edge.tag, yards(11), "edge"));
    expect(atEdge.bolt.left).toBe(yards(11));
    expect(atEdge.bolt.flaws[0]!.coreFrom).toBe(edge.flaws[0]!.coreFrom);
    const core = await buildBolt(owner, { flaws: [{ startsAt: yards(2), endsAt: yards(2) + inches(2) }] });
    const atCore = must(await measure(core.tag, yards(11), "core"));
    expect(atCore.bolt.left).toBe(yards(11));
    expect(atCore.bolt.flaws[0]!.startsAt).toBe(yards(2));
  });

  it("that turns out empty is put away, and comes back when cloth is found", async () => {
    const bolt = await buildBolt(owner);
    const empty = must(await measure(bolt.tag, 0, "core"));
    expect(empty.bolt.left).toBe(0);
    expect(empty.bolt.retiredAt).not.toBeNull();
    const found = must(await measure(bolt.tag, yards(1), "core"));
    expect(found.bolt).toMatchObject({ left: yards(1), retiredAt: null });
  });

  it("that is right is only written into the trail", async () => {
    const bolt = await buildBolt(owner);
    const moves = await db().Move.count();
    expect(must(await measure(bolt.tag, yards(10), "core")).difference).toBe(0);
    expect(await db().Move.count()).toBe(moves);
    expect(await db().Change.count({ where: { subject: "bolt", subjectId: String(bolt.id), act: "measured" } })).toBe(1);
  });

  it("makes promises short, and held again when the cloth is found", async () => {
    const bolt = await buildBolt(owner, { putUp: yards(4) });
    await runOn(bolt, 3, yards(1));
    const less = must(await measure(bolt.tag, yards(2.5), "core"));
    expect(less.short).toMatchObject([{ count: 1 }]);
    expect(less.bolt.reserved).toBe(yards(2));
    expect(await promisesOn(bolt.id)).toEqual(["2 held", "1 short"]);
    const more = must(await measure(bolt.tag, yards(4), "core"));
    expect(more.short).toEqual([]);
    expect(await promisesOn(bolt.id)).toEqual(["3 held"]);
  });
});

describe("a flaw", () => {
  it("is noted from today's cut edge and stays where it is when the bolt is cut", async () => {
    const bolt = await buildBolt(owner);
    must(await recordWasteCut(owner, { ...once(), tag: bolt.tag, length: yards(1), kind: "straightening" }));
    const noted = must(await noteFlaw(owner, { ...once(), tag: bolt.tag, fromEdge: yards(2), toEdge: yards(2) + inches(1), note: "slub" }));
    expect(noted.bolt.flaws).toMatchObject([{ startsAt: yards(3), endsAt: yards(3) + inches(1), coreFrom: yards(7), note: "slub" }]);
    expect(noted.bolt.longestPiece).toBe(yards(7) - inches(1));
    const cut = must(await recordWasteCut(owner, { ...once(), tag: bolt.tag, length: yards(1), kind: "sample" }));
    expect(cut.bolt.flaws[0]!.startsAt - cut.bolt.cutEdge).toBe(yards(1));
  });

  it("between promised lengths makes them short; taking it back holds them again", async () => {
    const bolt = await buildBolt(owner, { putUp: yards(2) });
    await runOn(bolt, 1, yards(1.5));
    const noted = must(await noteFlaw(owner, { ...once(), tag: bolt.tag, fromEdge: yards(1), toEdge: yards(1) + inches(1) }));
    expect(noted.short).toMatchObject([{ count: 1 }]);
    const removed = must(await removeFlaw(owner, { ...once(), tag: bolt.tag, flawId: noted.flawId }));
    expect(removed.bolt.reserved).toBe(yards(1.5));
    expect(codeOf(await removeFlaw(owner, { ...once(), tag: bolt.tag, flawId: noted.flawId }))).toBe("unknown-flaw");
  });

  it("off the bolt, or ending before it begins, is refused", async () => {
    const bolt = await buildBolt(owner);
    expect(codeOf(await noteFlaw(owner, { ...once(), tag: bolt.tag, fromEdge: yards(9), toEdge: yards(11) }))).toBe("off-the-bolt");
    expect(codeOf(await noteFlaw(owner, { ...once(), tag: bolt.tag, fromEdge: yards(2), toEdge: yards(2) }))).toBe("bad-range");
  });
});
