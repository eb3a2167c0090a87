import { addMinor, minor, type Minor } from "./money";
import { shareOut, taxOf, type TaxRules } from "./tax";

/** One tax of several on the same goods: a state's and a county's. Rate in 1/10 000 of a percent. */
export interface NamedRate {
  readonly name: string;
  readonly rate: number;
}

export interface ManyTaxedLine {
  /** As sold, in minor units. */
  readonly amount: number;
  readonly rates: readonly NamedRate[];
}

/** What a receipt says of one tax. */
export interface TaxPart extends NamedRate {
  /** The goods it lies on, as sold. */
  readonly on: Minor;
  readonly tax: Minor;
}

export interface ManyTaxedSale {
  /** In the order in which the taxes first occur; they add up to `tax`. */
  readonly parts: readonly TaxPart[];
  readonly goods: Minor;
  readonly tax: Minor;
  readonly total: Minor;
}

interface Running {
  readonly rate: NamedRate;
  on: number;
  tax: number;
}

/**
 * The tax of a sale on which several taxes lie, none on top of another. Added to the price, each tax is rounded for itself, half up, by
 * line or once by sale. Inside the price, all of a line's taxes are taken out together and rounded once, then parted by their
 * rates with largest remainders, so that the parts add up. A place that rounds its taxes together is one rate.
 */
export function taxSaleInParts(lines: readonly ManyTaxedLine[], { by, included }: TaxRules): ManyTaxedSale {
  const running = new Map<string, Running>();
  const groups = by === "line" ? lines : joinAlike(lines, included);
  for (const { amount, rates } of groups) {
    const together = included ? taxOf(amount, rates.reduce((sum, each) => sum + each.rate, 0), true) : 0;
    const taxes = included ? shareOut(together, rates.map((each) => each.rate)) : rates.map((each) => taxOf(amount, each.rate, false));
    rates.forEach((rate, index) => {
      const kept = running.get(keyOf(rate)) ?? { rate, on: 0, tax: 0 };
      running.set(keyOf(rate), { rate, on: kept.on + amount, tax: kept.tax + (taxes[index] ?? 0) });
    });
  }
  const parts = [...running.values()].map(({ rate, on, tax }) => ({ name: rate.name, rate: rate.rate, on: minor(on), tax: minor(tax) }));
  const goods = addMinor(lines.map((line) => line.amount));
  const tax = addMinor(parts.map((part) => part.tax));
  return { parts, goods, tax, total: included ? goods : addMinor([goods, tax]) };
}

/** By sale: goods under the same taxes are one sum where the tax is inside; where it is added, each tax has its own sum. */
function joinAlike(lines: readonly ManyTaxedLine[], included: boolean): ManyTaxedLine[] {
  const single = included ? lines : lines.flatMap((line) => line.rates.map((rate) => ({ amount: line.amount, rates: [rate] })));
  const joined = new Map<string, ManyTaxedLine>();
  for (const line of single) {
    const key = line.rates.map(keyOf).sort().join("\n");
    joined.set(key, { amount: (joined.get(key)?.amount ?? 0) + line.amount, rates: joined.get(key)?.rates ?? line.rates });
  }
  return [...joined.values()];
}

function keyOf({ name, rate }: NamedRate): string {
  return `${rate} ${name}`;
}
