import { Client } from "pg";
import { environment } from "@/lib/server/environment";

export interface Hint {
  readonly topic: string;
  readonly revision: number;
}

type Listener = (hint: Hint) => void;

interface Hub {
  readonly listeners: Set<Listener>;
  client: Client | null;
  connecting: boolean;
}

/** One per process, whichever copy of this module asks: pages and routes get separate copies. */
const shared = globalThis as typeof globalThis & { ellwandEventHub?: Hub };
const CHANNEL = "ellwand";
const RETRY_MS = 2_000;

/** Calls `listener` with each hint until the returned function is called. One LISTEN connection serves the process. */
export function listen(listener: Listener): () => void {
  const hub = (shared.ellwandEventHub ??= { listeners: new Set(), client: null, connecting: false });
  hub.listeners.add(listener);
  void connect(hub);
  return () => {
    hub.listeners.delete(listener);
  };
}

async function connect(hub: Hub): Promise<void> {
  if (hub.client || hub.connecting) return;
  hub.connecting = true;
  const client = new Client({ connectionString: environment().DATABASE_DIRECT_URL ?? environment().DATABASE_URL });
  const lost = () => {
    if (hub.client === client) hub.client = null;
    setTimeout(() => void connect(hub), RETRY_MS).unref();
  };
  try {
    client.on("error", lost);
    await client.connect();
    client.on("notification", ({ payload }) => tell(hub, payload));
    await client.query(`LISTEN ${CHANNEL}`);
    hub.client = client;
  } catch {
    lost();
  } finally {
    hub.connecting = false;
  }
}

function tell(hub: Hub, payload: string | undefined): void {
  const hint = readHint(payload);
  if (hint) for (const listener of hub.listeners) listener(hint);
}

function readHint(payload: string | undefined): Hint | null {
  try {
    const value = JSON.parse(payload ?? "") as Partial<Hint>;
    return typeof value.topic === "string" && typeof value.revision === "number" ? { topic: value.topic, revision: value.revision } : null;
  } catch {
    return null;
  }
}
