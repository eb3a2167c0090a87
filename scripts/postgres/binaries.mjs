import { spawnSync } from "node:child_process";
import fs from "node:fs";
import path from "node:path";
import { installDebianPackages } from "../debian-packages.mjs";
import { PlainFault } from "../plain-fault.mjs";

const DEBIAN_FOLDER = "/usr/lib/postgresql";
/** CREATE DATABASE … STRATEGY came with this version. */
const OLDEST_MAJOR = 15;

/**
 * The folder of initdb, pg_ctl and psql: the version that made the data where there is some, else the newest.
 * Installs Debian's package where none is found.
 * @param {string | null} madeBy the major version in the data folder's PG_VERSION.
 * @returns {string}
 */
export function postgresBinaries(madeBy) {
  let found = installed();
  if (found.length === 0) {
    installDebianPackages(["postgresql"], "to keep the shop's data");
    found = installed();
  }
  const usable = found.filter((each) => each.major >= OLDEST_MAJOR).sort((a, b) => b.major - a.major);
  const chosen = madeBy ? usable.find((each) => String(each.major) === madeBy) : usable[0];
  if (chosen) return chosen.folder;
  const have = found.map((each) => each.major).join(", ") || "none";
  throw new PlainFault(
    madeBy
      ? `The data was made by PostgreSQL ${madeBy}, and this system has ${have}. Install PostgreSQL ${madeBy}, or start again with --fresh (the data is then lost).`
      : `PostgreSQL ${OLDEST_MAJOR} or newer is needed, and this system has ${have}.`,
  );
}

/** @returns {{ major: number, folder: string }[]} */
function installed() {
  const folders = fs.existsSync(DEBIAN_FOLDER) ? fs.readdirSync(DEBIAN_FOLDER).map((each) => path.join(DEBIAN_FOLDER, each, "bin")) : [];
  const onPath = (process.env.PATH ?? "").split(path.delimiter).filter((each) => path.isAbsolute(each));
  const seen = new Map();
  for (const folder of [...folders, ...onPath]) {
    // Debian's own pg_ctl is not on the path, and psql on the path is a wrapper: initdb tells a real folder.
    if (!["initdb", "pg_ctl", "postgres", "psql"].every((each) => fs.existsSync(path.join(folder, each)))) continue;
    const major = Number(/\d+/.exec(spawnSync(path.join(folder, "postgres"), ["--version"], { encoding: "utf8" }).stdout ?? "")?.[0]);
    if (major && !seen.has(major)) seen.set(major, { major, folder });
  }
  return [...seen.values()];
}
