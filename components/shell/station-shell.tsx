import Link from "next/link";
import type { ReactNode } from "react";
import { ToastProvider } from "@/components/ui/toast";
import { Logo } from "./logo";

/** What a station knows of its line to the shop: how many entries it keeps until they have gone in. */
export type Connection = { readonly state: "connected" | "sending" | "lost"; readonly waiting: number; readonly since?: string };

interface StationShellProps {
  readonly title: ReactNode;
  readonly sub?: ReactNode;
  readonly connection?: Connection;
  /** Links, the clock, a Pause button. */
  readonly right?: ReactNode;
  /** counter 18 px; wall for a screen read from where one stands. */
  readonly size?: "counter" | "wall";
  readonly home?: string;
  readonly children: ReactNode;
}

/** The frame of the counter and the cutting table: one line of head, then the work. */
export function StationShell({ title, sub, connection, right, size = "counter", home = "/staff", children }: StationShellProps) {
  return (
    <ToastProvider>
      <div className={size === "wall" ? "station station-wall" : "station"}>
        <a className="skip" href="#main">
          Skip to the work
        </a>
        <header className="station-head">
          <Link href={home} className="logo-link" aria-label="Ellwand, all rooms">
            <Logo height={size === "wall" ? 28 : 26} />
          </Link>
          <h1>{title}</h1>
          {sub ? <p className="station-sub">{sub}</p> : null}
          <div className="station-right">
            {connection ? <ConnectionWords connection={connection} /> : null}
            {right}
          </div>
        </header>
        <div className="rod" aria-hidden="true" />
        <main id="main" tabIndex={-1}>
          {children}
        </main>
      </div>
    </ToastProvider>
  );
}

function ConnectionWords({ connection }: { connection: Connection }) {
  const lost = connection.state === "lost";
  return (
    <span role="status" className={lost ? "connection-lost" : undefined}>
      {sayConnection(connection)}
    </span>
  );
}

/** What is kept and what waits, in words. */
export function sayConnection({ state, waiting, since }: Connection): string {
  const entries = waiting === 1 ? "1 entry" : `${waiting} entries`;
  if (state === "lost") {
    const when = since ? `No connection since ${since}` : "No connection";
    return waiting === 0 ? `${when}, nothing waits to be sent` : `${when}, ${entries} kept here until it is back`;
  }
  if (state === "sending") return `Connected, sending ${entries}`;
  return waiting === 0 ? "Connected, nothing waits to be sent" : `Connected, ${entries} ${waiting === 1 ? "waits" : "wait"} to be sent`;
}
