import { isMainThread } from "node:worker_threads";
import { onParentGone } from "../parent-gone.mjs";

/** Preloaded into the processes that the start command begins: none of them may hold a port after its parent is gone. */
if (isMainThread) onParentGone(() => process.exit(0));
