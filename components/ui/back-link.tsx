import Link from "next/link";
import type { ReactNode } from "react";

/** Back to the list one came from. */
export function BackLink({ href, children }: { href: string; children: ReactNode }) {
  return (
    <Link href={href} className="back">
      <span aria-hidden="true">←</span>
      <span className="back-word">{children}</span>
    </Link>
  );
}
