import type { ReactNode } from "react";
import type { MeasureSystem } from "@/lib/core/measure/format";
import { length } from "@/lib/core/measure/length";
import { Button } from "./button";
import { totalsOf, type DataRow } from "./data-rows";
import { ClothLength } from "./figures";

interface PickedBarProps {
  readonly rows: readonly DataRow[];
  readonly noun: string;
  readonly names: string;
  readonly system: MeasureSystem;
  readonly acts: ReactNode;
  readonly letGo: () => void;
}

/** Names what was picked and totals it; the acts upon it stand at the right. */
export function PickedBar({ rows, noun, names, system, acts, letGo }: PickedBarProps) {
  const totals = totalsOf(rows);
  return (
    <section className="picked" aria-label={`Picked ${noun}`}>
      <span role="status">
        <b>
          {rows.length} {noun} picked,
        </b>{" "}
        {names}
        {totals.map(({ label, units }, index) => (
          <span key={label}>
            {index === 0 ? ": " : ", "}
            <ClothLength value={length(units)} system={system} /> {label}
          </span>
        ))}
      </span>
      <div className="acts">
        {acts}
        <Button variant="text" onClick={letGo}>
          Let go
        </Button>
      </div>
    </section>
  );
}
