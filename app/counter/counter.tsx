"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { StationShell } from "@/components/shell/station-shell";
import type { MeasureSystem } from "@/lib/core/measure/format";
import type { TillView } from "@/lib/data/counter/tills";
import { useReady } from "@/app/use-ready";
import { Basket } from "./basket";
import { OpenTill } from "./open-till";

interface CounterProps {
  readonly tills: readonly TillView[];
  readonly person: string;
  readonly system: MeasureSystem;
  readonly currency: string;
}

/** A till that is open sells; a closed one is opened with its float first. */
export function Counter({ tills, person, system, currency }: CounterProps) {
  const router = useRouter();
  const [tillId, setTillId] = useState(() => tills.find((till) => till.session)?.id ?? tills[0]?.id ?? 0);
  const ready = useReady();
  const till = tills.find((each) => each.id === tillId) ?? null;
  return (
    <StationShell title={`Counter, ${till?.name ?? "no till"}`} sub={person} size="counter" right={null}>
      <div className="page-section">
        {!ready ? (
          <p className="second">The till is being set up.</p>
        ) : till?.session ? (
          <Basket sessionId={till.session.id} system={system} currency={currency} closed={() => router.refresh()} />
        ) : (
          <OpenTill tills={tills} tillId={tillId} currency={currency} choose={setTillId} opened={() => router.refresh()} />
        )}
      </div>
    </StationShell>
  );
}
