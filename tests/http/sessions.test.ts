import { beforeAll, describe, expect, it } from "vitest";
import { freshDatabase } from "../support/database";
import { Browser, built, type RunningServer, signedInBrowser, startServer } from "../support/server";
import { asSuperuser, lookInto, makePerson, makeSite, PASSWORD, type Site, stored } from "../support/site";

const SESSION = "__Host-holdground.session";

describe.runIf(built)("a session over HTTP", () => {
  let server: RunningServer;
  let site: Site;
  beforeAll(async () => {
    lookInto((await freshDatabase()).superuserUrl);
    site = await makeSite("H-01");
    server = await startServer();
  });

  const replayed = (browser: Browser) => {
    const copy = new Browser(server.origin);
    for (const [name, value] of browser.cookies) copy.cookies.set(name, value);
    return copy;
  };
  /** How the pages, routes, stream and session endpoint answer to a cookie: refused everywhere, or the place that is not. */
  async function refusedEverywhere(browser: Browser): Promise<string[]> {
    const open: string[] = [];
    const project = `/projects/${site.projectId}`;
    for (const [path, headers] of [
      ["/projects", {}],
      [project, {}],
      [`${project}/settings`, {}],
      [`${project}/settings`, { rsc: "1", "next-router-state-tree": "%5B%22%22%5D" }],
    ] as [string, Record<string, string>][]) {
      const answer = await browser.fetch(path, { headers });
      const text = await answer.text();
      if (![302, 303, 307].includes(answer.status) && !text.includes("/sign-in"))
        open.push(`${path} ${answer.status}`);
      if (text.includes("Depot grid")) open.push(`${path} shows the project`);
    }
    for (const path of [
      "/api/projects",
      `/api/projects/${site.projectId}`,
      `/api/projects/${site.projectId}/events`,
      "/api/account",
    ]) {
      const answer = await browser.fetch(path);
      if (answer.status !== 401) open.push(`${path} ${answer.status}`);
      await answer.body?.cancel();
    }
    const session = await (await browser.fetch("/api/auth/session")).json();
    if (Object.keys(session as object).length > 0) open.push("/api/auth/session");
    return open;
  }

  it("is carried by one cookie with the strictest flags, smaller than 4096 bytes", async () => {
    const browser = new Browser(server.origin);
    const answer = await browser.signIn(site.lead.person.email, PASSWORD);
    const line = answer.headers.getSetCookie().find((cookie) => cookie.startsWith(`${SESSION}=`)) ?? "";
    expect(
      line
        .split("; ")
        .slice(1)
        .map((flag) => flag.split("=")[0])
        .sort(),
    ).toEqual(["Expires", "HttpOnly", "Path", "SameSite", "Secure"]);
    expect(line).toMatch(/SameSite=Lax/i);
    expect(line).toContain("Path=/");
    expect(line.length).toBeLessThan(4096);
    for (const cookie of answer.headers.getSetCookie())
      expect(cookie).toMatch(/^__Host-.*; HttpOnly; Secure/i);
    expect((await browser.fetch("/api/account")).status).toBe(200);
  });

  it("is a new one at each sign-in, whatever cookie came along", async () => {
    const browser = await signedInBrowser(server.origin, site.lead.person.email, PASSWORD);
    const first = browser.cookies.get(SESSION);
    await browser.signIn(site.lead.person.email, PASSWORD);
    expect(browser.cookies.get(SESSION)).not.toBe(first);
  });

  it("that was signed out is refused everywhere when its cookie is played again", async () => {
    const browser = await signedInBrowser(server.origin, site.lead.person.email, PASSWORD);
    const other = await signedInBrowser(server.origin, site.lead.person.email, PASSWORD);
    const stolen = replayed(browser);
    expect((await stolen.fetch("/api/account")).status).toBe(200);
    const answer = await browser.fetch("/api/auth/signout", {
      method: "POST",
      body: "",
      headers: { "content-type": "application/x-www-form-urlencoded" },
    });
    expect(answer.headers.get("clear-site-data")).toContain("storage");
    expect(browser.cookies.has(SESSION)).toBe(false);
    expect(await refusedEverywhere(stolen)).toEqual([]);
    expect((await other.fetch("/api/account")).status).toBe(200);
  });

  it("of a shut account is refused everywhere at the next request", async () => {
    const person = await makePerson("Shut Soon");
    await asSuperuser((db) =>
      db.query("insert into membership (project_id, person_id, role) values ($1, $2, 'lead')", [
        site.projectId,
        person.id,
      ]),
    );
    const browser = await signedInBrowser(server.origin, person.email, PASSWORD);
    expect((await browser.fetch(`/api/projects/${site.projectId}`)).status).toBe(200);
    await asSuperuser((db) => db.query("update person set disabled_at = now() where id = $1", [person.id]));
    expect(await refusedEverywhere(browser)).toEqual([]);
  });

  it("stays in the browser that changed the password, and ends in two others", async () => {
    const person = await makePerson("Three Browsers");
    const [one, two, three] = await Promise.all(
      [1, 2, 3].map(() => signedInBrowser(server.origin, person.email, PASSWORD)),
    );
    const answer = await one?.json("/api/account/password", "POST", {
      currentPassword: PASSWORD,
      password: "otter under the bridge",
    });
    expect(answer?.status).toBe(200);
    expect((await one?.fetch("/api/account"))?.status).toBe(200);
    for (const other of [two, three]) expect((await other?.fetch("/api/account"))?.status).toBe(401);
  });

  it("made of an edited, cut, foreign or empty cookie is nobody's, and never an error", async () => {
    const browser = await signedInBrowser(server.origin, site.lead.person.email, PASSWORD);
    const good = browser.cookies.get(SESSION) ?? "";
    const none = Buffer.from('{"alg":"none"}').toString("base64url");
    for (const cookie of [
      good.slice(0, -4),
      `${good.slice(0, 40)}A${good.slice(41)}`,
      `${none}.${Buffer.from(`{"personId":"${site.lead.person.id}"}`).toString("base64url")}.`,
      "null",
      "%00",
      "a.b.c.d.e",
      "x".repeat(3000),
    ]) {
      const forged = new Browser(server.origin);
      forged.cookies.set(SESSION, cookie);
      expect([cookie.slice(0, 12), (await forged.fetch("/api/account")).status]).toEqual([
        cookie.slice(0, 12),
        401,
      ]);
      expect((await forged.fetch("/api/auth/session")).status).toBe(200);
    }
  });

  it("ends its open stream of changes within five seconds of losing access", async () => {
    const person = await makePerson("Listening Person");
    await asSuperuser((db) =>
      db.query("insert into membership (project_id, person_id, role) values ($1, $2, 'reader')", [
        site.projectId,
        person.id,
      ]),
    );
    const browser = await signedInBrowser(server.origin, person.email, PASSWORD);
    const answer = await browser.fetch(`/api/projects/${site.projectId}/events`);
    expect(answer.headers.get("content-type")).toContain("text/event-stream");
    const reader = answer.body?.getReader();
    const heard: string[] = [];
    const ended = (async () => {
      for (;;) {
        const part = await reader?.read();
        if (!part || part.done) return performance.now();
        heard.push(new TextDecoder().decode(part.value));
      }
    })();
    await new Promise((done) => setTimeout(done, 500));
    const changeId = crypto.randomUUID();
    await asSuperuser((db) =>
      db.query(
        "insert into change (project_id, id, kind, subject_id, title, reason, made_by) values ($1, $2, 'criteria-changed', $1, 't', 'r', $3)",
        [site.projectId, changeId, person.id],
      ),
    );
    await new Promise((done) => setTimeout(done, 500));
    expect(heard.join("")).toContain(`event: change\ndata: {"changeId":"${changeId}"}`);
    const lost = performance.now();
    await asSuperuser((db) => db.query("delete from membership where person_id = $1", [person.id]));
    expect((await ended) - lost).toBeLessThan(5000);
  });

  it("hears of what it may have missed after the listening connection was cut", async () => {
    const browser = await signedInBrowser(server.origin, site.reader.person.email, PASSWORD);
    const answer = await browser.fetch(`/api/projects/${site.projectId}/events`);
    const reader = answer.body?.getReader();
    let heard = "";
    void (async () => {
      for (;;) {
        const part = await reader?.read();
        if (!part || part.done) return;
        heard += new TextDecoder().decode(part.value);
      }
    })().catch(() => {});
    await new Promise((done) => setTimeout(done, 500));
    expect(
      await stored(
        "select pg_terminate_backend(pid) as cut from pg_stat_activity where query = 'listen holdground_change' and datname = current_database()",
      ),
    ).toContainEqual({ cut: true });
    await expect.poll(() => heard, { timeout: 5000 }).toContain("event: reread");
    await reader?.cancel();
  });
});

