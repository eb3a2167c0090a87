import { migrateUp } from "@/migrations/migrate";
import { onDatabase } from "./database-fault.mjs";
import { runCommand } from "./plain-fault.mjs";

/** Brings the database of DATABASE_DIRECT_URL (else DATABASE_URL) up to date. */
await runCommand(async () => {
  const url = process.env.DATABASE_DIRECT_URL || process.env.DATABASE_URL;
  if (!url) throw new Error("DATABASE_URL is not set: it names the database to bring up to date.");
  const ran = await onDatabase(url, () => migrateUp(url));
  if (ran.length > 0) console.log(`The database is up to date: ${ran.join(", ")}.`);
});
