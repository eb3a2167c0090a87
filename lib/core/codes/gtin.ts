import { fail, ok, type Result } from "../result";

export type GtinFault = "empty" | "not-a-gtin" | "wrong-check";

/** Who gave the number out, which decides what it may be used for. */
export type GtinUse =
  /** Given out worldwide: it names the article. */
  | "global"
  /** Restricted circulation: made up by the shop, or by another one. It means nothing elsewhere. */
  | "in-store"
  /** A book, a magazine or sheet music (978, 979, 977): patterns carry it. */
  | "book"
  /** A coupon or refund slip, no article. */
  | "coupon";

export interface Gtin {
  /** As scanned, without blanks: 8, 12, 13 or 14 digits. */
  readonly digits: string;
  /** Padded to 14 digits, which is how it is kept and compared. */
  readonly key: string;
  readonly use: GtinUse;
}

const LENGTHS = [8, 12, 13, 14];
const KEY_LENGTH = 14;

/**
 * The check digit of a GS1 number without it: weights 3 and 1 in turn from the right, up to the next ten (GS1 General
 * Specifications, "Check digit calculations"). Holds for GTIN, SSCC and GLN alike. Throws RangeError on anything but digits.
 */
export function gs1CheckDigit(body: string): number {
  if (!/^\d{1,30}$/.test(body)) throw new RangeError(`${body} is not a row of digits`);
  const sum = [...body].reverse().reduce((total, digit, index) => total + Number(digit) * (index % 2 === 0 ? 3 : 1), 0);
  return (10 - (sum % 10)) % 10;
}

/**
 * Reads a GTIN-8, 12, 13 or 14 as scanned or typed. Blanks, hyphens and a scanner's symbology prefix do not matter. Faults:
 * `empty`, `not-a-gtin` (facts.length), `wrong-check`.
 */
export function parseGtin(text: string): Result<Gtin, GtinFault> {
  const said = text.slice(0, 60).trim().replace(/^\][A-Za-z]\d/, "").replace(/[\s-]/g, "");
  if (said === "") return fail("empty", "Nothing is written. Wanted: the number under the bars.");
  if (!/^\d+$/.test(said)) return fail("not-a-gtin", `“${text.trim().slice(0, 40)}” is not the number of a barcode. Wanted: figures only.`);
  if (!LENGTHS.includes(said.length)) return fail("not-a-gtin", `${said} has ${said.length} figures. Wanted: 8, 12, 13 or 14, as they stand under the bars.`, { facts: { length: said.length } });
  if (gs1CheckDigit(said.slice(0, -1)) !== Number(said.at(-1))) return fail("wrong-check", `${said} has a slip in it: its last figure does not fit. Scan it, or type it again.`);
  return ok({ digits: said, key: said.padStart(KEY_LENGTH, "0"), use: givenOutAs(said) });
}

/**
 * Restricted circulation: GTIN-8 that begin with 0 or 2, and prefixes 020 to 029, 040 to 049 and 200 to 299 (GS1 General
 * Specifications, "GS1 prefixes"). 050 to 059, 981 to 984 and 99 are coupons, 980 refund slips.
 */
function givenOutAs(digits: string): GtinUse {
  if (digits.length === 8) return /^[02]/.test(digits) ? "in-store" : "global";
  const prefix = digits.padStart(KEY_LENGTH, "0").slice(1, 4);
  if (/^(?:02|04|2)/.test(prefix)) return "in-store";
  if (/^97[789]$/.test(prefix)) return "book";
  return /^(?:05|98[0-4]|99)/.test(prefix) ? "coupon" : "global";
}

/**
 * A GTIN-13 of restricted circulation for an article that has no number: 20, ten digits, check digit. It means nothing
 * outside the shop. Throws RangeError on anything but a whole number of at most ten digits.
 */
export function makeInStoreGtin(number: number): string {
  if (!Number.isSafeInteger(number) || number < 0 || number > 9_999_999_999) throw new RangeError(`An in-store number is whole and has at most ten digits, not ${number}`);
  const body = `20${String(number).padStart(10, "0")}`;
  return `${body}${gs1CheckDigit(body)}`;
}
