import { spawn } from "node:child_process";
import { fileURLToPath } from "node:url";

const LEAVE_WITH_PARENT = fileURLToPath(new URL("./leave-with-parent.mjs", import.meta.url));
const KILL_AFTER_MS = 6_000;

/**
 * Starts a Node.js program that ends when this process ends, even when this process is killed.
 * @param {string[]} args the program and its arguments.
 * @param {{ cwd: string, env: NodeJS.ProcessEnv, stdout?: "inherit" | "pipe" }} options
 */
export function startChild(args, { cwd, env, stdout = "inherit" }) {
  return spawn(process.execPath, ["--import", LEAVE_WITH_PARENT, ...args], { cwd, env, stdio: ["ignore", stdout, "inherit"] });
}

/**
 * Asks a child to end, and ends it after a while if it does not.
 * @param {import("node:child_process").ChildProcess} child
 * @returns {Promise<void>}
 */
export function stopChild(child) {
  if (child.exitCode !== null || child.signalCode !== null) return Promise.resolve();
  return new Promise((resolve) => {
    const timer = setTimeout(() => child.kill("SIGKILL"), KILL_AFTER_MS);
    child.once("exit", () => {
      clearTimeout(timer);
      resolve();
    });
    child.kill("SIGTERM");
  });
}
