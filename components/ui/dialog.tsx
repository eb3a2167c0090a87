"use client";

import { useEffect, useId, useRef, type ReactNode } from "react";
import { Button } from "./button";
import type { ButtonVariant } from "./button-style";

interface DialogProps {
  readonly open: boolean;
  /** A question: "Send order P-0387?" */
  readonly title: ReactNode;
  /** What will be done and that it cannot be undone. */
  readonly children: ReactNode;
  /** The safe choice; it has the focus, and Esc is the same. */
  readonly safeLabel: string;
  readonly onSafe: () => void;
  readonly actLabel: string;
  readonly onAct: () => void;
  /** refuse for what breaks or throws away. */
  readonly actVariant?: Extract<ButtonVariant, "fill" | "refuse">;
  readonly pending?: boolean;
  readonly size?: "desk" | "counter";
  readonly wide?: boolean;
}

/** Only before what cannot be undone. The browser's own dialog keeps the focus inside and gives it back to the opener. */
export function Dialog({ open, title, children, safeLabel, onSafe, actLabel, onAct, actVariant = "fill", pending = false, size = "desk", wide = false }: DialogProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  const safe = useRef<HTMLButtonElement>(null);
  const opener = useRef<HTMLElement | null>(null);
  const titleId = useId();
  const wordsId = useId();

  useEffect(() => {
    const element = dialog.current;
    if (!element) return;
    if (open && !element.open) {
      opener.current = document.activeElement instanceof HTMLElement ? document.activeElement : null;
      element.showModal();
      safe.current?.focus();
    } else if (!open && element.open) {
      element.close();
      opener.current?.focus();
    }
  }, [open]);

  return (
    <dialog
      ref={dialog}
      className={wide ? "dialog dialog-wide" : "dialog"}
      aria-labelledby={titleId}
      aria-describedby={wordsId}
      onCancel={(event) => {
        event.preventDefault();
        if (!pending) onSafe();
      }}
    >
      <h2 id={titleId}>{title}</h2>
      <div id={wordsId} className="dialog-words">
        {children}
      </div>
      <div className="acts">
        <Button ref={safe} size={size} onClick={pending ? undefined : onSafe} aria-disabled={pending || undefined}>
          {safeLabel}
        </Button>
        <Button variant={actVariant} size={size} pending={pending} onClick={onAct}>
          {actLabel}
        </Button>
      </div>
    </dialog>
  );
}
