import path from "node:path";
import type { Worker } from "node:worker_threads";
import { endJob, reportProgress, takeJob, type TakenJob } from "@/lib/data/planning/jobs";
import { environment } from "@/lib/server/environment";
import type { FromWorker, ToWorker } from "./messages";

/** One worker a process, kept warm: the solver's first call costs 0.2 s. */
interface Planner {
  worker: Worker | null;
  busy: boolean;
}

const shared = globalThis as typeof globalThis & { ellwandPlanner?: Planner };
const WORKER_NAME = `process-${process.pid}`;
const REPORT_EVERY_MS = 400;

/** Works off the waiting jobs, one after the other. Called after a job is asked for, and every few seconds. */
export async function runPlanningJobs(): Promise<void> {
  const planner = (shared.ellwandPlanner ??= { worker: null, busy: false });
  if (planner.busy) return;
  planner.busy = true;
  try {
    for (let job = await takeJob(WORKER_NAME); job; job = await takeJob(WORKER_NAME)) await runJob(planner, job);
  } finally {
    planner.busy = false;
  }
}

async function runJob(planner: Planner, job: TakenJob): Promise<void> {
  const worker = (planner.worker ??= startWorker(planner));
  const stopFlag = new Int32Array(new SharedArrayBuffer(4));
  let latest = { done: 0, sentence: "Begun." };
  const timer = setInterval(async () => {
    const { stopAsked } = await reportProgress(job.id, latest.done, latest.sentence).catch(() => ({ stopAsked: false }));
    if (stopAsked) Atomics.store(stopFlag, 0, 1);
  }, REPORT_EVERY_MS);
  try {
    const answer = await ask(worker, { id: job.id, kind: job.kind, input: job.input, stopFlag }, (progress) => (latest = progress));
    const stopped = Atomics.load(stopFlag, 0) === 1;
    await endJob(job, { state: answer.ok ? (stopped ? "stopped" : "done") : "failed", result: answer.ok ? answer.value : { fault: answer.fault }, sentence: answer.ok ? "" : answer.fault.message });
  } catch (error) {
    console.error("Planning job", job.id, error);
    planner.worker = null;
    await worker.terminate();
    await endJob(job, { state: "failed", result: null, sentence: "The planner broke off. Ask for the plan again." });
  } finally {
    clearInterval(timer);
  }
}

function startWorker(planner: Planner): Worker {
  // Asked for at run time, so that the bundler does not look for a file that is made beside the pages.
  const { Worker: Thread } = process.getBuiltinModule("node:worker_threads");
  const worker = new Thread(path.resolve(process.cwd(), environment().PLANNER_WORKER));
  worker.unref();
  worker.once("exit", () => {
    if (planner.worker === worker) planner.worker = null;
  });
  return worker;
}

function ask(worker: Worker, message: ToWorker, progress: (progress: { done: number; sentence: string }) => void): Promise<Extract<FromWorker, { kind: "answer" }>["result"]> {
  return new Promise((resolve, reject) => {
    const finish = () => {
      worker.off("message", hear);
      worker.off("error", fail);
      worker.off("exit", gone);
    };
    const hear = (said: FromWorker) => {
      if (said.id !== message.id) return;
      if (said.kind === "progress") progress(said.progress);
      else {
        finish();
        resolve(said.result);
      }
    };
    const fail = (error: unknown) => {
      finish();
      reject(error instanceof Error ? error : new Error(String(error)));
    };
    const gone = () => fail(new Error("The planner's worker ended."));
    worker.on("message", hear);
    worker.on("error", fail);
    worker.on("exit", gone);
    worker.postMessage(message);
  });
}
