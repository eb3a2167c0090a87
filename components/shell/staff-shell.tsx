import Link from "next/link";
import type { ReactNode } from "react";
import { ToastProvider } from "@/components/ui/toast";
import type { RoleName } from "@/lib/core/policy/policy";
import { FindField } from "./find-field";
import { Logo } from "./logo";
import { PersonSlip } from "./person-slip";
import { SectionNav } from "./section-nav";
import { OFFICE_SECTIONS, SECTIONS, sectionsFor, type Section } from "./sections";

interface StaffShellProps {
  readonly person: { readonly name: string; readonly roles: readonly RoleName[] };
  /** What a person is called at right, such as "Owner"; the first role unless said otherwise. */
  readonly role?: string;
  readonly sections?: readonly Section[];
  /** Today brings its own rod, so the head ends in a hairline. */
  readonly rod?: "rod" | "none";
  /** A form with a submit button that ends the session. */
  readonly signOut: ReactNode;
  readonly children: ReactNode;
}

/** The frame of the back office: name, rooms, find, person, and the rod under it. */
export function StaffShell({ person, role, sections = SECTIONS, rod = "rod", signOut, children }: StaffShellProps) {
  const first = person.roles[0];
  return (
    <ToastProvider>
      <a className="skip" href="#main">
        Skip to the sheet
      </a>
      <header className={rod === "none" ? "staff-head staff-head-day" : "staff-head"}>
        <Link href="/staff" className="logo-link" aria-label="Ellwand, today">
          <Logo />
        </Link>
        <SectionNav sections={sectionsFor(person, sections)} />
        <FindField />
        <PersonSlip name={person.name} role={role ?? (first ? sayRole(first) : "")} links={sectionsFor(person, OFFICE_SECTIONS)} signOut={signOut} />
      </header>
      {rod === "none" ? null : <div className="rod" aria-hidden="true" />}
      <main id="main" tabIndex={-1}>
        {children}
      </main>
    </ToastProvider>
  );
}

export function sayRole(role: RoleName): string {
  return role.charAt(0).toUpperCase() + role.slice(1);
}
