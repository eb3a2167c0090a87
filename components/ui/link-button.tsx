import Link from "next/link";
import type { ComponentProps } from "react";
import { buttonClass, shortcutName, type ButtonSize, type ButtonVariant } from "./button-style";
import { Kbd } from "./kbd";

interface LinkButtonProps extends ComponentProps<typeof Link> {
  readonly variant?: ButtonVariant;
  readonly size?: ButtonSize;
  readonly keys?: string;
}

/** Goes somewhere and looks like an act; it stays a link, so that it opens in a new tab. */
export function LinkButton({ variant, size, keys, className, children, ...rest }: LinkButtonProps) {
  return (
    <Link {...rest} className={buttonClass(variant, size, className)} aria-keyshortcuts={keys ? shortcutName(keys) : undefined}>
      {children}
      {keys ? <Kbd keys={keys} /> : null}
    </Link>
  );
}
