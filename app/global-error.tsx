"use client";

import "./globals.css";

interface GlobalErrorProps {
  readonly error: Error & { digest?: string };
  readonly reset: () => void;
}

/** The last page: it stands when even the frame could not be made, so it leans on nothing else. */
export default function GlobalError({ error, reset }: GlobalErrorProps) {
  return (
    <html lang="en">
      <body>
        <title>Ellwand could not start this page</title>
        <div className="rod" aria-hidden="true" />
        <main className="page-head">
          <div>
            <h1>Ellwand could not start this page</h1>
            <p className="page-head-sub">The fault is on our side. What was already recorded is safe.{error.digest ? ` It is in the log under ${error.digest}.` : ""}</p>
            <button type="button" className="btn mt-4" onClick={reset}>
              Try again
            </button>
          </div>
        </main>
      </body>
    </html>
  );
}
