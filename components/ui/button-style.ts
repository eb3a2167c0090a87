/**
 * fill: the one act of the view; plain: an ordinary act; draft: can be unpicked; text: a way back; refuse: flaw, short,
 * or what cannot be undone.
 */
export type ButtonVariant = "fill" | "plain" | "draft" | "text" | "refuse";
/** sm 30 px, desk 38, counter 56, wall 78. */
export type ButtonSize = "sm" | "desk" | "counter" | "wall";

export function buttonClass(variant: ButtonVariant = "plain", size: ButtonSize = "desk", more = ""): string {
  return ["btn", variant === "plain" ? "" : `btn-${variant}`, size === "desk" ? "" : `btn-${size}`, more].filter(Boolean).join(" ");
}

/** "Alt S" as aria-keyshortcuts wants it: "Alt+S". */
export function shortcutName(keys: string): string {
  return keys.trim().replaceAll(/\s+/g, "+");
}
