"use client";

import { useId, useRef, type KeyboardEvent, type ReactNode } from "react";
import { displayYards, formatCentimetres, formatMetres, type MeasureSystem } from "@/lib/core/measure/format";
import { length, type Length } from "@/lib/core/measure/length";
import { parseMetres, parseYards, type LengthLimits } from "@/lib/core/measure/parse";
import { FieldFoot, fieldWiring, type FieldWords } from "./field";
import { Inches } from "./figures";
import { AmbiguousLength } from "./ambiguous-length";
import { LengthKeys } from "./length-keys";
import { metreAndPart, stepOf, yardAndPart } from "./length-steps";
import { useLengthText } from "./use-length-text";

interface LengthFieldProps extends FieldWords, LengthLimits {
  readonly id?: string;
  /** The form receives the length as a whole number of 1/160 mm; what cannot be read goes as it was typed. */
  readonly name?: string;
  readonly system?: MeasureSystem;
  /** Give `value` to hold the length outside, `defaultValue` to let the field hold it. */
  readonly value?: Length | null;
  readonly defaultValue?: Length | null;
  readonly onChange?: (value: Length | null) => void;
  /** Enter in the field, once what stands there is a length. */
  readonly onEnter?: (value: Length) => void;
  /** What is said beside each reading of an ambiguous length: a price. */
  readonly priceOf?: (value: Length) => ReactNode;
  readonly size?: "desk" | "counter";
  readonly autoFocus?: boolean;
  readonly required?: boolean;
}

/** Whole yards, a space, eighths; or a written fraction. Up and Down step an eighth, or 10 cm. A point asks which is meant. */
export function LengthField(props: LengthFieldProps) {
  const { label, hint, error, hideLabel = false, optional = false, name, system = "yards", value, defaultValue = null, onChange, onEnter, priceOf, size = "desk", autoFocus, required } = props;
  const made = useId();
  const id = props.id ?? made;
  const input = useRef<HTMLInputElement>(null);
  const choices = useRef<HTMLDivElement>(null);
  const limits = { most: props.most, least: props.least };
  const metric = system === "metres";
  const words = useLengthText({
    value,
    start: defaultValue,
    parse: (text) => (metric ? parseMetres(text, limits) : parseYards(text, limits)),
    hand: (read) => (metric ? formatMetres(read) : displayYards(read)),
    onChange,
  });
  const read = words.reading.ok ? words.reading.value : null;
  const fault = words.reading.ok ? null : words.reading.fault;
  const isAsking = words.finished && fault?.code === "ambiguous";
  const said = error ?? (words.finished && fault && !isAsking && (fault.code !== "empty" || required) ? fault.message : null);
  const foot = hint ?? (said || isAsking ? null : <OtherMeasure value={read} system={system} />);
  const wiring = fieldWiring(id, foot, said);

  function onKeyDown(event: KeyboardEvent<HTMLInputElement>) {
    if (event.key === "ArrowUp" || event.key === "ArrowDown") {
      event.preventDefault();
      words.put(stepped(read, event.key === "ArrowUp" ? 1 : -1, system, limits));
    } else if (event.key === "Enter") {
      words.finish();
      if (fault) event.preventDefault();
      if (fault?.code === "ambiguous") requestAnimationFrame(() => choices.current?.querySelector("button")?.focus());
      if (read !== null && onEnter) {
        event.preventDefault();
        onEnter(read);
      }
    }
  }

  function settle(next: Length) {
    words.put(next);
    input.current?.focus();
  }

  return (
    <div className={["field", metric ? "length-metric" : "", size === "counter" ? "length-counter" : ""].filter(Boolean).join(" ")}>
      <label htmlFor={id} className={hideLabel ? "sr" : "field-label"}>
        {label}
        {optional ? <span className="quiet">, if there is one</span> : null}
      </label>
      <div className="length-row">
        <span className="input-box length-box">
          <input
            {...wiring}
            ref={input}
            value={words.text}
            inputMode={metric ? "text" : "decimal"}
            autoComplete="off"
            spellCheck={false}
            required={required}
            // The counter's own screen opens on the length; nothing stands before it that would be skipped.
            autoFocus={autoFocus}
            maxLength={40}
            style={{ width: `${Math.max(metric ? 5 : 3, words.text.length)}ch` }}
            onChange={(event) => words.write(event.target.value)}
            onKeyDown={onKeyDown}
            onFocus={(event) => event.target.select()}
            onBlur={() => words.finish()}
          />
          {metric ? null : <span className="input-box-unit">yd</span>}
          <span className="length-typed" aria-hidden="true">
            {typedWords(words.typed, words.text, read, system)}
          </span>
        </span>
        {isAsking ? null : <LengthKeys system={system} value={read} pick={(part) => words.put(withPart(read, part, system, limits))} />}
      </div>
      {isAsking ? <AmbiguousLength text={words.text} fault={fault} group={choices} settle={settle} again={() => input.current?.focus()} priceOf={priceOf} /> : null}
      <FieldFoot id={id} error={said} hint={foot} />
      {name ? <input type="hidden" name={name} value={read ?? words.text} /> : null}
    </div>
  );
}

/** The same length in the other measures, so that a tape of either kind can be laid beside it. */
function OtherMeasure({ value, system }: { value: Length | null; system: MeasureSystem }) {
  if (value === null) return system === "metres" ? "Metres and centimetres, such as 2 40." : "Yards and eighths, such as 2 3 or 2 3/8.";
  const centimetres = formatCentimetres(Math.round(value / 1600) * 1600);
  if (system === "metres") return `${centimetres} cm`;
  return (
    <>
      <Inches value={value} />, or {centimetres} cm
    </>
  );
}

function typedWords(typed: string | null, text: string, read: Length | null, system: MeasureSystem): string {
  if (typed !== null) return `typed ${typed}`;
  if (read === null) return "";
  const hand = system === "metres" ? formatMetres(read) : displayYards(read);
  return hand === text ? "" : `reads ${hand}`;
}

function kept(units: number, { most, least }: LengthLimits): Length {
  return length(Math.min(Math.max(units, least ?? 1), most ?? Number.MAX_SAFE_INTEGER));
}

function stepped(read: Length | null, direction: 1 | -1, system: MeasureSystem, limits: LengthLimits): Length {
  const step = stepOf(system);
  const from = read ?? 0;
  const mark = direction === 1 ? Math.floor(from / step) + 1 : Math.ceil(from / step) - 1;
  return kept(Math.max(mark, 1) * step, limits);
}

function withPart(read: Length | null, part: number, system: MeasureSystem, limits: LengthLimits): Length {
  const { whole } = system === "metres" ? metreAndPart(read ?? 0) : yardAndPart(read ?? 0);
  return kept(whole + part, limits);
}
