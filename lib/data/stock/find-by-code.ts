import { QueryTypes } from "sequelize";
import { parseCode, type CodeKind } from "@/lib/core/codes/code";
import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import { db } from "@/models/database";

/** What a scan or a typed code names. `title` is a line for a person: the fabric, the kit, the notion. */
export type Found =
  | { readonly kind: "bolt"; readonly id: number; readonly tag: string; readonly title: string; readonly fabricId: number }
  | { readonly kind: "piece"; readonly id: number; readonly tag: string; readonly title: string; readonly fabricId: number }
  | { readonly kind: "kit"; readonly id: number; readonly serial: string; readonly title: string; readonly runCode: string; readonly state: string }
  | { readonly kind: "run"; readonly id: number; readonly code: string; readonly title: string; readonly state: string }
  | { readonly kind: "cut"; readonly runLengthId: number; readonly serial: string; readonly title: string; readonly runCode: string; readonly state: string }
  | { readonly kind: "notion"; readonly id: number; readonly number: string; readonly title: string }
  | { readonly kind: "receipt"; readonly id: number; readonly receipt: string; readonly title: string };

type FindFault = "forbidden" | "unknown-code" | "wrong-check";

/** A query for each kind of code whose thing the book keeps; $1 is the text, $2 the number in the code. */
const BY_KIND: Partial<Record<CodeKind, string>> = {
  bolt: `SELECT 'bolt' AS kind, b.id, b.tag, f.name AS title, f.id AS "fabricId" FROM bolts b JOIN fabrics f ON f.id = b.fabric_id WHERE b.tag = $1 AND $2::bigint IS NOT NULL`,
  piece: `SELECT 'piece' AS kind, p.id, p.tag, f.name AS title, f.id AS "fabricId" FROM pieces p JOIN fabrics f ON f.id = p.fabric_id WHERE p.tag = $1 AND $2::bigint IS NOT NULL`,
  kit: `SELECT 'kit' AS kind, k.id, k.serial, d.name || ', ' || c.name AS title, r.code AS "runCode", k.state
          FROM run_kits k JOIN runs r ON r.id = k.run_id JOIN colourways c ON c.id = r.colourway_id
          JOIN kit_versions v ON v.id = c.kit_version_id JOIN kit_designs d ON d.id = v.kit_design_id WHERE k.serial = $1 AND $2::bigint IS NOT NULL`,
  run: `SELECT 'run' AS kind, r.id, r.code, d.name || ', ' || c.name AS title, r.state
          FROM runs r JOIN colourways c ON c.id = r.colourway_id
          JOIN kit_versions v ON v.id = c.kit_version_id JOIN kit_designs d ON d.id = v.kit_design_id WHERE r.code = $1 AND $2::bigint IS NOT NULL`,
  cut: `SELECT 'cut' AS kind, l.id AS "runLengthId", k.serial, f.name AS title, r.code AS "runCode", l.state
          FROM run_lengths l JOIN run_kits k ON k.id = l.run_kit_id JOIN runs r ON r.id = l.run_id JOIN fabrics f ON f.id = l.fabric_id
         WHERE l.id = $2::bigint AND $1::text IS NOT NULL`,
  receipt: `SELECT 'receipt' AS kind, s.id, s.receipt, p.name || ', ' || to_char(s.at AT TIME ZONE COALESCE((SELECT time_zone FROM shops), 'UTC'), 'YYYY-MM-DD') AS title
          FROM sales s JOIN people p ON p.id = s.person_id WHERE s.receipt = $1 AND $2::bigint IS NOT NULL`,
};

/**
 * Finds what a scanned or typed code names: one of the shop's own codes, or a notion's number or GTIN. Faults:
 * `forbidden`, `wrong-check` (a slip in one of the shop's codes), `unknown-code`.
 */
export async function findByCode(actor: Actor, { text }: { text: string }): Promise<Result<Found, FindFault>> {
  if (!can(actor, "find.see")) return fail("forbidden", "Codes are looked up by people who work here.");
  const code = parseCode(text);
  const sql = code.ok ? BY_KIND[code.value.kind] : undefined;
  if (code.ok && sql) {
    const found = await read(sql, [code.value.text, code.value.number]);
    if (found) return ok(found);
  }
  const notion = await read(`SELECT 'notion' AS kind, id, number, name AS title FROM notions WHERE number = $1 OR gtin = $1`, [text.trim().slice(0, 60)]);
  if (notion) return ok(notion);
  if (!code.ok && code.fault.code === "wrong-check") return fail("wrong-check", code.fault.message);
  return fail("unknown-code", `Nothing in the shop has the code ${text.trim().slice(0, 60)}.`);
}

async function read(sql: string, bind: readonly unknown[]): Promise<Found | null> {
  const [row] = await db().sequelize.query<Found>(sql, { bind: [...bind], type: QueryTypes.SELECT });
  return row ?? null;
}
