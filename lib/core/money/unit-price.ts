import { exponentOf } from "./currency";
import { minor, type Minor } from "./money";

declare const unitPriceBrand: unique symbol;

/** Lengths come as whole numbers of 1/160 mm; money knows no more of them than how many make a yard or a metre. */
const UNITS_PER = { yard: 146_304, metre: 160_000 } as const;

/** An integer count of 1/10 000 of the major unit, per yard or metre (or per piece): 12.40 a yard is 124 000. */
export type UnitPrice = number & { readonly [unitPriceBrand]: "UnitPrice" };

export function unitPrice(tenThousandths: number): UnitPrice {
  if (!Number.isSafeInteger(tenThousandths) || tenThousandths < 0) throw new RangeError(`A unit price is a whole number of 1/10 000 from nothing up, not ${tenThousandths}`);
  return tenThousandths as UnitPrice;
}

/** A price in minor units as a unit price. */
export function unitPriceOf(minorUnits: number, currency: string): UnitPrice {
  return unitPrice(minorUnits * 10 ** (4 - exponentOf(currency)));
}

/**
 * What a length costs, rounded once, half up. 2 3/8 yd at 14.60 a yard is 34.675, so 34.68.
 *
 * @param length in 1/160 mm.
 */
export function lineTotal(price: UnitPrice | number, length: number, per: keyof typeof UNITS_PER, currency: string): Minor {
  return roundedQuotient(BigInt(price) * BigInt(length), BigInt(UNITS_PER[per]) * fromTenThousandths(currency));
}

/** What a count of pieces costs, rounded once, half up. */
export function countTotal(price: UnitPrice | number, count: number, currency: string): Minor {
  return roundedQuotient(BigInt(price) * BigInt(count), fromTenThousandths(currency));
}

function fromTenThousandths(currency: string): bigint {
  return 10n ** BigInt(4 - exponentOf(currency));
}

/** Half up for amounts from nothing up; every price and length is. */
function roundedQuotient(numerator: bigint, denominator: bigint): Minor {
  return minor(Number((2n * numerator + denominator) / (2n * denominator)));
}
