/**
 * The one command that brings Ellwand up: packages, PostgreSQL, migrations, the demo's shop, the build, the servers.
 * Only Node.js itself is imported here at first, since the packages may not be installed yet.
 */
import fs from "node:fs";
import path from "node:path";
import { fileURLToPath } from "node:url";
import { checkNode, ensurePackages } from "./packages.mjs";
import { onParentGone, startedByNpm } from "./parent-gone.mjs";
import { PlainFault, runCommand } from "./plain-fault.mjs";
import { DEMO_CLUSTER, ensurePostgres, freePort, removePostgres } from "./postgres.mjs";
import { runNode } from "./run-node.mjs";
import { sourceHash } from "./source-hash.mjs";
import { stopChild } from "./start/children.mjs";
import { keptSecret } from "./start/kept-secret.mjs";
import { startOptions } from "./start/options.mjs";
import { demandPort, startMailSink, startPages } from "./start/services.mjs";

const ROOT = path.resolve(path.dirname(fileURLToPath(import.meta.url)), "..");
const KEPT = path.join(ROOT, ".ellwand");
const MAIL_FOLDER = path.join(KEPT, "mail");
const SEED_SOURCES = ["seeders"];

/** @typedef {import("./start/options.mjs").StartOptions} StartOptions */
/** What has to be undone at the end, last first. @typedef {(() => Promise<void>)[]} Undo */

/** @param {StartOptions} options @param {Undo} undo */
async function start(options, undo) {
  checkNode();
  await demandPort(options.port, options.lan ? "0.0.0.0" : "127.0.0.1");
  makeKeptFolder();
  ensurePackages(ROOT);
  const database = await bringUpDatabase(options, undo);
  const env = { ...process.env, ...database.env, ...(await bringUpMail(undo)), ...settings(options) };
  const { buildWorker, ensureBuild, WORKER_FILE } = await import("./build.mjs");
  env.PLANNER_WORKER ??= WORKER_FILE;
  if (options.dev) await buildWorker();
  else await ensureBuild();
  const address = options.lan ? await serveNetwork(options, env, undo) : await serveLoopback(options, env, undo);
  await announce(address, database.demo);
}

function makeKeptFolder() {
  try {
    fs.mkdirSync(KEPT, { recursive: true });
    fs.accessSync(KEPT, fs.constants.W_OK);
  } catch (error) {
    const code = /** @type {NodeJS.ErrnoException} */ (error).code;
    throw new PlainFault(code === "ENOSPC" ? `The disk is full: ${KEPT} could not be made.` : `This user may not write to ${KEPT} (${code}). Start as the user who owns the project's folder.`);
  }
}

/**
 * A database of the shop's own when its address is given, else the demo's. The demo's known passwords go only into a
 * cluster that this command made itself, or where they are asked for.
 * @param {StartOptions} options @param {Undo} undo
 */
async function bringUpDatabase(options, undo) {
  const given = process.env.DATABASE_URL;
  if (given) {
    const env = { DATABASE_URL: given, DATABASE_DIRECT_URL: process.env.DATABASE_DIRECT_URL || given };
    await script("scripts/migrate.ts", env);
    if (options.demo) await script("scripts/seed.ts", env);
    return { env, demo: options.demo };
  }
  if (options.fresh) {
    await removePostgres(DEMO_CLUSTER.folder);
    fs.rmSync(MAIL_FOLDER, { recursive: true, force: true });
  }
  const cluster = await ensurePostgres(DEMO_CLUSTER);
  undo.push(cluster.leave);
  const env = { DATABASE_URL: cluster.url, DATABASE_DIRECT_URL: cluster.url };
  await script("scripts/migrate.ts", env);
  const stamp = path.join(cluster.data, "ellwand.seeded");
  const hash = sourceHash(ROOT, SEED_SOURCES);
  // Seeding again would bring back what a person has taken away since.
  if (!fs.existsSync(stamp) || fs.readFileSync(stamp, "utf8") !== hash) {
    console.log("Filling the demo's shop …");
    await script("scripts/seed.ts", env);
    fs.writeFileSync(stamp, hash);
  }
  return { env, demo: true };
}

