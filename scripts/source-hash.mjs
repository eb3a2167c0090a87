import { createHash } from "node:crypto";
import fs from "node:fs";
import path from "node:path";

/**
 * A short hash of the names and contents of files, so that what was made from them is made again only when they change.
 * @param {string} root
 * @param {readonly string[]} places files or folders under the root; those that are missing count as empty.
 */
export function sourceHash(root, places) {
  const hash = createHash("sha256");
  for (const place of places) {
    for (const file of filesUnder(path.join(root, place))) hash.update(path.relative(root, file)).update("\0").update(fs.readFileSync(file)).update("\0");
  }
  return hash.digest("hex").slice(0, 16);
}

/**
 * Every file below, in an order that does not depend on the file system. @param {string} place
 * @returns {string[]}
 */
export function filesUnder(place) {
  const stat = fs.statSync(place, { throwIfNoEntry: false });
  if (!stat) return [];
  if (!stat.isDirectory()) return [place];
  return fs
    .readdirSync(place)
    .filter((name) => !name.startsWith(".") && name !== "node_modules")
    .sort()
    .flatMap((name) => filesUnder(path.join(place, name)));
}
