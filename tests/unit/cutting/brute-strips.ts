import type { Blank } from "@/lib/core/piece/strip-plan";

/**
 * The least length of strips with sub-cuts for a few pieces, from the definition: try every set of pieces, lying every
 * way they may, as the strip that holds the first piece still wanted. Exponential; for tests of a handful of pieces.
 */
export function bruteStrips(blanks: readonly Blank[], usableWidth: number): number {
  const known = new Map<string, number>();
  const best = (wanted: readonly number[]): number => {
    const first = wanted.findIndex((count) => count > 0);
    if (first < 0) return 0;
    const name = wanted.join(",");
    const before = known.get(name);
    if (before !== undefined) return before;
    let least = Infinity;
    const fill = (at: number, room: number, height: number, taken: readonly number[]) => {
      if (at === blanks.length) {
        if ((taken[first] ?? 0) > 0) least = Math.min(least, height + best(wanted.map((count, index) => count - (taken[index] ?? 0))));
        return;
      }
      const blank = blanks[at] as Blank;
      for (let straight = 0; straight <= (wanted[at] ?? 0); straight++) {
        for (let turned = 0; turned <= (blank.mayTurn ? (wanted[at] ?? 0) - straight : 0); turned++) {
          const waste = straight + turned > 0 ? blank.endWaste : 0;
          const left = room - straight * blank.across - turned * blank.along - waste;
          if (left < 0) break;
          const tall = Math.max(height, straight > 0 ? blank.along : 0, turned > 0 ? blank.across : 0);
          fill(at + 1, left, tall, [...taken, straight + turned]);
        }
      }
    };
    fill(0, usableWidth, 0, []);
    known.set(name, least);
    return least;
  };
  return best(blanks.map((blank) => blank.count));
}
