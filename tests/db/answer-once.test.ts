import { randomUUID } from "node:crypto";
import { beforeAll, describe, expect, it } from "vitest";
import type { Actor } from "@/lib/core/policy/policy";
import { fail, ok } from "@/lib/core/result";
import { answerOnce } from "@/lib/data/answer-once";
import { canonicalJson } from "@/lib/data/canonical-json";
import { recordWasteCut } from "@/lib/data/stock/record-waste-cut";
import { inches } from "@/lib/core/measure/length";
import { db } from "@/models/database";
import { buildBolt, buildPerson, buildShop, codeOf, must } from "./factories";
import { withTestDatabase } from "./test-database";

withTestDatabase();

let owner: Actor;
beforeAll(async () => {
  await buildShop();
  owner = await buildPerson();
});

describe("a request", () => {
  it("sent 20 times at once makes one cut and gives each the same answer", async () => {
    const bolt = await buildBolt(owner);
    const input = { requestId: randomUUID(), tag: bolt.tag, length: inches(9), kind: "sample" as const };
    const answers = await Promise.all(Array.from({ length: 20 }, () => recordWasteCut(owner, input)));
    expect(new Set(answers.map((answer) => canonicalJson(must(answer)))).size).toBe(1);
    expect(await db().Cut.count({ where: { boltId: bolt.id } })).toBe(1);
    expect(await db().Move.count({ where: { fromPlace: "bolt", fromId: bolt.id } })).toBe(1);
  });

  it("with other content under the same id is refused and does nothing", async () => {
    const bolt = await buildBolt(owner);
    const input = { requestId: randomUUID(), tag: bolt.tag, length: inches(9), kind: "sample" as const };
    must(await recordWasteCut(owner, input));
    expect(codeOf(await recordWasteCut(owner, { ...input, length: inches(10) }))).toBe("request-reused");
    expect(await db().Cut.count({ where: { boltId: bolt.id } })).toBe(1);
  });

  it("of one person is not answered to another", async () => {
    const bolt = await buildBolt(owner);
    const input = { requestId: randomUUID(), tag: bolt.tag, length: inches(9), kind: "sample" as const };
    must(await recordWasteCut(owner, input));
    expect(codeOf(await recordWasteCut(await buildPerson(), input))).toBe("request-reused");
  });

  it("under another use case's id is refused", async () => {
    const requestId = randomUUID();
    must(await answerOnce(owner, "one", { requestId }, async () => ok(1)));
    expect(codeOf(await answerOnce(owner, "two", { requestId }, async () => ok(2)))).toBe("request-reused");
  });

  it("that was refused leaves nothing and may be sent again", async () => {
    const requestId = randomUUID();
    const people = await db().Person.count();
    const refused = await answerOnce(owner, "three", { requestId }, async (transaction) => {
      await db().Person.create({ name: "Nobody", email: `${randomUUID()}@example.org` }, { transaction });
      return fail("not-now", "Not now.");
    });
    expect(codeOf(refused)).toBe("not-now");
    expect(await db().Person.count()).toBe(people);
    expect(must(await answerOnce(owner, "three", { requestId }, async () => ok("later")))).toBe("later");
    expect(must(await answerOnce(owner, "three", { requestId }, async () => ok("never run")))).toBe("later");
  });

  it("that meets a deadlock is run again", async () => {
    const [a, b] = [await buildBolt(owner), await buildBolt(owner)];
    let arrived = 0;
    const bothHoldOne = async () => {
      arrived += 1;
      for (let waited = 0; arrived < 2 && waited < 200; waited += 1) await new Promise((resolve) => setTimeout(resolve, 10));
    };
    const crosswise = (first: number, second: number) =>
      answerOnce(owner, "crosswise", { requestId: randomUUID() }, async (transaction) => {
        await db().Bolt.update({ shelf: "B1" }, { where: { id: first }, transaction });
        await bothHoldOne();
        await db().Bolt.update({ shelf: "B2" }, { where: { id: second }, transaction });
        return ok(null);
      });
    const answers = await Promise.all([crosswise(a.id, b.id), crosswise(b.id, a.id)]);
    expect(answers.map(codeOf)).toEqual(["ok", "ok"]);
  });

  it("whose work throws is not stored", async () => {
    const requestId = randomUUID();
    await expect(
      answerOnce(owner, "four", { requestId }, async () => {
        throw new Error("a programmer's error");
      }),
    ).rejects.toThrow("a programmer's error");
    expect(await db().Request.count({ where: { id: requestId } })).toBe(0);
  });
});
