import type { KeyboardEvent, ReactNode, RefObject } from "react";
import { length, type Length } from "@/lib/core/measure/length";
import type { Fault } from "@/lib/core/result";
import { Button } from "./button";
import { Yards } from "./figures";
import { Kbd } from "./kbd";

interface AmbiguousLengthProps {
  readonly text: string;
  readonly fault: Fault | null;
  readonly group: RefObject<HTMLDivElement | null>;
  readonly settle: (value: Length) => void;
  readonly again: () => void;
  readonly priceOf?: (value: Length) => ReactNode;
}

/** A point can be read two ways: nothing is entered until one is chosen, by its number, and none is filled in advance. */
export function AmbiguousLength({ text, fault, group, settle, again, priceOf }: AmbiguousLengthProps) {
  const readings = readingsOf(fault);

  function onKeyDown(event: KeyboardEvent) {
    const chosen = readings[Number(event.key) - 1];
    if (event.key === "Escape") again();
    else if (chosen !== undefined) settle(chosen);
    else return;
    event.preventDefault();
    event.stopPropagation();
  }

  return (
    <div className="length-ask" ref={group} role="group" aria-label={`${text} can be read more than one way`} onKeyDown={onKeyDown}>
      <p role="alert">
        <b>{readings.length > 1 ? `${text} can be read two ways.` : `${text} has a point in it.`}</b> Nothing is entered. A point is never taken for eighths: write 2 5 or 2 5/8 for eighths, 2 1/2 for a half.
      </p>
      <div className="acts">
        {readings.map((reading, index) => (
          <Button key={reading} onClick={() => settle(reading)}>
            <span>
              <Yards value={reading} />
              {priceOf ? <>, {priceOf(reading)}</> : null}
            </span>
            <Kbd keys={String(index + 1)} />
          </Button>
        ))}
        <Button variant="text" onClick={again}>
          Write it again
          <Kbd keys="Esc" />
        </Button>
      </div>
    </div>
  );
}

function readingsOf(fault: Fault | null): readonly Length[] {
  const readings: unknown = fault?.facts?.readings;
  if (!Array.isArray(readings)) return [];
  return readings.filter((units): units is number => Number.isSafeInteger(units) && units > 0).map(length);
}
