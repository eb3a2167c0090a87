import { spawnSync } from "node:child_process";
import { X509Certificate } from "node:crypto";
import fs from "node:fs";
import os from "node:os";
import path from "node:path";
import { installDebianPackages } from "../debian-packages.mjs";
import { PlainFault } from "../plain-fault.mjs";

const ROOT_DAYS = 3650;
/** Apple's devices refuse a server certificate that is valid for longer than 825 days. */
const SERVER_DAYS = 390;
const RENEW_BEFORE_MS = 14 * 86_400_000;

/** @typedef {{ key: string, cert: string, root: string, rootFingerprint: string }} LanCertificate PEM texts. */

/** The addresses of this machine in its networks, IPv4. */
export function ownAddresses() {
  const found = Object.values(os.networkInterfaces())
    .flatMap((each) => each ?? [])
    .filter((each) => each.family === "IPv4" && !each.internal)
    .map((each) => each.address);
  if (found.length === 0) throw new PlainFault("--lan needs a network, and this machine has only its own loopback. Connect it, or start without --lan.");
  return found;
}

/**
 * A certificate for these addresses, signed by a root of this project's own that a tablet can be told to trust. The
 * root stays the same while the addresses change, so a tablet is told once.
 * @param {string} folder @param {string[]} addresses
 * @returns {LanCertificate}
 */
export function ensureCertificate(folder, addresses) {
  const file = (/** @type {string} */ name) => path.join(folder, name);
  const read = (/** @type {string} */ name) => fs.readFileSync(file(name), "utf8");
  fs.mkdirSync(folder, { recursive: true, mode: 0o700 });
  const names = [...addresses.map((each) => `IP:${each}`), "IP:127.0.0.1", "DNS:localhost"].join(",");
  if (!isGood(file("root.crt")) || !fs.existsSync(file("root.key"))) {
    makeRoot(folder);
    fs.rmSync(file("server.crt"), { force: true });
  }
  if (!isGood(file("server.crt")) || !fs.existsSync(file("names")) || read("names") !== names) {
    makeServer(folder, names);
    fs.writeFileSync(file("names"), names);
  }
  const root = read("root.crt");
  return { key: read("server.key"), cert: read("server.crt") + root, root, rootFingerprint: new X509Certificate(root).fingerprint256 };
}

/** @param {string} file */
function isGood(file) {
  if (!fs.existsSync(file)) return false;
  return Date.parse(new X509Certificate(fs.readFileSync(file)).validTo) - RENEW_BEFORE_MS > Date.now();
}

/** @param {string} folder */
function makeRoot(folder) {
  openssl(folder, [
    ...["req", "-x509", "-newkey", "ec", "-pkeyopt", "ec_paramgen_curve:prime256v1", "-nodes", "-sha256"],
    ...["-days", String(ROOT_DAYS), "-subj", `/CN=Ellwand on ${os.hostname().slice(0, 40).replaceAll("/", "-")}`],
    ...["-addext", "basicConstraints=critical,CA:TRUE,pathlen:0", "-addext", "keyUsage=critical,keyCertSign,cRLSign"],
    ...["-keyout", "root.key", "-out", "root.crt"],
  ]);
  fs.chmodSync(path.join(folder, "root.key"), 0o600);
}

/** @param {string} folder @param {string} names */
function makeServer(folder, names) {
  openssl(folder, ["req", "-new", "-newkey", "ec", "-pkeyopt", "ec_paramgen_curve:prime256v1", "-nodes", "-subj", "/CN=Ellwand", "-keyout", "server.key", "-out", "server.csr"]);
  fs.chmodSync(path.join(folder, "server.key"), 0o600);
  const extensions = ["basicConstraints=critical,CA:FALSE", "keyUsage=critical,digitalSignature", "extendedKeyUsage=serverAuth", `subjectAltName=${names}`];
  fs.writeFileSync(path.join(folder, "server.ext"), `${extensions.join("\n")}\n`);
  openssl(folder, [
    ...["x509", "-req", "-in", "server.csr", "-CA", "root.crt", "-CAkey", "root.key", "-CAcreateserial", "-sha256"],
    ...["-days", String(SERVER_DAYS), "-extfile", "server.ext", "-out", "server.crt"],
  ]);
}

/** @param {string} folder @param {string[]} args */
function openssl(folder, args) {
  const run = () => spawnSync("openssl", args, { cwd: folder, encoding: "utf8" });
  let result = run();
  if (/** @type {NodeJS.ErrnoException | undefined} */ (result.error)?.code === "ENOENT") {
    installDebianPackages(["openssl"], "to make the certificate of --lan");
    result = run();
  }
  if (result.status !== 0) throw new PlainFault(`The certificate could not be made. openssl said:\n  ${(result.stderr ?? "").trim()}`);
}
