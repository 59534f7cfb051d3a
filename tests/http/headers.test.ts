import { request } from "node:http";
import { beforeAll, describe, expect, it } from "vitest";
import { freshDatabase } from "../support/database";
import { Browser, built, type RunningServer, signedInBrowser, startServer } from "../support/server";
import { lookInto, makeSite, PASSWORD, type Site, stored } from "../support/site";

describe.runIf(built)("every answer", () => {
  let server: RunningServer;
  let site: Site;
  let lead: Browser;
  beforeAll(async () => {
    lookInto((await freshDatabase()).superuserUrl);
    site = await makeSite("A-01");
    server = await startServer();
    lead = await signedInBrowser(server.origin, site.lead.person.email, PASSWORD);
  });

  const kinds = () =>
    ({
      "a public page": [new Browser(server.origin), "/sign-in"],
      "a page of the workspace": [lead, `/projects/${site.projectId}/settings`],
      "the list of projects": [lead, "/projects"],
      "a redirect to sign in": [new Browser(server.origin), "/projects"],
      "an answer of the API": [lead, `/api/projects/${site.projectId}`],
      "a refusal of the API": [new Browser(server.origin), `/api/projects/${site.projectId}`],
      "a page that is not there": [lead, "/nothing/here"],
      "an API address that is not there": [lead, "/api/nothing"],
      "next-auth": [lead, "/api/auth/session"],
    }) as Record<string, [Browser, string]>;

  it("carries the headers that keep browsers strict, and is private and unstored", async () => {
    for (const [kind, [browser, path]] of Object.entries(kinds())) {
      const { headers } = await browser.fetch(path);
      expect([kind, headers.get("strict-transport-security")]).toEqual([
        kind,
        expect.stringContaining("max-age=63072000"),
      ]);
      expect([kind, headers.get("x-content-type-options")]).toEqual([kind, "nosniff"]);
      expect([kind, headers.get("referrer-policy")]).toEqual([kind, "same-origin"]);
      expect([kind, headers.get("cross-origin-opener-policy")]).toEqual([kind, "same-origin"]);
      expect([kind, headers.get("cross-origin-resource-policy")]).toEqual([kind, "same-origin"]);
      expect([kind, headers.get("cache-control")]).toEqual([
        kind,
        expect.stringMatching(/private.*no-store|no-store.*private/),
      ]);
      expect([kind, headers.get("x-powered-by")]).toEqual([kind, null]);
    }
  });

  it("carries a content security policy with a nonce of its own and nothing unsafe", async () => {
    const nonces = new Set<string>();
    for (const [kind, [browser, path]] of Object.entries(kinds())) {
      for (let n = 0; n < 2; n += 1) {
        const policy = (await browser.fetch(path)).headers.get("content-security-policy") ?? "";
        expect([kind, policy]).toEqual([kind, expect.not.stringMatching(/unsafe|\*|http:(?!\/\/127\.)/)]);
        for (const rule of [
          "object-src 'none'",
          "base-uri 'none'",
          "frame-ancestors 'none'",
          "form-action 'self'",
        ])
          expect([kind, policy]).toEqual([kind, expect.stringContaining(rule)]);
        nonces.add(/'nonce-([0-9a-f]{32})'/.exec(policy)?.[1] ?? "");
      }
    }
    expect(nonces.size).toBe(Object.keys(kinds()).length * 2);
  });

  it("gives each script of a page the nonce of that answer", async () => {
    for (const [browser, path] of [
      [new Browser(server.origin), "/sign-in"],
      [lead, `/projects/${site.projectId}/settings`],
    ] as const) {
      const answer = await browser.fetch(path);
      const nonce = /'nonce-([0-9a-f]{32})'/.exec(answer.headers.get("content-security-policy") ?? "")?.[1];
      const html = await answer.text();
      const scripts = html.match(/<script\b[^>]*>/g) ?? [];
      expect(scripts.length).toBeGreaterThan(3);
      for (const script of scripts) expect(script).toContain(`nonce="${nonce}"`);
      expect(html).not.toMatch(/<[a-z][^>]*\sstyle="/);
      expect(html).not.toMatch(/\son[a-z]+="/);
    }
  });

  it("lets nobody in who passes for the framework, a proxy or another host", async () => {
    const forged: Record<string, string>[] = [
      { "x-middleware-subrequest": "proxy:proxy:proxy:proxy:proxy" },
      {
        "x-middleware-subrequest":
          "src/middleware:src/middleware:src/middleware:src/middleware:src/middleware",
      },
      { "x-middleware-next": "1" },
      { "x-middleware-rewrite": `/projects/${site.projectId}` },
      { "x-middleware-prefetch": "1" },
      { "x-nextjs-data": "1" },
      { "next-resume": "1" },
      { rsc: "1" },
      { "next-router-prefetch": "1", rsc: "1" },
      { "next-router-segment-prefetch": "/_tree", rsc: "1" },
      { purpose: "prefetch" },
      { "x-forwarded-host": "evil.example" },
      { "x-forwarded-for": "127.0.0.1" },
      { "x-original-url": "/sign-in" },
      { "x-rewrite-url": "/sign-in" },
      { "x-invoke-path": "/sign-in" },
      { "x-matched-path": `/projects/${site.projectId}` },
      { "x-now-route-matches": "1" },
      { authorization: "Bearer x" },
      { cookie: "__Host-holdground.session=x" },
    ];
    const paths = [
      `/projects/${site.projectId}`,
      `/projects/${site.projectId}/settings`,
      `//projects/${site.projectId}/settings`,
      `/projects/${site.projectId}/settings/`,
      `/projects/${site.projectId}/settings?_rsc=1`,
      `/projects/${site.projectId}/settings.rsc`,
      `/_next/data/x/projects/${site.projectId}/settings.json`,
      `/PROJECTS/${site.projectId}/settings`,
      `/%70rojects/${site.projectId}/settings`,
    ];
    const stranger = new Browser(server.origin);
    for (const path of paths)
      for (const headers of [{}, ...forged] as Record<string, string>[]) {
        const answer = await stranger.fetch(path.startsWith("//") ? `${server.origin}${path}` : path, {
          headers,
        });
        const text = await answer.text();
        expect([path, headers, text.includes("Depot grid") || text.includes("A-01")]).toEqual([
          path,
          headers,
          false,
        ]);
        expect(answer.headers.get("location") ?? "").not.toContain("evil.example");
      }
  });

  it("is a refusal where a change comes without this site's Origin, and nothing changes", async () => {
    const before = await stored("select revision, title from project order by id");
    for (const origin of [
      undefined,
      "null",
      "http://evil.example",
      "https://127.0.0.1",
      `${server.origin}.evil.example`,
    ])
      for (const [method, path] of [
        ["PATCH", `/api/projects/${site.projectId}`],
        ["POST", `/api/projects/${site.projectId}/members`],
        ["POST", "/api/account/sessions/end"],
      ] as const) {
        const headers: Record<string, string> = {
          "content-type": "application/json",
          "if-match": '"1"',
          "x-forwarded-host": "evil.example",
          cookie: [...lead.cookies].map(([name, value]) => `${name}=${value}`).join("; "),
        };
        if (origin !== undefined) headers.origin = origin;
        const answer = await fetch(`${server.origin}${path}`, {
          method,
          headers,
          body: JSON.stringify({ title: "Taken over" }),
        });
        expect([origin, method, path, answer.status]).toEqual([origin, method, path, 403]);
      }
    expect(await stored("select revision, title from project order by id")).toEqual(before);
    expect((await lead.fetch("/api/account")).status).toBe(200);
  });

  it("shows the true peer in the record, whatever the client says", async () => {
    await new Promise<void>((done, failed) => {
      const body = new URLSearchParams({
        email: "peer@example.test",
        password: "x",
        json: "true",
      }).toString();
      const { hostname, port } = new URL(server.origin);
      const sent = request(
        {
          hostname,
          port,
          localAddress: "127.0.0.77",
          method: "POST",
          path: "/api/auth/callback/credentials",
          headers: {
            "content-type": "application/x-www-form-urlencoded",
            origin: server.origin,
            "x-forwarded-for": "203.0.113.9",
            "x-real-ip": "203.0.113.9",
            "x-holdground-peer": "203.0.113.9",
          },
        },
        (answer) => answer.resume().on("end", () => done()),
      );
      sent.on("error", failed);
      sent.end(body);
    });
    expect(await stored("select address from sign_in_attempt where account = 'peer@example.test'")).toEqual([
      { address: "127.0.0.77" },
    ]);
  });
});
