"use client";

import { useEffect, useRef } from "react";
import { Kbd } from "@/components/ui/kbd";

interface FindFieldProps {
  readonly action?: string;
  readonly placeholder?: string;
}

/** Finds by name or by a scanned tag. "/" brings one here from anywhere but a field being written in. */
export function FindField({ action = "/staff/find", placeholder = "Find or scan" }: FindFieldProps) {
  const input = useRef<HTMLInputElement>(null);
  useEffect(() => {
    function onKey(event: KeyboardEvent) {
      if (event.key !== "/" || event.ctrlKey || event.metaKey || event.altKey || isWriting(event.target)) return;
      event.preventDefault();
      input.current?.focus();
      input.current?.select();
    }
    document.addEventListener("keydown", onKey);
    return () => document.removeEventListener("keydown", onKey);
  }, []);
  return (
    <form className="find" role="search" action={action} method="get">
      <svg className="icon" viewBox="0 0 16 16" aria-hidden="true">
        <circle cx="6.6" cy="6.6" r="4.4" />
        <path d="M10 10l4.5 4.5" />
      </svg>
      <input ref={input} name="q" type="search" aria-label={placeholder} aria-keyshortcuts="/" placeholder={placeholder} autoComplete="off" maxLength={120} />
      <Kbd keys="/" />
    </form>
  );
}

/** A key pressed in a field belongs to the field. */
export function isWriting(target: EventTarget | null): boolean {
  if (!(target instanceof HTMLElement)) return false;
  if (target.isContentEditable) return true;
  if (target instanceof HTMLInputElement) return !["checkbox", "radio", "button", "submit", "range"].includes(target.type);
  return target instanceof HTMLTextAreaElement || target instanceof HTMLSelectElement;
}
