import { notFound } from "next/navigation";
import { BlockDiagram } from "@/components/diagrams/block-diagram";
import { PatchDiagram } from "@/components/diagrams/patch-diagram";
import { PageHead } from "@/components/shell/page-head";
import { BackLink } from "@/components/ui/back-link";
import { Inches } from "@/components/ui/figures";
import { Notice } from "@/components/ui/notice";
import { SubmitButton } from "@/components/ui/submit-button";
import { Cell, Head, RowHead, RuledTable } from "@/components/ui/table";
import { TextInput } from "@/components/ui/text-input";
import { formatExactInches, formatInches } from "@/lib/core/measure/format";
import { inches } from "@/lib/core/measure/length";
import { parseInches } from "@/lib/core/measure/parse";
import { analyseBlock } from "@/lib/core/patchwork/analyse-block";
import { blockCutList, blockGrowth } from "@/lib/core/patchwork/cut-list";
import type { BlockSize } from "@/lib/core/piece/drawing";
import { getBlock } from "@/lib/data/designs/blocks";
import { cuttingRulesOf, requireShop } from "@/lib/data/shop";
import { requireActor } from "@/lib/server/auth/require-actor";
import { sayMethod } from "./say-method";

export const metadata = { title: "Block" };

const LIMITS = { least: inches(0.5), most: inches(200) };

/** A block at any size: its patches with letters, how each is cut, and what it says of itself. */
export default async function BlockPage({ params, searchParams }: { params: Promise<{ slug: string }>; searchParams: Promise<Record<string, string | undefined>> }) {
  await requireActor("block.see");
  const [block, shop] = await Promise.all([getBlock((await params).slug), requireShop()]);
  if (!block) notFound();
  const typed = (await searchParams).size;
  const asked = typed === undefined ? null : parseInches(typed, LIMITS);
  const size: BlockSize = asked?.ok ? { width: asked.value, height: asked.value } : block.size;
  const analysis = analyseBlock(block.drawing, size);
  const rules = cuttingRulesOf(shop);
  const list = analysis.ok ? blockCutList(analysis.value, size, rules) : [];
  const growth = analysis.ok ? blockGrowth(analysis.value, rules) : { across: 0, down: 0 };
  const roleName = new Map(block.roles.map((role) => [role.id, role.name]));
  return (
    <>
      <PageHead back={<BackLink href="/staff/blocks">Blocks</BackLink>} title={block.name} sub={<>Version {block.version}, drawn at <Inches value={block.size.width} />, shown at <Inches value={size.width} /></>} />
      <form method="get" className="page-section flex items-end gap-4">
        <TextInput label="Finished size, in" name="size" defaultValue={typed ?? formatInches(size.width)} error={asked && !asked.ok ? asked.fault.message : null} maxLength={12} />
        <SubmitButton variant="plain">Show at this size</SubmitButton>
      </form>
      {analysis.ok ? (
        <section className="page-section table-scroll">
          <BlockDiagram patches={analysis.value.patches} size={size} roles={block.roles} side={520} rulers={{ grid: block.drawing.grid, system: shop.system }} label={`${block.name} with its patch letters`} />
        </section>
      ) : (
        <Notice kind="error">{analysis.fault.message}</Notice>
      )}
      <RuledTable caption="Patches and how each is cut" page>
        <thead>
          <tr>
            <Head>Patch</Head>
            <Head>Fabric role</Head>
            <Head>Finished</Head>
            <Head>How it is cut</Head>
            <Head figure>Count</Head>
          </tr>
        </thead>
        <tbody>
          {list.map((piece) => (
            <tr key={piece.key}>
              <RowHead>
                <PatchDiagram letter={piece.letter} finished={piece.finished} cut={piece.cut} label={`Patch ${piece.letter}, ${piece.name}`} /> {piece.letter}
              </RowHead>
              <Cell label="Fabric role">{roleName.get(piece.role) ?? piece.role}</Cell>
              <Cell label="Finished">{piece.name}</Cell>
              <Cell label="How it is cut">{sayMethod(piece)}</Cell>
              <Cell figure label="Count">
                {piece.count}
              </Cell>
            </tr>
          ))}
        </tbody>
      </RuledTable>
      <section className="page-section">
        <h2>What it says</h2>
        <ul>
          {analysis.ok ? analysis.value.complaints.map((complaint, index) => <li key={index}>{complaint.sentence}</li>) : null}
          <li>
            {growth.across === 0 && growth.down === 0
              ? "Grows nothing: what is sewn as cut falls on the ruler."
              : `The sewn block grows ${formatExactInches(growth.across)} in across and ${formatExactInches(growth.down)} in down, since its cuts go to the nearest mark.`}
          </li>
        </ul>
      </section>
    </>
  );
}
