import { spawnSync } from "node:child_process";
import fs from "node:fs";
import { PlainFault } from "./plain-fault.mjs";

/** Debian starts a cluster of its own when PostgreSQL is installed, unless this file says otherwise. */
const CLUSTER_SETTINGS = "/etc/postgresql-common/createcluster.conf";

/**
 * Installs Debian packages as root. Where that is not possible it throws one sentence with the command to run.
 * @param {string[]} packages
 * @param {string} purpose what they are for, as the end of "is needed …".
 */
export function installDebianPackages(packages, purpose) {
  const list = packages.join(" ");
  const command = `apt-get install -y --no-install-recommends ${list}`;
  const asked = `${list} ${packages.length === 1 ? "is" : "are"} needed ${purpose}`;
  if (spawnSync("apt-get", ["--version"], { stdio: "ignore" }).status !== 0) {
    throw new PlainFault(`${asked}, and this system has no apt-get. Install ${list} with the system's own means, then try again.`);
  }
  if (process.getuid?.() !== 0) {
    throw new PlainFault(`${asked}, and only root may install packages. Run this once, then try again:\n  sudo ${command}`);
  }
  console.log(`Installing ${list} …`);
  if (packages.some((each) => each.startsWith("postgresql"))) forbidDebianCluster();
  const environment = { ...process.env, DEBIAN_FRONTEND: "noninteractive" };
  const run = (/** @type {string[]} */ args) => spawnSync("apt-get", args, { env: environment, encoding: "utf8", stdio: ["ignore", "pipe", "pipe"] });
  const install = ["install", "-y", "--no-install-recommends", ...packages];
  let result = run(install);
  if (result.status !== 0) {
    // The lists may be missing or old, as in a fresh container.
    run(["update"]);
    result = run(install);
  }
  if (result.status !== 0) {
    const reason = `${result.stdout}\n${result.stderr}`.trim().split("\n").slice(-4).join("\n  ");
    throw new PlainFault(`${asked}, and apt-get could not install ${packages.length === 1 ? "it" : "them"}. It said:\n  ${reason}`);
  }
}

function forbidDebianCluster() {
  const before = fs.existsSync(CLUSTER_SETTINGS) ? fs.readFileSync(CLUSTER_SETTINGS, "utf8") : "";
  if (/^\s*create_main_cluster\s*=\s*false/m.test(before)) return;
  fs.mkdirSync("/etc/postgresql-common", { recursive: true });
  fs.writeFileSync(CLUSTER_SETTINGS, `${before}${before && !before.endsWith("\n") ? "\n" : ""}create_main_cluster = false\n`);
}
