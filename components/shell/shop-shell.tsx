import Link from "next/link";
import type { ReactNode } from "react";
import { Logo } from "./logo";
import { ShopNav, type ShopLink } from "./shop-nav";

interface ShopShellProps {
  readonly shop: { readonly name: string; readonly address?: string };
  readonly links: readonly ShopLink[];
  /** Find and basket, at right. */
  readonly right?: ReactNode;
  /** Hours, how to ask. */
  readonly foot?: ReactNode;
  readonly children: ReactNode;
}

/** The storefront: the shop's name leads, quilts hang from the wand, Ellwand signs the foot. */
export function ShopShell({ shop, links, right, foot, children }: ShopShellProps) {
  return (
    <div className="shop">
      <a className="skip" href="#main">
        Skip to the page
      </a>
      <header className="shop-head">
        <ShopNav links={links} />
        <Link href="/" className="shop-name">
          {shop.name}
          {shop.address ? <small>{shop.address}</small> : null}
        </Link>
        <div className="shop-right">{right}</div>
      </header>
      <div className="shop-rail" aria-hidden="true" />
      <main id="main" tabIndex={-1}>
        {children}
      </main>
      <footer className="shop-foot">
        {foot}
        <p>
          Till and kits by <Logo height={22} />
        </p>
      </footer>
    </div>
  );
}
