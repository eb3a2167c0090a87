import Link from "next/link";
import { redirect } from "next/navigation";
import { PageHead } from "@/components/shell/page-head";
import { listBlocks } from "@/lib/data/designs/blocks";
import { listKits } from "@/lib/data/designs/kits";
import { findByCode, type Found } from "@/lib/data/stock/find-by-code";
import { listBolts } from "@/lib/data/stock/list-bolts";
import { requireActor } from "@/lib/server/auth/require-actor";

export const metadata = { title: "Find" };

const MOST = 20;

/** A scanned code goes straight to its thing; a word is looked for among bolts, blocks and kits. */
export default async function FindPage({ searchParams }: { searchParams: Promise<Record<string, string | string[] | undefined>> }) {
  const actor = await requireActor("find.see");
  const asked = (await searchParams).q;
  const text = (typeof asked === "string" ? asked : "").trim().slice(0, 80);
  if (text === "") return <PageHead title="Find or scan" sub="Write a name, a tag or a serial in the field above, or scan it." />;
  const coded = await findByCode(actor, { text });
  const address = coded.ok ? addressOf(coded.value) : null;
  if (address) redirect(address);
  const [bolts, blocks, kits] = await Promise.all([listBolts(actor, { text, limit: MOST }), listBlocks(), listKits()]);
  const holds = (name: string) => name.toLowerCase().includes(text.toLowerCase());
  const found = [
    ...(bolts.ok ? bolts.value.bolts : []).map((bolt) => ({ href: `/staff/bolts/${bolt.tag}`, label: `${bolt.fabric.name}, bolt ${bolt.tag}, lot ${bolt.lot}` })),
    ...blocks.filter((block) => holds(block.name)).map((block) => ({ href: `/staff/blocks/${block.slug}`, label: `${block.name}, block` })),
    ...kits.filter((kit) => holds(kit.name)).map((kit) => ({ href: `/staff/kits/${kit.slug}`, label: `${kit.name}, kit` })),
  ];
  const nothing = coded.ok ? `${coded.value.title} has no page of its own.` : `Nothing in the shop answers to “${text}”. Wanted: a name, a tag or a serial.`;
  return (
    <>
      <PageHead title={`Find “${text}”`} sub={found.length === 0 ? nothing : `${found.length} found.`} />
      <ul className="page-section">
        {found.map((each) => (
          <li key={each.href} className="py-2">
            <Link href={each.href}>{each.label}</Link>
          </li>
        ))}
      </ul>
    </>
  );
}

function addressOf(found: Found): string | null {
  switch (found.kind) {
    case "bolt":
      return `/staff/bolts/${found.tag}`;
    case "run":
      return `/staff/runs/${found.code}`;
    case "kit":
    case "cut":
      return `/staff/runs/${found.runCode}`;
    default:
      return null;
  }
}
