import Link from "next/link";
import { Tape } from "@/components/diagrams/tape";
import { TapeAxis, yardLines } from "@/components/diagrams/tape-axis";
import { PageHead } from "@/components/shell/page-head";
import { ClothPatterns } from "@/components/ui/cloth-patterns";
import { ClothLength } from "@/components/ui/figures";
import { LinkButton } from "@/components/ui/link-button";
import { SubmitButton } from "@/components/ui/submit-button";
import { Swatch } from "@/components/ui/swatch";
import { Cell, Head, NoRows, RowHead, RuledTable } from "@/components/ui/table";
import { TextInput } from "@/components/ui/text-input";
import type { Length } from "@/lib/core/measure/length";
import { listBolts } from "@/lib/data/stock/list-bolts";
import { requireShop } from "@/lib/data/shop";
import { boltFilterInput } from "@/lib/input/stock";
import { requireActor } from "@/lib/server/auth/require-actor";
import { boltTape } from "./bolt-tape";

export const metadata = { title: "Bolts" };

const TAPE_WIDTH = 420;

export default async function BoltsPage({ searchParams }: { searchParams: Promise<Record<string, string | string[] | undefined>> }) {
  const actor = await requireActor("bolt.see");
  const filter = boltFilterInput.parse(await searchParams);
  const [page, shop] = await Promise.all([listBolts(actor, { ...filter, after: filter.after ?? null }), requireShop()]);
  const { bolts, next } = page.ok ? page.value : { bolts: [], next: null };
  const max = Math.max(1, ...bolts.map((bolt) => bolt.putUp)) as Length;
  const tiles = [...new Map(bolts.map((bolt) => [bolt.fabric.slug, { id: bolt.fabric.slug, tile: bolt.fabric.tile, colour: bolt.fabric.colour }])).values()];
  const kept = new URLSearchParams(Object.entries({ text: filter.text, shelf: filter.shelf }).flatMap(([name, value]) => (value ? [[name, value]] : [])));
  return (
    <>
      <ClothPatterns fabrics={tiles} />
      <PageHead title="Bolts" sub="In shelf order. What can be sold is the longest single piece that leaves every promise whole." />
      <form method="get" className="page-section flex flex-wrap items-end gap-4">
        <TextInput label="Fabric, tag or lot" name="text" defaultValue={filter.text} maxLength={80} />
        <TextInput label="Shelf begins with" name="shelf" defaultValue={filter.shelf} maxLength={40} />
        <SubmitButton variant="plain">Show bolts</SubmitButton>
      </form>
      <RuledTable caption="Bolts in shelf order" page stack>
        <thead>
          <tr>
            <Head>Fabric</Head>
            <Head>Tag</Head>
            <Head>Lot</Head>
            <Head>Shelf</Head>
            <Head>
              On the bolt, from the core
              <TapeAxis width={TAPE_WIDTH} max={max} system={shop.system} />
            </Head>
            <Head figure>Left</Head>
            <Head figure>Reserved</Head>
            <Head figure>To sell</Head>
            <Head>Note</Head>
          </tr>
        </thead>
        <tbody>
          {bolts.length === 0 ? (
            <NoRows columns={9}>
              No bolt answers to that. <Link href="/staff/bolts">Show all bolts</Link>
            </NoRows>
          ) : null}
          {bolts.map((bolt) => (
            <tr key={bolt.id}>
              <RowHead>
                <span className="inline-flex items-center gap-3">
                  <Swatch fabric={{ tile: bolt.fabric.tile, colour: bolt.fabric.colour }} label={bolt.fabric.name} />
                  <Link href={`/staff/bolts/${bolt.tag}`}>{bolt.fabric.name}</Link>
                </span>
              </RowHead>
              <Cell label="Tag">{bolt.tag}</Cell>
              <Cell label="Lot">{bolt.lot}</Cell>
              <Cell label="Shelf">{bolt.shelf}</Cell>
              <Cell wide style={yardLines({ width: TAPE_WIDTH, max, system: shop.system, offset: 9 })}>
                <Tape {...boltTape(bolt, shop.system)} width={TAPE_WIDTH} max={max} hidden />
              </Cell>
              <Cell figure label="Left">
                <ClothLength value={bolt.left as Length} system={shop.system} />
              </Cell>
              <Cell figure label="Reserved">
                {bolt.reserved > 0 ? <ClothLength value={bolt.reserved as Length} system={shop.system} /> : <span className="quiet">none</span>}
              </Cell>
              <Cell figure label="To sell">
                <ClothLength value={bolt.toSell as Length} system={shop.system} />
              </Cell>
              <Cell label="Note">{[bolt.flaws.length ? "flaw" : "", bolt.fabricLeft < bolt.lowMark ? "below the mark" : ""].filter(Boolean).join(", ")}</Cell>
            </tr>
          ))}
        </tbody>
      </RuledTable>
      {next ? (
        <div className="page-section">
          <LinkButton href={`/staff/bolts?${kept.size ? `${kept}&` : ""}after=${encodeURIComponent(next)}`}>More bolts</LinkButton>
        </div>
      ) : null}
    </>
  );
}
