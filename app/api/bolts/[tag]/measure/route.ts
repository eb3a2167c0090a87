import { measureBolt } from "@/lib/data/stock/measure-bolt";
import { measureInput } from "@/lib/input/stock";
import { route } from "@/lib/server/doors/route";

export const POST = route(measureInput, "bolt.measure", measureBolt);
