"use client";

import Link from "next/link";
import { usePathname } from "next/navigation";
import { useEffect, useRef } from "react";
import { currentSection, type Section } from "./sections";

/** The rooms as a row; on a narrow sheet it scrolls, and the room one is in is brought into view. */
export function SectionNav({ sections }: { sections: readonly Section[] }) {
  const path = usePathname();
  const current = currentSection(path, sections);
  const list = useRef<HTMLUListElement>(null);
  useEffect(() => {
    const here = list.current?.querySelector<HTMLElement>("[aria-current]");
    const row = list.current?.parentElement;
    if (here && row) row.scrollLeft = here.offsetLeft - (row.clientWidth - here.offsetWidth) / 2;
  }, [path]);
  return (
    <nav className="sections" aria-label="Sections">
      <ul ref={list}>
        {sections.map((section) => (
          <li key={section.href}>
            <Link href={section.href} aria-current={section === current ? (path === section.href ? "page" : "true") : undefined}>
              {section.label}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
