import type { ReactNode } from "react";

/** error: what was found and what was wanted; warn: look before you go on; info: good to know; offline: what is kept and what waits. */
export type NoticeKind = "error" | "warn" | "info" | "offline";

interface NoticeProps {
  readonly kind: NoticeKind;
  readonly title?: ReactNode;
  readonly children?: ReactNode;
  /** One way on. */
  readonly action?: ReactNode;
  readonly size?: "desk" | "counter";
}

/** Stays until what it speaks of is settled. An error interrupts those who listen; the others wait their turn. */
export function Notice({ kind, title, children, action, size = "desk" }: NoticeProps) {
  return (
    <div role={kind === "error" ? "alert" : "status"} className={`notice notice-${kind}${size === "counter" ? " notice-counter" : ""}`}>
      {title ? <b>{title}</b> : null}
      {title && children ? " " : null}
      {children}
      {action ? <div className="acts mt-3">{action}</div> : null}
    </div>
  );
}
