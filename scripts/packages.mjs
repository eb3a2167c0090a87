import { spawnSync } from "node:child_process";
import fs from "node:fs";
import path from "node:path";
import { PlainFault } from "./plain-fault.mjs";

const OLDEST_NODE = [20, 9];

/** Refuses a Node.js that cannot run the project, with both versions named. */
export function checkNode(version = process.versions.node) {
  const [major = 0, minor = 0] = version.split(".").map(Number);
  const [needMajor = 0, needMinor = 0] = OLDEST_NODE;
  if (major > needMajor || (major === needMajor && minor >= needMinor)) return;
  throw new PlainFault(`Node.js ${OLDEST_NODE.join(".")} or newer is needed, and this is ${version}.`);
}

/**
 * Installs the packages of package-lock.json where they are missing or others. npm writes its own record last, so an
 * installation that was broken off is seen as missing.
 * @param {string} root
 */
export function ensurePackages(root) {
  if (sameAsLock(root)) return;
  console.log("Installing the packages of package-lock.json. The first time this takes a minute or two …");
  const result = spawnSync("npm", ["ci", "--no-audit", "--no-fund", "--fetch-retry-mintimeout=2000", "--fetch-retry-maxtimeout=8000"], { cwd: root, encoding: "utf8", stdio: ["ignore", "inherit", "pipe"] });
  if (result.error) throw new PlainFault(`npm could not be started (${result.error.message}). It comes with Node.js.`);
  if (result.status !== 0) throw new PlainFault(npmFault(result.stderr));
}

/** @param {string} root */
export function sameAsLock(root) {
  const wanted = packagesIn(path.join(root, "package-lock.json"));
  const have = packagesIn(path.join(root, "node_modules/.package-lock.json"));
  if (!wanted || !have) return false;
  return Object.entries(wanted).every(([place, entry]) => {
    if (place === "") return true;
    const installed = have[place];
    // What is optional may be for another system.
    return installed ? installed.version === entry.version && fs.existsSync(path.join(root, place)) : entry.optional === true || entry.devOptional === true || entry.peer === true;
  });
}

/**
 * @param {string} file
 * @returns {Record<string, { version?: string, optional?: boolean, devOptional?: boolean, peer?: boolean }> | null}
 */
function packagesIn(file) {
  if (!fs.existsSync(file)) return null;
  return JSON.parse(fs.readFileSync(file, "utf8")).packages ?? null;
}

/** @param {string} said what npm wrote. */
function npmFault(said) {
  const intro = "The packages could not be installed.";
  if (/ENOSPC/.test(said)) return `${intro} The disk is full: about 1 GB is needed.`;
  if (/ENOTFOUND|EAI_AGAIN|ETIMEDOUT|ECONNREFUSED|ECONNRESET|ENETUNREACH/.test(said)) {
    return `${intro} npm's registry could not be reached: connect to the network once, after that none is needed.`;
  }
  if (/EACCES|EPERM/.test(said)) return `${intro} This user may not write to the project's folder.`;
  return `${intro} npm said:\n  ${said.trim().split("\n").slice(-6).join("\n  ")}`;
}
