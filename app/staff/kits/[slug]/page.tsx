import { notFound } from "next/navigation";
import { CutMap } from "@/components/diagrams/cut-map";
import { QuiltDiagram } from "@/components/diagrams/quilt-diagram";
import { PageHead } from "@/components/shell/page-head";
import { BackLink } from "@/components/ui/back-link";
import { ClothPatterns } from "@/components/ui/cloth-patterns";
import { ClothLength, Inches, Money } from "@/components/ui/figures";
import { LinkTabs } from "@/components/ui/tabs";
import { Cell, Head, RowHead, RuledTable } from "@/components/ui/table";
import type { KitPlan } from "@/lib/core/kit/kit-plan";
import { layQuilt } from "@/lib/core/patchwork/quilt-layout";
import { can } from "@/lib/core/policy/policy";
import { getFabrics } from "@/lib/data/designs/fabrics";
import { getKit } from "@/lib/data/designs/kits";
import { getQuiltVersion } from "@/lib/data/designs/quilts";
import { keptPlan } from "@/lib/data/planning/jobs";
import { planRun } from "@/lib/data/runs/plan-run";
import { requireShop } from "@/lib/data/shop";
import { requireActor } from "@/lib/server/auth/require-actor";
import { StartRunForm } from "./start-run-form";

export const metadata = { title: "Kit bench" };

/** One kit asked for is enough to hear how many the bolts would allow. */
const ONE = 1;

export default async function KitBenchPage({ params, searchParams }: { params: Promise<{ slug: string }>; searchParams: Promise<Record<string, string | undefined>> }) {
  const actor = await requireActor("kit.see");
  const kit = await getKit((await params).slug);
  if (!kit) notFound();
  const asked = Number((await searchParams).colourway);
  const colourway = kit.colourways.find((each) => each.id === asked) ?? kit.colourways[0];
  if (!colourway) notFound();
  const [shop, quilt, kept, fabrics, run] = await Promise.all([
    requireShop(),
    getQuiltVersion(kit.quiltVersionId),
    keptPlan(colourway.planHash),
    getFabrics([...new Set(Object.values(colourway.fabrics))]),
    planRun(actor, { colourwayId: colourway.id, kits: ONE }),
  ]);
  const plan = kept as KitPlan | null;
  const laid = quilt ? layQuilt(quilt.design) : null;
  const tileOf = new Map(fabrics.map((fabric) => [fabric.id, { id: fabric.slug, tile: fabric.tile, colour: fabric.colour }]));
  const cloth = Object.fromEntries(Object.entries(colourway.fabrics).map(([role, id]) => [role, tileOf.get(id)]));
  const allows = new Map(run.ok ? run.value.plan.allows.map((each) => [each.fabric, each.kits]) : []);
  const most = run.ok ? run.value.plan.mostKits : 0;
  return (
    <>
      <ClothPatterns fabrics={[...tileOf.values()]} />
      <PageHead
        back={<BackLink href="/staff/kits">Kits</BackLink>}
        title={`${kit.name}, ${colourway.name}`}
        sub={
          quilt ? (
            <>
              <Inches value={quilt.size.width} bare /> × <Inches value={quilt.size.height} />, sold in lengths, version {kit.version}, <Money minor={colourway.price} currency={shop.currency} />
            </>
          ) : null
        }
      />
      <div className="page-section">
        <LinkTabs label="Colourways" tabs={kit.colourways.map((each) => ({ href: `/staff/kits/${kit.slug}?colourway=${each.id}`, label: each.name, current: each.id === colourway.id }))} />
      </div>
      <RuledTable caption="Fabrics of one kit" page>
        <thead>
          <tr>
            <Head>Fabric</Head>
            <Head>Pieces</Head>
            <Head figure>Strips</Head>
            <Head figure>Net, in</Head>
            <Head figure>No plan under, in</Head>
            <Head figure>Cut length</Head>
            <Head figure>Kits it allows</Head>
          </tr>
        </thead>
        <tbody>
          {plan?.fabrics.map((each) => (
            <tr key={each.fabric} className={run.ok && run.value.plan.limiting === each.fabric ? "limiting" : undefined}>
              <RowHead>{each.name}</RowHead>
              <Cell label="Pieces">{each.pieces.map((piece) => (piece.method.kind === "long-strip" ? piece.name : `${piece.count} ${piece.letter}`)).join(", ")}</Cell>
              <Cell figure label="Strips">
                {each.plan.strips.length}
              </Cell>
              <Cell figure label="Net">
                <Inches value={each.plan.length} bare />
              </Cell>
              <Cell figure label="No plan under">
                <Inches value={each.plan.bounds.strips} bare />
              </Cell>
              <Cell figure label="Cut length">
                <ClothLength value={each.allowance.cutLength} system={shop.system} />
              </Cell>
              <Cell figure label="Kits it allows">
                {allows.get(each.fabric) ?? 0}
              </Cell>
            </tr>
          ))}
        </tbody>
      </RuledTable>
      <section className="page-section">
        <p className={most === 0 ? "short" : undefined}>{run.ok ? run.value.plan.reason : run.fault.message}</p>
        {can(actor, "run.start") ? <StartRunForm colourwayId={colourway.id} most={most} /> : null}
      </section>
      <section className="page-section">
        <h2>The quilt</h2>
        {laid?.ok && quilt ? <QuiltDiagram layout={laid.value} roles={quilt.design.roles} cloth={cloth} width={420} label={`${kit.name} in ${colourway.name}`} binding={quilt.design.binding?.role ?? null} /> : null}
      </section>
      {plan?.fabrics.map((each) => (
        <section key={each.fabric} className="page-section table-scroll">
          <h2>{each.name}</h2>
          <p className="second">
            Net <Inches value={each.allowance.net} />, square the end <Inches value={each.allowance.straightening} />, mis-cuts <Inches value={each.allowance.misCuts} />, prewash <Inches value={each.allowance.prewash} />, up to
            the step <Inches value={each.allowance.rounding} />: cut <ClothLength value={each.allowance.cutLength} system={shop.system} />.
          </p>
          <CutMap plan={each.plan} blanks={each.blanks} pieces={each.pieces} allowance={each.allowance} system={shop.system} width={760} cloth={tileOf.get(Number(each.fabric)) ?? null} name={each.name} />
        </section>
      ))}
    </>
  );
}
