import { formatLength } from "@/lib/core/measure/format";
import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import { answerOnce, type OnceInput } from "@/lib/data/answer-once";
import type { BoltChange } from "@/lib/data/bolt-view";
import { recordChange } from "@/lib/data/record-change";
import { db } from "@/models/database";
import { loadBolt } from "./load-bolts";
import { lockBoltByTag } from "./lock-bolts";
import { settleBolt } from "./settle-bolt";
import { readShopRules } from "./shop-rules";

export interface FlawInput extends OnceInput {
  readonly tag: string;
  /** From today's cut edge to where the flaw begins and ends, in 1/160 mm. */
  readonly fromEdge: number;
  readonly toEdge: number;
  readonly note?: string;
}

export type FlawFault = "forbidden" | "unknown-bolt" | "bad-range" | "off-the-bolt" | "request-reused";

/**
 * Notes a flaw at distances from today's cut edge; it is kept from the bolt's first free end, so that later cuts do not
 * move it. Promises that no longer fit between the flaws become short.
 */
export async function noteFlaw(actor: Actor, input: FlawInput): Promise<Result<BoltChange & { readonly flawId: number }, FlawFault>> {
  if (!can(actor, "bolt.flaw")) return fail("forbidden", "Flaws are noted by the people who handle bolts.");
  return answerOnce<BoltChange & { readonly flawId: number }, FlawFault>(actor, "bolt.flaw", input, async (transaction) => {
    const bolt = await lockBoltByTag(transaction, input.tag);
    if (!bolt) return fail("unknown-bolt", `No bolt has the tag ${input.tag}. Scan the tag on the bolt's end.`);
    if (!(Number.isSafeInteger(input.fromEdge) && Number.isSafeInteger(input.toEdge) && input.fromEdge >= 0 && input.toEdge > input.fromEdge)) {
      return fail("bad-range", "A flaw begins at the cut edge or after it, and ends after it begins.");
    }
    const left = bolt.putUp - bolt.cutEdge;
    if (input.toEdge > left) {
      const { system } = await readShopRules(transaction);
      return fail("off-the-bolt", `The flaw would end ${formatLength(input.toEdge, system)} from the cut edge, but only ${formatLength(left, system)} are left on bolt ${bolt.tag}. Measure the bolt first.`, {
        facts: { left },
      });
    }
    const flaw = await db().Flaw.create(
      { boltId: bolt.id, startsAt: bolt.cutEdge + input.fromEdge, endsAt: bolt.cutEdge + input.toEdge, note: (input.note ?? "").slice(0, 200), notedBy: actor.personId },
      { transaction },
    );
    const short = await settleBolt(transaction, actor, bolt);
    await recordChange(transaction, actor, { subject: "bolt", subjectId: bolt.id, act: "flaw noted", details: { flawId: flaw.id, startsAt: flaw.startsAt, endsAt: flaw.endsAt, note: flaw.note } });
    return ok({ flawId: flaw.id, short, bolt: await loadBolt(bolt.id, transaction) });
  });
}
