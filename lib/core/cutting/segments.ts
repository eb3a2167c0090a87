import { length, type Length } from "../measure/length";
import type { Segment } from "../piece/bolt-plan";

/** A bolt's cloth in bolt coordinates: 0 is its first free end, `endsAt` its core. */
export interface BoltCloth {
  /** Where the next cut begins. */
  readonly cutEdge: Length;
  readonly endsAt: Length;
  readonly flaws: readonly Segment[];
}

/** The stretches between the cut edge and the core that no flaw touches, in order. Flaws may overlap and come in any order. */
export function segmentsOf({ cutEdge, endsAt, flaws }: BoltCloth): Segment[] {
  const segments: Segment[] = [];
  let from: number = cutEdge;
  for (const flaw of [...flaws].sort((a, b) => a.startsAt - b.startsAt)) {
    const end = Math.min(flaw.startsAt, endsAt);
    if (end > from) segments.push({ startsAt: length(from), endsAt: length(end) });
    from = Math.max(from, flaw.endsAt);
  }
  if (from < endsAt) segments.push({ startsAt: length(from), endsAt });
  return segments;
}

export function segmentLength(segment: Segment): Length {
  return length(segment.endsAt - segment.startsAt);
}

/** The longest stretch without a flaw; 0 when there is none. */
export function longestSegment(segments: readonly Segment[]): Length {
  return segments.reduce<Length>((longest, segment) => (segmentLength(segment) > longest ? segmentLength(segment) : longest), length(0));
}

/** A place on the bolt as screens draw it: counted from the core. Its own inverse. */
export function fromCore(position: Length, endsAt: Length): Length {
  return length(endsAt - position);
}
