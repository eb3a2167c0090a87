"use client";

import { useId, useState } from "react";
import { formatFigure, parseMoney, type Minor } from "@/lib/core/money/money";
import { Field, type FieldWords } from "./field";

interface MoneyFieldProps extends FieldWords {
  readonly id?: string;
  /** The form receives minor units; what cannot be read goes as it was typed. */
  readonly name?: string;
  readonly currency: string;
  readonly defaultValue?: number | null;
  readonly onChange?: (value: Minor | null) => void;
  /** The most that is taken, in minor units. */
  readonly most?: number;
  /** "a yard", "each". */
  readonly per?: string;
  readonly required?: boolean;
  readonly autoFocus?: boolean;
}

/** An amount, rewritten with its figures behind the point once it has been read. */
export function MoneyField({ label, hint, error, hideLabel, optional, id, name, currency, defaultValue = null, onChange, most, per, required, autoFocus }: MoneyFieldProps) {
  const made = useId();
  const [text, setText] = useState(defaultValue === null ? "" : plainFigure(defaultValue, currency));
  const [finished, setFinished] = useState(false);
  const reading = parseMoney(text, currency, most);
  const fault = reading.ok || (reading.fault.code === "empty" && !required) ? null : reading.fault;
  const said = error ?? (finished && fault ? fault.message : null);

  function finish() {
    setFinished(true);
    if (reading.ok) setText(plainFigure(reading.value, currency));
  }

  return (
    <Field id={id ?? made} label={label} hint={hint} error={said} hideLabel={hideLabel} optional={optional}>
      {(wiring) => (
        <span className="input-box figures justify-self-start">
          <span className="input-box-unit">{symbolOf(currency)}</span>
          <input
            {...wiring}
            value={text}
            inputMode="decimal"
            autoComplete="off"
            required={required}
            autoFocus={autoFocus}
            maxLength={40}
            onChange={(event) => {
              setText(event.target.value);
              setFinished(false);
              const next = parseMoney(event.target.value, currency, most);
              onChange?.(next.ok ? next.value : null);
            }}
            onKeyDown={(event) => {
              if (event.key !== "Enter") return;
              finish();
              if (fault) event.preventDefault();
            }}
            onFocus={(event) => event.target.select()}
            onBlur={finish}
          />
          {per ? <span className="input-box-unit">{per}</span> : null}
          {name ? <input type="hidden" name={name} value={reading.ok ? reading.value : text} /> : null}
        </span>
      )}
    </Field>
  );
}

/** Without thousands marks, which the field would have to read again. */
function plainFigure(minor: number, currency: string): string {
  return formatFigure(minor, currency).replaceAll(",", "");
}

function symbolOf(currency: string): string {
  const parts = new Intl.NumberFormat("en-US", { style: "currency", currency, currencyDisplay: "narrowSymbol" }).formatToParts(0);
  return parts.find((part) => part.type === "currency")?.value ?? currency;
}
