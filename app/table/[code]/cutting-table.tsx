"use client";

import { useRouter } from "next/navigation";
import { useMemo, useState, type FormEvent } from "react";
import { StationShell } from "@/components/shell/station-shell";
import { Button } from "@/components/ui/button";
import { ClothLength } from "@/components/ui/figures";
import { Notice } from "@/components/ui/notice";
import { SubmitButton } from "@/components/ui/submit-button";
import { TextInput } from "@/components/ui/text-input";
import type { MeasureSystem } from "@/lib/core/measure/format";
import type { RunView } from "@/lib/data/runs/runs";
import { useOutgoing } from "./use-outgoing";

interface CuttingTableProps {
  readonly run: RunView;
  readonly person: { readonly id: number; readonly name: string; readonly place: string };
  readonly system: MeasureSystem;
}

/** One number, one bolt, one big act. What is cut is kept on the tablet first and sent when the network is there. */
export function CuttingTable({ run, person, system }: CuttingTableProps) {
  const router = useRouter();
  // Taken by the server, but perhaps not yet in the run as this page last fetched it.
  const [sent, setSent] = useState<ReadonlySet<number>>(new Set());
  const { queue, state } = useOutgoing(person.id, (entry) => {
    setSent((before) => new Set(before).add(Number(entry.body.runLengthId)));
    router.refresh();
  });
  const [tag, setTag] = useState<string | null>(null);
  const [said, setSaid] = useState<string | null>(null);

  const waiting = useMemo(() => new Set([...sent, ...state.entries.filter((entry) => entry.state === "waiting").map((entry) => Number(entry.body.runLengthId))]), [state.entries, sent]);
  const left = run.runLengths.filter((each) => each.state === "to-cut" && !waiting.has(each.id));
  const next = left[0] ?? null;
  const inHand = tag !== null && next?.boltTag === tag;
  const done = run.runLengths.filter((each) => each.state === "cut" || waiting.has(each.id)).length;

  function scan(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const scanned = String(new FormData(event.currentTarget).get("tag") ?? "").trim().toUpperCase();
    event.currentTarget.reset();
    if (!next || scanned === "") return;
    if (scanned === next.boltTag) {
      setTag(scanned);
      setSaid(null);
      return;
    }
    const other = run.runLengths.find((each) => each.boltTag === scanned);
    setTag(null);
    setSaid(
      other
        ? `Found ${other.fabric}, lot ${other.lot}. Wanted ${next.fabric}, lot ${next.lot}, shelf ${next.shelf}.`
        : `That tag is not on this run. Wanted ${next.fabric}, tag ${next.boltTag}, shelf ${next.shelf}.`,
    );
  }

  async function cut() {
    if (!queue || !next || !inHand || next.boltTag === null) return;
    await queue.keep({
      lane: next.boltTag,
      path: `/api/bolts/${next.boltTag}/cuts`,
      body: { runLengthId: next.id, length: next.length, at: new Date().toISOString(), asFact: state.connection !== "connected" },
      said: `Cut ${next.fabric} for bag ${next.kitNumber}`,
      personId: person.id,
    });
  }

  const refused = state.entries.filter((entry) => entry.state === "refused");
  return (
    <StationShell
      title={`${run.kit}, ${run.kits} ${run.kits === 1 ? "kit" : "kits"}`}
      sub={`${run.colourway}, ${person.place}, ${person.name}`}
      size="wall"
      connection={{ state: state.connection === "connected" ? "connected" : "lost", waiting: state.entries.filter((entry) => entry.state === "waiting").length }}
      right={
        <span>
          {done} of {run.runLengths.length} cut
        </span>
      }
    >
      <div className="page-section grid gap-6">
        {refused.map((entry) => (
          <Notice key={entry.id} kind="error" title={entry.said} size="counter" action={<Button onClick={() => void queue?.dismiss(entry.id)}>Put it away</Button>}>
            {entry.refusal}
          </Notice>
        ))}
        {said ? (
          <Notice kind="error" title="Wrong bolt." size="counter">
            {said}
          </Notice>
        ) : null}
        {next ? (
          <>
            <p className="text-112 strong" style={{ lineHeight: 1 }}>
              <ClothLength value={next.length} system={system} />
            </p>
            <h2 className="text-36">{next.fabric}</h2>
            <p className="text-22">
              Shelf {next.shelf}, tag {next.boltTag}, lot {next.lot}. Into bag {next.kitNumber}. {inHand ? "Right bolt." : "Scan the bolt’s tag first."}
            </p>
            <form onSubmit={scan} className="flex flex-wrap items-end gap-4">
              <TextInput label="Scan the bolt" name="tag" readOnly={queue === null} autoComplete="off" autoFocus size="counter" maxLength={40} />
              <SubmitButton variant="plain" size="counter">
                Take the scan
              </SubmitButton>
            </form>
            <Button variant="fill" size="wall" onClick={() => void cut()} disabled={!inHand || queue === null}>
              Cut for bag {next.kitNumber}
            </Button>
          </>
        ) : (
          <p className="text-28">Every length of this run is cut.</p>
        )}
      </div>
    </StationShell>
  );
}
