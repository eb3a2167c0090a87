import { createRequire } from "node:module";
import path from "node:path";
import loadHighs from "highs";
import { createHighsSolver } from "../lib/core/cutting/highs-solver";
import type { Actor } from "../lib/core/policy/policy";
import { getFabrics } from "../lib/data/designs/fabrics";
import { kitPlanInput } from "../lib/data/designs/kit-plan-input";
import { getQuiltVersion } from "../lib/data/designs/quilts";
import { addColourway, keepKit } from "../lib/data/designs/save-kit";
import { keepQuiltVersion } from "../lib/data/designs/save-quilt";
import { planKitNow } from "../lib/data/planning/plan-now";
import { allowanceRulesOf, cuttingRulesOf, requireShop } from "../lib/data/shop";
import { db } from "../models/database";
import { DEMO_KITS, type DemoKit } from "./demo-quilts";
import { demoRequestId, must } from "./demo-request";

const solver = createHighsSolver(() => {
  const folder = path.dirname(createRequire(import.meta.url).resolve("highs"));
  return loadHighs({ locateFile: (file: string) => path.join(folder, file) });
});

/** Quilts, kits and colourways, planned by the program itself. */
export async function seedKits(owner: Actor): Promise<void> {
  for (const kit of DEMO_KITS) {
    if (await db().KitDesign.count({ where: { name: kit.name } })) continue;
    await seedKit(owner, kit);
  }
}

async function seedKit(owner: Actor, kit: DemoKit): Promise<void> {
  const shop = await requireShop();
  const blocks = new Map((await db().Block.findAll({ raw: true })).map((block) => [block.id, block.slug]));
  const versions = new Map((await db().BlockVersion.findAll({ where: { version: 1 }, raw: true })).map((version) => [blocks.get(version.blockId), version.id]));
  const stored = kit.quilt((slug) => versions.get(slug) ?? 0);
  const quilt = must(`quilt ${kit.name}`, await keepQuiltVersion(owner, { requestId: demoRequestId(`quilt ${kit.name}`), quiltId: null, name: kit.name, quilt: stored }));
  const rules = cuttingRulesOf(shop);
  const allowance = allowanceRulesOf(shop);
  const colourways = await Promise.all(kit.colourways.map(async (each) => ({ ...each, fabrics: await fabricIds(each.fabrics) })));
  for (const colourway of colourways) await plan(quilt.versionId, colourway.fabrics);
  const notionIds = new Map((await db().Notion.findAll({ raw: true })).map((notion) => [notion.number, notion.id]));
  const [first, ...others] = colourways;
  if (!first) throw new Error(`The demo kit ${kit.name} has no colourway.`);
  const kept = must(
    `kit ${kit.name}`,
    await keepKit(owner, {
      requestId: demoRequestId(`kit ${kit.name}`),
      kitDesignId: null,
      name: kit.name,
      quiltVersionId: quilt.versionId,
      allowance,
      rules,
      notions: kit.notions.map(({ number, count }) => ({ notionId: notionIds.get(number) ?? 0, count })),
      labourMinutes: kit.labourMinutes,
      sheetCost: 310,
      smallParts: false,
      colourway: first,
    }),
  );
  for (const colourway of others) {
    must(`colourway ${colourway.name}`, await addColourway(owner, { requestId: demoRequestId(`colourway ${kit.name} ${colourway.name}`), kitVersionId: kept.kitVersionId, colourway }));
  }
}

async function plan(quiltVersionId: number, fabricIdOf: Readonly<Record<string, number>>): Promise<void> {
  const shop = await requireShop();
  const quilt = await getQuiltVersion(quiltVersionId);
  if (!quilt) throw new Error("The demo's quilt was not kept.");
  const fabrics = new Map((await getFabrics(Object.values(fabricIdOf))).map((fabric) => [fabric.id, fabric]));
  const byRole = Object.fromEntries(Object.entries(fabricIdOf).flatMap(([role, id]) => {
    const fabric = fabrics.get(id);
    return fabric ? [[role, fabric]] : [];
  }));
  const input = must("plan", kitPlanInput({ quilt: quilt.design, fabrics: byRole, rules: cuttingRulesOf(shop), allowance: allowanceRulesOf(shop), system: shop.system }));
  must("plan", await planKitNow(input, solver));
}

async function fabricIds(slugs: Readonly<Record<string, string>>): Promise<Record<string, number>> {
  const ids = new Map((await db().Fabric.findAll({ raw: true })).map((fabric) => [fabric.slug, fabric.id]));
  return Object.fromEntries(Object.entries(slugs).map(([role, slug]) => [role, ids.get(slug) ?? 0]));
}
