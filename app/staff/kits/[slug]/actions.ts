"use server";

import { startRun } from "@/lib/data/runs/start-run";
import { startRunInput } from "@/lib/input/runs";
import { action } from "@/lib/server/doors/action";

export const beginRun = action(startRunInput, "run.start", startRun);
