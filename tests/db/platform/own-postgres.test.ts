import { execFile } from "node:child_process";
import fs from "node:fs";
import os from "node:os";
import path from "node:path";
import { promisify } from "node:util";
import { Client } from "pg";
import { afterAll, describe, expect, it } from "vitest";
import { ensurePostgres, removePostgres, stopPostgres } from "@/scripts/postgres.mjs";

const ROOT = path.resolve(import.meta.dirname, "../../..");
const run = promisify(execFile);

describe("a PostgreSQL of our own", () => {
  const parent = fs.mkdtempSync(path.join(os.tmpdir(), "ellwand-own-"));
  fs.chmodSync(parent, 0o755);
  const wish = { folder: path.join(parent, "postgres"), name: "shop", durable: false };

  afterAll(async () => {
    await removePostgres(wish.folder);
    fs.rmSync(parent, { recursive: true, force: true });
  });

  async function ask(url: string, sql: string): Promise<unknown> {
    const client = new Client({ connectionString: url });
    await client.connect();
    try {
      return Object.values((await client.query<Record<string, unknown>>(sql)).rows[0] ?? {})[0];
    } finally {
      await client.end();
    }
  }

  async function kill(data: string): Promise<number> {
    const pid = Number(fs.readFileSync(path.join(data, "postmaster.pid"), "utf8").split("\n")[0]);
    process.kill(pid, "SIGKILL");
    return pid;
  }

  /** Starts in processes of their own, all at once. */
  async function startTogether(times: number): Promise<Set<string>> {
    const code = `import { ensurePostgres } from ${JSON.stringify(path.join(ROOT, "scripts/postgres.mjs"))}; console.log((await ensurePostgres(${JSON.stringify(wish)})).url);`;
    const all = await Promise.all(Array.from({ length: times }, () => run(process.execPath, ["--input-type=module", "--eval", code])));
    return new Set(all.map(({ stdout }) => stdout.trim()));
  }

  it("is made once by starts that run together", async () => {
    const urls = await startTogether(3);
    expect(urls.size).toBe(1);
    expect(fs.readdirSync(wish.folder).filter((name) => name.startsWith("data"))).toEqual(["data"]);
  });

  it("takes only those who know the password, on loopback", async () => {
    const { url, data } = await ensurePostgres(wish);
    expect(await ask(url, "SELECT current_database()")).toBe("shop");
    expect(await ask(url, "SHOW listen_addresses")).toBe("127.0.0.1");
    expect(await ask(url, "SHOW unix_socket_directories")).toBe("");
    const wrong = new URL(url);
    wrong.password = "wrong";
    await expect(ask(wrong.href, "SELECT 1")).rejects.toMatchObject({ code: "28P01" });
    expect(fs.statSync(path.join(data, "ellwand.password")).mode & 0o077).toBe(0);
  });

  it("comes back after a kill, on the same port and with what was committed", async () => {
    const before = await ensurePostgres(wish);
    await ask(before.url, "CREATE TABLE cloth AS SELECT 7 AS yards");
    await kill(before.data);
    const after = await ensurePostgres(wish);
    expect(after).toMatchObject({ url: before.url, started: true, made: false });
    expect(await ask(after.url, "SELECT yards FROM cloth")).toBe(7);
  });

  it("is not fooled when the killed server's number belongs to another process", async () => {
    const before = await ensurePostgres(wish);
    await kill(before.data);
    const file = path.join(before.data, "postmaster.pid");
    fs.writeFileSync(file, fs.readFileSync(file, "utf8").replace(/^\d+/, String(process.pid)));
    expect(await ensurePostgres(wish)).toMatchObject({ url: before.url, started: true });
  });

  it("is started once by starts that run together after a kill", async () => {
    const before = await ensurePostgres(wish);
    await kill(before.data);
    expect(await startTogether(4)).toEqual(new Set([before.url]));
  });

  it("stays up for others, and is stopped by whoever leaves last", async () => {
    const cluster = await ensurePostgres(wish);
    const other = new Client({ connectionString: cluster.url });
    other.on("error", () => undefined);
    await other.connect();
    await cluster.leave();
    expect((await other.query("SELECT 1 AS one")).rows).toEqual([{ one: 1 }]);
    await other.end();
    await cluster.leave();
    expect(await stopPostgres(wish.folder)).toBe(false);
  });
});
