import type { Transaction } from "sequelize";
import { CORE_VERSION } from "@/lib/core/core-version";
import type { KitPlan } from "@/lib/core/kit/kit-plan";
import type { CuttingRules } from "@/lib/core/piece/cut-piece";
import type { AllowanceRules } from "@/lib/core/piece/strip-plan";
import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import { answerOnce } from "@/lib/data/answer-once";
import { hashOfPlan, keptPlan } from "@/lib/data/planning/jobs";
import { recordChange } from "@/lib/data/record-change";
import { requireShop } from "@/lib/data/shop";
import { db } from "@/models/database";
import type { KitNotion } from "./design-views";
import { getFabrics } from "./fabrics";
import { freeSlug } from "./free-slug";
import { kitPlanInput } from "./kit-plan-input";
import { getQuiltVersion } from "./quilts";

export interface ColourwayInput {
  readonly name: string;
  /** Quilt role to fabric id. */
  readonly fabrics: Readonly<Record<string, number>>;
  /** Minor units. */
  readonly price: number;
}

export interface KitVersionInput {
  readonly quiltVersionId: number;
  readonly allowance: AllowanceRules;
  readonly rules: CuttingRules;
  readonly notions: readonly KitNotion[];
  readonly labourMinutes: number;
  /** Minor units. */
  readonly sheetCost: number;
  readonly smallParts: boolean;
}

export interface KeepKitInput extends KitVersionInput {
  readonly requestId: string;
  /** Null starts a new kit. */
  readonly kitDesignId: number | null;
  readonly name: string;
  readonly colourway: ColourwayInput;
}

type KitFault = "forbidden" | "unknown-quilt" | "unknown-fabric" | "unknown-kit" | "not-planned" | "name-taken" | "request-reused" | string;

/** A kit's plan with the hash that finds it. */
interface Planned {
  readonly hash: string;
  readonly plan: KitPlan;
}

/** Keeps a kit's next version with its first colourway. The colourway must have been planned: `not-planned` otherwise. */
export async function keepKit(actor: Actor, input: KeepKitInput): Promise<Result<{ kitVersionId: number; colourwayId: number; slug: string }, KitFault>> {
  if (!can(actor, "kit.save")) return forbidden();
  const planned = await plannedFor(input, input.colourway);
  if (!planned.ok) return planned;
  return answerOnce<{ kitVersionId: number; colourwayId: number; slug: string }, KitFault>(actor, "kit.keep", input, async (transaction) => {
    const design =
      input.kitDesignId === null
        ? await db().KitDesign.create({ slug: await freeSlug(transaction, "kit_designs", input.name), name: input.name, madeBy: actor.personId }, { transaction })
        : await db().KitDesign.findByPk(input.kitDesignId, { transaction, lock: transaction.LOCK.NO_KEY_UPDATE });
    if (!design) return unknownKit();
    if (design.name !== input.name) await design.update({ name: input.name }, { transaction });
    const last = await db().KitVersion.findOne({ where: { kitDesignId: design.id }, order: [["version", "DESC"]], transaction });
    const version = await db().KitVersion.create(
      {
        kitDesignId: design.id,
        version: (last?.version ?? 0) + 1,
        name: input.name,
        quiltVersionId: input.quiltVersionId,
        allowance: input.allowance,
        rules: input.rules,
        notions: input.notions,
        labourMinutes: input.labourMinutes,
        sheetCost: input.sheetCost,
        smallParts: input.smallParts,
        coreVersion: CORE_VERSION,
        madeBy: actor.personId,
      },
      { transaction },
    );
    const colourwayId = await insertColourway(transaction, actor, version.id, input.colourway, planned.value);
    await recordChange(transaction, actor, { subject: "kit-design", subjectId: design.id, act: "version kept", details: { version: version.version } });
    return ok({ kitVersionId: version.id, colourwayId, slug: design.slug });
  });
}

/** Adds a colourway to a kit version as it stands. Faults: `unknown-kit`, `not-planned`, `name-taken`. */
export async function addColourway(actor: Actor, input: { requestId: string; kitVersionId: number; colourway: ColourwayInput }): Promise<Result<{ colourwayId: number }, KitFault>> {
  if (!can(actor, "kit.save")) return forbidden();
  const version = await db().KitVersion.findByPk(input.kitVersionId, { raw: true });
  if (!version) return unknownKit();
  const planned = await plannedFor({ quiltVersionId: version.quiltVersionId, allowance: version.allowance as AllowanceRules, rules: version.rules as CuttingRules }, input.colourway);
  if (!planned.ok) return planned;
  return answerOnce<{ colourwayId: number }, KitFault>(actor, "kit.colourway", input, async (transaction) => {
    if (await db().Colourway.count({ where: { kitVersionId: version.id, name: input.colourway.name }, transaction })) {
      return fail("name-taken", `This kit already has a colourway ${input.colourway.name}.`, { fields: { name: "Choose another name." } });
    }
    return ok({ colourwayId: await insertColourway(transaction, actor, version.id, input.colourway, planned.value) });
  });
}

/** The kept plan of a colourway, found by the hash of what the planner would be asked now. */
async function plannedFor(kit: Pick<KitVersionInput, "quiltVersionId" | "allowance" | "rules">, colourway: ColourwayInput): Promise<Result<Planned, KitFault>> {
  const quilt = await getQuiltVersion(kit.quiltVersionId);
  if (!quilt) return fail("unknown-quilt", "There is no such quilt version; choose the quilt again.");
  const known = new Map((await getFabrics(Object.values(colourway.fabrics))).map((fabric) => [fabric.id, fabric]));
  const fabrics = Object.fromEntries(Object.entries(colourway.fabrics).flatMap(([role, id]) => {
    const fabric = known.get(id);
    return fabric ? [[role, fabric] as const] : [];
  }));
  const { system } = await requireShop();
  const input = kitPlanInput({ quilt: quilt.design, fabrics, rules: kit.rules, allowance: kit.allowance, system });
  if (!input.ok) return input;
  const hash = hashOfPlan("kit", input.value);
  const plan = (await keptPlan(hash)) as KitPlan | null;
  return plan ? ok({ hash, plan }) : fail("not-planned", "This colourway has not been planned yet with these fabrics and allowances. Plan it first, then keep it.");
}

async function insertColourway(transaction: Transaction, actor: Actor, kitVersionId: number, { name, fabrics, price }: ColourwayInput, { hash, plan }: Planned): Promise<number> {
  const row = await db().Colourway.create({ kitVersionId, name, fabrics, price, planHash: hash, coreVersion: CORE_VERSION, madeBy: actor.personId }, { transaction });
  const lengths = plan.fabrics.map((each) => ({ colourwayId: row.id, fabricId: Number(each.fabric), cutLength: each.allowance.cutLength, plannedWidth: each.usableWidth }));
  await db().ColourwayLength.bulkCreate(lengths, { transaction });
  return row.id;
}

function forbidden() {
  return fail("forbidden", "Kits are designed by designers, managers and owners.");
}

function unknownKit() {
  return fail("unknown-kit", "There is no such kit; it may have been put away.");
}
