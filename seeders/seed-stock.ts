import { inTransaction } from "../lib/data/in-transaction";
import { postMove } from "../lib/data/ledger";
import { receiveBolt } from "../lib/data/stock/receive-bolt";
import { ok } from "../lib/core/result";
import { yards } from "../lib/core/measure/length";
import type { Actor } from "../lib/core/policy/policy";
import { db } from "../models/database";
import { DEMO_BOLTS } from "./demo-fabrics";
import { demoRequestId, must } from "./demo-request";
import { DEMO_NOTIONS } from "./demo-shop";

/** Bolts come in through the receiving door and notions through the ledger, as in any shop. */
export async function seedStock(owner: Actor): Promise<void> {
  const fabrics = new Map((await db().Fabric.findAll({ raw: true })).map((fabric) => [fabric.slug, fabric.id]));
  for (const bolt of DEMO_BOLTS) {
    const what = `bolt ${bolt.fabric} ${bolt.lot}`;
    must(
      what,
      await receiveBolt(owner, {
        requestId: demoRequestId(what),
        fabricId: fabrics.get(bolt.fabric) ?? 0,
        lot: bolt.lot,
        shelf: bolt.shelf,
        putUp: yards(bolt.yards),
        flaws: bolt.flaws?.map((flaw) => ({ startsAt: yards(flaw.from), endsAt: yards(flaw.to), note: flaw.note })),
      }),
    );
  }
  for (const notion of DEMO_NOTIONS) await stockNotion(owner, notion);
}

async function stockNotion(owner: Actor, { number, gtin, name, price, cost, onHand }: (typeof DEMO_NOTIONS)[number]): Promise<void> {
  must(
    `notion ${number}`,
    await inTransaction(async (transaction) => {
      const [row, made] = await db().Notion.findOrCreate({ where: { number }, defaults: { number, gtin, name, price, cost }, transaction });
      if (made) {
        await postMove(transaction, { what: { item: "notion", notionId: row.id }, quantity: onHand, from: { place: "supplier" }, to: { place: "shelf" }, reason: "opening stock", personId: owner.personId });
      }
      return ok(null);
    }),
  );
}
