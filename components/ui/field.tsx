import type { ReactNode } from "react";

/** The ids by which a control names its hint and its error. */
export interface FieldWiring {
  readonly id: string;
  readonly "aria-describedby": string | undefined;
  readonly "aria-invalid": true | undefined;
  readonly required?: boolean;
}

export interface FieldWords {
  readonly label: ReactNode;
  readonly hint?: ReactNode;
  /** What was found and what was wanted; it stays until the field is right. */
  readonly error?: string | null;
  /** Say so where a form has both kinds. */
  readonly optional?: boolean;
  readonly hideLabel?: boolean;
}

interface FieldProps extends FieldWords {
  readonly id: string;
  readonly className?: string;
  readonly children: (wiring: FieldWiring) => ReactNode;
}

/** The label above, the hint and the error below, and the wires between them. */
export function Field({ id, label, hint, error, optional = false, hideLabel = false, className = "", children }: FieldProps) {
  const wiring = fieldWiring(id, hint, error);
  return (
    <div className={`field ${className}`.trim()}>
      <label htmlFor={id} className={hideLabel ? "sr" : "field-label"}>
        {label}
        {optional ? <span className="quiet">, if there is one</span> : null}
      </label>
      {children(wiring)}
      <FieldFoot id={id} hint={hint} error={error} />
    </div>
  );
}

export function fieldWiring(id: string, hint: ReactNode, error: string | null | undefined): FieldWiring {
  const describedBy = [error ? `${id}-error` : "", hint ? `${id}-hint` : ""].filter(Boolean).join(" ");
  return { id, "aria-describedby": describedBy || undefined, "aria-invalid": error ? true : undefined };
}

export function FieldFoot({ id, hint, error }: { id: string; hint?: ReactNode; error?: string | null }) {
  return (
    <>
      {error ? (
        <p className="field-error" id={`${id}-error`} role="alert">
          {error}
        </p>
      ) : null}
      {hint ? (
        <p className="field-hint" id={`${id}-hint`}>
          {hint}
        </p>
      ) : null}
    </>
  );
}
