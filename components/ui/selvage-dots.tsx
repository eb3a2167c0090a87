/** The true stages of a record, in order; a record has five. */
export const STAGES = ["planned", "reserved", "cutting", "cut", "packed"] as const;
export type Stage = (typeof STAGES)[number];

interface SelvageDotsProps {
  /** 0 to `of`. */
  readonly done: number;
  readonly of?: number;
  /** The stage in words, after the dots. */
  readonly word: string;
}

/** One ink, full or empty, the word after them: as a mill prints its colours on the selvage. */
export function SelvageDots({ done, of = 5, word }: SelvageDotsProps) {
  return (
    <span className="dots">
      <svg width={of * 14 + 2} height="14" viewBox={`0 0 ${of * 14 + 2} 14`} aria-hidden="true">
        {Array.from({ length: of }, (_, index) => (
          <circle key={index} cx={7 + index * 14} cy="7" r="4.6" fill={index < done ? "var(--walnut)" : "var(--paper)"} stroke="var(--walnut)" strokeWidth="1.5" />
        ))}
      </svg>
      {word}
      <span className="sr">
        , {done} of {of} stages
      </span>
    </span>
  );
}

/** A record at one of its five stages, or still a draft. */
export function StageDots({ stage }: { stage: Stage | "draft" }) {
  return <SelvageDots done={stage === "draft" ? 0 : STAGES.indexOf(stage) + 1} word={stage} />;
}
