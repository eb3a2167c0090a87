import type { Transaction } from "sequelize";
import { formatLength } from "@/lib/core/measure/format";
import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import type { ShortView } from "@/lib/data/bolt-view";
import { recordChange } from "@/lib/data/record-change";
import { db } from "@/models/database";
import { ABSURD_CUT, appendCut, isAbsurdCut } from "./append-cut";
import { clothHolds, toSell } from "./cloth";
import { asTag, boltIdOf, lockBolts, type LockedBolt } from "./lock-bolts";
import { readPromises } from "./promises";
import { settleBolt } from "./settle-bolt";
import { readShopRules } from "./shop-rules";

export interface SellFromBoltInput {
  readonly requestId: string;
  readonly tag: string;
  /** Cut from the edge, in 1/160 mm. */
  readonly length: number;
  /** It was sold at a till without a network: the cloth is gone, so it is recorded whatever the book says. */
  readonly asFact?: boolean;
  /** Why fabric that is promised may go all the same; counts only from a person with `till.take-reserved`. */
  readonly takeReservedBecause?: string;
  readonly at?: string;
  readonly note?: string;
}

export interface SoldFromBolt {
  readonly cutId: number;
  readonly boltId: number;
  readonly fabricId: number;
  readonly lot: string;
  /** What is left on the bolt. */
  readonly left: number;
  readonly short: readonly ShortView[];
  /** What the book had to find, in 1/160 mm; 0 as a rule. */
  readonly found: number;
}

export type SellFault = "unknown-bolt" | "absurd-length" | "too-short" | "takes-reserved" | "reason-missing";

/** Locks every bolt of a sale in id order, before its lines are sold one by one. Tags that are not known are left to `sellFromBolt`. */
export async function lockBoltsOfSale(transaction: Transaction, tags: readonly string[]): Promise<void> {
  const bolts = await db().Bolt.findAll({ where: { tag: tags.map(asTag) }, attributes: ["id"], transaction, raw: true });
  await lockBolts(transaction, bolts.map((bolt) => bolt.id));
}

/**
 * Sells a length off a bolt inside the sale's transaction (the policy is the sale's; call `lockBoltsOfSale` first when a
 * sale takes from several). A request is refused with figures: `too-short` (facts: left), `takes-reserved` when
 * something that is held would no longer fit after the cut (facts: toSell, reserved, left, mayTake), `reason-missing`.
 * With `asFact` it is always recorded: the book is corrected and promises become short.
 */
export async function sellFromBolt(transaction: Transaction, actor: Actor, input: SellFromBoltInput): Promise<Result<SoldFromBolt, SellFault>> {
  const id = await boltIdOf(transaction, input.tag);
  const before = id === null ? undefined : (await lockBolts(transaction, [id])).get(id);
  if (!before) return fail("unknown-bolt", `No bolt has the tag ${input.tag}. Scan the tag on the bolt's end.`);
  if (isAbsurdCut(before, input.length)) return fail("absurd-length", ABSURD_CUT);
  if (!input.asFact) {
    const refusal = await refuse(transaction, actor, before, input);
    if (!refusal.ok) return refusal;
  }
  const cut = await appendCut(transaction, actor, before, {
    length: input.length,
    purpose: "sale",
    to: { place: "customer" },
    reason: "sold by length",
    requestId: input.requestId,
    at: input.at,
    note: input.note,
  });
  const short = await settleBolt(transaction, actor, cut.bolt);
  await recordChange(transaction, actor, {
    subject: "bolt",
    subjectId: before.id,
    act: "sold",
    details: { cutId: cut.cutId, length: input.length, found: cut.found, ...(short.length > 0 ? { tookReserved: short, because: input.takeReservedBecause ?? null } : {}) },
  });
  return ok({ cutId: cut.cutId, boltId: before.id, fabricId: before.fabricId, lot: before.lot, left: cut.bolt.putUp - cut.bolt.cutEdge, short, found: cut.found });
}

async function refuse(transaction: Transaction, actor: Actor, bolt: LockedBolt, input: SellFromBoltInput): Promise<Result<null, SellFault>> {
  const { system, straightening } = await readShopRules(transaction);
  const left = bolt.putUp - bolt.cutEdge;
  if (input.length > left) {
    return fail("too-short", `Bolt ${bolt.tag} has ${formatLength(left, system)} left by the book; ${formatLength(input.length, system)} are wanted. Measure it, or take another bolt.`, { facts: { left } });
  }
  const held = (await readPromises(transaction, bolt.id)).map((promise) => ({ length: promise.length, count: promise.held }));
  const flaws = await db().Flaw.findAll({ where: { boltId: bolt.id }, attributes: ["startsAt", "endsAt"], transaction, raw: true });
  const cloth = { cutEdge: bolt.cutEdge, putUp: bolt.putUp, flaws };
  if (clothHolds({ ...cloth, cutEdge: bolt.cutEdge + input.length }, held, straightening)) return ok(null);
  const mayTake = can(actor, "till.take-reserved");
  if (!mayTake || input.takeReservedBecause === undefined) {
    const free = toSell(cloth, held, straightening);
    const how = mayTake ? "It can be taken with a reason." : "A manager can take it with a reason.";
    return fail(
      "takes-reserved",
      `Of the ${formatLength(left, system)} left on bolt ${bolt.tag}, ${formatLength(bolt.reserved, system)} are promised; ${formatLength(free, system)} can be sold on one piece. ${how}`,
      { facts: { left, reserved: bolt.reserved, toSell: free, mayTake } },
    );
  }
  if (input.takeReservedBecause.trim() === "") return fail("reason-missing", "Say in a few words why promised fabric is sold.", { fields: { takeReservedBecause: "Write a reason." } });
  return ok(null);
}
