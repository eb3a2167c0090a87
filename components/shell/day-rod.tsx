import Link from "next/link";
import type { CSSProperties, ReactNode } from "react";
import { placeLies, placeTasks, share, type DayHours, type Minute } from "./day-places";

/** Work that takes a stretch of the day; it lies on the rod. */
export interface DayLie {
  readonly id: string;
  readonly from: Minute;
  readonly to: Minute;
  readonly title: string;
  readonly who: string;
  readonly href?: string;
  /** Waiting for something, so dashed. */
  readonly waits?: boolean;
}

/** Work that falls due at an hour; it hangs from the rod. */
export interface DayTask {
  readonly id: string;
  readonly at: Minute;
  /** "by noon", "10.30, still open". */
  readonly when: string;
  readonly title: ReactNode;
  readonly words?: ReactNode;
  readonly act?: ReactNode;
}

interface DayRodProps {
  readonly hours: DayHours;
  /** Minutes past midnight in the shop's own time; null on another day. */
  readonly now: Minute | null;
  readonly lies: readonly DayLie[];
  readonly tasks: readonly DayTask[];
}

/** The day drawn as a rod with its hours. Below 1100 px it is a list in order of the clock. */
export function DayRod({ hours, now, lies, tasks }: DayRodProps) {
  const laid = placeLies(lies);
  const rows = Math.max(0, ...laid.map((lie) => lie.row + 1));
  return (
    <div className="day">
      <section aria-label="Work that takes a stretch of the day" className="day-lies" style={{ height: rows * 55 }}>
        {laid.map(({ lie, row }) => (
          <Lie key={lie.id} lie={lie} style={{ left: share(lie.from, hours), width: `calc(${share(lie.to, hours)} - ${share(lie.from, hours)})`, bottom: row * 55 }} />
        ))}
      </section>
      <Rod hours={hours} now={now} />
      <Sheet hours={hours} now={now} tasks={tasks} />
    </div>
  );
}

function Lie({ lie, style }: { lie: DayLie; style: CSSProperties }) {
  const className = lie.waits ? "day-lie day-lie-wait" : "day-lie";
  const words = (
    <>
      <b>{lie.title}</b>
      <span>{lie.who}</span>
      <span className="sr">
        , {sayClock(lie.from)} to {sayClock(lie.to)}
      </span>
    </>
  );
  return lie.href ? (
    <Link href={lie.href} className={className} style={style}>
      {words}
    </Link>
  ) : (
    <div className={className} style={style}>
      {words}
    </div>
  );
}

function Rod({ hours, now }: { hours: DayHours; now: Minute | null }) {
  const quarters = Math.floor((hours.to - hours.from) / 15);
  const minutes = Array.from({ length: quarters + 1 }, (_, index) => hours.from + index * 15);
  const said = `The day from ${sayClock(hours.from)} to ${sayClock(hours.to)}.${now === null ? "" : ` It is ${sayClock(now)}.`}`;
  return (
    <div className="day-rod" role="img" aria-label={said}>
      {minutes.map((minute) => (
        <span key={minute} className="day-tick" style={{ left: share(minute, hours), height: minute % 60 === 0 ? 34 : minute % 30 === 0 ? 14 : 8 }} />
      ))}
      {minutes
        .filter((minute) => minute % 60 === 0 && minute < hours.to)
        .map((minute) => (
          <span key={minute} className="day-hour" style={{ left: share(minute, hours) }}>
            {minute === 720 ? "noon" : ((minute / 60 + 11) % 12) + 1}
          </span>
        ))}
      {now === null || now < hours.from || now > hours.to ? null : (
        <span className="day-now num" style={{ left: share(now, hours) }}>
          {sayClock(now)}
        </span>
      )}
    </div>
  );
}

function Sheet({ hours, now, tasks }: { hours: DayHours; now: Minute | null; tasks: readonly DayTask[] }) {
  const slots = Math.max(1, Math.round((hours.to - hours.from) / 15));
  const placed = placeTasks(tasks, hours);
  return (
    <section aria-label="What falls due today" className="day-sheet" style={{ "--slots": slots } as CSSProperties}>
      {now === null || now < hours.from || now > hours.to ? null : <div className="day-now-line" aria-hidden="true" style={{ left: share(now, hours) }} />}
      {placed
        .filter(({ row }) => row > 0)
        .map(({ task }) => (
          <span key={task.id} className="day-stub" aria-hidden="true" style={{ left: share(task.at, hours) }} />
        ))}
      {placed.map(({ task, row, column, span, leftward }) => (
        <article key={task.id} className={leftward ? "day-task day-task-left" : "day-task"} style={{ gridRow: row + 1, gridColumn: `${column + 1} / span ${span}` }}>
          <h2>
            <time>{task.when}</time>
            {task.title}
          </h2>
          {task.words ? <p>{task.words}</p> : null}
          {task.act}
        </article>
      ))}
    </section>
  );
}

/** "11.48", as a shop writes the clock; twelve hours. */
export function sayClock(minute: Minute): string {
  const hour = ((Math.floor(minute / 60) + 11) % 12) + 1;
  return `${hour}.${String(minute % 60).padStart(2, "0")}`;
}
