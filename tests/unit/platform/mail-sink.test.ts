import { spawn, type ChildProcess } from "node:child_process";
import { once } from "node:events";
import fs from "node:fs";
import os from "node:os";
import path from "node:path";
import { createInterface } from "node:readline";
import { createTransport } from "nodemailer";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { listSunkMail, readSunkMail } from "@/lib/server/mail-sink";

const ROOT = path.resolve(import.meta.dirname, "../../..");

describe("the local mail server", () => {
  const folder = fs.mkdtempSync(path.join(os.tmpdir(), "ellwand-mail-"));
  let child: ChildProcess;
  let url = "";

  beforeAll(async () => {
    Object.assign(process.env, { MAIL_SINK_FOLDER: folder, DATABASE_URL: "postgres://nowhere", NEXTAUTH_SECRET: "a secret of sixteen and more" });
    child = spawn(process.execPath, ["--import", "tsx", "scripts/mail-sink.ts", folder], { cwd: ROOT, stdio: ["ignore", "pipe", "inherit"] });
    if (!child.stdout) throw new Error("The port is read from the output.");
    const [port] = await once(createInterface({ input: child.stdout }), "line");
    url = `smtp://127.0.0.1:${port}`;
  });

  afterAll(() => {
    child.kill();
    fs.rmSync(folder, { recursive: true, force: true });
  });

  it("keeps a letter so that it reads as it was written", async () => {
    const subject = "Deine Kissenhülle „Wolkenzug“ ist gepackt – 3⅜ Yards, ein sehr langer Betreff, der über eine Zeile geht";
    const text = "Guten Tag,\n\nder Stoff = 1¼ yd, 5 € je Meter.\n.\nEine sehr lange Zeile, die der Brief umbrechen muss, damit kein Server daran Anstoß nimmt, und die trotzdem ganz bleibt.";
    await createTransport(url).sendMail({ from: "Osier Falls <shop@osierfalls.example>", to: "mika@example.net", subject, text });
    const [letter] = await listSunkMail();
    expect(letter).toMatchObject({ from: "Osier Falls <shop@osierfalls.example>", to: "mika@example.net", subject, text });
    expect(Math.abs(Date.now() - (letter?.receivedAt.getTime() ?? 0))).toBeLessThan(60_000);
    expect(await readSunkMail(letter?.id ?? "")).toEqual(letter);
  });

  it("shows the newest letter first, and the plain text of one that has both", async () => {
    await createTransport(url).sendMail({ from: "shop@osierfalls.example", to: "a@example.net, b@example.net", subject: "Second", text: "Plain", html: "<p>Rich</p>" });
    const letters = await listSunkMail();
    expect(letters.map((each) => each.subject)[0]).toBe("Second");
    expect(letters[0]).toMatchObject({ to: "a@example.net, b@example.net", text: "Plain" });
  });

  it("looks for nothing outside its folder", async () => {
    fs.writeFileSync(path.join(folder, "../secret.eml"), "Subject: no\n\nno");
    for (const id of ["../secret", "..%2fsecret", "", "1764600000000-0a1b2c3d"]) expect(await readSunkMail(id)).toBeNull();
    fs.rmSync(path.join(folder, "../secret.eml"));
  });
});
