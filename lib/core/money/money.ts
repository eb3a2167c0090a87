import { fail, ok, type Result } from "../result";
import { exponentOf } from "./currency";

declare const minorBrand: unique symbol;

/** An amount as an integer count of the currency's minor unit (cents). */
export type Minor = number & { readonly [minorBrand]: "Minor" };

/** Brands a whole number of minor units. Throws RangeError on anything else. */
export function minor(units: number): Minor {
  if (!Number.isSafeInteger(units)) throw new RangeError(`Money is a whole number of minor units, not ${units}`);
  return (units === 0 ? 0 : units) as Minor;
}

export function addMinor(amounts: readonly number[]): Minor {
  return minor(amounts.reduce((sum, amount) => sum + amount, 0));
}

/** "$94.00", as the shop's locale writes it. */
export function formatMoney(units: number, currency: string, locale = "en-US"): string {
  return new Intl.NumberFormat(locale, { style: "currency", currency }).format(units / 10 ** exponentOf(currency));
}

/** "94.00": the figure alone, for columns whose head names the currency. */
export function formatFigure(units: number, currency: string, locale = "en-US"): string {
  const digits = exponentOf(currency);
  return new Intl.NumberFormat(locale, { minimumFractionDigits: digits, maximumFractionDigits: digits, useGrouping: true }).format(units / 10 ** digits);
}

/**
 * An amount as typed, in either hand: "94", "94.00", "94,00", "1,234.50", "1.234,50", "1'234". The last of two kinds of mark
 * parts the minor units; one kind that comes more than once parts thousands. Faults: `empty`, `not-money`, `too-fine`
 * (more figures behind the point than the currency has), `too-much` (facts.most).
 */
export function parseMoney(text: string, currency: string, most = 100_000_000): Result<Minor, "empty" | "not-money" | "too-fine" | "too-much"> {
  const digits = exponentOf(currency);
  const example = digits === 0 ? "1240" : "12.40";
  const typed = text.slice(0, 60).trim();
  if (typed === "") return fail("empty", `Nothing is written. Wanted: an amount, such as ${example}.`);
  const figures = typed.replace(new RegExp(`^(?:${currency}|\\p{Sc})|(?:${currency}|\\p{Sc}|kr\\.?)$`, "giu"), "").replace(/[\s'’]/g, "");
  const match = /^(\d{1,12})(?:[.,](\d{1,6}))?$/.exec(withoutThousands(figures, digits));
  if (!match) return fail("not-money", `“${typed.slice(0, 40)}” is not an amount. Wanted: figures, such as ${example}.`);
  const fraction = match[2] ?? "";
  if (fraction.length > digits) return fail("too-fine", `${typed} has ${fraction.length} figures behind the point; ${currency} has ${digits === 0 ? "none" : digits}.`);
  const units = Number(match[1]) * 10 ** digits + Number(fraction.padEnd(digits, "0") || "0");
  if (units > most) return fail("too-much", `${typed} is more than the ${formatFigure(most, currency)} taken here.`, { facts: { most } });
  return ok(minor(units));
}

/** The same figures without their thousands marks; anything that is not grouped by threes stays as it is. */
function withoutThousands(figures: string, digits: number): string {
  if (/^\d{1,3}(?:,\d{3})+\.\d+$/.test(figures)) return figures.replaceAll(",", "");
  if (/^\d{1,3}(?:\.\d{3})+,\d+$/.test(figures)) return figures.replaceAll(".", "");
  const repeated = /^\d{1,3}([.,])\d{3}(?:\1\d{3})+$/.test(figures);
  const cannotBeMinor = digits === 0 && /^\d{1,3}[.,]\d{3}$/.test(figures);
  return repeated || cannotBeMinor ? figures.replace(/[.,]/g, "") : figures;
}
