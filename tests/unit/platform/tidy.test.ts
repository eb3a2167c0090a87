import { spawnSync } from "node:child_process";
import fs from "node:fs";
import path from "node:path";
import { describe, expect, it } from "vitest";
import { filesUnder } from "@/scripts/source-hash.mjs";

const ROOT = path.resolve(import.meta.dirname, "../../..");
const MADE = /^(build|coverage|node_modules|playwright-report|shots|test-results)\/|^next-env\.d\.ts$|\.tsbuildinfo$/;
const files = trackedFiles().filter((file) => fs.existsSync(path.join(ROOT, file)));

/** What is in the repository; in a copy without one, everything that is not made by a tool. */
function trackedFiles(): string[] {
  const listed = spawnSync("git", ["ls-files"], { cwd: ROOT, encoding: "utf8", maxBuffer: 64_000_000 });
  if (listed.status === 0) return listed.stdout.split("\n").filter((file) => file !== "");
  return filesUnder(ROOT).map((file) => path.relative(ROOT, file)).filter((file) => !MADE.test(file));
}

const TOP = new Set([
  ...["app", "components", "lib", "models", "migrations", "seeders", "labels", "public", "fonts", "tests", "scripts"],
  ...["package.json", "package-lock.json", "tsconfig.json", "next.config.mjs", "tailwind.config.ts", "README.md", "DEVELOPERS.md", "LICENSE"],
]);
const TOP_PATTERN = /^(\..*|.*\.config\..*|.*\.d\.ts|proxy\.ts|instrumentation[^/]*\.ts)$/;

const MOST_LINES = 400;
const isFixture = (file: string) => file.startsWith("tests/fixtures/");
const sources = files.filter((file) => /\.(ts|tsx|mts|mjs|cjs)$/.test(file) && !isFixture(file)).map((file) => ({ file, text: fs.readFileSync(path.join(ROOT, file), "utf8") }));

/** Put together from halves, so that this file does not find itself. */
const FORBIDDEN: readonly [what: string, pattern: RegExp][] = [
  ["type any", /(:\s*|\bas\s+|<|,\s*)any\b(?=\s*[;,)>\]={|&]|\[\]|$)/m],
  ["switched-off compiler", new RegExp("@ts-" + "(ignore|nocheck|expect-error)")],
  ["switched-off lint rule", new RegExp("eslint-" + "disable")],
  ["unfinished work", new RegExp("\\b(TO" + "DO|FIX" + "ME|XX" + "X)\\b")],
];
const SKIPPED = /\b(it|test|describe)\.(skip|only|todo|fixme)\b/;

describe("the tree is tidy", () => {
  it("has nothing at the top level that has no business there", () => {
    const top = new Set(files.map((file) => file.split("/")[0] ?? ""));
    expect([...top].filter((name) => !TOP.has(name) && !TOP_PATTERN.test(name))).toEqual([]);
  });

  it.each(FORBIDDEN)("holds no %s", (_, pattern) => {
    const found = sources.filter(({ text }) => pattern.test(withoutProse(text, pattern))).map(({ file }) => file);
    expect(found).toEqual([]);
  });

  it("skips no test", () => {
    expect(sources.filter(({ file, text }) => file.startsWith("tests/") && SKIPPED.test(text)).map(({ file }) => file)).toEqual([]);
  });

  it(`keeps every file under ${MOST_LINES} lines`, () => {
    const long = sources.filter(({ file, text }) => !file.startsWith("seeders/") && text.split("\n").length > MOST_LINES + 1);
    expect(long.map(({ file }) => file)).toEqual([]);
  });

  it("names files in kebab-case, apart from what Next.js names", () => {
    const named = sources.filter(({ file }) => !/^[a-z0-9.-]+$/.test(path.basename(file)));
    expect(named.map(({ file }) => file)).toEqual([]);
  });

  it("has no drawer for odds and ends", () => {
    expect(files.filter((file) => /(^|\/)(utils?|helpers?|common|misc|index)(\/|\.(ts|tsx|mjs)$)/.test(file) && !isFixture(file))).toEqual([]);
  });
});

describe("the tidy checks can fail", () => {
  it.each([
    ["const a: any = 1;", 0],
    ["let rows: any[];", 0],
    ["read(x as any)", 0],
    ["Record<string, any>", 0],
    ["// @ts-" + "ignore", 1],
    ["/* eslint-" + "disable */", 2],
    ["// TO" + "DO: later", 3],
  ])("%s is found", (text, rule) => {
    expect(FORBIDDEN[rule]?.[1].test(text)).toBe(true);
  });

  it.each(["// as any shop would", "const many: company = any(x)", "a sentence, any of it"])("%s is left alone", (text) => {
    const [, pattern] = FORBIDDEN[0] ?? [];
    expect(pattern && pattern.test(withoutProse(text, pattern))).toBe(false);
  });
});

/** Comments may say "as any shop would"; for the other checks comments are the very thing. */
function withoutProse(text: string, pattern: RegExp): string {
  if (pattern !== FORBIDDEN[0]?.[1]) return text;
  return text.replace(/\/\*[\s\S]*?\*\//g, "").replace(/(^|\s)\/\/.*$/gm, "").replace(/"(?:[^"\\\n]|\\.)*"|`[^`]*`/g, '""');
}
