import { randomUUID } from "node:crypto";
import type { z } from "zod";
import { env } from "@/lib/env";
import { AnsweredBefore, type Context, databaseCode, sha256 } from "@/lib/services/context";
import {
  Forbidden,
  Invalid,
  NotFound,
  Refusal,
  RevisionMissing,
  SignedOut,
  Unavailable,
} from "@/lib/services/errors";
import { rolesInProject } from "@/lib/services/members/roles-in-project";
import { problem } from "./problem";
import { currentPerson } from "./session";

type Params = Record<string, string | string[]>;
type RouteContext = { params: Promise<Params> };
type Run = (context: Context, given: never) => Promise<unknown>;
type Handler = (request: Request, route: RouteContext) => Promise<Response>;

/** What the OpenAPI page and the tests read of a route: the schema it takes and how it answers. */
export type Described = Handler & {
  described: { body?: z.ZodType; query?: z.ZodType; status: number; write: boolean };
};

const UUID = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/i;
const BODY_LIMIT_BYTES = 1_000_000;

/** A reading route inside a project: `run(context, { ...path ids, ...query })`. */
export function read(options: { query?: z.ZodType; run: Run }): Described {
  return described(
    async (request, context, ids) => {
      const query = Object.fromEntries(new URL(request.url).searchParams);
      return answer(await options.run(context, { ...query, ...ids } as never), 200, context.requestId);
    },
    { query: options.query, status: 200, write: false },
  );
}

/**
 * A changing route inside a project: own origin, JSON, a body within the limit, If-Match where `ifMatch` is set
 * (its number arrives as `revision`), an answer kept under Idempotency-Key. `run(context, { ...body, ...path ids })`.
 */
export function write(options: {
  body?: z.ZodType;
  status?: 200 | 201 | 202 | 204;
  ifMatch?: boolean;
  limit_bytes?: number;
  run: Run;
}): Described {
  const status = options.status ?? 200;
  return described(
    async (request, context, ids) => {
      assertOwnOrigin(request);
      const text = await bodyWithin(request, options.limit_bytes ?? BODY_LIMIT_BYTES);
      const given = { ...parsedBody(request, text), ...ids } as Record<string, unknown>;
      if (options.ifMatch) given.revision = seenRevision(request);
      const key = request.headers.get("idempotency-key");
      if (key !== null && !/^[\x21-\x7e]{8,128}$/.test(key))
        throw new Invalid("An Idempotency-Key has 8 to 128 printable characters.");
      const route = `${request.method} ${new URL(request.url).pathname}`;
      const keyed = key
        ? { key, route, bodyHash: sha256(`${request.headers.get("if-match")}\n${text}`), status }
        : undefined;
      return answer(await options.run({ ...context, keyed }, given as never), status, context.requestId);
    },
    { body: options.body, status, write: true },
  );
}

function described(
  act: (request: Request, context: Context, ids: Record<string, string>) => Promise<Response>,
  description: Described["described"],
): Described {
  const handler = async (request: Request, route: RouteContext): Promise<Response> => {
    const requestId = randomUUID();
    try {
      const person = await currentPerson();
      if (!person) throw new SignedOut("Please sign in; nobody is signed in here or the session has ended.");
      const { projectId, ids } = pathIds(await route.params);
      const roles = await rolesInProject(person.id, projectId);
      if (roles.length === 0) throw new NotFound("There is no such project among yours.");
      return await act(request, { person, projectId, roles, requestId }, ids);
    } catch (error) {
      return refusal(error, request, requestId);
    }
  };
  return Object.assign(handler, { described: description });
}

/** Maps anything thrown to an answer: refusals as they are, the rest as a 500 that tells nothing but its number. */
export function refusal(error: unknown, request: Request, requestId: string): Response {
  const path = new URL(request.url).pathname;
  if (error instanceof AnsweredBefore) return answer(error.body, error.status, requestId);
  if (error instanceof Refusal) {
    if ([401, 403, 404].includes(error.status))
      log("refused", { requestId, method: request.method, path, code: error.code });
    return problem(error, requestId);
  }
  const code = databaseCode(error);
  if (code?.startsWith("08") || code === "ECONNREFUSED" || code === "57P01" || isConnectionLoss(error))
    return problem(
      new Unavailable("The database does not answer just now. Nothing was changed; please try again."),
      requestId,
    );
  log("failed", {
    requestId,
    method: request.method,
    path,
    cause: String((error as Error)?.stack ?? error),
    code,
  });
  const body = { type: "about:blank", title: "failed", status: 500, code: "failed", requestId };
  return new Response(
    JSON.stringify({ ...body, detail: "Something went wrong on our side. Nothing was changed." }),
    {
      status: 500,
      headers: { "content-type": "application/problem+json", "cache-control": "private, no-store" },
    },
  );
}

