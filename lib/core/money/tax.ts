import { addMinor, minor, type Minor } from "./money";

/** 1/10 000 of a percent: 6.5 % is 65 000. */
export const WHOLE = 1_000_000;

export interface TaxedLine {
  /** As sold, in minor units: without tax where it is added, with it where prices include it. */
  readonly amount: number;
  readonly rate: number;
}

export interface TaxRules {
  readonly by: "line" | "sale";
  readonly included: boolean;
}

export interface TaxedSale {
  /** In the lines' order; they add up to `tax`. */
  readonly lineTaxes: readonly Minor[];
  /** The sum of the lines as sold. */
  readonly goods: Minor;
  readonly tax: Minor;
  /** To pay: goods and tax, or goods alone where prices include it. */
  readonly total: Minor;
}

/**
 * The tax of a sale. By line: each line's tax is rounded, half up, and added. By sale: the lines of one rate are added
 * and the tax on their sum is rounded once, then shared among them by largest remainder. What rates apply to what goods
 * is the shop's to say and its adviser's to check.
 */
export function taxSale(lines: readonly TaxedLine[], rules: TaxRules): TaxedSale {
  const goods = addMinor(lines.map((line) => line.amount));
  const lineTaxes = rules.by === "line" ? lines.map((line) => taxOf(line.amount, line.rate, rules.included)) : shareBySale(lines, rules.included);
  const tax = addMinor(lineTaxes);
  return { lineTaxes, goods, tax, total: rules.included ? goods : addMinor([goods, tax]) };
}

/** The tax on one amount, rounded half up; on goods that come back (below nothing) it is what was paid on them. */
export function taxOf(amount: number, rate: number, included: boolean): Minor {
  if (!Number.isSafeInteger(rate) || rate < 0) throw new RangeError(`A tax rate is a whole number of 1/10 000 of a percent from nothing up, not ${rate}`);
  const under = BigInt(included ? WHOLE + rate : WHOLE);
  const tax = Number((2n * BigInt(Math.abs(amount)) * BigInt(rate) + under) / (2n * under));
  return minor(amount < 0 ? -tax : tax);
}

function shareBySale(lines: readonly TaxedLine[], included: boolean): Minor[] {
  const taxes = lines.map(() => 0);
  for (const rate of new Set(lines.map((line) => line.rate))) {
    const group = lines.flatMap((line, index) => (line.rate === rate ? [{ amount: line.amount, index }] : []));
    const sum = addMinor(group.map((each) => each.amount));
    const shares = shareOut(taxOf(sum, rate, included), group.map((each) => each.amount));
    group.forEach((each, at) => (taxes[each.index] = shares[at] ?? 0));
  }
  return taxes.map(minor);
}

/**
 * Shares an amount by weights so that the parts add up: floors first, then one each to the largest remainders, the first
 * of equal ones. Weights and amount may lie below nothing; where the weights cancel out, the first part takes all.
 */
export function shareOut(amount: number, weights: readonly number[]): Minor[] {
  const whole = weights.reduce((sum, weight) => sum + BigInt(weight), 0n);
  if (whole === 0n) return weights.map((_, index) => minor(index === 0 ? amount : 0));
  const parts = weights.map((weight, index) => ({ index, ...divide(BigInt(amount) * BigInt(weight), whole) }));
  let left = amount - Number(parts.reduce((sum, part) => sum + part.floor, 0n));
  const shares = parts.map((part) => Number(part.floor));
  for (const part of [...parts].sort((a, b) => (a.rest === b.rest ? a.index - b.index : a.rest > b.rest ? -1 : 1))) {
    if (left === 0) break;
    shares[part.index] = (shares[part.index] ?? 0) + 1;
    left -= 1;
  }
  return shares.map(minor);
}

/** Division that goes down, with a remainder from nothing up whatever the signs. */
function divide(amount: bigint, by: bigint): { readonly floor: bigint; readonly rest: bigint } {
  const [over, under] = by < 0n ? [-amount, -by] : [amount, by];
  const rest = ((over % under) + under) % under;
  return { floor: (over - rest) / under, rest };
}
