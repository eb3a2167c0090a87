import { sendOutbox } from "./mail/send-outbox";
import { runPlanningJobs } from "./planner/run-jobs";

const shared = globalThis as typeof globalThis & { ellwandBackground?: boolean };
const MAIL_EVERY_MS = 3_000;
const PLAN_EVERY_MS = 1_000;

/** Rows hold the work, so it does not matter which server does it, or that one was killed over it. */
export function startBackgroundWork(): void {
  if (shared.ellwandBackground) return;
  shared.ellwandBackground = true;
  repeat("Sending e-mail", MAIL_EVERY_MS, sendOutbox);
  repeat("Planning", PLAN_EVERY_MS, runPlanningJobs);
}

function repeat(what: string, everyMs: number, work: () => Promise<unknown>): void {
  const again = () => setTimeout(() => void turn(), everyMs).unref();
  const turn = async () => {
    try {
      await work();
    } catch (error) {
      console.error(`${what} failed:`, (error as Error).message);
    }
    again();
  };
  again();
}
