import { randomBytes } from "node:crypto";
import { Client } from "pg";
import { afterAll, beforeAll, inject } from "vitest";
import { closeDb, makeDb, useDb } from "@/models/database";
import { databaseUrl, seededTemplate } from "@/scripts/test-templates";

export interface TestDatabase {
  /** Known once the tests run; read it inside a test or a hook, not while the file is being loaded. */
  readonly url: string;
}

/** With `DATABASE_POOL=1` a query that forgot its transaction waits for the only connection, and times out. */
const POOL = Number(process.env.DATABASE_POOL) || 5;

/**
 * Gives this test file a database of its own, on which `db()` then works: migrated and empty, or with the demo's shop.
 * Call it at the top of the file.
 */
export function withTestDatabase({ seeded = false, pool = POOL }: { seeded?: boolean; pool?: number } = {}): TestDatabase {
  const clusterUrl = inject("clusterUrl");
  const name = `file_${Date.now()}_${randomBytes(4).toString("hex")}`;
  const url = databaseUrl(clusterUrl, name);

  beforeAll(async () => {
    const template = seeded ? await seededTemplate(clusterUrl) : inject("migratedTemplate");
    await administer(clusterUrl, `CREATE DATABASE ${name} TEMPLATE ${template} STRATEGY file_copy`);
    useDb(makeDb(url, { pool, acquireMs: 10_000 }));
  }, 240_000);

  afterAll(async () => {
    await closeDb();
    await administer(clusterUrl, `DROP DATABASE IF EXISTS ${name} WITH (FORCE)`);
  });

  return { url };
}

async function administer(clusterUrl: string, sql: string): Promise<void> {
  const client = new Client({ connectionString: clusterUrl });
  await client.connect();
  try {
    await client.query(sql);
  } finally {
    await client.end();
  }
}
