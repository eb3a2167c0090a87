import { QueryTypes, type Transaction } from "sequelize";
import type { Length } from "@/lib/core/measure/length";
import type { CuttingRules } from "@/lib/core/piece/cut-piece";
import type { AllowanceRules } from "@/lib/core/piece/strip-plan";
import { db } from "@/models/database";

/** The shop's own settings. Lengths in 1/160 mm, money in minor units. */
export interface ShopView {
  readonly name: string;
  readonly address: string;
  readonly email: string;
  readonly currency: string;
  readonly locale: string;
  readonly timeZone: string;
  readonly system: "yards" | "metres";
  readonly paper: "letter" | "a4";
  readonly seamAllowance: Length;
  readonly rulerStep: Length;
  readonly sellingStep: Length;
  readonly leastCut: Length;
  readonly straightening: Length;
  readonly misCutBasisPoints: number;
  readonly endOfBolt: Length;
  readonly saleableRemnant: Length;
  readonly labourRate: number;
  readonly taxBy: "line" | "sale";
  readonly taxIncluded: boolean;
  readonly cashStep: number;
}

/** The shop, or null on a database that the first-run page has not filled yet. */
export async function getShop(transaction?: Transaction): Promise<ShopView | null> {
  const [shop] = await db().sequelize.query<ShopView>(
    `SELECT name, address, email, currency, locale, time_zone AS "timeZone", system, paper, seam_allowance AS "seamAllowance",
            ruler_step AS "rulerStep", selling_step AS "sellingStep", least_cut AS "leastCut", straightening,
            mis_cut_basis_points AS "misCutBasisPoints", end_of_bolt AS "endOfBolt", saleable_remnant AS "saleableRemnant",
            labour_rate AS "labourRate", tax_by AS "taxBy", tax_included AS "taxIncluded", cash_step AS "cashStep"
       FROM shops WHERE id = 1`,
    { type: QueryTypes.SELECT, transaction },
  );
  return shop ?? null;
}

/** The shop, which is there on every page behind the sign-in. */
export async function requireShop(transaction?: Transaction): Promise<ShopView> {
  const shop = await getShop(transaction);
  if (!shop) throw new Error("The shop has not been set up yet.");
  return shop;
}

export function cuttingRulesOf(shop: ShopView): CuttingRules {
  return { seamAllowance: shop.seamAllowance, rulerStep: shop.rulerStep };
}

/** The shop's usual allowances, as a new kit starts with them. */
export function allowanceRulesOf(shop: ShopView): AllowanceRules {
  return {
    straightening: shop.straightening,
    misCut: { kind: "percent", basisPoints: shop.misCutBasisPoints },
    shrinkAlong: 0,
    shrinkAcross: 0,
    endOfBolt: shop.endOfBolt,
    sellingStep: shop.sellingStep,
    leastCut: shop.leastCut,
  };
}