describe.runIf(built)("a sign-in over HTTP", () => {
  let server: RunningServer;
  let email: string;
  beforeAll(async () => {
    lookInto((await freshDatabase()).superuserUrl);
    email = (await makePerson("Form Person")).email;
    server = await startServer();
  });
  const form = (fields: Record<string, string>, headers: Record<string, string> = {}) =>
    fetch(`${server.origin}/api/auth/callback/credentials`, {
      method: "POST",
      redirect: "manual",
      body: new URLSearchParams(fields).toString(),
      headers: { "content-type": "application/x-www-form-urlencoded", ...headers },
    });

  it("by a plain form leads on to the page that was asked for", async () => {
    const answer = await form(
      { email, password: PASSWORD, callbackUrl: "/projects/1?x=2" },
      { origin: server.origin },
    );
    expect([answer.status, answer.headers.get("location")]).toEqual([302, `${server.origin}/projects/1?x=2`]);
    expect(answer.headers.get("set-cookie")).toContain(SESSION);
  });

  it("by a plain form that is refused goes back to the page, with no word of what was typed in its address", async () => {
    const answer = await form(
      { email, password: "wrong secret", callbackUrl: "/projects" },
      { origin: server.origin },
    );
    expect([answer.status, answer.headers.get("location")]).toEqual([
      303,
      `${server.origin}/sign-in?refused=signed-out&callbackUrl=%2Fprojects`,
    ]);
    expect(answer.headers.get("set-cookie") ?? "").not.toContain(SESSION);
  });

  for (const callbackUrl of [
    "//evil.example",
    "https:evil.example",
    "\\\\evil.example",
    "data:text/html,x",
    "javascript:alert(1)",
    "%0d%0aLocation: //evil.example",
    "http://127.0.0.1@evil.example",
    "http://127.0.0.1.evil.example/",
  ])
    it(`ends on its own site when asked to go to ${callbackUrl}`, async () => {
      const answer = await form({ email, password: PASSWORD, callbackUrl }, { origin: server.origin });
      expect(new URL(answer.headers.get("location") ?? "", server.origin).origin).toBe(server.origin);
    });

  it("needs this site's Origin, or next-auth's own token where a client sends none", async () => {
    expect((await form({ email, password: PASSWORD }, { origin: "http://evil.example" })).status).toBe(403);
    expect((await form({ email, password: PASSWORD }, { origin: "null" })).status).toBe(403);
    expect(
      (
        await form(
          { email, password: PASSWORD },
          { origin: "http://evil.example", "x-forwarded-host": "evil.example" },
        )
      ).status,
    ).toBe(403);
    const bare = await form({ email, password: PASSWORD });
    expect(bare.headers.get("set-cookie") ?? "").not.toContain(SESSION);
    const client = new Browser(server.origin);
    const { csrfToken } = (await (await client.fetch("/api/auth/csrf")).json()) as { csrfToken: string };
    const cookie = [...client.cookies].map(([name, value]) => `${name}=${value}`).join("; ");
    expect(
      (await form({ email, password: PASSWORD, csrfToken }, { cookie })).headers.get("set-cookie"),
    ).toContain(SESSION);
  });

  it("says 429 and when to come back after too many wrong ones", async () => {
    const answers = [];
    for (let n = 0; n < 13; n += 1)
      answers.push(
        await form(
          { email: "guessed@example.test", password: `guess ${n}`, json: "true" },
          { origin: server.origin },
        ),
      );
    const refused = answers.find(({ status }) => status === 429);
    expect(answers[0]?.status).toBe(401);
    expect(Number(refused?.headers.get("retry-after"))).toBeGreaterThan(0);
    expect((await form({ email, password: PASSWORD, json: "true" }, { origin: server.origin })).status).toBe(
      200,
    );
  });
});
