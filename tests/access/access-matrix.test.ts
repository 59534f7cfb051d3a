import { randomUUID } from "node:crypto";
import { readFileSync } from "node:fs";
import { beforeAll, describe, expect, it } from "vitest";
import { type Role, roles } from "@/lib/access/policy";
import { freshDatabase } from "../support/database";
import { routeFiles } from "../support/routes";
import { Browser, built, type RunningServer, signedInBrowser, startServer } from "../support/server";
import { asSuperuser, lookInto, makePerson, makeSite, PASSWORD, type Site, stored } from "../support/site";

type Who = "anybody" | "signed-in" | "administrator" | Role[];
const matrix: { routes: Record<string, Record<string, Who>> } = JSON.parse(
  readFileSync(`${import.meta.dirname}/../api/access-matrix.json`, "utf8"),
);
const cells = Object.entries(matrix.routes).flatMap(([route, methods]) =>
  Object.entries(methods).map(([method, who]) => ({ route, method, who })),
);

describe("the access matrix", () => {
  it("names every route and method that there is, and no other", () => {
    const files = Object.fromEntries(routeFiles().map(({ route, methods }) => [route, methods]));
    const named = Object.fromEntries(
      Object.entries(matrix.routes).map(([route, methods]) => [route, Object.keys(methods).sort()]),
    );
    expect(named).toEqual(files);
  });

  it("gives routes of a project to roles, and other routes to no role", () => {
    for (const { route, method, who } of cells) {
      expect([route, method, Array.isArray(who)]).toEqual([
        route,
        method,
        route.startsWith("/api/projects/[project]"),
      ]);
      if (Array.isArray(who)) for (const role of who) expect(roles).toContain(role);
    }
  });
});

