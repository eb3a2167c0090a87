import Link from "next/link";
import { PageHead } from "@/components/shell/page-head";
import { StageDots } from "@/components/ui/selvage-dots";
import { can } from "@/lib/core/policy/policy";
import { listRuns } from "@/lib/data/runs/runs";
import { requireShop } from "@/lib/data/shop";
import { listExceptions } from "@/lib/data/stock/list-exceptions";
import { requireActor } from "@/lib/server/auth/require-actor";

export const metadata = { title: "Today" };

/** What this person has to do now. */
export default async function TodayPage() {
  const actor = await requireActor("today.see");
  const shop = await requireShop();
  const runs = await listRuns({ open: true });
  const exceptions = can(actor, "exception.see") ? await listExceptions(actor, {}) : null;
  const day = new Intl.DateTimeFormat("en-GB", { weekday: "long", day: "numeric", month: "long", timeZone: shop.timeZone }).format(new Date());
  return (
    <>
      <PageHead title={[day, actor.place, actor.name.split(" ")[0]].filter(Boolean).join(", ")} sub={shop.name} />
      <section className="page-section">
        <h2>Runs under way</h2>
        {runs.length === 0 ? <p className="second">No run is under way. A manager starts one from a kit’s page.</p> : null}
        <ul>
          {runs.map((run) => (
            <li key={run.id} className="py-2">
              <Link href={`/staff/runs/${run.code}`}>
                {run.kit}, {run.colourway} × {run.kits}
              </Link>{" "}
              {run.state === "cancelled" ? "cancelled" : <StageDots stage={run.state} />} {run.cut} of {run.lengths} lengths cut, {run.packed} of {run.kits} kits packed
            </li>
          ))}
        </ul>
      </section>
      {exceptions?.ok && exceptions.value.exceptions.length > 0 ? (
        <section className="page-section">
          <h2>What facts have upset</h2>
          <ul>
            {exceptions.value.exceptions.map((exception) => (
              <li key={exception.id} className="py-2">
                {exception.sentence}
              </li>
            ))}
          </ul>
        </section>
      ) : null}
    </>
  );
}
