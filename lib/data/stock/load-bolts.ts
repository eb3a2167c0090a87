import { QueryTypes, type Transaction } from "sequelize";
import { fromCore, type BoltView } from "@/lib/data/bolt-view";
import { db } from "@/models/database";
import { longestPiece, toSell, type Demand } from "./cloth";
import { readShopRules, type ShopRules } from "./shop-rules";

interface BoltRow extends Omit<BoltView, "left" | "toSell" | "longestPiece" | "flaws" | "fabricLeft" | "claim" | "receivedAt" | "retiredAt"> {
  readonly fabricLeft: number | null;
  readonly receivedAt: Date;
  readonly retiredAt: Date | null;
  readonly flaws: readonly { id: number; startsAt: number; endsAt: number; note: string }[] | null;
  readonly held: readonly Demand[] | null;
  readonly claim: { station: string; personId: number; person: string; runId: number | null; claimedAt: string } | null;
}

/** `where` and `order` are SQL of ours over `b` (bolts) and `f` (fabrics); what people typed goes into `bind` only. */
export interface BoltQuery {
  readonly where: string;
  readonly order?: string;
  readonly limit?: number;
  readonly bind: readonly unknown[];
}

const SELECT = `
  SELECT b.id, b.tag, b.lot, b.shelf, COALESCE(b.usable_width, f.usable_width) AS "usableWidth", b.put_up AS "putUp",
         b.cut_edge AS "cutEdge", b.reserved, b.received_at AS "receivedAt", b.retired_at AS "retiredAt",
         f.low_mark AS "lowMark", f.price,
         json_build_object('id', f.id, 'slug', f.slug, 'name', f.name, 'reference', f.reference, 'tile', f.tile,
                           'colour', f.colour, 'value', f.value, 'oneWay', f.one_way) AS fabric,
         (SELECT SUM(o.put_up - o.cut_edge) FROM bolts o WHERE o.fabric_id = f.id AND o.retired_at IS NULL) AS "fabricLeft",
         (SELECT json_agg(json_build_object('id', l.id, 'startsAt', l.starts_at, 'endsAt', l.ends_at, 'note', l.note) ORDER BY l.starts_at, l.id)
            FROM flaws l WHERE l.bolt_id = b.id AND l.ends_at > b.cut_edge AND l.starts_at < b.put_up) AS flaws,
         (SELECT json_agg(json_build_object('length', r.length, 'count', r.count)) FROM reservations r
           WHERE r.bolt_id = b.id AND r.state = 'held') AS held,
         (SELECT json_build_object('station', c.station, 'personId', c.person_id, 'person', p.name, 'runId', c.run_id, 'claimedAt', c.claimed_at)
            FROM claims c JOIN people p ON p.id = c.person_id WHERE c.bolt_id = b.id) AS claim
    FROM bolts b JOIN fabrics f ON f.id = b.fabric_id`;

/** Bolts as views, in one query; every figure is worked out from rows, none is cached on the way. */
export async function loadBolts(query: BoltQuery, transaction?: Transaction, rules?: ShopRules): Promise<BoltView[]> {
  const { straightening } = rules ?? (await readShopRules(transaction));
  const limit = query.limit === undefined ? "" : ` LIMIT ${Math.trunc(query.limit)}`;
  const rows = await db().sequelize.query<BoltRow>(`${SELECT} WHERE ${query.where} ORDER BY ${query.order ?? "b.id"}${limit}`, {
    bind: [...query.bind],
    type: QueryTypes.SELECT,
    transaction: transaction ?? null,
  });
  return rows.map((row) => viewOf(row, straightening));
}

/** One bolt by id; throws when there is none, since ids come from our own rows. */
export async function loadBolt(id: number, transaction?: Transaction): Promise<BoltView> {
  const [bolt] = await loadBolts({ where: "b.id = $1", bind: [id] }, transaction);
  if (!bolt) throw new Error(`No bolt has the id ${id}`);
  return bolt;
}

function viewOf({ held, flaws, claim, ...row }: BoltRow, straightening: number): BoltView {
  const here = flaws ?? [];
  const cloth = { cutEdge: row.cutEdge, putUp: row.putUp, flaws: here };
  return {
    ...row,
    left: row.putUp - row.cutEdge,
    toSell: toSell(cloth, held ?? [], straightening),
    longestPiece: longestPiece(cloth),
    flaws: here.map((flaw) => ({ ...flaw, coreFrom: fromCore(row.putUp, flaw.startsAt), coreTo: fromCore(row.putUp, flaw.endsAt) })),
    fabricLeft: row.fabricLeft ?? 0,
    claim: claim && { ...claim, claimedAt: new Date(claim.claimedAt).toISOString() },
    receivedAt: row.receivedAt.toISOString(),
    retiredAt: row.retiredAt?.toISOString() ?? null,
  };
}
