import { useId, type ComponentPropsWithRef, type ReactNode } from "react";
import { FieldFoot, fieldWiring } from "./field";
import type { Option } from "./text-input";

type CheckboxProps = Omit<ComponentPropsWithRef<"input">, "type"> & { readonly label: ReactNode; readonly hint?: ReactNode; readonly error?: string | null };

/** The whole label is the target: 36 px at a desk, 44 under a finger. */
export function Checkbox({ label, hint, error, id, className = "", ...rest }: CheckboxProps) {
  const made = useId();
  const wiring = fieldWiring(id ?? made, hint, error);
  return (
    <div className={`field ${className}`.trim()}>
      <label className="tick-label">
        <input {...rest} {...wiring} type="checkbox" className="tick" />
        <span>{label}</span>
      </label>
      <FieldFoot id={wiring.id} hint={hint} error={error} />
    </div>
  );
}

interface RadioRowProps {
  readonly legend: ReactNode;
  readonly name: string;
  readonly options: readonly Option[];
  readonly value?: string;
  readonly defaultValue?: string;
  readonly onChange?: (value: string) => void;
  readonly hint?: ReactNode;
  readonly error?: string | null;
  readonly required?: boolean;
}

export function RadioRow({ legend, name, options, value, defaultValue, onChange, hint, error, required }: RadioRowProps) {
  const wiring = fieldWiring(useId(), hint, error);
  return (
    <fieldset className="field" aria-describedby={wiring["aria-describedby"]}>
      <legend className="field-label">{legend}</legend>
      <div className="tick-row">
        {options.map((option) => (
          <label key={option.value} className="tick-label">
            <input
              type="radio"
              className="tick"
              name={name}
              value={option.value}
              disabled={option.disabled}
              required={required}
              defaultChecked={value === undefined ? option.value === defaultValue : undefined}
              checked={value === undefined ? undefined : option.value === value}
              onChange={onChange ? () => onChange(option.value) : undefined}
              readOnly={value !== undefined && !onChange}
            />
            <span>{option.label}</span>
          </label>
        ))}
      </div>
      <FieldFoot id={wiring.id} hint={hint} error={error} />
    </fieldset>
  );
}
