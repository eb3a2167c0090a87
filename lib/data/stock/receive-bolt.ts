import { randomUUID } from "node:crypto";
import type { Transaction } from "sequelize";
import { makeCode } from "@/lib/core/codes/code";
import { MAX_LENGTH } from "@/lib/core/measure/length";
import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import { answerOnce, type OnceInput } from "@/lib/data/answer-once";
import type { BoltView } from "@/lib/data/bolt-view";
import { postMove } from "@/lib/data/ledger";
import { recordChange } from "@/lib/data/record-change";
import { bumpRevision } from "@/lib/data/revisions";
import { db } from "@/models/database";
import { loadBolt } from "./load-bolts";

export interface ReceiveBoltInput extends OnceInput {
  readonly fabricId: number;
  /** The dye lot on the bolt's end, 1 to 40 characters. */
  readonly lot: string;
  /** As measured, in 1/160 mm; bolts rarely hold what the invoice says. */
  readonly putUp: number;
  /** As the invoice says, when it does. */
  readonly invoiced?: number | null;
  readonly shelf?: string;
  /** Only where the bolt differs from its fabric. */
  readonly usableWidth?: number | null;
  /** Flaws seen on receiving, from the free end. */
  readonly flaws?: readonly { readonly startsAt: number; readonly endsAt: number; readonly note?: string }[];
  readonly receivedAt?: string;
}

export type ReceiveFault = "forbidden" | "unknown-fabric" | "bad-lot" | "absurd-length" | "bad-range" | "request-reused";

/**
 * Takes a bolt into stock, from its supplier, and gives it a tag. Faults: `forbidden`, `unknown-fabric`, `bad-lot`,
 * `absurd-length`, `bad-range` (a flaw that does not lie on the bolt), `request-reused`.
 */
export async function receiveBolt(actor: Actor, input: ReceiveBoltInput): Promise<Result<BoltView, ReceiveFault>> {
  if (!can(actor, "bolt.receive")) return fail("forbidden", "Bolts are received by cutters, managers and owners.");
  const wrong = wrongWith(input);
  if (wrong) return wrong;
  return answerOnce<BoltView, ReceiveFault>(actor, "bolt.receive", input, async (transaction) => {
    const fabric = await db().Fabric.findByPk(input.fabricId, { attributes: ["id"], transaction, raw: true });
    if (!fabric) return fail("unknown-fabric", "That fabric is not in the book. Add the fabric first.", { fields: { fabricId: "Choose a fabric." } });
    return ok(await takeIn(transaction, actor, input));
  });
}

function wrongWith({ lot, putUp, invoiced, flaws = [] }: ReceiveBoltInput): Result<never, ReceiveFault> | null {
  if (lot.trim().length < 1 || lot.trim().length > 40) return fail("bad-lot", "Write the dye lot, 1 to 40 characters.", { fields: { lot: "Write the dye lot, 1 to 40 characters." } });
  for (const [field, value] of [["putUp", putUp], ["invoiced", invoiced]] as const) {
    if (value !== null && value !== undefined && !(Number.isSafeInteger(value) && value > 0 && value <= MAX_LENGTH)) {
      return fail("absurd-length", "A bolt is longer than nothing and shorter than 14 000 yd.", { fields: { [field]: "Write a length above zero." } });
    }
  }
  if (flaws.some((flaw) => !(Number.isSafeInteger(flaw.startsAt) && Number.isSafeInteger(flaw.endsAt) && flaw.startsAt >= 0 && flaw.endsAt > flaw.startsAt && flaw.endsAt <= putUp))) {
    return fail("bad-range", "A flaw begins at the free end or after it, ends after it begins, and lies on the bolt.", { fields: { flaws: "Check where the flaws lie." } });
  }
  return null;
}

async function takeIn(transaction: Transaction, actor: Actor, input: ReceiveBoltInput): Promise<BoltView> {
  const bolt = await db().Bolt.create(
    {
      // The tag holds the number that this row is about to get.
      tag: randomUUID(),
      fabricId: input.fabricId,
      lot: input.lot.trim(),
      shelf: (input.shelf ?? "").trim().slice(0, 40),
      usableWidth: input.usableWidth ?? null,
      invoiced: input.invoiced ?? null,
      putUp: input.putUp,
      ...(input.receivedAt ? { receivedAt: new Date(input.receivedAt) } : {}),
    },
    { transaction },
  );
  const tag = makeCode("bolt", bolt.id);
  await db().Bolt.update({ tag }, { where: { id: bolt.id }, transaction });
  for (const flaw of input.flaws ?? []) {
    await db().Flaw.create({ boltId: bolt.id, startsAt: flaw.startsAt, endsAt: flaw.endsAt, note: (flaw.note ?? "").slice(0, 200), notedBy: actor.personId }, { transaction });
  }
  await postMove(transaction, {
    what: { item: "fabric", fabricId: input.fabricId },
    quantity: input.putUp,
    from: { place: "supplier" },
    to: { place: "bolt", id: bolt.id },
    reason: "received",
    personId: actor.personId,
    requestId: input.requestId,
  });
  await recordChange(transaction, actor, { subject: "bolt", subjectId: bolt.id, act: "received", details: { tag, putUp: input.putUp, invoiced: input.invoiced ?? null, lot: bolt.lot, shelf: bolt.shelf } });
  bumpRevision("bolts", transaction);
  return loadBolt(bolt.id, transaction);
}
