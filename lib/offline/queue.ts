import type { Answer, Entry, NewEntry } from "./entry";
import type { OfflineStore } from "./store";

export interface QueueState {
  readonly entries: readonly Entry[];
  readonly connection: "connected" | "no-network" | "server-down" | "signed-out";
}

export interface OutgoingQueue {
  /** Keeps an entry on the disk, then starts sending. Resolves once it is kept, not once it is sent. */
  keep(entry: NewEntry): Promise<Entry>;
  /** Sends whatever waits, as far as the network goes. */
  drain(): Promise<void>;
  /** Puts a refused entry away after a person has read why. */
  dismiss(id: string): Promise<void>;
  state(): QueueState;
  subscribe(listener: () => void): () => void;
}

export interface QueueSettings {
  readonly store: OfflineStore;
  readonly personId: number;
  readonly send: (entry: Entry) => Promise<Answer>;
  /** Told of every entry that the server took, with its answer. */
  readonly taken?: (entry: Entry, value: unknown) => void;
  readonly makeId?: () => string;
  readonly now?: () => number;
}

/**
 * A durable queue of what was done at a station. Within a lane the order is kept; a refused entry is set aside with the
 * server's sentence and blocks nothing; entries of another person stay until that person is back; an entry leaves the
 * disk only after a 2xx. Complexity is linear in the entries waiting, which are a day's cuts at most.
 */
export async function openQueue(settings: QueueSettings): Promise<OutgoingQueue> {
  const { store, personId, send, taken, makeId = () => crypto.randomUUID(), now = Date.now } = settings;
  const listeners = new Set<() => void>();
  let current: QueueState = { entries: await store.list(), connection: "connected" };
  let draining: Promise<void> | null = null;
  let again = false;

  const tell = async (connection = current.connection) => {
    current = { entries: await store.list(), connection };
    for (const listener of listeners) listener();
  };

  const sendLane = async (lane: readonly Entry[]): Promise<QueueState["connection"]> => {
    for (const entry of lane) {
      const answer = await send(entry);
      if (answer.kind === "later") return answer.reason;
      if (answer.kind === "taken") {
        await store.remove(entry.id);
        taken?.(entry, answer.value);
      } else {
        await store.replace({ ...entry, state: "refused", refusal: answer.sentence });
      }
      await tell();
    }
    return "connected";
  };

  const drainOnce = async () => {
    const waiting = (await store.list()).filter((entry) => entry.state === "waiting" && entry.personId === personId);
    const ends = await Promise.all(lanesOf(waiting).map(sendLane));
    await tell(ends.find((end) => end !== "connected") ?? "connected");
  };

  const drain = async () => {
    if (draining) {
      again = true;
      return draining;
    }
    draining = (async () => {
      do {
        again = false;
        await drainOnce();
      } while (again && current.connection === "connected");
    })();
    try {
      await draining;
    } finally {
      draining = null;
    }
  };

  return {
    async keep(entry) {
      const kept: Entry = { ...entry, id: entry.id ?? makeId(), madeAt: now(), state: "waiting", refusal: null };
      await store.add(kept);
      await tell();
      void drain();
      return kept;
    },
    drain,
    async dismiss(id) {
      await store.remove(id);
      await tell();
    },
    state: () => current,
    subscribe(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
  };
}

/** Map.groupBy would say the same, but tablets of 2023 do not know it. */
function lanesOf(entries: readonly Entry[]): Entry[][] {
  const lanes = new Map<string, Entry[]>();
  for (const entry of entries) {
    const lane = lanes.get(entry.lane);
    if (lane) lane.push(entry);
    else lanes.set(entry.lane, [entry]);
  }
  return [...lanes.values()];
}
