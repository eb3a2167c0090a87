import { NextResponse, type NextRequest } from "next/server";

/**
 * Sets the content security policy with a nonce for this page, and tells the page its own path for the way back after
 * signing in. It is never the lock: pages, actions and routes ask for themselves.
 */
export function proxy(request: NextRequest): NextResponse {
  const nonce = Buffer.from(crypto.randomUUID()).toString("base64");
  const policy = contentSecurityPolicy(nonce);
  const headers = new Headers(request.headers);
  headers.set("x-nonce", nonce);
  headers.set("x-ellwand-path", request.nextUrl.pathname + request.nextUrl.search);
  headers.set("content-security-policy", policy);
  const response = NextResponse.next({ request: { headers } });
  response.headers.set("content-security-policy", policy);
  return response;
}

function contentSecurityPolicy(nonce: string): string {
  // The development server evaluates code for its fast refresh; the built one never does.
  const development = process.env.NODE_ENV === "development" ? " 'unsafe-eval'" : "";
  return [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'${development}`,
    "style-src 'self' 'unsafe-inline'",
    "img-src 'self' data: blob:",
    "font-src 'self'",
    "connect-src 'self'",
    "worker-src 'self'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join("; ");
}

export const config = { matcher: ["/((?!_next/static|_next/image|fabrics/|fonts/|api/|.*\\.(?:svg|png|ico|webmanifest|js)$).*)"] };
