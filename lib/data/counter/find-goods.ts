import { QueryTypes } from "sequelize";
import { parseCode } from "@/lib/core/codes/code";
import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import { getBolt } from "@/lib/data/stock/get-bolt";
import { db } from "@/models/database";

/** Something that can be put into a basket. Prices: fabric in 1/10 000 of the major unit a yard or metre, the rest in minor units. */
export type Goods =
  | { readonly item: "fabric"; readonly tag: string; readonly name: string; readonly lot: string; readonly price: number; readonly left: number; readonly toSell: number }
  | { readonly item: "kit"; readonly serial: string; readonly name: string; readonly price: number }
  | { readonly item: "notion"; readonly number: string; readonly name: string; readonly price: number; readonly onHand: number };

/** What a scan or a typed number means at the counter: a bolt, a packed kit, or a notion. Faults: `unknown-goods`. */
export async function findGoods(actor: Actor, { text }: { text: string }): Promise<Result<Goods>> {
  if (!can(actor, "till.sell")) return fail("forbidden", "The counter is for those who sell.");
  const code = parseCode(text);
  if (code.ok && code.value.kind === "bolt") {
    const bolt = await getBolt(actor, { tag: code.value.text });
    if (!bolt.ok) return bolt;
    const { tag, fabric, lot, price, left, toSell } = bolt.value;
    return ok({ item: "fabric", tag, name: fabric.name, lot, price, left, toSell });
  }
  if (code.ok && code.value.kind === "kit") return findKit(code.value.text);
  const [notion] = await db().sequelize.query<{ number: string; name: string; price: number; onHand: number }>(
    `SELECT number, name, price, on_hand AS "onHand" FROM notions WHERE number = $1 OR gtin = $1`,
    { bind: [text.trim()], type: QueryTypes.SELECT },
  );
  if (notion) return ok({ item: "notion", ...notion });
  return fail("unknown-goods", `“${text.slice(0, 40)}” is neither a bolt’s tag, a kit’s serial nor a notion’s number.`);
}

async function findKit(serial: string): Promise<Result<Goods>> {
  const [kit] = await db().sequelize.query<{ serial: string; name: string; price: number; state: string }>(
    `SELECT x.serial, k.name || ' kit, ' || c.name AS name, c.price, x.state FROM run_kits x JOIN runs r ON r.id = x.run_id
       JOIN colourways c ON c.id = r.colourway_id JOIN kit_versions v ON v.id = c.kit_version_id JOIN kit_designs k ON k.id = v.kit_design_id
      WHERE x.serial = $1`,
    { bind: [serial], type: QueryTypes.SELECT },
  );
  if (!kit) return fail("unknown-kit", `No kit has the serial ${serial}.`);
  if (kit.state !== "packed") return fail("kit-not-for-sale", `Kit ${serial} is ${kit.state === "sold" ? "sold already" : "not packed yet"}.`);
  return ok({ item: "kit", serial: kit.serial, name: kit.name, price: kit.price });
}
