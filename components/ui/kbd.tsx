/** A key, shown on what it does. "Alt+S" is written as two words on one cap. */
export function Kbd({ keys }: { keys: string }) {
  return <kbd>{keys.replaceAll("+", " ")}</kbd>;
}
