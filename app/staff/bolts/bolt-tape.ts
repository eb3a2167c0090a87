import type { TapeProps } from "@/components/diagrams/tape-props";
import type { MeasureSystem } from "@/lib/core/measure/format";
import type { Length } from "@/lib/core/measure/length";
import type { BoltView } from "@/lib/data/bolt-view";

/** A bolt as its tape is drawn: from the core, what is held at the cut edge. */
export function boltTape(bolt: BoltView, system: MeasureSystem): Omit<TapeProps, "width" | "max"> {
  const heldFrom = Math.max(0, bolt.left - bolt.reserved) as Length;
  return {
    name: bolt.fabric.name,
    putUp: bolt.putUp as Length,
    left: bolt.left as Length,
    reserved: bolt.reserved > 0 ? [{ from: heldFrom, to: bolt.left as Length, label: "" }] : [],
    flaws: bolt.flaws.map((flaw) => ({ from: Math.min(flaw.coreFrom, flaw.coreTo) as Length, to: Math.max(flaw.coreFrom, flaw.coreTo) as Length })),
    system,
    cloth: { id: bolt.fabric.slug, tile: bolt.fabric.tile, colour: bolt.fabric.colour },
  };
}
