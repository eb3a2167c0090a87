/**
 * The server that browser tests and pictures run against: the finished build, a fresh copy of the demo's shop, and a
 * mail folder of its own. Everything it made is gone when it ends.
 *
 *   node --import tsx scripts/e2e-server.ts --port 3417
 */
import { randomBytes } from "node:crypto";
import fs from "node:fs";
import path from "node:path";
import { parseArgs } from "node:util";
import pg from "pg";
import { WORKER_FILE } from "./build.mjs";
import { PlainFault, runCommand } from "./plain-fault.mjs";
import { stopChild } from "./start/children.mjs";
import { demandPort, startMailSink, startPages } from "./start/services.mjs";
import { joinTestCluster } from "./test-cluster.mjs";
import { databaseUrl, dropLeftovers, seededTemplate } from "./test-templates";

const ROOT = path.resolve(import.meta.dirname, "..");
const undo: (() => Promise<void>)[] = [];

async function administer(clusterUrl: string, sql: string): Promise<void> {
  const client = new pg.Client({ connectionString: clusterUrl });
  await client.connect();
  await client.query(sql).finally(() => client.end());
}

async function freshShop(): Promise<string> {
  const cluster = await joinTestCluster();
  undo.push(cluster.leave);
  await dropLeftovers(cluster.url);
  const name = `e2e_${Date.now()}_${randomBytes(4).toString("hex")}`;
  await administer(cluster.url, `CREATE DATABASE ${name} TEMPLATE ${await seededTemplate(cluster.url)} STRATEGY file_copy`);
  undo.push(() => administer(cluster.url, `DROP DATABASE IF EXISTS ${name} WITH (FORCE)`));
  return databaseUrl(cluster.url, name);
}

async function serve(port: number): Promise<void> {
  await demandPort(port, "127.0.0.1");
  if (!fs.existsSync(path.join(ROOT, process.env.NEXT_DIST_DIR || ".next", "BUILD_ID"))) throw new PlainFault("There is no build to serve. Run npm run build first.");
  const url = await freshShop();
  const mail = path.join(ROOT, ".ellwand", `e2e-mail-${process.pid}`);
  undo.push(async () => fs.rmSync(mail, { recursive: true, force: true }));
  const sink = await startMailSink(ROOT, mail);
  undo.push(() => stopChild(sink.child));
  const pages = await startPages(ROOT, {
    port,
    dev: false,
    env: {
      ...process.env,
      NODE_ENV: "production",
      NEXT_TELEMETRY_DISABLED: "1",
      DATABASE_URL: url,
      DATABASE_DIRECT_URL: url,
      NEXTAUTH_URL: `http://127.0.0.1:${port}`,
      NEXTAUTH_SECRET: randomBytes(32).toString("base64url"),
      SMTP_URL: sink.url,
      MAIL_SINK_FOLDER: mail,
      PLANNER_WORKER: WORKER_FILE,
    },
  });
  undo.push(() => stopChild(pages));
  pages.once("exit", (code) => void stop(code ?? 1));
  console.log(`The shop for the tests is open at http://127.0.0.1:${port}, on ${url}`);
}

let stopping = false;

async function stop(code: number): Promise<void> {
  if (stopping) return;
  stopping = true;
  for (const each of undo.toReversed()) await each().catch((error: Error) => console.error(error.message));
  process.exit(code);
}

await runCommand(async () => {
  for (const signal of ["SIGINT", "SIGTERM"] as const) process.on(signal, () => void stop(0));
  const { values } = parseArgs({ options: { port: { type: "string", default: "3417" } } });
  try {
    await serve(Number(values.port));
  } catch (error) {
    console.error(error instanceof PlainFault ? error.message : error);
    await stop(1);
  }
});
