import { fail, ok, type Result } from "../result";
import { roundToCash } from "./cash-rounding";
import { minor, type Minor } from "./money";

export type TenderKind = "cash" | "card" | "gift-card" | "store-credit";

export interface Tender {
  readonly kind: TenderKind;
  /** What the customer hands over, in minor units. */
  readonly given: number;
}

export interface SettledTender {
  readonly kind: TenderKind;
  readonly given: Minor;
  /** What of it pays the sale. */
  readonly amount: Minor;
  readonly change: Minor;
}

export interface Settlement {
  readonly tenders: readonly SettledTender[];
  /** Added to the total so that cash can pay it; nothing where no cash is given. */
  readonly rounding: Minor;
  readonly change: Minor;
}

/** What is left to pay after some tenders; never below nothing. */
export function stillToPay(total: number, tenders: readonly Tender[]): Minor {
  return minor(Math.max(0, total - tenders.reduce((sum, tender) => sum + tender.given, 0)));
}

/**
 * Settles a sale with its tenders. Only cash gives change, and only the part paid in cash is rounded to coins. Faults:
 * `not-enough` (facts.missing), `too-much` when something other than cash exceeds what is due.
 */
export function settle(total: number, tenders: readonly Tender[], cashStep = 1): Result<Settlement, "not-enough" | "too-much"> {
  if (tenders.some((tender) => !Number.isSafeInteger(tender.given) || tender.given < 0)) throw new RangeError("What is given is a whole number of minor units from nothing up");
  const other = tenders.filter((tender) => tender.kind !== "cash").reduce((sum, tender) => sum + tender.given, 0);
  if (other > total) return fail("too-much", "More than what is due was taken by card or voucher. Only cash gives change.");
  const cash = tenders.filter((tender) => tender.kind === "cash");
  const due = total - other;
  const cashDue = cash.length ? roundToCash(due, cashStep) : due;
  const given = cash.reduce((sum, tender) => sum + tender.given, 0);
  if (given < cashDue) return fail("not-enough", "What was given does not pay the sale.", { facts: { missing: cashDue - given } });
  let left = cashDue;
  const settled = tenders.map((tender): SettledTender => {
    const amount = tender.kind === "cash" ? Math.min(left, tender.given) : tender.given;
    if (tender.kind === "cash") left -= amount;
    return { kind: tender.kind, given: minor(tender.given), amount: minor(amount), change: minor(tender.given - amount) };
  });
  return ok({ tenders: settled, rounding: minor(cashDue - due), change: minor(given - cashDue) });
}
