import fs from "node:fs";
import path from "node:path";
import { describe, expect, it } from "vitest";

const ROOT = path.resolve(import.meta.dirname, "../../..");
const lock = JSON.parse(fs.readFileSync(path.join(ROOT, "package-lock.json"), "utf8")) as { packages: Record<string, { version?: string }> };

/**
 * The oldest versions without a published security fault that concerns us (advisories up to 2026-12-01): code execution
 * in server components and a cross-user cache disclosure in next, SQL injection through JSON keys in sequelize, sign-in
 * in next-auth, the AVIF decoder in sharp, SMTP injection in nodemailer.
 */
const FLOORS: Record<string, string> = {
  next: "16.4.6",
  react: "19.3.1",
  "react-dom": "19.3.1",
  sequelize: "6.37.8",
  "next-auth": "4.24.15",
  sharp: "0.35.5",
  nodemailer: "9.0.0",
};

function atLeast(version: string, floor: string): boolean {
  const parts = (text: string) => text.split("-")[0]?.split(".").map(Number) ?? [];
  const [have, need] = [parts(version), parts(floor)];
  const different = need.findIndex((each, index) => each !== (have[index] ?? 0));
  return different < 0 ? !version.includes("-") : (have[different] ?? 0) > (need[different] ?? 0);
}

function copiesOf(name: string): [place: string, version: string][] {
  return Object.entries(lock.packages)
    .filter(([place]) => place.endsWith(`node_modules/${name}`))
    .map(([place, { version = "0.0.0" }]) => [place, version]);
}

describe("the version floors", () => {
  it.each(Object.entries(FLOORS))("no copy of %s is older than %s", (name, floor) => {
    const copies = copiesOf(name);
    expect(copies.length).toBeGreaterThan(0);
    expect(copies.filter(([, version]) => !atLeast(version, floor))).toEqual([]);
  });

  it.each([
    ["16.4.5", "16.4.6", false],
    ["16.10.0", "16.4.6", true],
    ["9.0.0-beta.1", "9.0.0", false],
    ["0.35.5", "0.35.5", true],
    ["17.0.0", "16.4.6", true],
  ])("%s is compared with %s by its numbers", (version, floor, expected) => {
    expect(atLeast(version, floor)).toBe(expected);
  });
});
