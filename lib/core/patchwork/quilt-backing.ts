import { length, type Length } from "../measure/length";
import { roundUp } from "../measure/rounding";

export interface BackingPanels {
  /** How many panels are sewn side by side. */
  readonly panels: number;
  /** Along the bolt, of each panel. */
  readonly panelLength: Length;
  /** Across the fabric, of each panel: an equal share with its seams, no more than the usable width. */
  readonly panelAcross: Length;
  /** Which way the joins run over the quilt's back; null where there is none. */
  readonly seams: "down" | "across" | null;
  /** Off the bolt, no allowance in it. */
  readonly length: Length;
}

export interface BackingSize {
  /** The quilt, finished, in 1/160 mm; on point not whole. */
  readonly width: number;
  readonly height: number;
  /** On every side. */
  readonly overhang: Length;
  /** A print with a direction stands upright on the back, so its joins can only run down. */
  readonly oneWay?: boolean;
}

/**
 * Panels joined along or across, whichever takes less cloth, and among equals the one with fewer seams, down the quilt
 * before across it. n panels give n W - (n - 1) 2s, the selvages already off (common practice; trade.md). A wide
 * backing that covers a way of the quilt needs one panel.
 *
 * @param usableWidth across the fabric; has to be wider than a seam takes.
 * @param seamAllowance s, of each side of a join.
 * @param step the ruler's, to which panels are rounded up.
 */
export function backingPanels(size: BackingSize, usableWidth: Length, seamAllowance: Length, step: Length = length(1)): BackingPanels {
  if (usableWidth <= 2 * seamAllowance) throw new RangeError("A fabric is wider than the seams that join it.");
  const [across, down] = [size.width + 2 * size.overhang, size.height + 2 * size.overhang];
  const seamsDown = panelsFor(across, down, "down", { usableWidth, seamAllowance, step });
  if (size.oneWay) return seamsDown;
  const seamsAcross = panelsFor(down, across, "across", { usableWidth, seamAllowance, step });
  const better = seamsAcross.length - seamsDown.length || seamsAcross.panels - seamsDown.panels;
  return better < 0 ? seamsAcross : seamsDown;
}

interface Cloth {
  readonly usableWidth: Length;
  readonly seamAllowance: Length;
  readonly step: Length;
}

/** Panels that cover `covered` side by side, each `long`. */
function panelsFor(covered: number, long: number, seams: "down" | "across", { usableWidth, seamAllowance, step }: Cloth): BackingPanels {
  const seam = 2 * seamAllowance;
  const panels = Math.max(1, Math.ceil((covered - seam) / (usableWidth - seam) - 1e-9));
  const share = roundUp((covered + (panels - 1) * seam) / panels, step);
  const panelLength = roundUp(long, step);
  return { panels, panelLength, panelAcross: share > usableWidth ? usableWidth : share, seams: panels > 1 ? seams : null, length: length(panels * panelLength) };
}
