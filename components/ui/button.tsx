import type { ComponentPropsWithRef, ReactNode } from "react";
import { buttonClass, shortcutName, type ButtonSize, type ButtonVariant } from "./button-style";
import { Kbd } from "./kbd";

export interface ButtonProps extends ComponentPropsWithRef<"button"> {
  readonly variant?: ButtonVariant;
  readonly size?: ButtonSize;
  /** The key that does the same, such as "Alt S"; the caller listens for it. */
  readonly keys?: string;
  /** Work is under way: the button keeps its place and its focus, says so, and does nothing a second time. */
  readonly pending?: boolean;
  /** What the button says meanwhile, such as "Reserving". */
  readonly pendingLabel?: ReactNode;
}

/** Verb and noun. It is of type "button" unless told otherwise, so that no form is sent by accident. */
export function Button({ variant, size, keys, pending = false, pendingLabel, className, type = "button", children, onClick, ...rest }: ButtonProps) {
  return (
    <button
      {...rest}
      type={pending ? "button" : type}
      className={buttonClass(variant, size, className)}
      aria-disabled={pending || undefined}
      aria-keyshortcuts={keys ? shortcutName(keys) : undefined}
      onClick={pending ? undefined : onClick}
    >
      {pending ? (pendingLabel ?? children) : children}
      {keys && !pending ? <Kbd keys={keys} /> : null}
    </button>
  );
}
