import type { ReactNode } from "react";

interface PageHeadProps {
  readonly title: ReactNode;
  readonly sub?: ReactNode;
  /** Buttons; the filled one last. */
  readonly actions?: ReactNode;
  /** A BackLink, above the title. */
  readonly back?: ReactNode;
}

export function PageHead({ title, sub, actions, back }: PageHeadProps) {
  return (
    <div className="page-head">
      <div>
        {back}
        <h1>{title}</h1>
        {sub ? <p className="page-head-sub">{sub}</p> : null}
      </div>
      {actions ? <div className="acts">{actions}</div> : null}
    </div>
  );
}
