import { openDB, type DBSchema, type IDBPDatabase } from "idb";
import type { Entry } from "./entry";

interface Schema extends DBSchema {
  entries: { key: string; value: Entry & { readonly order: number } };
  /** What a station needs to go on without the network: a run, its bolts, the counter's list. */
  snapshots: { key: string; value: { readonly value: unknown; readonly savedAt: number } };
}

const STRICT = { durability: "strict" } as const;

/** The device's durable memory. Writes reach the disk before they resolve. */
export interface OfflineStore {
  add(entry: Entry): Promise<void>;
  /** In the order they were made. */
  list(): Promise<Entry[]>;
  replace(entry: Entry): Promise<void>;
  remove(id: string): Promise<void>;
  saveSnapshot(key: string, value: unknown): Promise<void>;
  readSnapshot<Value>(key: string): Promise<{ value: Value; savedAt: number } | null>;
}

/** Opens the store and asks the browser not to clear it when space runs short. */
export async function openStore(name = "ellwand"): Promise<OfflineStore> {
  const database = await openDB<Schema>(name, 1, {
    upgrade(created) {
      created.createObjectStore("entries", { keyPath: "id" });
      created.createObjectStore("snapshots");
    },
  });
  if (typeof navigator !== "undefined") void navigator.storage?.persist?.().catch(() => false);
  return storeOf(database);
}

function storeOf(database: IDBPDatabase<Schema>): OfflineStore {
  return {
    async add(entry) {
      const transaction = database.transaction("entries", "readwrite", STRICT);
      const known = await transaction.store.getAll();
      const order = 1 + known.reduce((most, each) => Math.max(most, each.order), 0);
      await transaction.store.add({ ...entry, order });
      await transaction.done;
    },
    async list() {
      const entries = await database.getAll("entries");
      return entries.sort((a, b) => a.order - b.order);
    },
    async replace(entry) {
      const transaction = database.transaction("entries", "readwrite", STRICT);
      const known = await transaction.store.get(entry.id);
      if (known) await transaction.store.put({ ...known, ...entry });
      await transaction.done;
    },
    async remove(id) {
      const transaction = database.transaction("entries", "readwrite", STRICT);
      await transaction.store.delete(id);
      await transaction.done;
    },
    async saveSnapshot(key, value) {
      await database.put("snapshots", { value, savedAt: Date.now() }, key);
    },
    async readSnapshot<Value>(key: string) {
      const found = await database.get("snapshots", key);
      return found ? { value: found.value as Value, savedAt: found.savedAt } : null;
    },
  };
}
