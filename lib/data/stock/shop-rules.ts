import type { Transaction } from "sequelize";
import { db } from "@/models/database";

/** What stock needs of the shop's settings; lengths in 1/160 mm. */
export interface ShopRules {
  readonly system: "yards" | "metres";
  readonly straightening: number;
}

/** 1 in, as it stands before the first-run page is filled in. */
const BEFORE_FIRST_RUN: ShopRules = { system: "yards", straightening: 4064 };

export async function readShopRules(transaction?: Transaction): Promise<ShopRules> {
  const shop = await db().Shop.findByPk(1, { attributes: ["system", "straightening"], transaction: transaction ?? null, raw: true });
  return shop ? { system: shop.system, straightening: shop.straightening } : BEFORE_FIRST_RUN;
}
