/**
 * Calls back once when the process that started this one is gone. npm runs its commands through a shell, and ending npm
 * ends only that shell: without this a server would stay behind on its port.
 * @param {() => void} then
 */
export function onParentGone(then) {
  const parent = process.ppid;
  const timer = setInterval(() => {
    if (process.ppid === parent) return;
    clearInterval(timer);
    then();
  }, 500);
  timer.unref();
}

/** Whether npm started this process; one started by hand may outlive its shell. */
export const startedByNpm = process.env.npm_lifecycle_event !== undefined;
