import { isDatabaseUp } from "@/lib/data/health";

export const dynamic = "force-dynamic";

/** Whether this server answers and reaches its database. Says nothing else, and needs no sign-in. */
export async function GET(): Promise<Response> {
  const up = await isDatabaseUp();
  return Response.json({ up }, { status: up ? 200 : 503 });
}
