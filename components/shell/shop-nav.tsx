"use client";

import Link from "next/link";
import { usePathname } from "next/navigation";

export interface ShopLink {
  readonly href: string;
  readonly label: string;
}

export function ShopNav({ links }: { links: readonly ShopLink[] }) {
  const path = usePathname();
  return (
    <nav className="shop-nav" aria-label="Shop">
      {links.map((link) => (
        <Link key={link.href} href={link.href} aria-current={isWithin(path, link.href) ? (path === link.href ? "page" : "true") : undefined}>
          {link.label}
        </Link>
      ))}
    </nav>
  );
}

function isWithin(path: string, href: string): boolean {
  return path === href || (href !== "/" && path.startsWith(`${href}/`));
}
