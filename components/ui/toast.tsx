"use client";

import { createContext, useCallback, useContext, useEffect, useMemo, useRef, useState, type ReactNode } from "react";

export interface ToastWords {
  /** What happened. */
  readonly said: ReactNode;
  /** One way back, such as "Give it back"; with it the toast stays until it is answered or closed. */
  readonly undo?: { readonly label: string; readonly act: () => void };
}

interface Shown extends ToastWords {
  readonly id: number;
}

type Tell = (words: ToastWords) => void;

const Telling = createContext<Tell | null>(null);
/** Long enough to read two lines twice. */
const READING_MS = 8_000;

/** Holds the toasts of a shell. At most three lie over the sheet; the oldest gives way. */
export function ToastProvider({ children }: { children: ReactNode }) {
  const [shown, setShown] = useState<readonly Shown[]>([]);
  const next = useRef(0);
  const close = useCallback((id: number) => setShown((all) => all.filter((toast) => toast.id !== id)), []);
  const tell = useCallback<Tell>((words) => {
    next.current += 1;
    const toast = { ...words, id: next.current };
    setShown((all) => [...all, toast].slice(-3));
  }, []);
  const value = useMemo(() => tell, [tell]);
  return (
    <Telling.Provider value={value}>
      {children}
      <div className="toasts" role="status" aria-live="polite">
        {shown.map((toast) => (
          <ToastSlip key={toast.id} toast={toast} close={close} />
        ))}
      </div>
    </Telling.Provider>
  );
}

function ToastSlip({ toast, close }: { toast: Shown; close: (id: number) => void }) {
  const { id, said, undo } = toast;
  const [held, setHeld] = useState(false);
  const stays = undo !== undefined || held;
  useEffect(() => {
    if (stays) return;
    const timer = setTimeout(() => close(id), READING_MS);
    return () => clearTimeout(timer);
  }, [close, id, stays]);
  return (
    <div className="toast" onPointerEnter={() => setHeld(true)} onPointerLeave={() => setHeld(false)} onFocus={() => setHeld(true)} onBlur={() => setHeld(false)}>
      <span>{said}</span>
      <span className="toast-acts">
        {undo ? (
          <button
            type="button"
            onClick={() => {
              undo.act();
              close(id);
            }}
          >
            {undo.label}
          </button>
        ) : null}
        <button type="button" className="toast-close" aria-label="Close this note" onClick={() => close(id)}>
          <span aria-hidden="true">×</span>
        </button>
      </span>
    </div>
  );
}

/** Says what happened. Only under a shell, which holds the toasts. */
export function useToast(): Tell {
  const tell = useContext(Telling);
  if (!tell) throw new Error("useToast is used outside a ToastProvider");
  return tell;
}
