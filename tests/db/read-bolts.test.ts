import { randomUUID } from "node:crypto";
import { beforeAll, describe, expect, it } from "vitest";
import { inches, yards } from "@/lib/core/measure/length";
import type { Actor } from "@/lib/core/policy/policy";
import { makeCode } from "@/lib/core/codes/code";
import type { BoltPage, BoltView } from "@/lib/data/bolt-view";
import { findByCode } from "@/lib/data/stock/find-by-code";
import { getBolt } from "@/lib/data/stock/get-bolt";
import { listBolts, type BoltFilter } from "@/lib/data/stock/list-bolts";
import { noteFlaw } from "@/lib/data/stock/note-flaw";
import { recordCut } from "@/lib/data/stock/record-cut";
import { recordWasteCut } from "@/lib/data/stock/record-waste-cut";
import { db } from "@/models/database";
import { buildBolt, buildFabric, buildPerson, buildRun, buildShop, codeOf, must } from "./factories";
import { withTestDatabase } from "./test-database";

withTestDatabase();

let owner: Actor;
let moss: BoltView[];
let rust: BoltView;
const once = () => ({ requestId: randomUUID() });

beforeAll(async () => {
  await buildShop();
  owner = await buildPerson({ name: "Ines" });
  const dots = await buildFabric({ name: "Moss dots", lowMark: yards(40) });
  const leaves = await buildFabric({ name: "Rust 100% leaves", lowMark: yards(3) });
  moss = [];
  for (const [shelf, lot] of [["A2", "L1"], ["A1", "L2"], ["B1", "L1"]] as const) moss.push(await buildBolt(owner, { fabricId: dots.id, shelf, lot, putUp: yards(10) }));
  rust = await buildBolt(owner, { fabricId: leaves.id, shelf: "A1", putUp: yards(5) });
});

async function tags(filter: BoltFilter): Promise<string[]> {
  return must(await listBolts(owner, filter)).bolts.map((bolt) => bolt.tag);
}

describe("the list of bolts", () => {
  it("is in shelf order and paged by key without a gap or a repeat", async () => {
    const all = await tags({});
    expect(all).toEqual([moss[1]!.tag, rust.tag, moss[0]!.tag, moss[2]!.tag]);
    const paged: string[] = [];
    let after: string | null = null;
    do {
      const page: BoltPage = must(await listBolts(owner, { limit: 1, after }));
      expect(page.bolts).toHaveLength(1);
      paged.push(...page.bolts.map((bolt) => bolt.tag));
      after = page.next;
    } while (after);
    expect(paged).toEqual(all);
  });

  it("finds by any part of the name, the lot, the tag and the shelf's beginning; % and _ are only characters", async () => {
    expect(await tags({ text: "moss" })).toHaveLength(3);
    expect(await tags({ text: "L2" })).toEqual([moss[1]!.tag]);
    expect(await tags({ text: rust.tag.toLowerCase() })).toEqual([rust.tag]);
    expect(await tags({ text: "100%" })).toEqual([rust.tag]);
    expect(await tags({ text: "%" })).toEqual([rust.tag]);
    expect(await tags({ text: "'; DROP TABLE bolts; --" })).toEqual([]);
    expect(await tags({ shelf: "a" })).toHaveLength(3);
    expect(await tags({ fabricId: rust.fabric.id })).toEqual([rust.tag]);
    expect(await tags({ after: "nonsense" })).toHaveLength(4);
  });

  it("knows which fabrics are below their mark", async () => {
    expect(await tags({ belowMark: true })).toHaveLength(3);
    const [bolt] = must(await listBolts(owner, { text: "moss", limit: 1 })).bolts;
    expect(bolt).toMatchObject({ fabricLeft: yards(30), lowMark: yards(40) });
  });

  it("offers a length only where it lies on one piece", async () => {
    expect(await tags({ atLeast: yards(6) })).toHaveLength(3);
    must(await noteFlaw(owner, { ...once(), tag: moss[0]!.tag, fromEdge: yards(5), toEdge: yards(5) + inches(1) }));
    expect(await tags({ atLeast: yards(6) })).toEqual([moss[1]!.tag, moss[2]!.tag]);
    expect(await tags({ atLeast: yards(6), limit: 1 })).toEqual([moss[1]!.tag]);
  });

  it("leaves out bolts with nothing left", async () => {
    const bolt = await buildBolt(owner, { shelf: "Z9", putUp: yards(1) });
    must(await recordWasteCut(owner, { ...once(), tag: bolt.tag, length: yards(1), kind: "sample" }));
    expect(await tags({ shelf: "Z9" })).toEqual([]);
    expect(await tags({ shelf: "Z9", withRetired: true })).toEqual([bolt.tag]);
  });
});

describe("one bolt", () => {
  it("shows its chain, what is promised and its trail", async () => {
    const bolt = await buildBolt(owner, { shelf: "C1" });
    const run = await buildRun(owner, { kits: 2, lengths: [{ fabricId: bolt.fabric.id, boltId: bolt.id, length: yards(1) }] });
    must(await recordWasteCut(owner, { ...once(), tag: bolt.tag, length: inches(1), kind: "straightening" }));
    must(await recordCut(owner, { ...once(), runLengthId: run.lengths[0]!.id, tag: bolt.tag, length: inches(37) }));
    const detail = must(await getBolt(owner, { tag: bolt.tag.toLowerCase() }));
    expect(detail.cuts).toMatchObject([
      { purpose: "waste", length: inches(1), startsAt: 0, coreFrom: yards(10), kit: null, canUndo: false, person: "Ines" },
      { purpose: "kit", length: inches(37), planned: yards(1), kit: { runCode: run.code, number: 1 }, canUndo: true },
    ]);
    expect(detail.reservations).toMatchObject([{ length: yards(1), count: 1, state: "held", run: { code: run.code, purpose: "shelf" } }]);
    expect(detail.history.map((each) => each.act)).toEqual(["cut", "straightened", "reserved", "received"]);
  });

  it("that is not there is said so", async () => {
    expect(codeOf(await getBolt(owner, { tag: "B9999" }))).toBe("unknown-bolt");
  });
});

describe("a scan", () => {
  it("finds bolts, runs' lengths and notions, and tells a slip from something unknown", async () => {
    expect(must(await findByCode(owner, { text: rust.tag }))).toMatchObject({ kind: "bolt", tag: rust.tag, title: rust.fabric.name });
    const run = await buildRun(owner, { kits: 1, lengths: [{ fabricId: rust.fabric.id, boltId: rust.id, length: yards(1) }] });
    expect(must(await findByCode(owner, { text: makeCode("cut", run.lengths[0]!.id) }))).toMatchObject({ kind: "cut", runLengthId: run.lengths[0]!.id, runCode: run.code });
    await db().Notion.create({ number: "Z-14", gtin: "4006381333931", name: "Zip, 14 in", price: 350, cost: 120 });
    expect(must(await findByCode(owner, { text: "4006381333931" }))).toMatchObject({ kind: "notion", number: "Z-14" });
    expect(must(await findByCode(owner, { text: " Z-14 " }))).toMatchObject({ kind: "notion" });
    const slip = rust.tag.slice(0, -1) + (rust.tag.endsWith("A") ? "B" : "A");
    expect(codeOf(await findByCode(owner, { text: slip }))).toBe("wrong-check");
    expect(codeOf(await findByCode(owner, { text: makeCode("bolt", 987_654) }))).toBe("unknown-code");
    expect(codeOf(await findByCode(owner, { text: "" }))).toBe("unknown-code");
  });
});
