import { can, type Actor } from "@/lib/core/policy/policy";
import { fail, ok, type Result } from "@/lib/core/result";
import type { BoltPage, BoltView } from "@/lib/data/bolt-view";
import { loadBolts } from "./load-bolts";
import { readShopRules, type ShopRules } from "./shop-rules";

export interface BoltFilter {
  /** Any part of the fabric's name or reference, of the tag, or of the lot. */
  readonly text?: string;
  readonly fabricId?: number;
  /** The shelf's beginning: "B" finds B1 and B12. */
  readonly shelf?: string;
  /** So much can be sold on one piece, in 1/160 mm. */
  readonly atLeast?: number;
  /** Only fabrics of which less is left than their mark. */
  readonly belowMark?: boolean;
  /** Bolts with nothing left too. */
  readonly withRetired?: boolean;
  /** `next` of the page before. */
  readonly after?: string | null;
  /** Bolts a page, 1 to 200; 50 when not said. */
  readonly limit?: number;
}

const DEFAULT_LIMIT = 50;
const MOST_A_PAGE = 200;

/** Bolts in shelf order (shelf, then id), paged by key. Faults: `forbidden`. */
export async function listBolts(actor: Actor, filter: BoltFilter = {}): Promise<Result<BoltPage, "forbidden">> {
  if (!can(actor, "bolt.see")) return fail("forbidden", "Bolts are shown to people who work here.");
  const limit = Math.min(MOST_A_PAGE, Math.max(1, Math.trunc(filter.limit ?? DEFAULT_LIMIT)));
  const rules = await readShopRules();
  const bolts: BoltView[] = [];
  let key = readKey(filter.after);
  // Between the flaws only the core can say what can be sold, so a filtered page may take more than one reading.
  for (;;) {
    const read = await readPage(filter, key, limit + 1, rules);
    bolts.push(...read.filter((bolt) => filter.atLeast === undefined || bolt.toSell >= filter.atLeast));
    const last = read.at(-1);
    if (bolts.length > limit || read.length <= limit || !last) break;
    key = last;
  }
  const page = bolts.slice(0, limit);
  const last = page.at(-1);
  return ok({ bolts: page, next: bolts.length > limit && last ? `${last.shelf}~${last.id}` : null });
}

interface Key {
  readonly shelf: string;
  readonly id: number;
}

/** A key that cannot be read starts from the beginning. */
function readKey(after: string | null | undefined): Key | null {
  const at = after?.lastIndexOf("~") ?? -1;
  if (!after || at < 0) return null;
  const id = Number(after.slice(at + 1));
  return Number.isSafeInteger(id) && id >= 0 && id <= 2_147_483_647 ? { shelf: after.slice(0, at), id } : null;
}

function readPage(filter: BoltFilter, key: Key | null, limit: number, rules: ShopRules): Promise<BoltView[]> {
  const bind: unknown[] = [];
  const bound = (value: unknown) => `$${bind.push(value)}`;
  const where: string[] = ["true"];
  if (!filter.withRetired) where.push("b.retired_at IS NULL");
  if (filter.fabricId !== undefined) where.push(`b.fabric_id = ${bound(filter.fabricId)}`);
  if (filter.shelf) where.push(`b.shelf ILIKE ${bound(`${escaped(filter.shelf)}%`)}`);
  if (filter.atLeast !== undefined) where.push(`b.put_up - b.cut_edge - b.reserved >= ${bound(filter.atLeast)}`);
  if (filter.belowMark) {
    where.push(`(SELECT COALESCE(SUM(o.put_up - o.cut_edge), 0) FROM bolts o WHERE o.fabric_id = f.id AND o.retired_at IS NULL) < f.low_mark`);
  }
  if (filter.text?.trim()) {
    const like = bound(`%${escaped(filter.text.trim())}%`);
    where.push(`(f.name ILIKE ${like} OR f.reference ILIKE ${like} OR b.tag ILIKE ${like} OR b.lot ILIKE ${like})`);
  }
  if (key) where.push(`(b.shelf, b.id) > (${bound(key.shelf)}, ${bound(key.id)})`);
  return loadBolts({ where: where.join(" AND "), order: "b.shelf, b.id", limit, bind }, undefined, rules);
}

/** The text as it stands, where LIKE would read % and _ as wildcards. */
function escaped(text: string): string {
  return text.slice(0, 100).replaceAll(/[\\%_]/g, "\\$&");
}
