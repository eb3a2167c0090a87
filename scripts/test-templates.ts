import { execFile } from "node:child_process";
import path from "node:path";
import { promisify } from "node:util";
import { Client } from "pg";
import { migrateUp } from "@/migrations/migrate";
import { sourceHash } from "./source-hash.mjs";

const ROOT = path.resolve(import.meta.dirname, "..");
const MIGRATION_SOURCES = ["migrations"];
/** The seed goes through the data layer, so a change there is a change of the seeded shop. */
const SEED_SOURCES = ["migrations", "models", "seeders", "lib", "labels", "package-lock.json"];
const TEMPLATE_LOCK = 7_202_612;
const KEPT_HOURS = 6;

/** Makes the template of the present migrations where it is missing, and returns its name. */
export function migratedTemplate(clusterUrl: string): Promise<string> {
  const name = `template_migrated_${sourceHash(ROOT, MIGRATION_SOURCES)}`;
  return ensureTemplate(clusterUrl, name, async (url) => void (await migrateUp(url)));
}

/** Makes the template with the demo's shop in it where it is missing, and returns its name. */
export function seededTemplate(clusterUrl: string): Promise<string> {
  const name = `template_seeded_${sourceHash(ROOT, SEED_SOURCES)}`;
  return ensureTemplate(clusterUrl, name, seedInOwnProcess);
}

/** The seed runs apart, so that it cannot change which database this process works on. */
async function seedInOwnProcess(url: string): Promise<void> {
  const run = promisify(execFile);
  const environment = { ...process.env, DATABASE_URL: url, DATABASE_DIRECT_URL: url };
  await run(process.execPath, ["--import", "tsx", "scripts/migrate.ts"], { cwd: ROOT, env: environment });
  await run(process.execPath, ["--import", "tsx", "scripts/seed.ts"], { cwd: ROOT, env: environment });
}

/** Test runs side by side wait for each other; a template that was being made when its run was killed is made anew. */
async function ensureTemplate(clusterUrl: string, name: string, fill: (url: string) => Promise<void>): Promise<string> {
  const client = new Client({ connectionString: clusterUrl });
  await client.connect();
  try {
    await client.query("SELECT pg_advisory_lock($1)", [TEMPLATE_LOCK]);
    const { rowCount } = await client.query("SELECT 1 FROM pg_database WHERE datname = $1", [name]);
    if (rowCount) return name;
    const unfinished = `${name}_unfinished`;
    await client.query(`DROP DATABASE IF EXISTS ${unfinished} WITH (FORCE)`);
    await client.query(`CREATE DATABASE ${unfinished}`);
    await fill(databaseUrl(clusterUrl, unfinished));
    await client.query(`COMMENT ON DATABASE ${unfinished} IS '${Date.now()}'`);
    await client.query(`ALTER DATABASE ${unfinished} RENAME TO ${name}`);
    return name;
  } finally {
    await client.end();
  }
}

/** The address of another database in the same cluster. */
export function databaseUrl(clusterUrl: string, name: string): string {
  const url = new URL(clusterUrl);
  url.pathname = `/${name}`;
  return url.href;
}

/** Removes databases of killed runs and templates of sources that are gone. Those of a run beside this one are younger. */
export async function dropLeftovers(clusterUrl: string): Promise<void> {
  const client = new Client({ connectionString: clusterUrl });
  await client.connect();
  try {
    const { rows } = await client.query<{ name: string; made: string | null }>(
      "SELECT datname AS name, shobj_description(oid, 'pg_database') AS made FROM pg_database WHERE datname LIKE 'template\\_%' OR datname LIKE 'file\\_%' OR datname LIKE 'e2e\\_%'",
    );
    const oldest = Date.now() - KEPT_HOURS * 3_600_000;
    for (const { name, made } of rows) {
      const time = Number(made ?? /^(?:file|e2e)_(\d+)_/.exec(name)?.[1]);
      if (time > 0 && time < oldest) await client.query(`DROP DATABASE IF EXISTS ${name} WITH (FORCE)`);
    }
  } finally {
    await client.end();
  }
}
