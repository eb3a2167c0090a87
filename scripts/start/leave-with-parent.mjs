import { isMainThread } from "node:worker_threads";

/** Preloaded into the processes that the start command begins: none of them may hold a port after its parent is gone. */
if (isMainThread) {
  const parent = process.ppid;
  setInterval(() => {
    if (process.ppid !== parent) process.exit(0);
  }, 500).unref();
}
