import type { Length } from "../measure/length";
import { exponentOf } from "../money/currency";
import { addMinor, minor, type Minor } from "../money/money";
import { taxOf } from "../money/tax";
import { lineTotal } from "../money/unit-price";

/** What a price is rounded up to: nothing, a whole unit of the currency, a half, or the last minor unit before a whole. */
export type PriceEnding = "none" | "whole" | "half" | "ninety-nine";

export interface KitFabricCost {
  readonly fabric: string;
  readonly cutLength: Length;
  /** At retail and as bought, in 1/10 000 of the major unit per yard or metre. */
  readonly unitPrice: number;
  readonly unitCost: number;
}

export interface KitNotionCost {
  readonly name: string;
  readonly count: number;
  /** Each, in minor units. */
  readonly price: number;
  readonly cost: number;
}

export interface KitCostInput {
  readonly currency: string;
  readonly per: "yard" | "metre";
  readonly fabrics: readonly KitFabricCost[];
  readonly notions: readonly KitNotionCost[];
  /** What the printed sheet costs, in minor units; it is passed on as it is. */
  readonly sheetCost: number;
  readonly labourMinutes: number;
  /** Minor units an hour. */
  readonly labourRate: number;
  readonly ending: PriceEnding;
  /** The price the shop has set, in minor units; without it the worked-out one counts. */
  readonly setPrice?: number;
  /** The rate (1/10 000 of a percent) that prices include; it is nobody's margin. */
  readonly includedTax?: number;
}

export interface KitCostLine {
  readonly kind: "fabric" | "notion" | "sheet" | "labour";
  /** The fabric's number or the notion's name; empty for sheet and labour. */
  readonly of: string;
  readonly price: Minor;
  readonly cost: Minor;
}

export interface KitCost {
  readonly lines: readonly KitCostLine[];
  /** What the lines add up to. */
  readonly sum: Minor;
  /** From the sum to `suggested`. */
  readonly roundedUp: Minor;
  readonly suggested: Minor;
  /** The set price, or the suggested one. */
  readonly soldAt: Minor;
  readonly cost: Minor;
  /** What is left of the price without tax once everything in the kit is paid; below nothing when it sells at a loss. */
  readonly margin: Minor;
  /** Of the price without tax, in hundredths of a percent; null when there is no price. */
  readonly marginBasisPoints: number | null;
}

/**
 * A kit's price and margin: its fabrics at retail, notions, the sheet and cutting labour, each line rounded once, the sum
 * rounded up to the shop's ending. Labour is a price and a cost alike. Throws RangeError on amounts below nothing.
 */
export function priceKit(input: KitCostInput): KitCost {
  const lines = linesOf(input);
  const sum = addMinor(lines.map((line) => line.price));
  const cost = addMinor(lines.map((line) => line.cost));
  const suggested = roundUpTo(sum, input.ending, input.currency);
  const soldAt = minor(checked(input.setPrice ?? suggested));
  const net = soldAt - (input.includedTax ? taxOf(soldAt, input.includedTax, true) : 0);
  const margin = minor(net - cost);
  return { lines, sum, roundedUp: minor(suggested - sum), suggested, soldAt, cost, margin, marginBasisPoints: net === 0 ? null : Math.round((margin * 10_000) / net) };
}

function linesOf({ currency, per, fabrics, notions, sheetCost, labourMinutes, labourRate }: KitCostInput): KitCostLine[] {
  const labour = minor(Math.floor((2 * checked(labourMinutes) * checked(labourRate) + 60) / 120));
  return [
    ...fabrics.map(({ fabric, cutLength, unitPrice, unitCost }): KitCostLine => ({
      kind: "fabric",
      of: fabric,
      price: lineTotal(checked(unitPrice), checked(cutLength), per, currency),
      cost: lineTotal(checked(unitCost), cutLength, per, currency),
    })),
    ...notions.map(({ name, count, price, cost }): KitCostLine => ({ kind: "notion", of: name, price: minor(checked(price) * checked(count)), cost: minor(checked(cost) * count) })),
    ...(sheetCost === 0 ? [] : [{ kind: "sheet" as const, of: "", price: minor(checked(sheetCost)), cost: minor(sheetCost) }]),
    ...(labour === 0 ? [] : [{ kind: "labour" as const, of: "", price: labour, cost: labour }]),
  ];
}

function checked(amount: number): number {
  if (!Number.isSafeInteger(amount) || amount < 0) throw new RangeError(`An amount of a kit's price is a whole number from nothing up, not ${amount}`);
  return amount;
}

/**
 * Up to the next price with the ending; one that has it stays, and nothing stays nothing. A currency without minor units
 * counts its hundreds as whole: 1240 yen go to 1300, 1250 or 1299.
 */
export function roundUpTo(amount: number, ending: PriceEnding, currency: string): Minor {
  const unit = 10 ** (exponentOf(currency) || 2);
  if (ending === "none" || amount === 0) return minor(amount);
  if (ending === "ninety-nine") return minor(Math.ceil((amount + 1) / unit) * unit - 1);
  const step = ending === "half" ? unit / 2 : unit;
  return minor(Math.ceil(amount / step) * step);
}
