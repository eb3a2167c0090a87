import { ROOT_PATH } from "./lan-proxy.mjs";

/**
 * What a person does once on each tablet, as text.
 * @param {string[]} addresses @param {number} port @param {import("./certificate.mjs").LanCertificate} certificate
 */
export function howToTrust(addresses, port, certificate) {
  return `
A tablet trusts this shop once it knows its certificate. Once on each tablet:
  1. Open https://${addresses[0]}:${port}${ROOT_PATH} there, and let the browser go on past its warning this once.
  2. iPad: Settings, General, VPN & Device Management: install the profile. Then General, About,
     Certificate Trust Settings: switch it on.
     Android: Settings, Security, Encryption & credentials, Install a certificate, CA certificate.
     Windows: open the file, Install Certificate, Local Machine, Trusted Root Certification Authorities.
  3. Compare its SHA-256 fingerprint:
     ${certificate.rootFingerprint.slice(0, 47)}
     ${certificate.rootFingerprint.slice(48)}`;
}
