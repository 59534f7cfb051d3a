import { type NextRequest, NextResponse } from "next/server";
import { env } from "@/lib/env";
import { answerHeaders, contentSecurityPolicy } from "@/lib/http/answer-headers";

/** The name of the session's cookie. Only its presence is looked at here: whether it holds is decided where data is read. */
const SESSION_COOKIE = "__Host-holdground.session";

/** Pages that anybody may open, and what needs no session because it holds no data. */
const PUBLIC =
  /^\/(sign-in|invitation|reset)(\/|$)|^\/(api|_next)\/|^\/[^/]+\.(svg|ico|png|webmanifest|txt)$/;

/** Sends those without a session to sign in, and sets the headers of every answer. It opens nothing and guards nothing. */
export function proxy(request: NextRequest): NextResponse {
  const { APP_ORIGIN, S3_ENDPOINT } = env();
  const { pathname, search } = request.nextUrl;
  const nonce = crypto.randomUUID().replaceAll("-", "");
  const policy = contentSecurityPolicy({
    nonce,
    store: S3_ENDPOINT,
    development: process.env.NODE_ENV === "development",
  });

  if (!PUBLIC.test(pathname) && !request.cookies.has(SESSION_COOKIE)) {
    const wanted = pathname === "/" ? "" : `?callbackUrl=${encodeURIComponent(pathname + search)}`;
    return withHeaders(NextResponse.redirect(new URL(`/sign-in${wanted}`, APP_ORIGIN), 307), policy, true);
  }

  const headers = new Headers(request.headers);
  for (const name of [...headers.keys()]) if (name.startsWith("x-middleware-")) headers.delete(name);
  headers.set("x-nonce", nonce);
  headers.set("content-security-policy", policy);
  return withHeaders(
    NextResponse.next({ request: { headers } }),
    policy,
    !pathname.startsWith("/_next/static/"),
  );
}

function withHeaders(answer: NextResponse, policy: string, dynamic: boolean): NextResponse {
  answer.headers.set("content-security-policy", policy);
  for (const [name, value] of Object.entries(answerHeaders)) answer.headers.set(name, value);
  if (dynamic) answer.headers.set("cache-control", "private, no-store");
  return answer;
}