const isConnectionLoss = (error: unknown): boolean => {
  for (let at = error; at instanceof Error; at = at.cause)
    if (/timeout exceeded when trying to connect|Connection terminated/i.test(at.message)) return true;
  return false;
};

/** One line of JSON a record: a line break in a field stays inside its string. */
function log(event: string, fields: Record<string, unknown>): void {
  process.stderr.write(`${JSON.stringify({ at: new Date().toISOString(), event, ...fields })}\n`);
}

/** A change must come from this site's own pages: the browser's Origin says so, and it must be JSON. */
export function assertOwnOrigin(request: Request): void {
  if (request.headers.get("origin") !== new URL(env().APP_ORIGIN).origin)
    throw new Forbidden("A change must come from this site's own pages.");
}

export async function bodyWithin(request: Request, limit_bytes: number): Promise<string> {
  const tooLarge = () => new Invalid(`The request is larger than ${limit_bytes} bytes.`, {}, 413);
  if (Number(request.headers.get("content-length") ?? 0) > limit_bytes) throw tooLarge();
  const reader = request.body?.getReader();
  if (!reader) return "";
  const parts: Uint8Array[] = [];
  let size = 0;
  for (;;) {
    const { done, value } = await reader.read();
    if (done) break;
    size += value.byteLength;
    if (size > limit_bytes) {
      await reader.cancel();
      throw tooLarge();
    }
    parts.push(value);
  }
  return Buffer.concat(parts).toString("utf8");
}

export function parsedBody(request: Request, text: string): Record<string, unknown> {
  if (text === "") return {};
  if (!/^application\/json\b/i.test(request.headers.get("content-type") ?? ""))
    throw new Invalid("A change is sent as application/json.", {}, 415);
  let body: unknown;
  try {
    body = JSON.parse(text);
  } catch {
    throw new Invalid("The request is not well-formed JSON.");
  }
  if (body === null || typeof body !== "object" || Array.isArray(body))
    throw new Invalid("The request is a JSON object with named fields.");
  return body as Record<string, unknown>;
}

function seenRevision(request: Request): number {
  const tag = request.headers.get("if-match");
  if (tag === null)
    throw new RevisionMissing("Say which revision you saw (If-Match), so that nobody's work is lost.");
  const seen = /^"(\d{1,9})"$/.exec(tag)?.[1];
  // A weak tag, a star or another form names no revision: it can match none.
  return seen === undefined ? -1 : Number(seen);
}

/** `[value]` arrives as `valueId`; a segment that is no uuid names nothing. Other segments keep their name. */
export function pathIds(params: Params): { projectId: Context["projectId"]; ids: Record<string, string> } {
  const ids: Record<string, string> = {};
  for (const [name, value] of Object.entries(params)) {
    if (typeof value !== "string") continue;
    if (name === "method" || name === "number") ids[name] = value;
    else if (!UUID.test(value)) throw new NotFound("There is nothing at this address.");
    else ids[`${name}Id`] = value.toLowerCase();
  }
  const { projectId, ...rest } = ids;
  return { projectId: (projectId ?? "") as Context["projectId"], ids: rest };
}

export function answer(body: unknown, status: number, requestId: string): Response {
  const headers: Record<string, string> = { "cache-control": "private, no-store", "x-request-id": requestId };
  if (body instanceof Response) {
    for (const [name, value] of Object.entries(headers)) body.headers.set(name, value);
    return body;
  }
  if (body !== null && typeof body === "object" && "revision" in body && typeof body.revision === "number")
    headers.etag = `"${body.revision}"`;
  if (status === 204) return new Response(null, { status, headers });
  return new Response(JSON.stringify(body ?? null), {
    status,
    headers: { ...headers, "content-type": "application/json; charset=utf-8" },
  });
}
