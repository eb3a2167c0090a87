import fs from "node:fs";
import path from "node:path";
import { setTimeout as sleep } from "node:timers/promises";
import { PlainFault } from "../plain-fault.mjs";

const PID_FILE = "postmaster.pid";
/** Back ends of a killed server notice its death and leave; this is far more than they need. */
const ORPHAN_WAIT_MS = 20_000;

/**
 * What the pid file says. Line 1 is the pid, line 4 the port, line 8 "ready" once connections are taken.
 * @param {string} data
 */
export function readPostmaster(data) {
  return parse(path.join(data, PID_FILE));
}

/** @param {string} file */
function parse(file) {
  let lines;
  try {
    lines = fs.readFileSync(file, "utf8").split("\n");
  } catch (error) {
    if (/** @type {NodeJS.ErrnoException} */ (error).code === "ENOENT") return null;
    throw error;
  }
  return { pid: Number(lines[0]), port: Number(lines[3]), ready: lines[7]?.trim() === "ready" };
}

/**
 * Whether the server of this very folder is alive. A pid alone says nothing: after a kill the number may belong to
 * any other process, and PostgreSQL would then refuse to start. A server's working folder is its data folder.
 * @param {string} data @param {number} pid
 */
export function servesFolder(data, pid) {
  if (!Number.isInteger(pid) || pid <= 0) return false;
  if (!fs.existsSync("/proc/self/cwd")) return answersSignal(pid);
  try {
    return fs.readlinkSync(`/proc/${pid}/cwd`) === data;
  } catch {
    return false;
  }
}

/** @param {number} pid */
function answersSignal(pid) {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return /** @type {NodeJS.ErrnoException} */ (error).code === "EPERM";
  }
}

/**
 * Removes the pid file of a server that was killed, once the last of its back ends is gone.
 * @param {string} data
 */
export async function clearStalePostmaster(data) {
  const file = path.join(data, PID_FILE);
  const seen = parse(file);
  if (!seen || servesFolder(data, seen.pid)) return;
  const deadline = Date.now() + ORPHAN_WAIT_MS;
  for (let left = processesIn(data); left.length > 0; left = processesIn(data)) {
    // Another start may have brought up a new server meanwhile: that one is in the folder by right.
    const now = parse(file);
    if (now && servesFolder(data, now.pid)) return;
    if (Date.now() > deadline) throw new PlainFault(`Processes of a PostgreSQL that was killed are still there (${left.join(", ")}). End them, then try again.`);
    await sleep(50);
  }
  takeAside(file, data);
}

/**
 * Moves the file away first and looks at it again afterwards: between reading and deleting, a start beside this one
 * may have written a new file, which is then put back.
 * @param {string} file @param {string} data
 */
function takeAside(file, data) {
  const aside = `${file}.stale-${process.pid}`;
  try {
    fs.renameSync(file, aside);
  } catch (error) {
    if (/** @type {NodeJS.ErrnoException} */ (error).code === "ENOENT") return;
    throw error;
  }
  const moved = parse(aside);
  if (moved && servesFolder(data, moved.pid)) fs.linkSync(aside, file);
  fs.rmSync(aside, { force: true });
}

/** @param {string} data */
function processesIn(data) {
  if (!fs.existsSync("/proc/self/cwd")) return [];
  return fs.readdirSync("/proc").filter((each) => /^\d+$/.test(each) && Number(each) !== process.pid && servesFolder(data, Number(each)));
}
