import Link from "next/link";
import { PageHead } from "@/components/shell/page-head";
import { StageDots } from "@/components/ui/selvage-dots";
import { Cell, Head, NoRows, RowHead, RuledTable } from "@/components/ui/table";
import { listRuns } from "@/lib/data/runs/runs";
import { requireActor } from "@/lib/server/auth/require-actor";

export const metadata = { title: "Runs" };

export default async function RunsPage() {
  await requireActor("run.see");
  const runs = await listRuns({ open: false });
  return (
    <>
      <PageHead title="Runs" sub="The newest first." />
      <RuledTable caption="Kit runs" page>
        <thead>
          <tr>
            <Head>Run</Head>
            <Head>Kit</Head>
            <Head figure>Kits</Head>
            <Head>Stage</Head>
            <Head figure>Cut</Head>
            <Head figure>Short</Head>
            <Head figure>Packed</Head>
          </tr>
        </thead>
        <tbody>
          {runs.length === 0 ? (
            <NoRows columns={7}>
              No run yet. Start one from <Link href="/staff/kits">a kit’s page</Link>.
            </NoRows>
          ) : null}
          {runs.map((run) => (
            <tr key={run.id}>
              <RowHead>
                <Link href={`/staff/runs/${run.code}`}>{run.code}</Link>
              </RowHead>
              <Cell label="Kit">
                {run.kit}, {run.colourway}
              </Cell>
              <Cell figure label="Kits">
                {run.kits}
              </Cell>
              <Cell label="Stage">{run.state === "cancelled" ? "cancelled" : <StageDots stage={run.state} />}</Cell>
              <Cell figure label="Cut">
                {run.cut} of {run.lengths}
              </Cell>
              <Cell figure label="Short">
                {run.short}
              </Cell>
              <Cell figure label="Packed">
                {run.packed} of {run.kits}
              </Cell>
            </tr>
          ))}
        </tbody>
      </RuledTable>
    </>
  );
}
