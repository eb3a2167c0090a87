import { notFound } from "next/navigation";
import { PageHead } from "@/components/shell/page-head";
import { BackLink } from "@/components/ui/back-link";
import { ClothLength } from "@/components/ui/figures";
import { LinkButton } from "@/components/ui/link-button";
import { StageDots } from "@/components/ui/selvage-dots";
import { Cell, Head, RowHead, RuledTable } from "@/components/ui/table";
import { can } from "@/lib/core/policy/policy";
import { getRun } from "@/lib/data/runs/runs";
import { requireShop } from "@/lib/data/shop";
import { requireActor } from "@/lib/server/auth/require-actor";

export const metadata = { title: "Run" };

/** A run with its bolt-length list, in the order in which the bolts stand on the shelves. */
export default async function RunPage({ params }: { params: Promise<{ code: string }> }) {
  const actor = await requireActor("run.see");
  const [run, shop] = await Promise.all([getRun((await params).code.toUpperCase()), requireShop()]);
  if (!run) notFound();
  return (
    <>
      <PageHead
        back={<BackLink href="/staff/runs">Runs</BackLink>}
        title={`${run.kit}, ${run.colourway} × ${run.kits}`}
        sub={
          <>
            Run {run.code}. {run.state === "cancelled" ? "Cancelled" : <StageDots stage={run.state} />}
          </>
        }
        actions={can(actor, "run.cut") && run.state !== "cancelled" ? <LinkButton href={`/table/${run.code}`}>Open at the cutting table</LinkButton> : null}
      />
      <section className="page-section">
        <h2>Kits</h2>
        <RuledTable caption="Kits of the run" dense>
          <thead>
            <tr>
              <Head>Bag</Head>
              <Head>Serial</Head>
              <Head>State</Head>
              <Head figure>Lengths cut</Head>
            </tr>
          </thead>
          <tbody>
            {run.runKits.map((kit) => (
              <tr key={kit.id}>
                <RowHead>{kit.number}</RowHead>
                <Cell label="Serial">{kit.serial}</Cell>
                <Cell label="State">{kit.state}</Cell>
                <Cell figure label="Lengths cut">
                  {kit.cut} of {kit.lengths}
                </Cell>
              </tr>
            ))}
          </tbody>
        </RuledTable>
      </section>
      <section className="page-section">
        <h2>Bolt-length list</h2>
        <RuledTable caption="Lengths in cutting order" dense>
          <thead>
            <tr>
              <Head>Shelf</Head>
              <Head>Bolt</Head>
              <Head>Fabric</Head>
              <Head>Lot</Head>
              <Head figure>Length</Head>
              <Head>Bag</Head>
              <Head>State</Head>
            </tr>
          </thead>
          <tbody>
            {run.runLengths.map((each) => (
              <tr key={each.id}>
                <Cell label="Shelf">{each.shelf}</Cell>
                <Cell label="Bolt">{each.boltTag}</Cell>
                <RowHead>{each.fabric}</RowHead>
                <Cell label="Lot">{each.lot}</Cell>
                <Cell figure label="Length">
                  <ClothLength value={each.length} system={shop.system} />
                </Cell>
                <Cell label="Bag">{each.kitNumber}</Cell>
                <Cell label="State">{each.state === "to-cut" ? "to cut" : each.state}</Cell>
              </tr>
            ))}
          </tbody>
        </RuledTable>
      </section>
    </>
  );
}
