import { notFound } from "next/navigation";
import { getRun } from "@/lib/data/runs/runs";
import { requireShop } from "@/lib/data/shop";
import { requireActor } from "@/lib/server/auth/require-actor";
import { CuttingTable } from "./cutting-table";

export const metadata = { title: "Cutting table" };

export default async function RunTablePage({ params }: { params: Promise<{ code: string }> }) {
  const actor = await requireActor("run.cut");
  const [run, shop] = await Promise.all([getRun((await params).code.toUpperCase()), requireShop()]);
  if (!run) notFound();
  return <CuttingTable run={run} person={{ id: actor.personId, name: actor.name, place: actor.place ?? "table" }} system={shop.system} />;
}
