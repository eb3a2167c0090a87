import { Client } from "pg";
import { Umzug } from "umzug";
import * as foundation from "./0001-foundation";

/** A migration runs inside a transaction of its own; a failure leaves the database as it was. */
export interface Migration {
  readonly up: string;
}

const MIGRATIONS: readonly { readonly name: string; readonly migration: Migration }[] = [
  { name: "0001-foundation", migration: foundation },
];

/** Two servers that start together migrate one after the other. */
const MIGRATION_LOCK = 7_202_611;

/** Brings the database at `url` up to date. Returns the names of the migrations that ran; throws with one sentence. */
export async function migrateUp(url: string): Promise<string[]> {
  const client = new Client({ connectionString: url });
  await client.connect();
  try {
    await client.query("SELECT pg_advisory_lock($1)", [MIGRATION_LOCK]);
    await client.query("CREATE TABLE IF NOT EXISTS schema_migrations (name text PRIMARY KEY, ran_at timestamptz NOT NULL DEFAULT now())");
    const umzug = new Umzug({ migrations: MIGRATIONS.map((each) => runnable(each, client)), storage: tableStorage(client), logger: undefined });
    return (await umzug.up()).map((each) => each.name);
  } catch (error) {
    throw new Error(`The database could not be brought up to date: ${(error as Error).message}`, { cause: error });
  } finally {
    await client.end();
  }
}

function runnable({ name, migration }: (typeof MIGRATIONS)[number], client: Client) {
  return {
    name,
    async up() {
      await client.query("BEGIN");
      try {
        await client.query(migration.up);
        await client.query("COMMIT");
      } catch (error) {
        await client.query("ROLLBACK");
        throw error;
      }
    },
  };
}

function tableStorage(client: Client) {
  return {
    async logMigration({ name }: { name: string }) {
      await client.query("INSERT INTO schema_migrations (name) VALUES ($1)", [name]);
    },
    async unlogMigration({ name }: { name: string }) {
      await client.query("DELETE FROM schema_migrations WHERE name = $1", [name]);
    },
    async executed(): Promise<string[]> {
      const { rows } = await client.query<{ name: string }>("SELECT name FROM schema_migrations ORDER BY name");
      return rows.map((row) => row.name);
    },
  };
}
