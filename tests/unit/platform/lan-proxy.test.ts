import fs from "node:fs";
import http from "node:http";
import https from "node:https";
import os from "node:os";
import path from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { ensureCertificate } from "@/scripts/lan/certificate.mjs";
import { startLanProxy } from "@/scripts/lan/lan-proxy.mjs";

describe("https for the tablets", () => {
  const folder = fs.mkdtempSync(path.join(os.tmpdir(), "ellwand-lan-"));
  const certificate = ensureCertificate(folder, ["192.0.2.7"]);
  let seen: http.IncomingHttpHeaders = {};
  let listenerGone: Promise<void>;
  const pages = http.createServer((request, response) => {
    seen = request.headers;
    if (request.url === "/events") {
      listenerGone = new Promise((resolve) => response.once("close", () => resolve()));
      response.writeHead(200, { "content-type": "text/event-stream" }).write("data: 1\n\n");
      return;
    }
    const chunks: Buffer[] = [];
    request.on("data", (chunk: Buffer) => chunks.push(chunk));
    request.on("end", () => response.writeHead(201, { "set-cookie": ["a=1", "b=2"] }).end(`${request.method} ${Buffer.concat(chunks).toString()}`));
  });
  let proxy: Awaited<ReturnType<typeof startLanProxy>>;

  beforeAll(async () => {
    await new Promise<void>((resolve) => pages.listen(0, "127.0.0.1", resolve));
    const address = pages.address();
    proxy = await startLanProxy({ port: 0, inner: typeof address === "object" && address ? address.port : 0, certificate, host: "127.0.0.1" });
  });

  afterAll(async () => {
    await proxy.stop();
    pages.closeAllConnections();
    pages.close();
    fs.rmSync(folder, { recursive: true, force: true });
  });

  function ask(url: string, options: https.RequestOptions = {}, body = ""): Promise<http.IncomingMessage> {
    return new Promise((resolve, reject) => {
      const request = https.request({ host: "127.0.0.1", port: proxy.port, path: url, ca: certificate.root, agent: false, ...options }, resolve);
      request.once("error", reject).end(body);
    });
  }

  async function text(answer: http.IncomingMessage): Promise<string> {
    const chunks: Buffer[] = [];
    for await (const chunk of answer) chunks.push(chunk as Buffer);
    return Buffer.concat(chunks).toString();
  }

  it("hands a request on and its answer back, trusted through the root alone", async () => {
    const answer = await ask("/", { method: "POST", headers: { host: "192.0.2.7:3000" } }, "yardage");
    expect([answer.statusCode, await text(answer), answer.headers["set-cookie"]]).toEqual([201, "POST yardage", ["a=1", "b=2"]]);
  });

  it("says itself where the request came from, whatever the client says", async () => {
    const headers = { host: "192.0.2.7:3000", "x-forwarded-for": "203.0.113.9", "x-forwarded-host": "evil.example", "x-forwarded-proto": "http", forwarded: "for=203.0.113.9", "x-real-ip": "203.0.113.9" };
    await text(await ask("/", { headers }));
    expect(seen).toMatchObject({ host: "192.0.2.7:3000", "x-forwarded-for": "127.0.0.1", "x-forwarded-host": "192.0.2.7:3000", "x-forwarded-proto": "https" });
    expect(seen.forwarded).toBeUndefined();
    expect(seen["x-real-ip"]).toBeUndefined();
  });

  it("gives out its root certificate, and never a key", async () => {
    const answer = await ask("/ellwand-root.crt");
    expect(answer.headers["content-type"]).toBe("application/x-x509-ca-cert");
    expect(await text(answer)).not.toContain("PRIVATE");
  });

  it("passes live events at once and lets go when the listener does", async () => {
    const answer = await ask("/events");
    const first = await new Promise<string>((resolve) => answer.once("data", (chunk: Buffer) => resolve(chunk.toString())));
    expect(first).toBe("data: 1\n\n");
    answer.destroy();
    await listenerGone;
  });

  it("keeps the root when the addresses change, so that a tablet is told once", () => {
    const moved = ensureCertificate(folder, ["198.51.100.4"]);
    expect(moved.root).toBe(certificate.root);
    expect(moved.cert).not.toBe(certificate.cert);
    expect(ensureCertificate(folder, ["198.51.100.4"]).cert).toBe(moved.cert);
    expect(fs.statSync(path.join(folder, "root.key")).mode & 0o077).toBe(0);
  });
});
