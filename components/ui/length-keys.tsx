import type { CSSProperties } from "react";
import type { MeasureSystem } from "@/lib/core/measure/format";
import type { Length } from "@/lib/core/measure/length";
import { keysOf, metreAndPart, yardAndPart } from "./length-steps";

interface LengthKeysProps {
  readonly system: MeasureSystem;
  readonly value: Length | null;
  readonly pick: (part: number) => void;
}

/** The parts of a yard or a metre as keys of a rule; the one that is measured is yellow. */
export function LengthKeys({ system, value, pick }: LengthKeysProps) {
  const keys = keysOf(system);
  const part = value === null ? null : (system === "metres" ? metreAndPart(value) : yardAndPart(value)).part;
  return (
    <div className="length-keys" role="group" aria-label={system === "metres" ? "Centimetres" : "Eighths"} style={{ "--keys": keys.length } as CSSProperties}>
      {keys.map((key) => (
        <button key={key.part} type="button" aria-pressed={key.part === part} style={{ "--tick": `${key.tick}px` } as CSSProperties} onClick={() => pick(key.part)}>
          <span aria-hidden="true">{key.label}</span>
          <span className="sr">{key.said}</span>
        </button>
      ))}
    </div>
  );
}
