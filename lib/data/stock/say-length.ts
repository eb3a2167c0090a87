import { PER_INCH, PER_METRE, PER_YARD } from "@/lib/core/measure/length";

const PER_EIGHTH_INCH = PER_INCH / 8;

/** A length of 1/160 mm in a sentence, as the shop measures: "2 3/8 yd", "1 yd 7 1/4 in", "1.25 m". */
export function sayLength(units: number, system: "yards" | "metres"): string {
  if (system === "metres") return `${Number((units / PER_METRE).toFixed(3))} m`;
  if ((units * 8) % PER_YARD === 0) return `${withFraction(Math.floor(units / PER_YARD), ((units % PER_YARD) * 8) / PER_YARD)} yd`;
  const eighths = Math.round(units / PER_EIGHTH_INCH);
  const yards = Math.floor(eighths / (8 * 36));
  const rest = eighths - yards * 8 * 36;
  const inches = `${withFraction(Math.floor(rest / 8), rest % 8)} in`;
  return yards === 0 ? inches : `${yards} yd ${inches}`;
}

function withFraction(whole: number, eighths: number): string {
  if (eighths === 0) return String(whole);
  const by = eighths % 4 === 0 ? 4 : eighths % 2 === 0 ? 2 : 1;
  const fraction = `${eighths / by}/${8 / by}`;
  return whole === 0 ? fraction : `${whole} ${fraction}`;
}
