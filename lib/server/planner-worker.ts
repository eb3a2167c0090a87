import { createRequire } from "node:module";
import path from "node:path";
import { parentPort } from "node:worker_threads";
import loadHighs from "highs";
import { planBolts } from "../core/cutting/bolt-plan";
import { createHighsSolver } from "../core/cutting/highs-solver";
import { planKit, type KitPlanInput } from "../core/kit/kit-plan";
import type { BoltPlanInput } from "../core/piece/bolt-plan";
import type { PlanControl } from "../core/piece/strip-plan";
import type { FromWorker, ToWorker } from "./planner/messages";

/**
 * The planner's worker thread: one question at a time, so that planning never holds up a page. It keeps the solver warm
 * between questions. `scripts/build.mjs` bundles it.
 */
const solver = createHighsSolver(() => {
  const folder = path.dirname(createRequire(import.meta.url).resolve("highs"));
  return loadHighs({ locateFile: (file: string) => path.join(folder, file) });
});
const BOLT_NODES = 500_000;
const port = parentPort;
if (!port) throw new Error("The planner's worker runs as a worker thread.");

port.on("message", async (message: ToWorker) => {
  const say = (said: FromWorker) => port.postMessage(said);
  const control: PlanControl = {
    progress: (progress) => say({ kind: "progress", id: message.id, progress }),
    stopped: () => Atomics.load(message.stopFlag, 0) === 1,
  };
  try {
    const result = message.kind === "kit" ? await planKit(message.input as KitPlanInput, solver, control) : await planBolts(message.input as BoltPlanInput, { nodes: BOLT_NODES }, null, control);
    say({ kind: "answer", id: message.id, result });
  } catch (error) {
    console.error("The planner", error);
    say({ kind: "answer", id: message.id, result: { ok: false, fault: { code: "planner-broke", message: "The planner broke off on this plan. Change a measure, or tell whoever looks after Ellwand." } } });
  }
});
