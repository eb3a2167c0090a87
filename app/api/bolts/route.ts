import { listBolts } from "@/lib/data/stock/list-bolts";
import { boltFilterInput } from "@/lib/input/stock";
import { route } from "@/lib/server/doors/route";

export const GET = route(boltFilterInput, "bolt.see", listBolts);
