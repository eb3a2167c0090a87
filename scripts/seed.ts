import { seedDemo } from "@/seeders/seed";
import { onDatabase } from "./database-fault.mjs";
import { runCommand } from "./plain-fault.mjs";

/** Fills the database of DATABASE_DIRECT_URL (else DATABASE_URL) with the demo's shop. Running it twice adds nothing. */
await runCommand(async () => {
  const url = process.env.DATABASE_DIRECT_URL || process.env.DATABASE_URL;
  if (!url) throw new Error("DATABASE_URL is not set: it names the database to fill.");
  await onDatabase(url, () => seedDemo(url));
});
