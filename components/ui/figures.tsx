import { PER_CENTIMETRE, PER_EIGHTH_YARD, PER_INCH, PER_METRE, PER_MILLIMETRE, PER_YARD } from "@/lib/core/measure/length";
import type { Length } from "@/lib/core/measure/length";
import { isMany, mixedNumber, sayMixedNumber, writeMixedNumber, type MixedNumber } from "./mixed-number";

/** What a shop measures in. */
export type MeasureSystem = "yards" | "metres";

interface FigureProps {
  readonly value: Length;
  /** Leave the unit out where the head of the column says it. */
  readonly bare?: boolean;
}

/** One mixed number: drawn as a fraction, said in words. */
export function Mixed({ figure }: { figure: MixedNumber }) {
  const written = writeMixedNumber(figure);
  const said = sayMixedNumber(figure);
  if (written === said) return <span className="q">{written}</span>;
  return (
    <span className="q">
      <span aria-hidden="true">{written}</span>
      <span className="sr">{said}</span>
    </span>
  );
}

function Unit({ short, one, many, figure }: { short: string; one: string; many: string; figure: MixedNumber }) {
  return (
    <span className="u">
      <span aria-hidden="true">{short}</span>
      <span className="sr"> {isMany(figure) ? many : one}</span>
    </span>
  );
}

/** Inches to the nearest 1/32, the finest mark that is stored. */
export function Inches({ value, bare = false }: FigureProps) {
  const figure = mixedNumber(value, PER_INCH, 32);
  return (
    <span className="whitespace-nowrap">
      <Mixed figure={figure} />
      {bare ? null : <Unit short="in" one="inch" many="inches" figure={figure} />}
    </span>
  );
}

/** Yards in eighths. What lies beyond the last eighth is said in inches and never rounded away. */
export function Yards({ value, bare = false }: FigureProps) {
  const eighths = Math.trunc(value / PER_EIGHTH_YARD);
  const beyond = Math.abs(value - eighths * PER_EIGHTH_YARD);
  const figure = mixedNumber(eighths * PER_EIGHTH_YARD, PER_YARD, 8);
  const inches = mixedNumber(eighths === 0 ? value : beyond, PER_INCH, 32);
  const isExact = inches.whole === 0 && inches.numerator === 0;
  if (eighths === 0 && !isExact) return <Inches value={value} />;
  return (
    <span className="whitespace-nowrap">
      <Mixed figure={figure} />
      {bare && isExact ? null : <Unit short="yd" one="yard" many="yards" figure={figure} />}
      {isExact ? null : (
        <>
          {" "}
          <Mixed figure={inches} />
          <Unit short="in" one="inch" many="inches" figure={inches} />
        </>
      )}
    </span>
  );
}

/** Metres and centimetres as a metric counter says them: "2 m 40", "85 cm", to the millimetre. */
export function Metres({ value, bare = false }: FigureProps) {
  const { written, said } = inMetres(value, bare);
  return (
    <span className="num whitespace-nowrap">
      <span aria-hidden="true">{written}</span>
      <span className="sr">{said}</span>
    </span>
  );
}

export function inMetres(value: number, bare = false): { written: string; said: string } {
  const millimetres = Math.round(Math.abs(value) / PER_MILLIMETRE);
  const sign = value < 0 && millimetres > 0 ? "\u2212" : "";
  const whole = Math.floor(millimetres / (PER_METRE / PER_MILLIMETRE));
  const rest = (millimetres % (PER_METRE / PER_MILLIMETRE)) / (PER_CENTIMETRE / PER_MILLIMETRE);
  const saidSign = sign === "" ? "" : "minus ";
  const metres = `${whole} ${whole === 1 ? "metre" : "metres"}`;
  if (rest === 0) return { written: `${sign}${whole}${bare ? "" : " m"}`, said: saidSign + metres };
  if (whole === 0) return { written: `${sign}${rest} cm`, said: `${saidSign}${rest} centimetres` };
  const two = Number.isInteger(rest) ? String(rest).padStart(2, "0") : `${rest} cm`;
  return { written: `${sign}${whole} m ${two}`, said: `${saidSign}${metres} ${rest}` };
}

/** A length of cloth in the shop's own measure. */
export function ClothLength({ value, system = "yards", bare = false }: FigureProps & { readonly system?: MeasureSystem }) {
  return system === "metres" ? <Metres value={value} bare={bare} /> : <Yards value={value} bare={bare} />;
}

/** A cut size: inches, or centimetres in a metric shop. */
export function CutSize({ value, system = "yards", bare = false }: FigureProps & { readonly system?: MeasureSystem }) {
  return system === "metres" ? <Metres value={value} bare={bare} /> : <Inches value={value} bare={bare} />;
}

interface MoneyProps {
  /** Minor units: cents, pence. */
  readonly minor: number;
  /** ISO 4217. */
  readonly currency: string;
  /** Leave the sign of the currency out where the head of the column says it. */
  readonly bare?: boolean;
}

export function Money({ minor, currency, bare = false }: MoneyProps) {
  return <span className="num whitespace-nowrap">{writeMoney(minor, currency, bare)}</span>;
}

/** The number of minor digits comes from the currency itself: two for USD, none for JPY. */
export function writeMoney(minor: number, currency: string, bare = false): string {
  const format = new Intl.NumberFormat("en-US", { style: "currency", currency, currencyDisplay: "narrowSymbol" });
  const digits = format.resolvedOptions().maximumFractionDigits ?? 2;
  const parts = format.formatToParts(minor / 10 ** digits);
  return parts
    .filter((part) => !(bare && part.type === "currency"))
    .map((part) => (part.type === "minusSign" ? "\u2212" : part.value))
    .join("")
    .trim();
}
