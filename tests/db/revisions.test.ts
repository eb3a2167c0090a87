import { randomUUID } from "node:crypto";
import { Client } from "pg";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { inches } from "@/lib/core/measure/length";
import type { Actor } from "@/lib/core/policy/policy";
import { fail, ok } from "@/lib/core/result";
import { inTransaction } from "@/lib/data/in-transaction";
import { afterCommit, bumpRevision, readRevision } from "@/lib/data/revisions";
import { recordWasteCut } from "@/lib/data/stock/record-waste-cut";
import { buildBolt, buildPerson, buildShop, must } from "./factories";
import { withTestDatabase } from "./test-database";

const database = withTestDatabase();

let owner: Actor;
let client: Client;
const heard: { topic: string; revision: number }[] = [];

beforeAll(async () => {
  await buildShop();
  owner = await buildPerson();
  client = new Client({ connectionString: database.url });
  await client.connect();
  client.on("notification", ({ payload }) => heard.push(JSON.parse(payload ?? "null")));
  await client.query("LISTEN ellwand");
});
afterAll(() => client.end());

/** Hints have arrived once a query on the listening connection is answered. */
async function hints(): Promise<typeof heard> {
  await client.query("SELECT 1");
  return heard.splice(0);
}

describe("a change", () => {
  it("tells each of its topics once, with the revision that a later read finds", async () => {
    const bolt = await buildBolt(owner);
    await hints();
    must(await recordWasteCut(owner, { requestId: randomUUID(), tag: bolt.tag, length: inches(1), kind: "sample" }));
    const got = await hints();
    expect(got.map((hint) => hint.topic).sort()).toEqual([`bolt:${bolt.tag}`, "bolts"].sort());
    for (const hint of got) expect(await readRevision(hint.topic)).toBe(hint.revision);
  });

  it("that is rolled back tells nothing", async () => {
    const before = await readRevision("bolts");
    await inTransaction(async (transaction) => {
      bumpRevision("bolts", transaction);
      return fail("no", "No.");
    });
    expect(await hints()).toEqual([]);
    expect(await readRevision("bolts")).toBe(before);
  });

  it("by many at once raises the revision, and none of them waits for another inside its transaction", async () => {
    const before = await readRevision("busy");
    await Promise.all(
      Array.from({ length: 20 }, () =>
        inTransaction(async (transaction) => {
          bumpRevision("busy", transaction);
          return ok(null);
        }),
      ),
    );
    const got = await hints();
    expect(got.length).toBeGreaterThan(0);
    expect(await readRevision("busy")).toBe(got.at(-1)?.revision);
    expect(await readRevision("busy")).toBeGreaterThan(before);
  });

  it("is committed even when what comes after it fails", async () => {
    const done = await inTransaction(async (transaction) => {
      afterCommit(transaction, async () => {
        throw new Error("this line is expected here");
      });
      return ok("done");
    });
    expect(must(done)).toBe("done");
  });
});
