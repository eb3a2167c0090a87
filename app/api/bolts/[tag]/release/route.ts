import { releaseClaim } from "@/lib/data/stock/claim-bolt";
import { releaseInput } from "@/lib/input/stock";
import { route } from "@/lib/server/doors/route";

export const POST = route(releaseInput, "bolt.move", releaseClaim);
