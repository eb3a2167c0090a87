import { fail, ok, type Result } from "../result";

/**
 * One table of codes: a letter for the kind, digits, and a check character by ISO/IEC 7064 MOD 37,2 over both. The mod
 * 37,2 system covers letters and digits with one check character and catches every single substitution and every swap
 * of neighbours; mod 11-2 would leave the letter unchecked. I, L, O and Q are no kinds, since they look like figures. A letter
 * O, I or L among the digits is taken for 0 or 1; the check character itself is taken as it stands, so that no slip gets through.
 */
const KINDS = {
  bolt: "B",
  piece: "P",
  kit: "K",
  cut: "C",
  run: "N",
  shelf: "W",
  person: "S",
  receipt: "R",
  gift: "G",
} as const;

export type CodeKind = keyof typeof KINDS;
export interface Code {
  readonly kind: CodeKind;
  readonly number: number;
  /** As `makeCode` writes it, however it was typed. */
  readonly text: string;
}

const ALPHABET = "0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZ*";
const RADIX = 2;
const MODULUS = 37;
const READ_AS: Readonly<Record<string, string>> = { O: "0", I: "1", L: "1" };
/** int4's largest has ten digits. */
const MOST_DIGITS = 10;
const LEAST_DIGITS = 4;
const KIND_OF: ReadonlyMap<string, CodeKind> = new Map(Object.entries(KINDS).map(([kind, letter]) => [letter, kind as CodeKind]));

/** The code of a thing: makeCode("bolt", 17) is "B0017" and its check character. Throws RangeError on anything but a whole number from 0. */
export function makeCode(kind: CodeKind, number: number): string {
  if (!Number.isSafeInteger(number) || number < 0 || String(number).length > MOST_DIGITS) throw new RangeError(`A code's number is whole and has at most ${MOST_DIGITS} digits, not ${number}`);
  const body = KINDS[kind] + String(number).padStart(LEAST_DIGITS, "0");
  return body + checkCharacter(body);
}

/**
 * Reads a scanned or typed code. Small letters, spaces and hyphens do not matter; a scanner's symbology prefix ("]C1") and an
 * address that ends in the code are taken off. Faults: `not-a-code`, `unknown-kind`, `wrong-check` (something was mistyped).
 */
export function parseCode(text: string): Result<Code, "not-a-code" | "unknown-kind" | "wrong-check"> {
  const said = bareCode(text);
  const match = new RegExp(`^([A-Z])([\\dOIL]{${LEAST_DIGITS},${MOST_DIGITS}})([0-9A-Z*])$`).exec(said);
  if (!match) return fail("not-a-code", `“${text.trim().slice(0, 40)}” is not one of this shop's codes. Wanted: a letter, figures and a check character, such as ${makeCode("bolt", 17)}.`);
  const [, letter = "", figures = "", check] = match;
  const digits = figures.replace(/[OIL]/g, (look) => READ_AS[look] ?? look);
  const kind = KIND_OF.get(letter);
  if (!kind) return fail("unknown-kind", `No code of this shop begins with ${letter}.`);
  if (checkCharacter(letter + digits) !== check) return fail("wrong-check", `${said} has a slip in it: its last character does not fit. Scan it, or type it again.`);
  return ok({ kind, number: Number(digits), text: makeCode(kind, Number(digits)) });
}

const MOST_READ = 200;

function bareCode(text: string): string {
  const said = text.slice(0, MOST_READ).trim().replace(/^\][A-Za-z]\d/, "");
  const ofAddress = /^https?:\/\/[^?#]*?\/([^/?#]+)\/?(?:[?#].*)?$/i.exec(said)?.[1];
  return (ofAddress ?? said).toUpperCase().replace(/[\s\u2010-\u2015-]/g, "");
}

/** ISO/IEC 7064, MOD 37,2: the pure system with one check character. Throws RangeError on a character outside the alphabet. */
export function checkCharacter(body: string): string {
  let sum = 0;
  for (const character of body) {
    const value = ALPHABET.indexOf(character);
    if (value < 0 || value === MODULUS - 1) throw new RangeError(`${character} cannot be in a code`);
    sum = ((sum + value) * RADIX) % MODULUS;
  }
  return ALPHABET.charAt((MODULUS + 1 - sum) % MODULUS);
}
