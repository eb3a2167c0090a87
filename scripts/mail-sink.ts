/**
 * A mail server on loopback that keeps every letter in a folder and sends none on. Prints its port as the first line.
 *
 *   node --import tsx scripts/mail-sink.ts FOLDER
 */
import { randomBytes } from "node:crypto";
import { mkdir, rename, writeFile } from "node:fs/promises";
import path from "node:path";
import type { Readable } from "node:stream";
import { SMTPServer } from "smtp-server";
import { PlainFault, runCommand } from "./plain-fault.mjs";

const MOST_BYTES = 10_000_000;

async function keep(folder: string, stream: Readable): Promise<void> {
  const chunks: Buffer[] = [];
  for await (const chunk of stream) chunks.push(chunk as Buffer);
  const name = `${Date.now()}-${randomBytes(4).toString("hex")}.eml`;
  // A reader never sees half a letter.
  const unfinished = path.join(folder, `.${name}`);
  await writeFile(unfinished, Buffer.concat(chunks), { mode: 0o600 });
  await rename(unfinished, path.join(folder, name));
}

await runCommand(async () => {
  const folder = process.argv[2];
  if (!folder) throw new PlainFault("Say in which folder letters are kept: node --import tsx scripts/mail-sink.ts FOLDER.");
  await mkdir(folder, { recursive: true, mode: 0o700 });
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ["STARTTLS", "AUTH"],
    disableReverseLookup: true,
    size: MOST_BYTES,
    onData(stream, _session, done) {
      keep(folder, stream).then(() => done(), (error: Error) => done(error));
    },
  });
  server.on("error", (error) => console.error("The local mail server:", error.message));
  server.listen(0, "127.0.0.1", () => {
    const address = server.server.address();
    // Not console.log: it colours numbers where a terminal is promised.
    if (address && typeof address === "object") process.stdout.write(`${address.port}\n`);
  });
  process.once("SIGTERM", () => server.close(() => process.exit(0)));
  process.once("SIGINT", () => server.close(() => process.exit(0)));
});
