import { X509Certificate } from "node:crypto";
import http from "node:http";
import https from "node:https";
import { PlainFault } from "../plain-fault.mjs";

export const ROOT_PATH = "/ellwand-root.crt";
/** What concerns only one connection (RFC 9110, 7.6.1) is not handed on. */
const HOP_BY_HOP = new Set(["connection", "keep-alive", "proxy-authenticate", "proxy-authorization", "proxy-connection", "te", "trailer", "transfer-encoding", "upgrade"]);

/**
 * Serves https to the network in front of the pages' server on loopback.
 * @param {{ port: number, inner: number, certificate: import("./certificate.mjs").LanCertificate, host?: string }} options
 * @returns {Promise<{ port: number, stop: () => Promise<void> }>}
 */
export function startLanProxy({ port, inner, certificate, host = "0.0.0.0" }) {
  const agent = new http.Agent({ keepAlive: true });
  const root = new X509Certificate(certificate.root).raw;
  const server = https.createServer({ key: certificate.key, cert: certificate.cert }, (request, response) => {
    if (request.url === ROOT_PATH) {
      response.writeHead(200, { "content-type": "application/x-x509-ca-cert", "content-length": root.length }).end(root);
      return;
    }
    handOn(request, response, inner, agent);
  });
  const stop = () =>
    new Promise((/** @type {(value: void) => void} */ resolve) => {
      server.close(() => resolve());
      server.closeAllConnections();
      agent.destroy();
    });
  return new Promise((resolve, reject) => {
    server.once("error", (error) => reject(new PlainFault(`Port ${port} cannot be served to the network: ${error.message}`)));
    server.listen(port, host, () => {
      const address = server.address();
      resolve({ port: address && typeof address === "object" ? address.port : port, stop });
    });
  });
}

/**
 * @param {http.IncomingMessage} request @param {http.ServerResponse} response @param {number} inner @param {http.Agent} agent
 */
function handOn(request, response, inner, agent) {
  const onward = http.request({ host: "127.0.0.1", port: inner, method: request.method, path: request.url, headers: onwardHeaders(request), agent });
  onward.once("response", (answer) => {
    response.writeHead(answer.statusCode ?? 502, keptHeaders(answer.headers));
    answer.pipe(response);
    answer.once("error", () => response.destroy());
  });
  onward.once("error", () => {
    if (response.headersSent) response.destroy();
    else response.writeHead(502, { "content-type": "text/plain; charset=utf-8" }).end("The shop's server does not answer. It may be starting: try again in a moment.\n");
  });
  // A listener to live events that goes away must not be served for ever.
  response.once("close", () => onward.destroy());
  request.pipe(onward);
}

/**
 * What a client says about where it comes from is worth nothing: those headers are dropped and set anew.
 * @param {http.IncomingMessage} request
 */
function onwardHeaders(request) {
  const kept = keptHeaders(request.headers);
  for (const name of Object.keys(kept)) {
    if (name.startsWith("x-forwarded-") || name.startsWith("x-middleware-") || ["forwarded", "x-real-ip", "x-nonce", "x-ellwand-path"].includes(name)) delete kept[name];
  }
  const from = request.socket.remoteAddress?.replace(/^::ffff:/, "") ?? "unknown";
  return { ...kept, "x-forwarded-for": from, "x-forwarded-proto": "https", "x-forwarded-host": request.headers.host ?? "" };
}

/** @param {http.IncomingHttpHeaders} headers @returns {http.OutgoingHttpHeaders} */
function keptHeaders(headers) {
  return Object.fromEntries(Object.entries(headers).filter(([name]) => !HOP_BY_HOP.has(name)));
}
