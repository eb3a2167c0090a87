import { once } from "node:events";
import net from "node:net";
import path from "node:path";
import { createInterface } from "node:readline";
import { setTimeout as sleep } from "node:timers/promises";
import { PlainFault } from "../plain-fault.mjs";
import { startChild } from "./children.mjs";

/**
 * Starts the local mail server. @param {string} root @param {string} folder where it keeps letters.
 */
export async function startMailSink(root, folder) {
  const child = startChild(["--import", "tsx", path.join(root, "scripts/mail-sink.ts"), folder], { cwd: root, env: process.env, stdout: "pipe" });
  if (!child.stdout) throw new Error("The mail server's output is read for its port.");
  const lines = createInterface({ input: child.stdout });
  const [line] = await Promise.race([once(lines, "line"), once(child, "exit").then(() => [""])]);
  if (!/^\d+$/.test(line)) throw new PlainFault("The local mail server did not start: the reason stands above.");
  return { child, url: `smtp://127.0.0.1:${line}` };
}

/**
 * Starts the pages' server on loopback and waits until it answers.
 * @param {string} root @param {{ port: number, dev: boolean, env: NodeJS.ProcessEnv }} options
 */
export async function startPages(root, { port, dev, env }) {
  const next = path.join(root, "node_modules/next/dist/bin/next");
  // Not through npx: ending that would leave the real server behind on its port.
  const child = startChild([next, dev ? "dev" : "start", "-H", "127.0.0.1", "-p", String(port)], { cwd: root, env });
  const deadline = Date.now() + 60_000;
  while (!(await answers(port))) {
    if (child.exitCode !== null || child.signalCode !== null) throw new PlainFault("The pages' server ended at once: the reason stands above.");
    if (Date.now() > deadline) throw new PlainFault(`The pages' server does not answer on port ${port}.`);
    await sleep(100);
  }
  return child;
}

/** @param {number} port @returns {Promise<boolean>} */
function answers(port) {
  return new Promise((resolve) => {
    const socket = net.connect(port, "127.0.0.1");
    socket.once("connect", () => resolve(Boolean(socket.destroy())));
    socket.once("error", () => resolve(false));
  });
}

/**
 * Throws one sentence when the port cannot be listened on. @param {number} port @param {string} host
 * @returns {Promise<void>}
 */
export function demandPort(port, host) {
  return new Promise((resolve, reject) => {
    const server = net.createServer();
    server.once("error", (error) => {
      const code = /** @type {NodeJS.ErrnoException} */ (error).code;
      if (code === "EACCES") reject(new PlainFault(`Port ${port} may not be used by this user. Choose one above 1023, for example: npm start -- --port 3001`));
      else if (code === "EADDRINUSE") reject(new PlainFault(`Port ${port} is taken by another program. Choose another one, for example: npm start -- --port ${port + 1}`));
      else reject(error);
    });
    server.listen({ port, host, exclusive: true }, () => server.close(() => resolve()));
  });
}
