import { randomBytes } from "node:crypto";
import fs from "node:fs";
import path from "node:path";

/**
 * The secret that signs session cookies: made once and kept, so that a restart signs nobody out.
 * @param {string} file
 */
export function keptSecret(file) {
  if (fs.existsSync(file)) {
    const kept = fs.readFileSync(file, "utf8").trim();
    if (kept.length >= 32) return kept;
  }
  const secret = randomBytes(32).toString("base64url");
  fs.mkdirSync(path.dirname(file), { recursive: true });
  fs.writeFileSync(file, `${secret}\n`, { mode: 0o600 });
  return secret;
}
