import { listTills } from "@/lib/data/counter/tills";
import { requireShop } from "@/lib/data/shop";
import { requireActor } from "@/lib/server/auth/require-actor";
import { Counter } from "./counter";

export const metadata = { title: "Counter" };

export default async function CounterPage() {
  const actor = await requireActor("till.sell");
  const [tills, shop] = await Promise.all([listTills(), requireShop()]);
  return <Counter tills={tills} person={actor.name} system={shop.system} currency={shop.currency} />;
}
