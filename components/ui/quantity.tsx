"use client";

import { useId, useState } from "react";
import { FieldFoot, fieldWiring, type FieldWords } from "./field";

interface QuantityProps extends FieldWords {
  readonly id?: string;
  readonly name?: string;
  readonly value?: number;
  readonly defaultValue?: number;
  readonly onChange?: (value: number) => void;
  readonly least?: number;
  readonly most?: number;
  /** What is counted, for the two steps: "kit". */
  readonly noun: string;
  readonly size?: "desk" | "counter";
}

/** A count with its two steps. What is typed counts once it is a whole number within the limits. */
export function Quantity({ label, hint, error, hideLabel = false, id, name, value, defaultValue = 1, onChange, least = 1, most = 9_999, noun, size = "desk" }: QuantityProps) {
  const made = useId();
  const [own, setOwn] = useState(defaultValue);
  const [draft, setDraft] = useState<string | null>(null);
  const count = value ?? own;
  const drafted = draft === null ? count : Number(draft);
  const isWrong = draft !== null && (draft.trim() === "" || !Number.isInteger(drafted) || drafted < least || drafted > most);
  const said = error ?? (isWrong ? `${draft?.trim() === "" ? "Nothing" : `“${draft}”`} is written. Wanted: a whole number from ${least} to ${most}.` : null);
  const wiring = fieldWiring(id ?? made, hint, said);

  function put(next: number) {
    setDraft(null);
    setOwn(next);
    onChange?.(next);
  }

  return (
    <div className="field">
      <label htmlFor={wiring.id} className={hideLabel ? "sr" : "field-label"}>
        {label}
      </label>
      <span className={size === "counter" ? "count count-counter justify-self-start" : "count justify-self-start"}>
        <button type="button" aria-label={`One ${noun} less`} disabled={count <= least} onClick={() => put(Math.max(least, count - 1))}>
          <span aria-hidden="true">−</span>
        </button>
        <input
          {...wiring}
          name={name}
          inputMode="numeric"
          autoComplete="off"
          maxLength={6}
          value={draft ?? String(count)}
          onFocus={(event) => event.target.select()}
          onChange={(event) => {
            const next = event.target.value;
            const read = Number(next);
            if (next.trim() !== "" && Number.isInteger(read) && read >= least && read <= most) put(read);
            else setDraft(next);
          }}
          onKeyDown={(event) => {
            if (event.key !== "ArrowUp" && event.key !== "ArrowDown") return;
            event.preventDefault();
            put(Math.min(most, Math.max(least, count + (event.key === "ArrowUp" ? 1 : -1))));
          }}
        />
        <button type="button" aria-label={`One ${noun} more`} disabled={count >= most} onClick={() => put(Math.min(most, count + 1))}>
          <span aria-hidden="true">+</span>
        </button>
      </span>
      <FieldFoot id={wiring.id} hint={hint} error={said} />
    </div>
  );
}
