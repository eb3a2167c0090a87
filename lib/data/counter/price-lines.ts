import { QueryTypes, type Transaction } from "sequelize";
import { formatLength, type MeasureSystem } from "@/lib/core/measure/format";
import { countTotal, lineTotal, unitPriceOf } from "@/lib/core/money/unit-price";
import { fail, ok, type Result } from "@/lib/core/result";
import type { SaleLineInput } from "@/lib/input/counter";
import { db } from "@/models/database";

/** A line as it is rung up: what it is, what it costs, and what tax its goods bear. Money in minor units. */
export interface PricedLine {
  readonly input: SaleLineInput;
  readonly description: string;
  readonly goods: "fabric" | "kit" | "notion";
  readonly fabricId: number | null;
  readonly runKitId: number | null;
  readonly notionId: number | null;
  /** 1/10 000 of the major unit, per yard, metre or piece. */
  readonly unitPrice: number;
  readonly amount: number;
}

export interface PriceRules {
  readonly currency: string;
  readonly system: MeasureSystem;
}

/** Prices a line from the book. Faults: `unknown-bolt`, `unknown-kit`, `kit-not-for-sale`, `unknown-notion`. */
export async function priceLine(transaction: Transaction, line: SaleLineInput, rules: PriceRules): Promise<Result<PricedLine>> {
  if (line.item === "fabric") return priceFabric(transaction, line, rules);
  return line.item === "kit" ? priceKitLine(transaction, line, rules) : priceNotion(transaction, line, rules);
}

async function priceFabric(transaction: Transaction, line: Extract<SaleLineInput, { item: "fabric" }>, { currency, system }: PriceRules): Promise<Result<PricedLine>> {
  const [fabric] = await db().sequelize.query<{ id: number; name: string; lot: string; price: number }>(
    `SELECT f.id, f.name, b.lot, f.price FROM bolts b JOIN fabrics f ON f.id = b.fabric_id WHERE b.tag = $1`,
    { bind: [line.tag], type: QueryTypes.SELECT, transaction },
  );
  if (!fabric) return fail("unknown-bolt", `No bolt has the tag ${line.tag}. Scan the tag on the bolt’s end.`);
  const amount = lineTotal(fabric.price, line.length, system === "yards" ? "yard" : "metre", currency);
  const description = `${fabric.name}, lot ${fabric.lot}, ${formatLength(line.length, system)}`;
  return ok({ input: line, description, goods: "fabric", fabricId: fabric.id, runKitId: null, notionId: null, unitPrice: fabric.price, amount });
}

async function priceKitLine(transaction: Transaction, line: Extract<SaleLineInput, { item: "kit" }>, { currency }: PriceRules): Promise<Result<PricedLine>> {
  const [kit] = await db().sequelize.query<{ id: number; state: string; name: string; price: number }>(
    `SELECT x.id, x.state, k.name || ' kit, ' || c.name AS name, c.price
       FROM run_kits x JOIN runs r ON r.id = x.run_id JOIN colourways c ON c.id = r.colourway_id
       JOIN kit_versions v ON v.id = c.kit_version_id JOIN kit_designs k ON k.id = v.kit_design_id
      WHERE x.serial = $1 FOR NO KEY UPDATE OF x`,
    { bind: [line.serial], type: QueryTypes.SELECT, transaction },
  );
  if (!kit) return fail("unknown-kit", `No kit has the serial ${line.serial}. Scan the label on the kit.`);
  if (kit.state !== "packed") return fail("kit-not-for-sale", `Kit ${line.serial} is ${kit.state === "sold" ? "sold already" : "not packed yet"}, so it cannot be sold.`);
  return ok({ input: line, description: `${kit.name}, ${line.serial}`, goods: "kit", fabricId: null, runKitId: kit.id, notionId: null, unitPrice: unitPriceOf(kit.price, currency), amount: kit.price });
}

async function priceNotion(transaction: Transaction, line: Extract<SaleLineInput, { item: "notion" }>, { currency }: PriceRules): Promise<Result<PricedLine>> {
  const notion = await db().Notion.findOne({ where: { number: line.number }, transaction, lock: transaction.LOCK.NO_KEY_UPDATE });
  if (!notion) return fail("unknown-notion", `No notion has the number ${line.number}.`);
  if (notion.onHand < line.count) return fail("not-enough-notions", `The book has ${notion.onHand} ${notion.name} on the shelf; ${line.count} are wanted.`);
  const price = unitPriceOf(notion.price, currency);
  return ok({ input: line, description: `${notion.name} × ${line.count}`, goods: "notion", fabricId: null, runKitId: null, notionId: notion.id, unitPrice: price, amount: countTotal(price, line.count, currency) });
}
