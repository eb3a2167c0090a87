/** Builds what the servers run: the planner's worker, and the pages. Nothing is done when the sources are unchanged. */
import fs from "node:fs";
import path from "node:path";
import { fileURLToPath } from "node:url";
import { PlainFault, runCommand } from "./plain-fault.mjs";
import { runNode } from "./run-node.mjs";
import { sourceHash } from "./source-hash.mjs";

const ROOT = path.resolve(path.dirname(fileURLToPath(import.meta.url)), "..");
const WORKER_SOURCE = "lib/server/planner-worker.ts";
export const WORKER_FILE = path.join(ROOT, "build/planner-worker.mjs");
const SOURCES = [
  "app", "components", "fonts", "labels", "lib", "models", "public",
  "instrumentation.ts", "next.config.mjs", "package-lock.json", "postcss.config.mjs", "proxy.ts", "tailwind.config.ts", "tsconfig.json",
];

/** Bundles the planner's worker: a worker thread cannot read TypeScript. */
export async function buildWorker() {
  const { build } = await import("esbuild");
  await build({
    absWorkingDir: ROOT,
    entryPoints: [WORKER_SOURCE],
    outfile: WORKER_FILE,
    bundle: true,
    platform: "node",
    format: "esm",
    target: "node20",
    packages: "external",
    sourcemap: "linked",
    logLevel: "warning",
  });
}

/**
 * Builds the pages unless the last build was made from these very sources.
 * @returns {Promise<boolean>} whether there was anything to build.
 */
export async function ensureBuild() {
  const folder = path.join(ROOT, process.env.NEXT_DIST_DIR || ".next");
  const stamp = path.join(folder, "ellwand-sources");
  const hash = sourceHash(ROOT, SOURCES);
  if (fs.existsSync(WORKER_FILE) && fs.existsSync(stamp) && fs.readFileSync(stamp, "utf8") === hash) return false;
  fs.rmSync(stamp, { force: true });
  await buildWorker();
  const next = path.join(ROOT, "node_modules/next/dist/bin/next");
  const code = await runNode([next, "build"], { cwd: ROOT, env: { ...process.env, NODE_ENV: "production", NEXT_TELEMETRY_DISABLED: "1" } });
  if (code !== 0) throw new PlainFault("The pages could not be built: the reason stands above.");
  // Next may settle tsconfig.json while it builds, so the stamp is that of the sources as they now are.
  fs.writeFileSync(stamp, sourceHash(ROOT, SOURCES));
  return true;
}

if (process.argv[1] && path.resolve(process.argv[1]) === fileURLToPath(import.meta.url)) {
  await runCommand(async () => {
    if (!(await ensureBuild())) console.log("The build is up to date.");
  });
}
