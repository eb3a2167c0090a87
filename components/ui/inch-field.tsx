"use client";

import { useId, type KeyboardEvent } from "react";
import { displayInches, formatMillimetres, type MeasureSystem } from "@/lib/core/measure/format";
import { length, PER_INCH, PER_MILLIMETRE, type Length } from "@/lib/core/measure/length";
import { parseInches, parseMillimetres, type LengthLimits } from "@/lib/core/measure/parse";
import { Field, type FieldWords } from "./field";
import { useLengthText } from "./use-length-text";

interface InchFieldProps extends FieldWords, LengthLimits {
  readonly id?: string;
  /** The form receives a whole number of 1/160 mm; what cannot be read goes as it was typed. */
  readonly name?: string;
  readonly system?: MeasureSystem;
  readonly value?: Length | null;
  readonly defaultValue?: Length | null;
  readonly onChange?: (value: Length | null) => void;
  readonly required?: boolean;
}

/** A cut or finished size: inches and a fraction ("3 7/8", "3 13/16"), or millimetres. Up and Down step 1/16 in or 1 mm. */
export function InchField({ label, hint, error, hideLabel, optional, id, name, system = "yards", value, defaultValue = null, onChange, required, most, least }: InchFieldProps) {
  const made = useId();
  const metric = system === "metres";
  const limits = { most, least };
  const words = useLengthText({
    value,
    start: defaultValue,
    parse: (text) => (metric ? parseMillimetres(text, limits) : parseInches(text, limits)),
    hand: (read) => (metric ? formatMillimetres(read) : displayInches(read)),
    onChange,
  });
  const read = words.reading.ok ? words.reading.value : null;
  const fault = words.reading.ok ? null : words.reading.fault;
  const said = error ?? (words.finished && fault && (fault.code !== "empty" || required) ? fault.message : null);
  const step = metric ? PER_MILLIMETRE : PER_INCH / 16;

  function onKeyDown(event: KeyboardEvent) {
    if (event.key === "Enter") {
      words.finish();
      if (fault && (fault.code !== "empty" || required)) event.preventDefault();
      return;
    }
    if (event.key !== "ArrowUp" && event.key !== "ArrowDown") return;
    event.preventDefault();
    const from = read ?? 0;
    const mark = event.key === "ArrowUp" ? Math.floor(from / step) + 1 : Math.ceil(from / step) - 1;
    words.put(length(Math.min(Math.max(mark * step, least ?? step), most ?? Number.MAX_SAFE_INTEGER)));
  }

  return (
    <Field id={id ?? made} label={label} hint={hint} error={said} hideLabel={hideLabel} optional={optional}>
      {(wiring) => (
        <span className="input-box figures justify-self-start">
          <input
            {...wiring}
            className="q"
            value={words.text}
            inputMode="text"
            autoComplete="off"
            spellCheck={false}
            required={required}
            maxLength={40}
            onChange={(event) => words.write(event.target.value)}
            onKeyDown={onKeyDown}
            onFocus={(event) => event.target.select()}
            onBlur={() => words.finish()}
          />
          <span className="input-box-unit">{metric ? "mm" : "in"}</span>
          {words.typed === null || words.typed.replace("/", "\u2044") === words.text ? null : <span className="length-typed">typed {words.typed}</span>}
          {name ? <input type="hidden" name={name} value={read ?? words.text} /> : null}
        </span>
      )}
    </Field>
  );
}
