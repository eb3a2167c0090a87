"use client";

import Form from "next/form";
import { useRef, useState, type ReactNode } from "react";
import type { Option } from "./text-input";

/** One word of the sentence that can be changed. */
export interface SentenceChoice {
  readonly name: string;
  /** What is chosen, for those who do not see the sentence: "Shelf". */
  readonly label: string;
  readonly options: readonly Option[];
  readonly value: string;
}

/** A word that is written: a name to search for. */
export interface SentenceBlank {
  readonly name: string;
  readonly label: string;
  readonly blank: true;
  readonly value: string;
  readonly placeholder?: string;
}

interface SentenceFilterProps {
  /** Address of the list; the answers go into its query. */
  readonly action: string;
  /** The sentence in order: plain words, and the words that can be changed. */
  readonly parts: readonly (string | SentenceChoice | SentenceBlank)[];
  /** Query fields that go along unchanged. */
  readonly kept?: Readonly<Record<string, string>>;
  /** Chips of colour families, at the right. */
  readonly end?: ReactNode;
}

/**
 * "Show [bolts below the mark] on [any shelf] from [any mill]". A changed word is sent at once, a written one with
 * Enter; the list changes in place, so that the word keeps its focus and may be changed on.
 */
export function SentenceFilter({ action, parts, kept = {}, end }: SentenceFilterProps) {
  const form = useRef<HTMLFormElement>(null);
  return (
    <Form ref={form} className="sentence" action={action} scroll={false} role="search" aria-label="What is shown">
      {Object.entries(kept).map(([name, value]) => (
        <input key={name} type="hidden" name={name} value={value} />
      ))}
      {parts.map((part, index) => {
        if (typeof part === "string") return <span key={`${index}-${part}`}>{part}</span>;
        if ("blank" in part) return <Blank key={part.name} blank={part} />;
        return <Choice key={part.name} choice={part} send={() => form.current?.requestSubmit()} />;
      })}
      <noscript>
        <button className="btn btn-sm">Show them</button>
      </noscript>
      {end ? <span className="sentence-end">{end}</span> : null}
    </Form>
  );
}

/** A word follows the address when that changes, and the person otherwise. */
function useWord(value: string): [string, (next: string) => void] {
  const [seen, setSeen] = useState(value);
  const [word, setWord] = useState(value);
  if (value !== seen) {
    setSeen(value);
    setWord(value);
  }
  return [word, setWord];
}

function Blank({ blank }: { blank: SentenceBlank }) {
  const [word, setWord] = useWord(blank.value);
  return (
    <input
      type="text"
      name={blank.name}
      aria-label={blank.label}
      value={word}
      placeholder={blank.placeholder}
      maxLength={120}
      autoComplete="off"
      onChange={(event) => setWord(event.target.value)}
    />
  );
}

function Choice({ choice, send }: { choice: SentenceChoice; send: () => void }) {
  const [word, setWord] = useWord(choice.value);
  return (
    <select
      name={choice.name}
      aria-label={choice.label}
      value={word}
      onChange={(event) => {
        setWord(event.target.value);
        requestAnimationFrame(send);
      }}
    >
      {choice.options.map((option) => (
        <option key={option.value} value={option.value}>
          {option.label}
        </option>
      ))}
    </select>
  );
}
