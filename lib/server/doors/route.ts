import type { NextRequest } from "next/server";
import type { z } from "zod";
import { can, type Actor, type Permission } from "@/lib/core/policy/policy";
import { fail, ok, type Fault, type Result } from "@/lib/core/result";
import { currentActor } from "@/lib/server/auth/current-actor";
import { environment } from "@/lib/server/environment";
import { parseInput } from "./parse-input";
import { foreignOrigin, notAllowed, notSignedIn } from "./refusals";
import { isSameOrigin } from "./same-origin";
import { statusOf } from "./status";

/** A JSON body of a scan, a cut or a sale is small; a drawing with 2 000 seams is under this. */
const MOST_BYTES = 1_000_000;

type Handler = (request: NextRequest, context: { params: Promise<Record<string, string | string[] | undefined>> }) => Promise<Response>;

/**
 * The door of every route handler. The input is the path's parameters, the query and, for a write, the JSON body, one
 * object for the schema. The use case answers a Result (sent as JSON) or a Response of its own (a PDF, a stream).
 */
export function route<Schema extends z.ZodType, Value>(
  schema: Schema,
  permission: Permission,
  work: (actor: Actor, input: z.output<Schema>, request: NextRequest) => Promise<Result<Value> | Response>,
): Handler {
  return async (request, context) => {
    const writes = request.method !== "GET" && request.method !== "HEAD";
    if (writes && !isSameOrigin(request.headers, environment().NEXTAUTH_URL)) return refuse(foreignOrigin().fault);
    const actor = await currentActor();
    if (!actor) return refuse(notSignedIn().fault);
    if (!can(actor, permission)) return refuse(notAllowed(permission).fault);
    const body = writes ? await readBody(request) : ok({});
    if (!body.ok) return refuse(body.fault);
    const parsed = parseInput(schema, { ...body.value, ...Object.fromEntries(request.nextUrl.searchParams), ...(await context.params) });
    if (!parsed.ok) return refuse(parsed.fault);
    const answer = await work(actor, parsed.value, request);
    if (answer instanceof Response) return answer;
    return answer.ok ? Response.json(answer.value ?? null) : refuse(answer.fault);
  };
}

export function refuse(fault: Fault): Response {
  return Response.json({ fault }, { status: statusOf(fault) });
}

async function readBody(request: NextRequest): Promise<Result<object, "not-json" | "too-large">> {
  const text = await request.text();
  if (text.length > MOST_BYTES) return fail("too-large", `The request holds ${text.length} characters; at most ${MOST_BYTES} are taken.`);
  if (text === "") return ok({});
  try {
    const value: unknown = JSON.parse(text);
    if (typeof value === "object" && value !== null && !Array.isArray(value)) return ok(value);
  } catch {
    // Said below, as for anything else that is not an object.
  }
  return fail("not-json", "The request's body is not a JSON object.");
}
