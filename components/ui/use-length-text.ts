import { useState } from "react";
import type { Length } from "@/lib/core/measure/length";
import type { LengthFault } from "@/lib/core/measure/parse";
import type { Result } from "@/lib/core/result";

export interface LengthText {
  /** What stands in the field. */
  readonly text: string;
  /** What was typed, once the field has been rewritten in the shop's hand. */
  readonly typed: string | null;
  readonly reading: Result<Length, LengthFault>;
  /** The person has finished writing, so a fault may be said. */
  readonly finished: boolean;
  readonly write: (text: string) => void;
  readonly put: (value: Length) => void;
  readonly finish: () => void;
}

interface LengthTextOptions {
  readonly value: Length | null | undefined;
  readonly start: Length | null;
  readonly parse: (text: string) => Result<Length, LengthFault>;
  /** How a length is written once it has been read. */
  readonly hand: (value: Length) => string;
  readonly onChange?: (value: Length | null) => void;
}

/**
 * The text of a length while it is being written. It is left alone until the person has finished, then rewritten; a
 * value given from outside replaces it unless it is the echo of what was just read.
 */
export function useLengthText({ value, start, parse, hand, onChange }: LengthTextOptions): LengthText {
  const first = value === undefined ? start : value;
  const [seen, setSeen] = useState<Length | null>(first);
  const [text, setText] = useState(first === null ? "" : hand(first));
  const [typed, setTyped] = useState<string | null>(null);
  const [finished, setFinished] = useState(false);
  if (value !== undefined && value !== seen) {
    setSeen(value);
    setText(value === null ? "" : hand(value));
    setTyped(null);
    setFinished(false);
  }
  const reading = parse(text);

  function tell(next: Length | null) {
    if (next === seen) return;
    setSeen(next);
    onChange?.(next);
  }

  return {
    text,
    typed,
    reading,
    finished,
    write(next) {
      setText(next);
      setTyped(null);
      setFinished(false);
      const read = parse(next);
      tell(read.ok ? read.value : null);
    },
    put(next) {
      setText(hand(next));
      setTyped(null);
      setFinished(false);
      tell(next);
    },
    finish() {
      setFinished(true);
      if (!reading.ok) return;
      const written = hand(reading.value);
      if (written === text) return;
      setTyped(text.trim());
      setText(written);
    },
  };
}
