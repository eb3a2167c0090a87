import Link from "next/link";
import { BlockDiagram } from "@/components/diagrams/block-diagram";
import { PageHead } from "@/components/shell/page-head";
import { Inches } from "@/components/ui/figures";
import { analyseBlock } from "@/lib/core/patchwork/analyse-block";
import { listBlocks } from "@/lib/data/designs/blocks";
import { requireActor } from "@/lib/server/auth/require-actor";

export const metadata = { title: "Blocks" };

export default async function BlocksPage() {
  await requireActor("block.see");
  const blocks = await listBlocks();
  return (
    <>
      <PageHead title="Blocks" sub={`${blocks.length} blocks. The traditional ones are in the public domain and drawn by us.`} />
      <ul className="page-section flex flex-wrap gap-8">
        {blocks.map((block) => {
          const analysis = analyseBlock(block.drawing, block.size);
          return (
            <li key={block.versionId} style={{ width: 160 }}>
              {analysis.ok ? <BlockDiagram patches={analysis.value.patches} size={block.size} roles={block.roles} side={150} letters={false} label={block.name} /> : null}
              <Link href={`/staff/blocks/${block.slug}`}>{block.name}</Link>
              <br />
              <span className="second">
                <Inches value={block.size.width} />, {analysis.ok ? analysis.value.patches.length : 0} patches
              </span>
            </li>
          );
        })}
      </ul>
    </>
  );
}
