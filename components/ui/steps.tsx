interface StepsProps {
  readonly label: string;
  readonly steps: readonly string[];
  /** Index of the step one is at; `steps.length` when all are done. */
  readonly at: number;
}

/** Where one is in a task of a few steps: done steps full, the mark one is at yellow. */
export function Steps({ label, steps, at }: StepsProps) {
  return (
    <ol className="steps" aria-label={label}>
      {steps.map((step, index) => (
        <li key={step} className={index < at ? "done" : undefined} aria-current={index === at ? "step" : undefined}>
          <span>
            {step}
            {index < at ? <span className="sr">, done</span> : null}
          </span>
        </li>
      ))}
    </ol>
  );
}
