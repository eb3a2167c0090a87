import { createHash } from "node:crypto";
import { spawnSync } from "node:child_process";
import fs from "node:fs";
import path from "node:path";
import { PlainFault } from "../plain-fault.mjs";

/**
 * Who runs the server, and where its files really lie. PostgreSQL refuses to run as root, so root lends the work to
 * the user that Debian made for it.
 * @typedef {{ folder: string, as: { uid: number, gid: number } | null }} Keeper
 */

/**
 * @param {string} wanted the folder asked for.
 * @returns {Keeper}
 */
export function keeperOf(wanted) {
  if (process.getuid?.() !== 0) {
    makeFolder(wanted);
    return { folder: fs.realpathSync(wanted), as: null };
  }
  const as = ownerOfData(wanted) ?? userPostgres();
  fs.mkdirSync(path.dirname(wanted), { recursive: true });
  if (reachable(path.dirname(wanted), as)) return { folder: ownedFolder(wanted, as), as };
  const hash = createHash("sha256").update(path.resolve(wanted)).digest("hex").slice(0, 12);
  const elsewhere = `/var/tmp/ellwand-${hash}`;
  // Anyone may make a folder in /var/tmp: one that somebody else made is not trusted with the shop's data.
  const owner = fs.existsSync(elsewhere) ? fs.lstatSync(elsewhere) : null;
  if (owner && (!owner.isDirectory() || ![0, as.uid].includes(owner.uid))) {
    throw new PlainFault(`${elsewhere} belongs to another user, and PostgreSQL's data was to be kept there. Remove it, then try again.`);
  }
  return { folder: ownedFolder(elsewhere, as), as };
}

/** @param {string} folder */
function makeFolder(folder) {
  try {
    fs.mkdirSync(folder, { recursive: true, mode: 0o700 });
    fs.accessSync(folder, fs.constants.R_OK | fs.constants.W_OK | fs.constants.X_OK);
  } catch (error) {
    const code = /** @type {NodeJS.ErrnoException} */ (error).code;
    if (code === "ENOSPC") throw new PlainFault(`The disk is full: ${folder} could not be made.`);
    throw new PlainFault(`${folder} must be a folder that this user may write to (${code}). Was it made by root? Then remove it or start as root.`);
  }
}

/** Data that an ordinary user made keeps its owner when root comes along. @param {string} wanted */
function ownerOfData(wanted) {
  const data = path.join(wanted, "data");
  if (!fs.existsSync(data)) return null;
  const { uid, gid } = fs.statSync(data);
  return uid === 0 ? null : { uid, gid };
}

function userPostgres() {
  const line = fs.readFileSync("/etc/passwd", "utf8").split("\n").find((each) => each.startsWith("postgres:"));
  const [, , uid, gid] = line?.split(":") ?? [];
  if (!uid || !gid) throw new PlainFault("PostgreSQL must not run as root, and this system has no user postgres. Make one, or start as an ordinary user.");
  return { uid: Number(uid), gid: Number(gid) };
}

/** @param {string} folder @param {{ uid: number, gid: number }} as */
function reachable(folder, as) {
  return spawnSync("/usr/bin/test", ["-x", path.resolve(folder)], { uid: as.uid, gid: as.gid, cwd: "/" }).status === 0;
}

/** @param {string} folder @param {{ uid: number, gid: number }} as */
function ownedFolder(folder, as) {
  fs.mkdirSync(folder, { recursive: true, mode: 0o700 });
  fs.chownSync(folder, as.uid, as.gid);
  fs.chmodSync(folder, 0o700);
  return fs.realpathSync(folder);
}