/** @param {string} file @param {Record<string, string>} env */
async function script(file, env) {
  const code = await runNode(["--import", "tsx", path.join(ROOT, file)], { cwd: ROOT, env: { ...process.env, ...env } });
  if (code !== 0) throw new PlainFault("Ellwand was not started.");
}

/** @param {Undo} undo @returns {Promise<Record<string, string>>} */
async function bringUpMail(undo) {
  if (process.env.SMTP_URL) return {};
  const sink = await startMailSink(ROOT, MAIL_FOLDER);
  undo.push(() => stopChild(sink.child));
  return { SMTP_URL: sink.url, MAIL_SINK_FOLDER: MAIL_FOLDER };
}

/** @param {StartOptions} options @returns {Record<string, string>} */
function settings(options) {
  return {
    NODE_ENV: options.dev ? "development" : "production",
    NEXT_TELEMETRY_DISABLED: "1",
    NEXTAUTH_URL: process.env.NEXTAUTH_URL || `http://127.0.0.1:${options.port}`,
    NEXTAUTH_SECRET: process.env.NEXTAUTH_SECRET || keptSecret(path.join(KEPT, "secret")),
  };
}

/** @param {StartOptions} options @param {NodeJS.ProcessEnv} env @param {Undo} undo */
async function serveLoopback({ port, dev }, env, undo) {
  const child = await startPages(ROOT, { port, dev, env });
  endWith(child, undo);
  return [env.NEXTAUTH_URL ?? `http://127.0.0.1:${port}`];
}

/** @param {StartOptions} options @param {NodeJS.ProcessEnv} env @param {Undo} undo */
async function serveNetwork({ port }, env, undo) {
  const { ensureCertificate, ownAddresses } = await import("./lan/certificate.mjs");
  const { startLanProxy } = await import("./lan/lan-proxy.mjs");
  const { howToTrust } = await import("./lan/how-to-trust.mjs");
  const addresses = ownAddresses();
  const certificate = ensureCertificate(path.join(KEPT, "lan"), addresses);
  const inner = await freePort(0);
  const outer = process.env.NEXTAUTH_URL || `https://${addresses[0]}:${port}`;
  const child = await startPages(ROOT, { port: inner, dev: false, env: { ...env, NEXTAUTH_URL: outer, TRUSTED_PROXY: "1" } });
  endWith(child, undo);
  const proxy = await startLanProxy({ port, inner, certificate });
  undo.push(proxy.stop);
  console.log(howToTrust(addresses, port, certificate));
  return addresses.map((each) => `https://${each}:${port}`);
}

/**
 * Without its server the command has nothing left to do. @param {import("node:child_process").ChildProcess} child @param {Undo} undo
 */
function endWith(child, undo) {
  let asked = false;
  undo.push(() => {
    asked = true;
    return stopChild(child);
  });
  child.once("exit", () => {
    if (asked || stopping) return;
    console.error("\nThe pages' server has ended. Start again with npm start.\n");
    void stop(undo, 1);
  });
}

/** @param {string[]} addresses @param {boolean} demo */
async function announce(addresses, demo) {
  console.log(`\nEllwand is open at ${addresses.join(" and ")}\n`);
  if (demo) await runNode(["--import", "tsx", path.join(ROOT, "scripts/demo-accounts.ts")], { cwd: ROOT });
  console.log("Ctrl-C stops it.\n");
}

let stopping = false;

/** @param {Undo} undo @param {number} code */
async function stop(undo, code) {
  if (stopping) return;
  stopping = true;
  for (const each of undo.toReversed()) await each().catch((/** @type {Error} */ error) => console.error(error.message));
  process.exit(code);
}

await runCommand(async () => {
  const options = startOptions(process.argv.slice(2), process.env);
  if (!options) return;
  /** @type {Undo} */
  const undo = [];
  for (const signal of /** @type {const} */ (["SIGINT", "SIGTERM", "SIGHUP"])) process.on(signal, () => void stop(undo, 0));
  if (startedByNpm) onParentGone(() => void stop(undo, 0));
  try {
    await start(options, undo);
  } catch (error) {
    if (stopping) return;
    console.error(error instanceof PlainFault ? `\n${error.message}\n` : error);
    await stop(undo, 1);
  }
});
