import Link from "next/link";
import { PageHead } from "@/components/shell/page-head";
import { Money } from "@/components/ui/figures";
import { Cell, Head, NoRows, RowHead, RuledTable } from "@/components/ui/table";
import { listKits } from "@/lib/data/designs/kits";
import { requireShop } from "@/lib/data/shop";
import { requireActor } from "@/lib/server/auth/require-actor";

export const metadata = { title: "Kits" };

export default async function KitsPage() {
  await requireActor("kit.see");
  const [kits, shop] = await Promise.all([listKits(), requireShop()]);
  return (
    <>
      <PageHead title="Kits" sub="Each colourway holds the lengths that its plan worked out." />
      <RuledTable caption="Kits and their colourways" page>
        <thead>
          <tr>
            <Head>Kit</Head>
            <Head>Colourway</Head>
            <Head figure>Fabrics</Head>
            <Head figure>Price</Head>
          </tr>
        </thead>
        <tbody>
          {kits.length === 0 ? <NoRows columns={4}>No kit has been designed yet.</NoRows> : null}
          {kits.flatMap((kit) =>
            kit.colourways.map((colourway) => (
              <tr key={colourway.id}>
                <RowHead>
                  <Link href={`/staff/kits/${kit.slug}?colourway=${colourway.id}`}>
                    {kit.name}, version {kit.version}
                  </Link>
                </RowHead>
                <Cell label="Colourway">{colourway.name}</Cell>
                <Cell figure label="Fabrics">
                  {colourway.lengths.length}
                </Cell>
                <Cell figure label="Price">
                  <Money minor={colourway.price} currency={shop.currency} />
                </Cell>
              </tr>
            )),
          )}
        </tbody>
      </RuledTable>
    </>
  );
}
