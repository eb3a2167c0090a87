import { notFound } from "next/navigation";
import { Tape } from "@/components/diagrams/tape";
import { PageHead } from "@/components/shell/page-head";
import { BackLink } from "@/components/ui/back-link";
import { ClothPatterns } from "@/components/ui/cloth-patterns";
import { ClothLength } from "@/components/ui/figures";
import { Cell, Head, NoRows, RuledTable } from "@/components/ui/table";
import type { Length } from "@/lib/core/measure/length";
import { can } from "@/lib/core/policy/policy";
import { getBolt } from "@/lib/data/stock/get-bolt";
import { requireShop } from "@/lib/data/shop";
import { requireActor } from "@/lib/server/auth/require-actor";
import { boltTape } from "../bolt-tape";
import { MeasureForm } from "./measure-form";

export const metadata = { title: "Bolt" };

export default async function BoltPage({ params }: { params: Promise<{ tag: string }> }) {
  const actor = await requireActor("bolt.see");
  const [found, shop] = await Promise.all([getBolt(actor, await params), requireShop()]);
  if (!found.ok) notFound();
  const bolt = found.value;
  return (
    <>
      <ClothPatterns fabrics={[{ id: bolt.fabric.slug, tile: bolt.fabric.tile, colour: bolt.fabric.colour }]} />
      <PageHead back={<BackLink href="/staff/bolts">Bolts</BackLink>} title={bolt.fabric.name} sub={`Tag ${bolt.tag}, lot ${bolt.lot}, shelf ${bolt.shelf || "none"}`} />
      <section className="page-section table-scroll">
        <Tape {...boltTape(bolt, shop.system)} width={900} max={bolt.putUp as Length} full figures clothHeight={40} tapeHeight={18} />
        <p className="mt-4">
          <ClothLength value={bolt.left as Length} system={shop.system} /> left, <ClothLength value={bolt.reserved as Length} system={shop.system} /> reserved,{" "}
          <ClothLength value={bolt.toSell as Length} system={shop.system} /> to sell on one piece.
        </p>
      </section>
      {can(actor, "bolt.measure") ? (
        <section className="page-section">
          <h2>Measure what is left</h2>
          <MeasureForm tag={bolt.tag} system={shop.system} left={bolt.left} />
        </section>
      ) : null}
      <section className="page-section">
        <h2>Cuts, the last first</h2>
        <RuledTable caption="Cuts" dense>
          <thead>
            <tr>
              <Head figure>Length</Head>
              <Head>For</Head>
              <Head>By</Head>
              <Head>Note</Head>
            </tr>
          </thead>
          <tbody>
            {bolt.cuts.length === 0 ? <NoRows columns={4}>Nothing has been cut from this bolt.</NoRows> : null}
            {[...bolt.cuts].reverse().map((cut) => (
              <tr key={cut.id}>
                <Cell figure label="Length">
                  <ClothLength value={cut.length as Length} system={shop.system} />
                </Cell>
                <Cell label="For">{cut.kit ? `kit ${cut.kit.number} of run ${cut.kit.runCode}` : cut.purpose}</Cell>
                <Cell label="By">{cut.person}</Cell>
                <Cell label="Note">{cut.note}</Cell>
              </tr>
            ))}
          </tbody>
        </RuledTable>
      </section>
    </>
  );
}
