import { inches, length } from "@/lib/core/measure/length";
import type { Blank } from "@/lib/core/piece/strip-plan";

/** A plain blank, `along` by `across` inches. */
export function buildBlank(key: string, along: number, across: number, count: number, more: Partial<Blank> = {}): Blank {
  return { key, pieceKey: key, label: key, along: inches(along), across: inches(across), count, gives: 1, mayTurn: false, endWaste: length(0), mark: "plain", ...more };
}
