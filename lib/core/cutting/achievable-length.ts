/** Beyond this the table of reachable sums costs more than the rounding it buys. */
const LONGEST_TABLE = 3_000_000;

/**
 * The least sum of parts, each used as often as one likes, that is at least `atLeast`. Any plan's length is such a sum
 * of strip widths, so a bound may be rounded up to it. All in the same unit; the parts are whole.
 */
export function achievableLength(parts: readonly number[], atLeast: number): number {
  const least = Math.max(0, Math.ceil(atLeast - 1e-6 - atLeast * 1e-12));
  const widest = Math.max(0, ...parts);
  if (widest === 0 || least === 0) return 0;
  if (least + widest > LONGEST_TABLE) return least;
  const reached = new Uint8Array(least + widest + 1);
  reached[0] = 1;
  for (const part of parts) for (let at = part; at < reached.length; at++) if (reached[at - part]) reached[at] = 1;
  for (let at = least; at < reached.length; at++) if (reached[at]) return at;
  return least;
}
