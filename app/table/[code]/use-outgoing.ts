"use client";

import { useEffect, useRef, useState } from "react";
import type { Entry } from "@/lib/offline/entry";
import { openQueue, type OutgoingQueue, type QueueState } from "@/lib/offline/queue";
import { sendEntry } from "@/lib/offline/send";
import { openStore } from "@/lib/offline/store";

const TRY_AGAIN_MS = 5_000;
const EMPTY: QueueState = { entries: [], connection: "connected" };

/** The station's durable queue: kept on the device, sent as soon as the network is there. */
export function useOutgoing(personId: number, taken: (entry: Entry) => void): { queue: OutgoingQueue | null; state: QueueState } {
  const [queue, setQueue] = useState<OutgoingQueue | null>(null);
  const [state, setState] = useState<QueueState>(EMPTY);
  const onTaken = useRef(taken);
  useEffect(() => {
    onTaken.current = taken;
  }, [taken]);
  useEffect(() => {
    let over = false;
    const stops: (() => void)[] = [];
    void openStore().then(async (store) => {
      const opened = await openQueue({ store, personId, send: (entry) => sendEntry(entry), taken: (entry) => onTaken.current(entry) });
      if (over) return;
      const show = () => setState(opened.state());
      const send = () => void opened.drain();
      stops.push(opened.subscribe(show));
      const timer = setInterval(send, TRY_AGAIN_MS);
      stops.push(() => clearInterval(timer));
      window.addEventListener("online", send);
      stops.push(() => window.removeEventListener("online", send));
      setQueue(opened);
      show();
      send();
    });
    return () => {
      over = true;
      for (const stop of stops) stop();
    };
  }, [personId]);
  return { queue, state };
}
