import Link from "next/link";
import { LonePage } from "@/components/shell/lone-page";
import { listRuns } from "@/lib/data/runs/runs";
import { requireActor } from "@/lib/server/auth/require-actor";

export const metadata = { title: "Cutting table" };

export default async function TablePage() {
  const actor = await requireActor("run.cut");
  const runs = await listRuns({ open: true });
  return (
    <LonePage title="Cutting table" sub={runs.length === 0 ? "No run waits to be cut." : `${actor.name}, choose a run.`}>
      <ul>
        {runs.map((run) => (
          <li key={run.id} className="py-4">
            <Link href={`/table/${run.code}`} className="text-22">
              {run.kit}, {run.colourway} × {run.kits}
            </Link>{" "}
            {run.cut} of {run.lengths} cut
          </li>
        ))}
      </ul>
      <p>
        <Link href="/staff">Back to today</Link>
      </p>
    </LonePage>
  );
}
