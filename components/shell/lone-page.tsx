import Link from "next/link";
import type { ReactNode } from "react";
import { Logo } from "./logo";

interface LonePageProps {
  readonly title: ReactNode;
  readonly sub?: ReactNode;
  readonly children?: ReactNode;
}

/** A page outside every room: signing in, an address that leads nowhere, an error. */
export function LonePage({ title, sub, children }: LonePageProps) {
  return (
    <>
      <header className="station-head">
        <Link href="/" className="logo-link" aria-label="Ellwand">
          <Logo />
        </Link>
      </header>
      <div className="rod" aria-hidden="true" />
      <main id="main" tabIndex={-1}>
        <div className="page-head">
          <div>
            <h1>{title}</h1>
            {sub ? <p className="page-head-sub">{sub}</p> : null}
          </div>
        </div>
        <div className="page-body">
          <div className="acts">{children}</div>
        </div>
      </main>
    </>
  );
}
