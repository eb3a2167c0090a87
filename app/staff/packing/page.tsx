import { PageHead } from "@/components/shell/page-head";
import { requireShop } from "@/lib/data/shop";
import { requireActor } from "@/lib/server/auth/require-actor";
import { PackingBench } from "./packing-bench";

export const metadata = { title: "Packing bench" };

export default async function PackingPage() {
  await requireActor("kit.pack");
  const shop = await requireShop();
  return (
    <>
      <PageHead title="Packing bench" sub="Scan the tag on a bag, then each length’s cut tag and each notion." />
      <PackingBench system={shop.system} />
    </>
  );
}
