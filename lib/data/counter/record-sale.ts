import { QueryTypes, type Transaction } from "sequelize";
import { makeCode } from "@/lib/core/codes/code";
import { formatMoney } from "@/lib/core/money/money";
import { taxSale, type TaxedSale } from "@/lib/core/money/tax";
import { settle, type Settlement } from "@/lib/core/money/tenders";
import { countTotal } from "@/lib/core/money/unit-price";
import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import { answerOnce } from "@/lib/data/answer-once";
import { postMove } from "@/lib/data/ledger";
import { queuePrint } from "@/lib/data/print/queue";
import { bumpRevision } from "@/lib/data/revisions";
import { requireShop, type ShopView } from "@/lib/data/shop";
import { lockBoltsOfSale, sellFromBolt } from "@/lib/data/stock/sell-yardage";
import type { SaleInput } from "@/lib/input/counter";
import type { ReceiptInput } from "@/labels/receipt";
import { db } from "@/models/database";
import { priceLine, type PricedLine } from "./price-lines";

export interface SaleView {
  readonly saleId: number;
  readonly receipt: string;
  /** Minor units. */
  readonly goods: number;
  readonly tax: number;
  readonly total: number;
  readonly change: number;
  readonly printJobId: number;
}

/**
 * Sells a basket for cash at an open till: cuts yardage off its bolts, hands kits and notions to the customer, and puts
 * the receipt on the print queue, all or nothing. Faults: those of its lines, `not-open`, `no-tax-rate`, `not-enough`.
 */
export async function recordSale(actor: Actor, input: SaleInput): Promise<Result<SaleView>> {
  if (!can(actor, "till.sell")) return fail("forbidden", "Sales are made by the counter, managers and owners.");
  const shop = await requireShop();
  return answerOnce<SaleView, string>(actor, "till.sale", input, async (transaction) => {
    const session = await db().TillSession.findOne({ where: { id: input.tillSessionId, closedAt: null }, transaction, lock: transaction.LOCK.KEY_SHARE });
    if (!session) return fail("not-open", "This till is closed. Open it with its float first.");
    await lockBoltsOfSale(transaction, input.lines.flatMap((line) => (line.item === "fabric" ? [line.tag] : [])));
    const priced: PricedLine[] = [];
    for (const line of input.lines) {
      const answer = await priceLine(transaction, line, shop);
      if (!answer.ok) return answer;
      priced.push(answer.value);
    }
    const taxed = await taxLines(transaction, priced, shop);
    if (!taxed.ok) return taxed;
    const settled = settle(taxed.value.total, [{ kind: "cash", given: input.cash }], shop.cashStep);
    if (!settled.ok) return fail("not-enough", `${formatMoney(taxed.value.total, shop.currency, shop.locale)} are due; ${formatMoney(input.cash, shop.currency, shop.locale)} were given.`, { facts: settled.fault.facts });
    return book(transaction, actor, { input, shop, priced, taxed: taxed.value, settled: settled.value });
  });
}

/** Today's rate of each line's goods, by the shop's own clock. A class of goods without a rate is asked about, never guessed. */
async function taxLines(transaction: Transaction, priced: readonly PricedLine[], shop: ShopView): Promise<Result<TaxedSale, "no-tax-rate">> {
  const rates = await db().sequelize.query<{ goods: string; rate: number }>(
    `SELECT goods, sum(rate)::int AS rate FROM tax_rates
      WHERE valid_from <= (now() AT TIME ZONE $1)::date AND (valid_to IS NULL OR valid_to > (now() AT TIME ZONE $1)::date) GROUP BY goods`,
    { bind: [shop.timeZone], type: QueryTypes.SELECT, transaction },
  );
  const rateOf = new Map(rates.map((row) => [row.goods, row.rate]));
  const bare = priced.find((line) => !rateOf.has(line.goods));
  if (bare) return fail("no-tax-rate", `The shop has no tax rate for ${bare.goods}. The owner enters one, even if it is nothing.`);
  return ok(taxSale(priced.map((line) => ({ amount: line.amount, rate: rateOf.get(line.goods) ?? 0 })), { by: shop.taxBy, included: shop.taxIncluded }));
}

interface Sale {
  readonly input: SaleInput;
  readonly shop: ShopView;
  readonly priced: readonly PricedLine[];
  readonly taxed: TaxedSale;
  readonly settled: Settlement;
}

