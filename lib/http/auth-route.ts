import { createHash, randomBytes, randomUUID } from "node:crypto";
import NextAuth from "next-auth";
import { env } from "@/lib/env";
import { Forbidden, Refusal, Throttled } from "@/lib/services/errors";
import { bodyWithin, refusal } from "./handle";
import { ownPath } from "./own-address";
import { PEER_HEADER, peerOf } from "./peer";
import { problem } from "./problem";
import { authOptions, CSRF_COOKIE } from "./session";

type Route = { params: Promise<{ nextauth: string[] }> };
type Body = Record<string, string>;

/** Answers of next-auth: csrf token, session, and its redirects to our own pages. */
export async function authGet(request: Request, route: Route): Promise<Response> {
  const requestId = randomUUID();
  try {
    const { nextauth } = await route.params;
    return await throughNextAuth(request, nextauth, {}, cookiesOf(request), requestId);
  } catch (error) {
    return refusal(error, request, requestId);
  }
}

/**
 * Sign-in and sign-out, as a form or as JSON. A request from this site's own pages needs no token beside its Origin; one
 * without an Origin must bring next-auth's token with its cookie; a foreign Origin is refused.
 */
export async function authPost(request: Request, route: Route): Promise<Response> {
  const requestId = randomUUID();
  try {
    const { nextauth } = await route.params;
    const act = nextauth.join("/");
    if (act === "_log") return new Response(null, { status: 204 });
    if (!["callback/credentials", "signout", "signin/credentials"].includes(act))
      return new Response(null, { status: 404, headers: { "cache-control": "private, no-store" } });
    const body = await readBody(request);
    const cookies = cookiesOf(request);
    const origin = request.headers.get("origin");
    if (origin !== null) {
      if (origin !== new URL(env().APP_ORIGIN).origin)
        throw new Forbidden("A change must come from this site's own pages.");
      proveOwn(body, cookies);
    }
    const asked = { json: body.json === "true", callbackUrl: ownPath(body.callbackUrl, env().APP_ORIGIN) };
    let why: unknown;
    const answer = await throughNextAuth(request, nextauth, body, cookies, requestId, (error) => {
      why = error;
    });
    if (act === "signout") answer.headers.set("clear-site-data", '"cache", "storage"');
    return why === undefined ? answer : refusedSignIn(why, asked, request, requestId);
  } catch (error) {
    return refusal(error, request, requestId);
  }
}

/** Why a sign-in was refused: in words for scripts, as a code in the address of the sign-in page for a plain form. */
function refusedSignIn(
  why: unknown,
  asked: { json: boolean; callbackUrl: string },
  request: Request,
  requestId: string,
): Response {
  if (asked.json || !(why instanceof Refusal))
    return why instanceof Refusal ? problem(why, requestId) : refusal(why, request, requestId);
  const back = new URLSearchParams({ refused: why.code, callbackUrl: asked.callbackUrl });
  if (why instanceof Throttled) back.set("wait", String(why.retryAfter_s));
  return seeOther(`/sign-in?${back}`);
}

/** Sends a browser on after a form, to an address of this site. */
export const seeOther = (path: string): Response =>
  new Response(null, {
    status: 303,
    headers: { location: new URL(path, env().APP_ORIGIN).href, "cache-control": "private, no-store" },
  });

/** Hands a request to next-auth through its plain request and answer objects, which need nothing but what we give. */
async function throughNextAuth(
  request: Request,
  nextauth: string[],
  body: Body,
  cookies: Record<string, string>,
  requestId: string,
  refused?: (error: unknown) => void,
): Promise<Response> {
  const headers = new Headers({ "cache-control": "private, no-store", "x-request-id": requestId });
  let status = 200;
  let content: string | null = null;
  const answer = {
    status: (code: number) => {
      status = code;
      return answer;
    },
    getHeader: (name: string) =>
      name.toLowerCase() === "set-cookie" ? headers.getSetCookie() : headers.get(name),
    setHeader: (name: string, value: string | string[]) => {
      headers.delete(name);
      for (const one of Array.isArray(value) ? value : [value]) headers.append(name, one);
      return answer;
    },
    json: (value: unknown) => {
      headers.set("content-type", "application/json; charset=utf-8");
      content = JSON.stringify(value);
    },
    send: (value: unknown) => {
      if (typeof value === "object" && value !== null) return answer.json(value);
      if (value !== undefined && value !== null) content = String(value);
    },
    end: () => {},
  };
  const asked = {
    method: request.method,
    query: { ...Object.fromEntries(new URL(request.url).searchParams), nextauth },
    body,
    cookies,
    headers: { ...Object.fromEntries(request.headers), [PEER_HEADER]: peerOf(request.headers) },
  };
  await NextAuth(asked as never, answer as never, authOptions(requestId, refused));
  headers.set("cache-control", "private, no-store");
  return new Response(content, { status, headers });
}

/** The Origin has shown that the request is our own: it gets the pair of token and cookie that next-auth asks for. */
function proveOwn(body: Body, cookies: Record<string, string>): void {
  const token = randomBytes(32).toString("hex");
  const seal = createHash("sha256").update(`${token}${env().NEXTAUTH_SECRET}`).digest("hex");
  body.csrfToken = token;
  cookies[CSRF_COOKIE] = `${token}|${seal}`;
}

function cookiesOf(request: Request): Record<string, string> {
  const cookies: Record<string, string> = {};
  for (const pair of (request.headers.get("cookie") ?? "").split(";")) {
    const at = pair.indexOf("=");
    if (at < 1) continue;
    const value = pair.slice(at + 1).trim();
    try {
      cookies[pair.slice(0, at).trim()] = decodeURIComponent(value);
    } catch {
      cookies[pair.slice(0, at).trim()] = value;
    }
  }
  return cookies;
}

async function readBody(request: Request): Promise<Body> {
  const text = await bodyWithin(request, 20_000);
  const type = request.headers.get("content-type") ?? "";
  if (/^application\/x-www-form-urlencoded\b/i.test(type))
    return Object.fromEntries(new URLSearchParams(text));
  if (/^application\/json\b/i.test(type) || text === "") {
    let body: unknown;
    try {
      body = text === "" ? {} : JSON.parse(text);
    } catch {
      body = {};
    }
    if (body !== null && typeof body === "object")
      return Object.fromEntries(Object.entries(body).map(([name, value]) => [name, String(value)]));
  }
  return {};
}
