import { useId, type ComponentPropsWithRef } from "react";
import { Field, type FieldWords } from "./field";

type TextInputProps = FieldWords & Omit<ComponentPropsWithRef<"input">, "size"> & { readonly size?: "desk" | "counter" };

export function TextInput({ label, hint, error, optional, hideLabel, id, className, size = "desk", ...rest }: TextInputProps) {
  const made = useId();
  return (
    <Field id={id ?? made} label={label} hint={hint} error={error} optional={optional} hideLabel={hideLabel} className={className}>
      {(wiring) => <input type="text" {...rest} {...wiring} required={rest.required} className={size === "counter" ? "input input-counter" : "input"} />}
    </Field>
  );
}

type TextAreaProps = FieldWords & ComponentPropsWithRef<"textarea">;

export function TextArea({ label, hint, error, optional, hideLabel, id, className, ...rest }: TextAreaProps) {
  const made = useId();
  return (
    <Field id={id ?? made} label={label} hint={hint} error={error} optional={optional} hideLabel={hideLabel} className={className}>
      {(wiring) => <textarea {...rest} {...wiring} required={rest.required} className="input" />}
    </Field>
  );
}

export interface Option {
  readonly value: string;
  readonly label: string;
  readonly disabled?: boolean;
}

type SelectProps = FieldWords & ComponentPropsWithRef<"select"> & { readonly options: readonly Option[] };

export function Select({ label, hint, error, optional, hideLabel, id, className, options, ...rest }: SelectProps) {
  const made = useId();
  return (
    <Field id={id ?? made} label={label} hint={hint} error={error} optional={optional} hideLabel={hideLabel} className={className}>
      {(wiring) => (
        <select {...rest} {...wiring} required={rest.required} className="input">
          {options.map((option) => (
            <option key={option.value} value={option.value} disabled={option.disabled}>
              {option.label}
            </option>
          ))}
        </select>
      )}
    </Field>
  );
}