describe.runIf(built)("each route, asked by each person", () => {
  let server: RunningServer;
  let site: Site;
  const browsers = {} as Record<
    Role | "anonymous" | "neighbour" | "removed" | "shut" | "administrator" | "casual",
    Browser
  >;

  beforeAll(async () => {
    lookInto((await freshDatabase()).superuserUrl);
    site = await makeSite("X-01");
    const neighbour = await makeSite("X-02");
    const removed = await makePerson("Removed Person");
    const shut = await makePerson("Shut Person");
    const casual = await makePerson("Casual Person");
    await asSuperuser((db) =>
      db.query(
        "insert into membership (project_id, person_id, role) select $1, id, r from unnest($2::uuid[]) id, unnest($3::text[]) r",
        [site.projectId, [removed.id, shut.id], roles],
      ),
    );
    server = await startServer();
    for (const role of roles)
      browsers[role] = await signedInBrowser(server.origin, site[role].person.email, PASSWORD);
    browsers.anonymous = new Browser(server.origin);
    browsers.neighbour = await signedInBrowser(server.origin, neighbour.lead.person.email, PASSWORD);
    browsers.administrator = await signedInBrowser(server.origin, site.administrator.email, PASSWORD);
    browsers.removed = await signedInBrowser(server.origin, removed.email, PASSWORD);
    browsers.shut = await signedInBrowser(server.origin, shut.email, PASSWORD);
    browsers.casual = await signedInBrowser(server.origin, casual.email, PASSWORD);
    // After they have signed in: access ends at the next request, not with the cookie.
    await asSuperuser(async (db) => {
      await db.query("delete from membership where person_id = $1", [removed.id]);
      await db.query("update person set disabled_at = now() where id = $1", [shut.id]);
    });
  });

  const path = (route: string, projectId: string) =>
    route
      .replace("[project]", projectId)
      .replace("[...nextauth]", "session")
      .replace("[number]", "1")
      .replace("[method]", "base-pressure")
      .replace(/\[[^\]]+\]/g, () => randomUUID());

  /** The answer's status, and whether a 404 says that the whole project is not theirs. */
  async function ask(
    browser: Browser,
    method: string,
    at: string,
  ): Promise<{ status: number; stranger: boolean }> {
    const stop = new AbortController();
    const body =
      method === "GET"
        ? {}
        : { body: "{}", headers: { "content-type": "application/json", "if-match": '"1"' } };
    const answer = await browser.fetch(at, { method, signal: stop.signal, ...body });
    const isProblem = answer.headers.get("content-type")?.startsWith("application/problem+json");
    const detail = isProblem ? ((await answer.json()) as { detail?: string }).detail : "";
    stop.abort();
    return { status: answer.status, stranger: detail === "There is no such project among yours." };
  }

  const contents = async () => {
    const tables = await stored<{ relname: string }>(
      "select relname from pg_class where relnamespace = 'public'::regnamespace and relkind = 'r' and relname not in ('person_session', 'sign_in_attempt') order by 1",
    );
    const rows: Record<string, unknown> = {};
    for (const { relname } of tables) {
      const [sum] = await stored<{ sum: string }>(
        `select count(*) || ' ' || coalesce(sum(hashtextextended(t::text, 0)), 0) as sum from "${relname}" t`,
      );
      rows[relname] = sum?.sum;
    }
    return rows;
  };

  it("is refused to those who may not, and nothing changes", async () => {
    const before = await contents();
    const wrong: string[] = [];
    for (const { route, method, who } of cells) {
      const at = path(route, site.projectId);
      const expectRefusal = async (name: keyof typeof browsers, status: number) => {
        const seen = await ask(browsers[name], method, at);
        const right = seen.status === status && (status !== 404 || seen.stranger);
        if (!right) wrong.push(`${name} ${method} ${route}: ${seen.status}, not ${status}`);
      };
      if (who === "anybody") continue;
      await expectRefusal("anonymous", 401);
      await expectRefusal("shut", 401);
      if (who === "administrator") for (const role of roles) await expectRefusal(role, 403);
      if (!Array.isArray(who)) continue;
      await expectRefusal("neighbour", 404);
      await expectRefusal("removed", 404);
      await expectRefusal("administrator", 404);
      for (const role of roles) if (!who.includes(role)) await expectRefusal(role, 403);
    }
    expect(wrong).toEqual([]);
    expect(await contents()).toEqual(before);
  });

  it("lets those in who may", async () => {
    const wrong: string[] = [];
    for (const { route, method, who } of cells) {
      const at = path(route, site.projectId);
      const names =
        who === "anybody"
          ? (["anonymous"] as const)
          : who === "signed-in"
            ? (["casual"] as const)
            : who === "administrator"
              ? ([who] as const)
              : who;
      for (const name of names) {
        // Some of these end the session that asks, so that each gets one of its own.
        if (name === "casual")
          browsers.casual = await signedInBrowser(server.origin, "casual.person@example.test", PASSWORD);
        const seen = await ask(browsers[name], method, at);
        // An empty body or an unknown id may well be refused, but never the person; and nothing may break.
        if ([401, 403].includes(seen.status) || seen.stranger || (seen.status >= 500 && seen.status !== 503))
          wrong.push(`${name} ${method} ${route}: ${seen.status}`);
      }
    }
    expect(wrong).toEqual([]);
  });

  it("shows the neighbour nothing of the project, with its ids in any place", async () => {
    const marks = [site.projectId, "X-01", site.lead.person.id, site.lead.person.email];
    const ids = (
      await stored<{ id: string }>(
        "select id from one_time_link union select person_id from membership where project_id = $1",
        [site.projectId],
      )
    ).map(({ id }) => id);
    const neighbourProject =
      ((await (await browsers.neighbour.fetch("/api/projects")).json()) as { projects: { id: string }[] })
        .projects[0]?.id ?? "";
    for (const { route, method, who } of cells) {
      if (!Array.isArray(who) || method !== "GET") continue;
      for (const id of [site.projectId, ...ids.slice(0, 3)]) {
        const own = route.replace("[project]", neighbourProject).replace(/\[[^\]]+\]/g, id);
        const stop = new AbortController();
        const answer = await browsers.neighbour.fetch(`${own}?id=${id}&projectId=${site.projectId}`, {
          signal: stop.signal,
        });
        const text = answer.headers.get("content-type")?.startsWith("text/event-stream")
          ? ""
          : await answer.text();
        stop.abort();
        for (const mark of marks)
          expect([route, mark, text.replaceAll(id, "").includes(mark)]).toEqual([route, mark, false]);
      }
    }
  });
});
