import { spawn } from "node:child_process";
import { onParentGone, startedByNpm } from "./parent-gone.mjs";

/** @type {Set<import("node:child_process").ChildProcess>} */
const running = new Set();

/**
 * Runs a Node.js program to its end and shows what it prints.
 * @param {string[]} args @param {{ cwd: string, env?: NodeJS.ProcessEnv }} options
 * @returns {Promise<number>} its exit code; 1 when a signal ended it.
 */
export function runNode(args, { cwd, env = process.env }) {
  return new Promise((resolve, reject) => {
    const child = spawn(process.execPath, args, { cwd, env, stdio: ["ignore", "inherit", "inherit"] });
    running.add(child);
    child.once("error", reject);
    child.once("exit", (code) => {
      running.delete(child);
      resolve(code ?? 1);
    });
  });
}

if (startedByNpm) onParentGone(() => running.forEach((child) => child.kill("SIGTERM")));
