import { z } from "zod";
import { findGoods } from "@/lib/data/counter/find-goods";
import { route } from "@/lib/server/doors/route";

const input = z.object({ text: z.string().trim().min(1, "Scan a tag or type a number.").max(80, "That is longer than any tag.") });

export const GET = route(input, "till.sell", findGoods);
