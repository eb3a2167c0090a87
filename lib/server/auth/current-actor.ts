import { getServerSession } from "next-auth";
import { cache } from "react";
import type { Actor } from "@/lib/core/policy/policy";
import { readSession } from "@/lib/data/people/sessions";
import { authOptions } from "./options";

/** Who asks, checked against the database once a request, so that a revoked session ends at once. */
export const currentActor = cache(async (): Promise<Actor | null> => {
  const session = await getServerSession(authOptions);
  return session?.sessionId ? readSession(session.sessionId) : null;
});
