/** ISO 4217: how many decimal digits a currency's minor unit has. Only the currencies a shop can choose. */
const EXPONENTS = {
  USD: 2, EUR: 2, GBP: 2, CAD: 2, AUD: 2, NZD: 2, CHF: 2, SEK: 2, NOK: 2, DKK: 2, ZAR: 2, PLN: 2, CZK: 2, JPY: 0,
} as const;

export type Currency = keyof typeof EXPONENTS;
export const CURRENCIES = Object.keys(EXPONENTS) as Currency[];

export function isCurrency(code: string): code is Currency {
  return Object.hasOwn(EXPONENTS, code);
}

/** Throws RangeError on a currency that is not in the table. */
export function exponentOf(currency: string): number {
  if (!isCurrency(currency)) throw new RangeError(`${currency} is not a currency that a shop can choose`);
  return EXPONENTS[currency];
}
