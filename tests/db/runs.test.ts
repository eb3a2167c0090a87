import { randomUUID } from "node:crypto";
import { beforeAll, describe, expect, it } from "vitest";
import { isPrintDocument } from "@/labels/documents";
import { inches, yards } from "@/lib/core/measure/length";
import type { Actor } from "@/lib/core/policy/policy";
import type { BoltView } from "@/lib/data/bolt-view";
import { cancelRun } from "@/lib/data/runs/cancel-run";
import { getRun, listRuns } from "@/lib/data/runs/runs";
import { startRun } from "@/lib/data/runs/start-run";
import { auditStock } from "@/lib/data/stock/audit-stock";
import { db } from "@/models/database";
import { buildBolt, buildPerson, buildRun, buildShop, codeOf, must } from "./factories";
import { withTestDatabase } from "./test-database";

withTestDatabase();

let owner: Actor;
let bolt: BoltView;
let colourwayId: number;

/** A colourway that takes 2 yd of one fabric a kit, and a bolt of 10 yd of it: straightening leaves room for four kits. */
beforeAll(async () => {
  await buildShop();
  owner = await buildPerson();
  bolt = await buildBolt(owner, { putUp: yards(10) });
  const other = await buildBolt(owner);
  const seen = await buildRun(owner, { kits: 1, lengths: [{ fabricId: other.fabric.id, boltId: other.id, length: yards(1) }] });
  const run = await db().Run.findByPk(seen.id, { rejectOnEmpty: true });
  colourwayId = run.colourwayId;
  await db().ColourwayLength.create({ colourwayId, fabricId: bolt.fabric.id, cutLength: yards(2), plannedWidth: inches(40) });
});

function start(kits: number) {
  return startRun(owner, { requestId: randomUUID(), colourwayId, kits, purpose: "shelf", due: null });
}

describe("a run", () => {
  it("reserves its lengths, gives each kit a serial and queues the bag tags; cancelled, it gives all back", async () => {
    const started = must(await start(3));
    const run = await getRun(started.code);
    expect(run).toMatchObject({ kits: 3, lengths: 3, cut: 0, short: 0, state: "reserved" });
    expect(new Set(run?.runKits.map((kit) => kit.serial)).size).toBe(3);
    expect(run?.runLengths.every((each) => each.boltTag === bolt.tag && each.length === yards(2))).toBe(true);
    const jobs = await db().PrintJob.findAll({ raw: true });
    expect(jobs).toHaveLength(1);
    expect(isPrintDocument(jobs[0]?.document)).toBe(true);
    expect((await db().Bolt.findByPk(bolt.id, { raw: true }))?.reserved).toBe(yards(6));
    expect(await auditStock()).toEqual([]);

    must(await cancelRun(owner, { requestId: randomUUID(), code: started.code, reason: "Class called off" }));
    expect((await db().Bolt.findByPk(bolt.id, { raw: true }))?.reserved).toBe(0);
    expect((await listRuns({ open: true })).map((each) => each.code)).not.toContain(started.code);
    expect(await auditStock()).toEqual([]);
  });

  it("is refused with figures when the bolts allow fewer kits", async () => {
    const refused = await start(5);
    expect(codeOf(refused)).toBe("not-enough-cloth");
    expect(refused.ok ? null : refused.fault.facts).toMatchObject({ kits: 4 });
    expect((await db().Bolt.findByPk(bolt.id, { raw: true }))?.reserved).toBe(0);
    expect(await auditStock()).toEqual([]);
  });
});
