import fs from "node:fs";
import os from "node:os";
import path from "node:path";
import { afterEach, describe, expect, it } from "vitest";
import { sameAsLock } from "@/scripts/packages.mjs";
import { sourceHash } from "@/scripts/source-hash.mjs";
import { countTests } from "@/scripts/test.mjs";

const folder = fs.mkdtempSync(path.join(os.tmpdir(), "ellwand-packages-"));

function write(file: string, content: unknown): string {
  const place = path.join(folder, file);
  fs.mkdirSync(path.dirname(place), { recursive: true });
  fs.writeFileSync(place, typeof content === "string" ? content : JSON.stringify(content));
  return place;
}

afterEach(() => fs.rmSync(folder, { recursive: true, force: true }));

describe("whether the packages must be installed", () => {
  const lock = { packages: { "": {}, "node_modules/zod": { version: "4.6.7" }, "node_modules/only-elsewhere": { version: "1.0.0", optional: true } } };

  it("is not so when they are those of the lock file", () => {
    write("package-lock.json", lock);
    write("node_modules/.package-lock.json", { packages: { "node_modules/zod": { version: "4.6.7" } } });
    write("node_modules/zod/package.json", "{}");
    expect(sameAsLock(folder)).toBe(true);
  });

  it("is so when none are there, when one is another version, or when one was deleted", () => {
    write("package-lock.json", lock);
    expect(sameAsLock(folder)).toBe(false);
    write("node_modules/.package-lock.json", { packages: { "node_modules/zod": { version: "4.6.6" } } });
    write("node_modules/zod/package.json", "{}");
    expect(sameAsLock(folder)).toBe(false);
    write("node_modules/.package-lock.json", { packages: { "node_modules/zod": { version: "4.6.7" } } });
    fs.rmSync(path.join(folder, "node_modules/zod"), { recursive: true });
    expect(sameAsLock(folder)).toBe(false);
  });
});

describe("the hash of the sources", () => {
  it("changes with a content and with a name, and with nothing else", () => {
    write("lib/a.ts", "1");
    write("lib/b.ts", "2");
    const first = sourceHash(folder, ["lib", "missing"]);
    expect(sourceHash(folder, ["lib", "missing"])).toBe(first);
    write("lib/b.ts", "3");
    const second = sourceHash(folder, ["lib", "missing"]);
    expect(second).not.toBe(first);
    fs.renameSync(path.join(folder, "lib/b.ts"), path.join(folder, "lib/c.ts"));
    expect(sourceHash(folder, ["lib", "missing"])).not.toBe(second);
  });
});

describe("the count of a test stage", () => {
  it("is what the runners report", () => {
    const vitest = write("unit.json", { numPassedTests: 12, numFailedTests: 2 });
    expect(countTests("vitest", vitest, false)).toEqual({ passed: 12, failed: 2 });
    const browser = write("e2e.json", { stats: { expected: 5, unexpected: 1, flaky: 1, skipped: 0 } });
    expect(countTests("playwright", browser, false)).toEqual({ passed: 6, failed: 1 });
  });

  it("is never without a failure when the runner failed", () => {
    expect(countTests("vitest", write("unit.json", { numPassedTests: 12, numFailedTests: 0 }), false)).toEqual({ passed: 12, failed: 1 });
    expect(countTests("vitest", path.join(folder, "none.json"), false)).toEqual({ passed: 0, failed: 1 });
  });
});
