"use client";

import Link from "next/link";
import { useId, useRef, type KeyboardEvent, type ReactNode } from "react";

export interface TabLink {
  readonly href: string;
  readonly label: ReactNode;
  readonly current: boolean;
}

/** Faces of one thing, each with an address of its own. */
export function LinkTabs({ label, tabs }: { label: string; tabs: readonly TabLink[] }) {
  return (
    <nav className="tabs" aria-label={label}>
      {tabs.map((tab) => (
        <Link key={tab.href} href={tab.href} aria-current={tab.current ? "page" : undefined} scroll={false}>
          {tab.label}
        </Link>
      ))}
    </nav>
  );
}

export interface Tab {
  readonly id: string;
  readonly label: ReactNode;
  readonly panel: ReactNode;
}

interface TabsProps {
  readonly label: string;
  readonly tabs: readonly Tab[];
  readonly chosen: string;
  readonly onChoose: (id: string) => void;
}

/** Faces on one sheet. Arrows choose, Home and End go to the ends, Tab goes on into the panel. */
export function Tabs({ label, tabs, chosen, onChoose }: TabsProps) {
  const base = useId();
  const list = useRef<HTMLDivElement>(null);
  const at = Math.max(0, tabs.findIndex((tab) => tab.id === chosen));
  const current = tabs[at];

  function onKeyDown(event: KeyboardEvent) {
    const next = { ArrowRight: (at + 1) % tabs.length, ArrowLeft: (at - 1 + tabs.length) % tabs.length, Home: 0, End: tabs.length - 1 }[event.key];
    const tab = next === undefined ? undefined : tabs[next];
    if (next === undefined || !tab) return;
    event.preventDefault();
    onChoose(tab.id);
    list.current?.querySelectorAll<HTMLElement>("[role=tab]")[next]?.focus();
  }

  return (
    <>
      <div ref={list} className="tabs" role="tablist" aria-label={label} onKeyDown={onKeyDown}>
        {tabs.map((tab, index) => (
          <button
            key={tab.id}
            type="button"
            role="tab"
            id={`${base}-${tab.id}`}
            aria-selected={index === at}
            aria-controls={index === at ? `${base}-panel` : undefined}
            tabIndex={index === at ? 0 : -1}
            onClick={() => onChoose(tab.id)}
          >
            {tab.label}
          </button>
        ))}
      </div>
      <div role="tabpanel" id={`${base}-panel`} aria-labelledby={current ? `${base}-${current.id}` : undefined} tabIndex={0}>
        {current?.panel}
      </div>
    </>
  );
}
