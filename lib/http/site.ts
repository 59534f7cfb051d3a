import { randomUUID } from "node:crypto";
import { env } from "@/lib/env";
import type { Visitor } from "@/lib/services/accounts/visitor";
import { Refusal } from "@/lib/services/errors";
import { seeOther } from "./auth-route";
import { answer, assertOwnOrigin, bodyWithin, parsedBody, pathIds, refusal } from "./handle";
import { ownPath } from "./own-address";
import { peerOf } from "./peer";
import { currentSession } from "./session";

type Route = { params: Promise<Record<string, string | string[]>> };
type Handler = (request: Request, route: Route) => Promise<Response>;
type Run = (visitor: Visitor, given: never) => Promise<unknown>;

/** Who asks, outside any project; perhaps nobody. */
export async function visitorOf(headers: Headers): Promise<Visitor> {
  const session = await currentSession();
  return {
    person: session?.person ?? null,
    sessionId: session?.sessionId ?? null,
    address: peerOf(headers),
    requestId: randomUUID(),
  };
}

/** A reading route outside any project. The verb itself says who may ask. */
export function readSite(run: Run): Handler {
  return (request, route) =>
    handled(request, route, async (visitor, ids) => {
      const query = Object.fromEntries(new URL(request.url).searchParams);
      return answer(await run(visitor, { ...query, ...ids } as never), 200, visitor.requestId);
    });
}

/**
 * A changing route outside any project: own origin, JSON within a small limit. With `form` it also takes a plain form,
 * as a page sends it before its scripts have run, and sends the browser on: to `form.done` or back with the reason.
 */
export function writeSite(options: { status?: 200 | 201; form?: { done: string }; run: Run }): Handler {
  return async (request, route) => {
    const plainForm =
      options.form &&
      /^application\/x-www-form-urlencoded\b/i.test(request.headers.get("content-type") ?? "");
    return handled(request, route, async (visitor, ids) => {
      assertOwnOrigin(request);
      const text = await bodyWithin(request, 20_000);
      if (!plainForm) {
        const given = { ...parsedBody(request, text), ...ids };
        return answer(await options.run(visitor, given as never), options.status ?? 200, visitor.requestId);
      }
      const fields = Object.fromEntries([...new URLSearchParams(text)].filter(([, value]) => value !== ""));
      try {
        await options.run(visitor, fields as never);
        return seeOther(options.form?.done ?? "/");
      } catch (error) {
        if (!(error instanceof Refusal)) throw error;
        const from = ownPath(request.headers.get("referer"), env().APP_ORIGIN).replace(/[?#].*$/, "");
        return seeOther(`${from}?${new URLSearchParams({ refused: error.code })}`);
      }
    });
  };
}

async function handled(
  request: Request,
  route: Route,
  act: (visitor: Visitor, ids: Record<string, string>) => Promise<Response>,
): Promise<Response> {
  const requestId = randomUUID();
  try {
    // A route without a name in brackets has no parameters at all.
    const { ids } = pathIds((await route.params) ?? {});
    return await act({ ...(await visitorOf(request.headers)), requestId }, ids);
  } catch (error) {
    return refusal(error, request, requestId);
  }
}
