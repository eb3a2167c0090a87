import { QueryTypes, type Transaction } from "sequelize";
import type { Actor } from "@/lib/core/policy/policy";
import type { Length } from "@/lib/core/measure/length";
import { queuePrint } from "@/lib/data/print/queue";
import { db } from "@/models/database";
import type { KitLabelInput } from "@/labels/kit-label";

interface LabelRow {
  serial: string;
  number: number;
  kits: number;
  kit: string;
  colourway: string;
  width: Length;
  height: Length;
  smallParts: boolean;
  shopName: string;
  system: "yards" | "metres";
  fibre: string;
  origin: string;
}

/** Puts a packed kit's label on the print queue, in the transaction that packs it. */
export async function queueKitPapers(transaction: Transaction, actor: Actor, runKitId: number): Promise<void> {
  const label = await kitLabelContent(runKitId, transaction);
  await queuePrint(transaction, actor, { printer: "label-4x6", title: `Kit label ${label.serial}`, document: { kind: "kit-label", content: [label] }, copies: 1 });
}

/** What the 4 x 6 in label of a kit says. Throws when there is no such kit: callers hold its lock. */
export async function kitLabelContent(runKitId: number, transaction?: Transaction): Promise<KitLabelInput> {
  const [row] = await db().sequelize.query<LabelRow>(
    `SELECT x.serial, x.number, r.kits, k.name AS kit, c.name AS colourway, q.width, q.height, v.small_parts AS "smallParts",
            s.name AS "shopName", s.system,
            (SELECT string_agg(DISTINCT f.fibre, ', ') FROM run_lengths l JOIN fabrics f ON f.id = l.fabric_id WHERE l.run_kit_id = x.id) AS fibre,
            (SELECT string_agg(DISTINCT f.origin, ', ') FROM run_lengths l JOIN fabrics f ON f.id = l.fabric_id WHERE l.run_kit_id = x.id) AS origin
       FROM run_kits x JOIN runs r ON r.id = x.run_id JOIN colourways c ON c.id = r.colourway_id
       JOIN kit_versions v ON v.id = c.kit_version_id JOIN kit_designs k ON k.id = v.kit_design_id
       JOIN quilt_versions q ON q.id = v.quilt_version_id CROSS JOIN shops s WHERE x.id = $1`,
    { bind: [runKitId], type: QueryTypes.SELECT, transaction },
  );
  if (!row) throw new Error(`There is no kit ${runKitId} to make a label for.`);
  const [fabrics, notions] = await Promise.all([labelFabrics(runKitId, transaction), labelNotions(runKitId, transaction)]);
  return {
    shopName: row.shopName,
    note: `quilt kit ${row.number} of ${row.kits}`,
    kitName: row.kit,
    colourway: row.colourway,
    serial: row.serial,
    link: row.serial,
    finished: { width: row.width, height: row.height },
    facts: [`${fabrics.length} fabrics, cut in lengths`],
    picture: null,
    fabrics,
    alsoInside: notions,
    fibre: row.fibre ?? "",
    origin: row.origin ?? "",
    care: "",
    smallParts: row.smallParts,
    price: null,
    measure: row.system,
  };
}

async function labelFabrics(runKitId: number, transaction?: Transaction): Promise<KitLabelInput["fabrics"]> {
  const rows = await db().sequelize.query<{ name: string; length: Length; lot: string | null }>(
    `SELECT f.name, l.length, b.lot FROM run_lengths l JOIN fabrics f ON f.id = l.fabric_id LEFT JOIN cuts c ON c.id = l.cut_id
       LEFT JOIN bolts b ON b.id = COALESCE(c.bolt_id, l.bolt_id) WHERE l.run_kit_id = $1 AND l.state <> 'cancelled' ORDER BY l.length DESC, f.name`,
    { bind: [runKitId], type: QueryTypes.SELECT, transaction },
  );
  return rows.map((row) => ({ name: row.name, length: row.length, lot: row.lot ?? "", hatch: "blank" }));
}

async function labelNotions(runKitId: number, transaction?: Transaction): Promise<string[]> {
  const rows = await db().sequelize.query<{ name: string }>(
    `SELECT n.name FROM packed_notions p JOIN notions n ON n.id = p.notion_id WHERE p.run_kit_id = $1 ORDER BY n.name`,
    { bind: [runKitId], type: QueryTypes.SELECT, transaction },
  );
  return rows.map((row) => row.name);
}
