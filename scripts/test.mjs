/**
 * Everything that must hold, in the order of what fails fastest: types, lint, layers, unit and reference tests,
 * database tests, the build, browser tests. Stops at the first stage that fails. The last line counts the tests.
 */
import fs from "node:fs";
import path from "node:path";
import { fileURLToPath } from "node:url";
import { installDebianPackages } from "./debian-packages.mjs";
import { checkNode, ensurePackages } from "./packages.mjs";
import { runCommand } from "./plain-fault.mjs";
import { runNode } from "./run-node.mjs";

const ROOT = path.resolve(path.dirname(fileURLToPath(import.meta.url)), "..");
const RESULTS = path.join(ROOT, "test-results");
const LAYERED = ["app", "components", "lib", "labels", "models", "migrations", "seeders", "scripts", "proxy.ts", "instrumentation.ts"];

const bin = (/** @type {string} */ file) => path.join(ROOT, "node_modules", file);
const report = (/** @type {string} */ name) => path.join(RESULTS, `${name}.json`);
const vitest = (/** @type {string} */ name, /** @type {string[]} */ projects) => [
  ...[bin("vitest/vitest.mjs"), "run", ...projects.flatMap((each) => ["--project", each])],
  ...["--reporter=default", "--reporter=json", `--outputFile.json=${report(name)}`],
];

/** @type {{ name: string, commands: string[][], counts?: "vitest" | "playwright" }[]} */
const STAGES = [
  // Next writes the types of its routes; a fresh clone has none yet.
  { name: "types", commands: [[bin("next/dist/bin/next"), "typegen"], [bin("typescript/bin/tsc"), "--noEmit"]] },
  { name: "lint", commands: [[bin("eslint/bin/eslint.js"), ".", "--max-warnings", "0"]] },
  { name: "layers", commands: [[bin("dependency-cruiser/bin/dependency-cruise.mjs"), "--config", ".dependency-cruiser.cjs", ...LAYERED]] },
  { name: "unit", commands: [vitest("unit", ["unit", "reference"])], counts: "vitest" },
  { name: "db", commands: [vitest("db", ["db"])], counts: "vitest" },
  { name: "build", commands: [["scripts/build.mjs"]] },
  { name: "e2e", commands: [[bin("@playwright/test/cli.js"), "test"]], counts: "playwright" },
];

/** Programs that the tests call, with the Debian package that brings each. */
const PROGRAMS = [
  { file: "/usr/bin/chromium", package: "chromium" },
  { file: "/usr/lib/postgresql", package: "postgresql" },
  { file: "/usr/bin/pdftotext", package: "poppler-utils" },
];

/**
 * How many tests of a stage passed and failed, from the report that its runner wrote. A file that could not even be
 * loaded counts as one failure.
 * @param {"vitest" | "playwright"} runner @param {string} file @param {boolean} ok whether the runner was content.
 */
export function countTests(runner, file, ok) {
  const fallback = { passed: 0, failed: ok ? 0 : 1 };
  if (!fs.existsSync(file)) return fallback;
  const said = JSON.parse(fs.readFileSync(file, "utf8"));
  const passed = runner === "vitest" ? said.numPassedTests : said.stats.expected + said.stats.flaky;
  const failed = runner === "vitest" ? said.numFailedTests : said.stats.unexpected;
  return { passed, failed: Math.max(failed, fallback.failed) };
}

async function testEverything() {
  checkNode();
  ensurePackages(ROOT);
  const missing = PROGRAMS.filter((each) => !fs.existsSync(each.file)).map((each) => each.package);
  if (missing.length > 0) installDebianPackages(missing, "to run the tests");
  fs.rmSync(RESULTS, { recursive: true, force: true });
  fs.mkdirSync(RESULTS, { recursive: true });
  const total = { passed: 0, failed: 0 };
  let code = 0;
  for (const stage of STAGES) {
    const began = Date.now();
    console.log(`\n── ${stage.name}`);
    for (const command of stage.commands) code ||= await runNode(command, { cwd: ROOT, env: { ...process.env, NEXT_TELEMETRY_DISABLED: "1", FORCE_COLOR: "0", NO_COLOR: "1" } });
    console.log(`── ${stage.name}: ${code === 0 ? "passed" : "failed"} after ${Math.round((Date.now() - began) / 1000)} s`);
    const counted = stage.counts ? countTests(stage.counts, report(stage.name), code === 0) : { passed: 0, failed: code === 0 ? 0 : 1 };
    total.passed += counted.passed;
    total.failed += counted.failed;
    if (code !== 0) break;
  }
  console.log(`\n${total.passed} passed, ${total.failed} failed`);
  return code;
}

if (process.argv[1] && path.resolve(process.argv[1]) === fileURLToPath(import.meta.url)) await runCommand(testEverything);