async function book(transaction: Transaction, actor: Actor, sale: Sale): Promise<Result<SaleView>> {
  const { input, shop, taxed, settled } = sale;
  const row = await db().Sale.create(
    {
      receipt: input.requestId,
      tillSessionId: input.tillSessionId,
      personId: actor.personId,
      requestId: input.requestId,
      goods: taxed.goods,
      tax: taxed.tax,
      rounding: settled.rounding,
      total: taxed.total + settled.rounding,
      currency: shop.currency,
    },
    { transaction },
  );
  const receipt = makeCode("receipt", row.id);
  await row.update({ receipt }, { transaction });
  for (const [position, line] of sale.priced.entries()) {
    const handed = await handOver(transaction, actor, input.requestId, line);
    if (!handed.ok) return handed;
    await db().SaleLine.create(
      {
        saleId: row.id,
        position,
        item: line.goods,
        description: line.description,
        fabricId: line.fabricId,
        boltId: handed.value.boltId,
        cutId: handed.value.cutId,
        runKitId: line.runKitId,
        notionId: line.notionId,
        length: line.input.item === "fabric" ? line.input.length : null,
        count: line.input.item === "notion" ? line.input.count : 1,
        unitPrice: line.unitPrice,
        amount: line.amount,
        tax: taxed.lineTaxes[position] ?? 0,
      },
      { transaction },
    );
  }
  await takeCash(transaction, actor, row.id, sale);
  const printJobId = await queuePrint(transaction, actor, { printer: "receipt", title: `Receipt ${receipt}`, document: { kind: "receipt", content: receiptOf(receipt, actor, sale) }, copies: 1 });
  bumpRevision("sales", transaction);
  return ok({ saleId: row.id, receipt, goods: taxed.goods, tax: taxed.tax, total: taxed.total + settled.rounding, change: settled.change, printJobId });
}

async function handOver(transaction: Transaction, actor: Actor, requestId: string, line: PricedLine): Promise<Result<{ boltId: number | null; cutId: number | null }>> {
  if (line.input.item === "fabric") {
    const sold = await sellFromBolt(transaction, actor, { requestId, tag: line.input.tag, length: line.input.length });
    return sold.ok ? ok({ boltId: sold.value.boltId, cutId: sold.value.cutId }) : sold;
  }
  const what = line.runKitId !== null ? { item: "kit" as const, runKitId: line.runKitId } : { item: "notion" as const, notionId: line.notionId ?? 0 };
  if (line.runKitId !== null) await db().RunKit.update({ state: "sold" }, { where: { id: line.runKitId }, transaction });
  const quantity = line.input.item === "notion" ? line.input.count : 1;
  await postMove(transaction, { what, quantity, from: { place: "shelf" }, to: { place: "customer" }, reason: "sold", personId: actor.personId, requestId });
  return ok({ boltId: null, cutId: null });
}

async function takeCash(transaction: Transaction, actor: Actor, saleId: number, { input, settled }: Sale): Promise<void> {
  for (const tender of settled.tenders) {
    if (tender.amount === 0) continue;
    await db().Tender.create({ saleId, kind: tender.kind, amount: tender.amount, given: tender.given, changeGiven: tender.change }, { transaction });
    await db().CashMove.create(
      { tillSessionId: input.tillSessionId, amount: tender.amount, kind: "sale", reason: "Sale", saleId, personId: actor.personId, requestId: input.requestId },
      { transaction },
    );
  }
}

function receiptOf(receipt: string, actor: Actor, { shop, priced, taxed, settled, input }: Sale): ReceiptInput {
  const money = (amount: number) => formatMoney(amount, shop.currency, shop.locale);
  return {
    shopName: shop.name,
    address: shop.address ? [shop.address] : [],
    heading: "Receipt",
    number: receipt,
    soldAt: new Intl.DateTimeFormat(shop.locale, { dateStyle: "medium", timeStyle: "short", timeZone: shop.timeZone }).format(new Date()),
    servedBy: actor.name,
    lines: priced.map((line) => ({
      name: line.description,
      sold: line.input.item === "fabric" ? { kind: "cloth", length: line.input.length } : { kind: "counted", quantity: line.input.item === "notion" ? line.input.count : 1 },
      price: line.input.item === "fabric" ? `${money(countTotal(line.unitPrice, 1, shop.currency))} a ${shop.system === "yards" ? "yard" : "metre"}` : "",
      amount: money(line.amount),
      remark: "",
    })),
    subtotal: money(taxed.goods),
    taxes: [{ label: "Sales tax", amount: money(taxed.tax) }],
    total: money(taxed.total + settled.rounding),
    tenders: [{ label: "Cash", amount: money(input.cash) }],
    change: settled.change > 0 ? money(settled.change) : null,
    taxWording: "",
    returnRule: "Cut goods are not returned unless flawed.",
    thanks: "",
    measure: shop.system,
  };
}
