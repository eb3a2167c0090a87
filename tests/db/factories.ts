import { randomUUID } from "node:crypto";
import { inches, yards } from "@/lib/core/measure/length";
import type { Actor, RoleName } from "@/lib/core/policy/policy";
import type { Result } from "@/lib/core/result";
import type { BoltView } from "@/lib/data/bolt-view";
import { inTransaction } from "@/lib/data/in-transaction";
import { receiveBolt, type ReceiveBoltInput } from "@/lib/data/stock/receive-bolt";
import { reserveInside } from "@/lib/data/stock/reserve-lengths";
import { db } from "@/models/database";

/** Stock does not look into what the core made. */
const CORE_VERSION = "test";

let made = 0;
/** A number that no other call in this file got. */
export function nextNumber(): number {
  made += 1;
  return made;
}

/** The value of a success; a refusal fails the test with its sentence. */
export function must<Value>(result: Result<Value>): Value {
  if (result.ok) return result.value;
  throw new Error(`${result.fault.code}: ${result.fault.message}`);
}

/** The fault code of a refusal, or "ok". */
export function codeOf(result: Result<unknown>): string {
  return result.ok ? "ok" : result.fault.code;
}

/** The shop as the stock needs it: yards, straightening 1 in. Safe to call twice. */
export async function buildShop(over: { straightening?: number; system?: "yards" | "metres" } = {}): Promise<void> {
  await db().Shop.upsert({
    id: 1,
    name: "Test shop",
    currency: "USD",
    system: over.system ?? "yards",
    seamAllowance: inches(0.25),
    rulerStep: inches(0.125),
    sellingStep: yards(0.125),
    leastCut: yards(0.25),
    straightening: over.straightening ?? inches(1),
    saleableRemnant: inches(9),
  });
}

/** A person with roles, as the actor that a door would hand on. */
export async function buildPerson({ roles = ["owner"], name }: { roles?: readonly RoleName[]; name?: string } = {}): Promise<Actor> {
  const number = nextNumber();
  const person = await db().Person.create({ name: name ?? `Person ${number}`, email: `person-${number}@example.org`, roles: [...roles] });
  return { personId: person.id, sessionId: randomUUID(), name: person.name, roles, place: null };
}

export async function buildFabric(over: { name?: string; usableWidth?: number; lowMark?: number; price?: number } = {}): Promise<{ id: number; name: string }> {
  const number = nextNumber();
  const name = over.name ?? `Fabric ${number}`;
  const fabric = await db().Fabric.create({
    slug: `fabric-${number}`,
    name,
    width: inches(44),
    usableWidth: over.usableWidth ?? inches(40),
    colour: "#336699",
    price: over.price ?? 120_000,
    cost: 60_000,
    lowMark: over.lowMark ?? 0,
  });
  return { id: fabric.id, name };
}

/** A bolt of 10 yd of a new fabric, received through its use case, so that the ledger is right. */
export async function buildBolt(actor: Actor, over: Partial<ReceiveBoltInput> = {}): Promise<BoltView> {
  const fabricId = over.fabricId ?? (await buildFabric()).id;
  return must(await receiveBolt(actor, { requestId: randomUUID(), lot: "L1", putUp: yards(10), shelf: "A1", ...over, fabricId }));
}

export interface BuiltLength {
  readonly id: number;
  readonly kitNumber: number;
  readonly runKitId: number;
  readonly length: number;
}

export interface BuiltRun {
  readonly id: number;
  readonly code: string;
  readonly lengths: readonly BuiltLength[];
}

export interface RunPlan {
  readonly kits: number;
  readonly purpose?: "shelf" | "class" | "orders";
  /** What each kit takes, and from which bolt; null: not planned yet. */
  readonly lengths: readonly { readonly fabricId: number; readonly boltId: number | null; readonly length: number; readonly plannedWidth?: number }[];
}

/** A run with its kits, its list of lengths, and its promises on the bolts. Throws when they do not fit. */
export async function buildRun(actor: Actor, plan: RunPlan): Promise<BuiltRun> {
  return must(await startRun(actor, plan));
}

/** The same, with the refusal handed back. */
export async function startRun(actor: Actor, { kits, purpose = "shelf", lengths }: RunPlan): Promise<Result<BuiltRun>> {
  const colourwayId = await buildColourway();
  return inTransaction<BuiltRun, string>(async (transaction) => {
    const run = await db().Run.create({ code: `R-${randomUUID()}`, colourwayId, kits, purpose, boltPlan: {}, madeBy: actor.personId }, { transaction });
    const built: BuiltLength[] = [];
    for (let number = 1; number <= kits; number += 1) {
      const kit = await db().RunKit.create({ runId: run.id, number, serial: `${run.code}-${number}` }, { transaction });
      for (const { fabricId, boltId, length, plannedWidth } of lengths) {
        const row = await db().RunLength.create(
          { runId: run.id, runKitId: kit.id, fabricId, boltId, length, plannedWidth: plannedWidth ?? inches(40), sequence: built.length },
          { transaction },
        );
        built.push({ id: row.id, kitNumber: number, runKitId: kit.id, length });
      }
    }
    const demands = lengths.flatMap(({ boltId, length }) => (boltId === null ? [] : [{ boltId, length, count: kits }]));
    const reserved = await reserveInside(transaction, actor, { runId: run.id, demands });
    return reserved.ok ? { ok: true, value: { id: run.id, code: run.code, lengths: built } } : reserved;
  });
}

let colourway: { readonly database: object; readonly id: number } | null = null;

/** One kit in one colourway for the whole file; stock does not look into it. */
async function buildColourway(): Promise<number> {
  if (colourway?.database === db()) return colourway.id;
  const quilt = await db().Quilt.create({ slug: `quilt-${nextNumber()}`, name: "Quilt" });
  const size = { width: inches(60), height: inches(60) };
  const quiltVersion = await db().QuiltVersion.create({ quiltId: quilt.id, version: 1, name: "Quilt", design: {}, blockVersionIds: [], coreVersion: CORE_VERSION, ...size });
  const kit = await db().KitDesign.create({ slug: `kit-${nextNumber()}`, name: "Kit" });
  const kitVersion = await db().KitVersion.create({ kitDesignId: kit.id, version: 1, name: "Kit", quiltVersionId: quiltVersion.id, allowance: {}, rules: {}, coreVersion: CORE_VERSION });
  const row = await db().Colourway.create({ kitVersionId: kitVersion.id, name: "Blue", fabrics: {}, price: 9900, planHash: "none", coreVersion: CORE_VERSION });
  colourway = { database: db(), id: row.id };
  return row.id;
}
