import { QueryTypes, type Transaction } from "sequelize";
import { db } from "@/models/database";

/** Something that does not add up: what the book says (`found`) against what its rows add up to (`wanted`). */
export interface AuditRow {
  readonly check: string;
  /** What it is about: "bolt B123X", "run R7K", "till session 4" … */
  readonly subject: string;
  readonly found: number;
  readonly wanted: number;
}

/** What lies at each place, by item, from the ledger alone: what came in less what went out. */
const AT_PLACE = `
  at_place AS (
    SELECT place, id, item, fabric_id, notion_id, run_kit_id, SUM(quantity)::bigint AS quantity FROM (
      SELECT to_place AS place, to_id AS id, item, fabric_id, notion_id, run_kit_id, quantity FROM moves
      UNION ALL
      SELECT from_place, from_id, item, fabric_id, notion_id, run_kit_id, -quantity FROM moves) each
    GROUP BY place, id, item, fabric_id, notion_id, run_kit_id)`;

const CHECKS: Readonly<Record<string, string>> = {
  "left on the bolt equals its ledger": `
    SELECT 'bolt ' || b.tag AS subject, (b.put_up - b.cut_edge)::bigint AS found, COALESCE(SUM(a.quantity), 0)::bigint AS wanted
      FROM bolts b LEFT JOIN at_place a ON a.place = 'bolt' AND a.id = b.id AND a.item = 'fabric' AND a.fabric_id = b.fabric_id
     GROUP BY b.id`,
  "a bolt holds its own fabric only": `
    SELECT 'bolt ' || b.tag, COUNT(*), 0 FROM bolts b JOIN at_place a ON a.place = 'bolt' AND a.id = b.id
     WHERE a.quantity <> 0 AND a.fabric_id IS DISTINCT FROM b.fabric_id GROUP BY b.id`,
  "the chain of cuts ends at the cut edge": `
    SELECT 'bolt ' || b.tag, b.cut_edge, COALESCE(MAX(c.ends_at), 0) FROM bolts b LEFT JOIN cuts c ON c.bolt_id = b.id GROUP BY b.id`,
  "the chain of cuts has no gap and no overlap": `
    SELECT 'bolt ' || b.tag, b.cut_edge, COALESCE(SUM(c.ends_at - c.starts_at), 0) FROM bolts b LEFT JOIN cuts c ON c.bolt_id = b.id GROUP BY b.id`,
  "each cut moved its cloth": `
    SELECT 'cut ' || c.id, c.ends_at - c.starts_at, COALESCE(m.quantity, 0) FROM cuts c LEFT JOIN (
        SELECT cut_id, from_id, SUM(quantity) AS quantity FROM moves
         WHERE cut_id IS NOT NULL AND from_place = 'bolt' AND reverses_id IS NULL GROUP BY cut_id, from_id) m ON m.cut_id = c.id AND m.from_id = c.bolt_id`,
  "reserved on the bolt equals what is held": `
    SELECT 'bolt ' || b.tag, b.reserved, COALESCE(SUM(r.length::bigint * r.count), 0)
      FROM bolts b LEFT JOIN reservations r ON r.bolt_id = b.id AND r.state = 'held' GROUP BY b.id`,
  "what is held is not more than what is left": `
    SELECT 'bolt ' || b.tag, GREATEST(0, b.reserved - (b.put_up - b.cut_edge)), 0 FROM bolts b`,
  "a bolt is put away when nothing is left": `
    SELECT 'bolt ' || b.tag, (b.retired_at IS NOT NULL)::int, (b.put_up = b.cut_edge)::int FROM bolts b`,
  "lengths that wait have their promise": `
    SELECT 'run ' || r.code || ', bolt ' || b.tag || ', length ' || length, SUM(promised), SUM(waiting) FROM (
        SELECT run_id, bolt_id, length, SUM(count)::bigint AS promised, 0::bigint AS waiting FROM reservations
         WHERE run_id IS NOT NULL AND state IN ('held','short') GROUP BY run_id, bolt_id, length
        UNION ALL
        SELECT run_id, bolt_id, length, 0, COUNT(*) FROM run_lengths WHERE state = 'to-cut' AND bolt_id IS NOT NULL GROUP BY run_id, bolt_id, length) both_sides
      JOIN runs r ON r.id = run_id JOIN bolts b ON b.id = bolt_id
     GROUP BY r.code, b.tag, length`,
  "a length is cut when it has a cut": `
    SELECT 'length ' || l.id, (l.state = 'cut')::int, (l.cut_id IS NOT NULL)::int FROM run_lengths l`,
  "a length and its cut name each other": `
    SELECT 'length ' || l.id, COUNT(*) FILTER (WHERE c.run_length_id IS DISTINCT FROM l.id OR c.purpose <> 'kit'), 0
      FROM run_lengths l JOIN cuts c ON c.id = l.cut_id GROUP BY l.id`,
  "bag and kit hold what was cut for them": `
    SELECT 'kit ' || k.serial, COALESCE(h.quantity, 0), COALESCE(c.quantity, 0) FROM run_kits k
      LEFT JOIN (SELECT id, SUM(quantity) AS quantity FROM at_place WHERE place IN ('bag','kit') AND item = 'fabric' GROUP BY id) h ON h.id = k.id
      LEFT JOIN (SELECT l.run_kit_id, SUM(c.ends_at - c.starts_at) AS quantity FROM run_lengths l JOIN cuts c ON c.id = l.cut_id GROUP BY l.run_kit_id) c ON c.run_kit_id = k.id
     WHERE k.state <> 'broken-down'`,
  "bag and kit hold the notions that were packed": `
    SELECT 'kit ' || k.serial, COALESCE(h.quantity, 0), COALESCE(p.quantity, 0) FROM run_kits k
      LEFT JOIN (SELECT id, SUM(quantity) AS quantity FROM at_place WHERE place IN ('bag','kit') AND item = 'notion' GROUP BY id) h ON h.id = k.id
      LEFT JOIN (SELECT run_kit_id, SUM(count) AS quantity FROM packed_notions GROUP BY run_kit_id) p ON p.run_kit_id = k.id
     WHERE k.state <> 'broken-down'`,
  "nothing is left in the bag of a packed kit": `
    SELECT 'kit ' || k.serial, COALESCE(SUM(ABS(a.quantity)), 0), 0 FROM run_kits k
      JOIN at_place a ON a.place = 'bag' AND a.id = k.id WHERE k.state IN ('packed','sold') GROUP BY k.id`,
  "packed kits stand on the shelf": `
    SELECT 'kit ' || k.serial, COALESCE(SUM(a.quantity), 0), (k.state = 'packed')::int
      FROM run_kits k LEFT JOIN at_place a ON a.place = 'shelf' AND a.item = 'kit' AND a.run_kit_id = k.id GROUP BY k.id`,
  "notions on hand equal their ledger": `
    SELECT 'notion ' || n.number, n.on_hand, COALESCE(SUM(a.quantity), 0)
      FROM notions n LEFT JOIN at_place a ON a.place = 'shelf' AND a.item = 'notion' AND a.notion_id = n.id GROUP BY n.id`,
  "pieces on the shelf equal their ledger": `
    SELECT 'piece ' || p.tag, CASE WHEN p.state = 'on-shelf' THEN p.length ELSE 0 END, COALESCE(SUM(a.quantity), 0)
      FROM pieces p LEFT JOIN at_place a ON a.place = 'piece' AND a.id = p.id GROUP BY p.id`,
  "sold lengths were cut": `
    SELECT 'receipt ' || s.receipt || ', line ' || l.position, l.length::bigint * l.count, c.ends_at - c.starts_at
      FROM sale_lines l JOIN sales s ON s.id = l.sale_id JOIN cuts c ON c.id = l.cut_id`,
  "tenders pay the sale": `
    SELECT 'receipt ' || s.receipt, COALESCE(SUM(t.amount), 0), s.total FROM sales s LEFT JOIN tenders t ON t.sale_id = s.id GROUP BY s.id`,
  "cash of a sale went into the drawer": `
    SELECT 'receipt ' || s.receipt, COALESCE(m.amount, 0), COALESCE(t.amount, 0) FROM sales s
      LEFT JOIN (SELECT sale_id, SUM(amount) AS amount FROM cash_moves WHERE kind = 'sale' GROUP BY sale_id) m ON m.sale_id = s.id
      LEFT JOIN (SELECT sale_id, SUM(amount) AS amount FROM tenders WHERE kind = 'cash' GROUP BY sale_id) t ON t.sale_id = s.id`,
  "expected in the drawer equals its moves": `
    SELECT 'till session ' || t.id, t.expected, COALESCE(SUM(m.amount), 0) FROM till_sessions t LEFT JOIN cash_moves m ON m.till_session_id = t.id
     WHERE t.closed_at IS NOT NULL GROUP BY t.id`,
};

const QUERY = `WITH ${AT_PLACE} ${Object.entries(CHECKS)
  .map(([check, sql]) => `SELECT '${check}' AS "check", subject, found::float8 AS found, wanted::float8 AS wanted FROM (${sql}) AS each (subject, found, wanted) WHERE found IS DISTINCT FROM wanted`)
  .join("\nUNION ALL\n")} ORDER BY 1, 2 LIMIT 500`;

/** Compares every cached figure and every chain with the sums, in one query on one snapshot. No row when all is well; 500 at most. */
export async function auditStock(transaction?: Transaction): Promise<AuditRow[]> {
  return db().sequelize.query<AuditRow>(QUERY, { type: QueryTypes.SELECT, transaction: transaction ?? null });
}
