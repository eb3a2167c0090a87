import { displayLength, formatMetres, mixedNumber, wordsOfNumber, type MeasureSystem, type MixedNumber } from "@/lib/core/measure/format";
import { PER_CENTIMETRE, PER_EIGHTH_YARD, PER_INCH, PER_METRE, PER_YARD } from "@/lib/core/measure/length";
import type { Length } from "@/lib/core/measure/length";
import { formatFigure, formatMoney } from "@/lib/core/money/money";

interface FigureProps {
  readonly value: Length;
  /** Leave the unit out where the head of the column says it. */
  readonly bare?: boolean;
}

/** One mixed number: drawn with the fraction slash (U+2044), which the family's `frac` sets, and said in words. */
export function Mixed({ figure }: { figure: MixedNumber }) {
  const whole = figure.whole.toLocaleString("en-US");
  const sign = figure.negative ? "\u2212" : "";
  if (figure.numerator === 0 && sign === "") return <span className="q">{whole}</span>;
  const fraction = figure.numerator === 0 ? "" : `${figure.numerator}\u2044${figure.denominator}`;
  const parts = figure.whole === 0 && fraction !== "" ? [fraction] : [whole, fraction].filter(Boolean);
  return (
    <span className="q">
      <span aria-hidden="true">{sign + parts.join(" ")}</span>
      <span className="sr">{wordsOfNumber(figure)}</span>
    </span>
  );
}

function Unit({ short, one, many, figure }: { short: string; one: string; many: string; figure: MixedNumber }) {
  const single = figure.whole === 1 ? figure.numerator === 0 : figure.whole === 0 && figure.numerator > 0;
  return (
    <span className="u">
      <span aria-hidden="true">{short}</span>
      <span className="sr"> {single ? one : many}</span>
    </span>
  );
}

/** Inches to the nearest 1/32, the finest mark that is stored. */
export function Inches({ value, bare = false }: FigureProps) {
  const figure = mixedNumber(value / PER_INCH, 32);
  return (
    <span className="whitespace-nowrap">
      <Mixed figure={figure} />
      {bare ? null : <Unit short="in" one="inch" many="inches" figure={figure} />}
    </span>
  );
}

/** Yards as a fraction down to 1/32. A length off those marks is given in eighths and inches, never rounded away. */
export function Yards({ value, bare = false }: FigureProps) {
  const isOnAMark = Number.isInteger((value * 32) / PER_YARD);
  const eighths = Math.trunc(value / PER_EIGHTH_YARD);
  if (!isOnAMark && eighths === 0) return <Inches value={value} />;
  const figure = isOnAMark ? mixedNumber(value / PER_YARD, 32) : mixedNumber(eighths / 8, 8);
  const beyond = mixedNumber(Math.abs(value - eighths * PER_EIGHTH_YARD) / PER_INCH, 32);
  return (
    <span className="whitespace-nowrap">
      <Mixed figure={figure} />
      {bare && isOnAMark ? null : <Unit short="yd" one="yard" many="yards" figure={figure} />}
      {isOnAMark ? null : (
        <>
          {" "}
          <span className="ml-1">
            <Mixed figure={beyond} />
            <Unit short="in" one="inch" many="inches" figure={beyond} />
          </span>
        </>
      )}
    </span>
  );
}

/** Metres and centimetres as a metric counter says them: "2 m 40", "85 cm". */
export function Metres({ value }: { readonly value: Length }) {
  return (
    <span className="num whitespace-nowrap">
      <span aria-hidden="true">{formatMetres(value).replace("-", "\u2212")}</span>
      <span className="sr">{sayMetres(value)}</span>
    </span>
  );
}

function sayMetres(value: number): string {
  const centimetres = Number((Math.abs(value) / PER_CENTIMETRE).toFixed(1));
  const whole = Math.floor(centimetres / (PER_METRE / PER_CENTIMETRE));
  const rest = Number((centimetres - whole * 100).toFixed(1));
  const sign = value < 0 && centimetres > 0 ? "minus " : "";
  const metres = `${whole} ${whole === 1 ? "metre" : "metres"}`;
  if (whole === 0) return `${sign}${rest} ${rest === 1 ? "centimetre" : "centimetres"}`;
  return rest === 0 ? sign + metres : `${sign}${metres} ${rest}`;
}

type SystemFigureProps = FigureProps & { readonly system?: MeasureSystem };

/** A length of cloth in the shop's own measure. */
export function ClothLength({ value, system = "yards", bare = false }: SystemFigureProps) {
  return system === "metres" ? <Metres value={value} /> : <Yards value={value} bare={bare} />;
}

/** A cut size: inches, or centimetres in a metric shop. */
export function CutSize({ value, system = "yards", bare = false }: SystemFigureProps) {
  return system === "metres" ? <Metres value={value} /> : <Inches value={value} bare={bare} />;
}

interface MoneyProps {
  /** Minor units: cents, pence. */
  readonly minor: number;
  /** ISO 4217, one of those a shop can choose. */
  readonly currency: string;
  readonly locale?: string;
  /** Leave the sign of the currency out where the head of the column says it. */
  readonly bare?: boolean;
}

export function Money({ minor, currency, locale = "en-US", bare = false }: MoneyProps) {
  const written = bare ? formatFigure(minor, currency, locale) : formatMoney(minor, currency, locale);
  return <span className="num whitespace-nowrap">{written.replace("-", "\u2212")}</span>;
}

/** A length inside a sentence that is plain text: an aria-label, a title. */
export function lengthInText(value: Length, system: MeasureSystem = "yards"): string {
  return displayLength(value, system);
}
