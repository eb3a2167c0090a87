import type { ReactNode } from "react";

/** Words for those who listen; the sheet shows the same thing in another way. */
export function VisuallyHidden({ children }: { children: ReactNode }) {
  return <span className="sr">{children}</span>;
}
