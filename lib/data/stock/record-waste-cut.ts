import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import { answerOnce, type OnceInput } from "@/lib/data/answer-once";
import type { BoltChange } from "@/lib/data/bolt-view";
import { recordChange } from "@/lib/data/record-change";
import { ABSURD_CUT, appendCut, isAbsurdCut } from "./append-cut";
import { loadBolt } from "./load-bolts";
import { lockBoltByTag } from "./lock-bolts";
import { settleBolt } from "./settle-bolt";

export type WasteKind = "straightening" | "flaw" | "mis-cut" | "sample";

export interface WasteCutInput extends OnceInput {
  readonly tag: string;
  /** From the cut edge, in 1/160 mm. A flaw is cut out together with the cloth before it. */
  readonly length: number;
  readonly kind: WasteKind;
  readonly at?: string;
  readonly note?: string;
}

const KINDS = {
  straightening: { purpose: "waste", place: "waste", reason: "straightening", act: "straightened" },
  flaw: { purpose: "waste", place: "waste", reason: "flaw cut out", act: "flaw cut out" },
  "mis-cut": { purpose: "mis-cut", place: "waste", reason: "mis-cut", act: "mis-cut" },
  sample: { purpose: "sample", place: "sample", reason: "sample", act: "sample cut" },
} as const;

/**
 * Records cloth that was cut off a bolt and goes to nobody: straightening, a flaw cut out, a mis-cut, a sample. A fact:
 * always recorded; it corrects the book where that said less was left. Faults: `forbidden`, `unknown-bolt`,
 * `absurd-length`, `request-reused`.
 */
export async function recordWasteCut(
  actor: Actor,
  input: WasteCutInput,
): Promise<Result<BoltChange & { readonly cutId: number; readonly found: number }, "forbidden" | "unknown-bolt" | "absurd-length" | "request-reused">> {
  if (!can(actor, "run.cut") && !can(actor, "till.sell")) return fail("forbidden", "Bolts are cut at the table and at the counter.");
  return answerOnce(actor, "bolt.waste", input, async (transaction) => {
    const before = await lockBoltByTag(transaction, input.tag);
    if (!before) return fail("unknown-bolt", `No bolt has the tag ${input.tag}. Scan the tag on the bolt's end.`);
    if (isAbsurdCut(before, input.length)) return fail("absurd-length", ABSURD_CUT);
    const { purpose, place, reason, act } = KINDS[input.kind];
    const cut = await appendCut(transaction, actor, before, {
      length: input.length,
      purpose,
      to: { place },
      reason: input.note ? `${reason}: ${input.note}` : reason,
      requestId: input.requestId,
      at: input.at,
      note: input.note,
    });
    const short = await settleBolt(transaction, actor, cut.bolt);
    await recordChange(transaction, actor, { subject: "bolt", subjectId: before.id, act, details: { cutId: cut.cutId, length: input.length, found: cut.found, note: input.note } });
    return ok({ cutId: cut.cutId, found: cut.found, short, bolt: await loadBolt(before.id, transaction) });
  });
}
