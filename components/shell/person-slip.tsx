"use client";

import Link from "next/link";
import { usePathname } from "next/navigation";
import { useEffect, useRef, type ReactNode } from "react";
import type { Section } from "./sections";

interface PersonSlipProps {
  readonly name: string;
  readonly role: string;
  readonly links: readonly Section[];
  /** The sign-out form, made by the page so that it is sent through the page's own door. */
  readonly signOut: ReactNode;
}

/** Who is here; under the name lie the office's own rooms and the way out. Esc folds it and returns to the name. */
export function PersonSlip({ name, role, links, signOut }: PersonSlipProps) {
  const details = useRef<HTMLDetailsElement>(null);
  const path = usePathname();
  useEffect(() => {
    if (details.current) details.current.open = false;
  }, [path]);
  useEffect(() => {
    function onPointer(event: PointerEvent) {
      if (details.current?.open && event.target instanceof Node && !details.current.contains(event.target)) details.current.open = false;
    }
    document.addEventListener("pointerdown", onPointer);
    return () => document.removeEventListener("pointerdown", onPointer);
  }, []);
  return (
    <details
      ref={details}
      className="person"
      onKeyDown={(event) => {
        if (event.key !== "Escape" || !details.current?.open) return;
        details.current.open = false;
        details.current.querySelector("summary")?.focus();
      }}
      onBlur={(event) => {
        if (event.relatedTarget instanceof Node && !event.currentTarget.contains(event.relatedTarget)) event.currentTarget.open = false;
      }}
    >
      <summary>
        <b>{name}</b>
        <span>{role}</span>
      </summary>
      <div className="person-slip">
        {links.map((link) => (
          <Link key={link.href} href={link.href} aria-current={path === link.href ? "page" : undefined}>
            {link.label}
          </Link>
        ))}
        {signOut}
      </div>
    </details>
  );
}
