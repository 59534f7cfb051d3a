import { type ChildProcess, spawn } from "node:child_process";
import { createServer } from "node:net";
import { setTimeout as pause } from "node:timers/promises";
import { afterAll } from "vitest";
import { builtFrom, sourcesHash } from "@/scripts/local/build.mjs";

const root = `${import.meta.dirname}/../..`;

/** True when there is a production build of these very sources to serve; `npm test` makes it before the tests run. */
export const built = process.env.HOLDGROUND_ANY_BUILD === "yes" || builtFrom() === sourcesHash();
if (!built)
  console.warn(
    "There is no production build of these sources: what talks to the server is left out here. npm test builds it first.",
  );

export type RunningServer = {
  origin: string;
  log: () => string;
  process: ChildProcess;
  stop: () => Promise<void>;
};
const running: RunningServer[] = [];

async function freePort(): Promise<number> {
  const probe = createServer();
  await new Promise<void>((listening) => probe.listen(0, "127.0.0.1", () => listening()));
  const address = probe.address();
  await new Promise((closed) => probe.close(closed));
  if (typeof address !== "object" || !address) throw new Error("no port");
  return address.port;
}

/** Serves the production build from a port of its own, over the database that DATABASE_URL names; ends with the file. */
export async function startServer(over: Record<string, string> = {}): Promise<RunningServer> {
  const port = await freePort();
  const origin = `http://127.0.0.1:${port}`;
  const child = spawn(
    process.execPath,
    ["node_modules/next/dist/bin/next", "start", "-H", "127.0.0.1", "-p", String(port)],
    {
      cwd: root,
      env: {
        ...process.env,
        NODE_ENV: "production",
        NEXT_TELEMETRY_DISABLED: "1",
        APP_ORIGIN: origin,
        NEXTAUTH_URL: origin,
        ...over,
      },
      stdio: ["ignore", "pipe", "pipe"],
    },
  );
  let log = "";
  child.stdout.on("data", (part) => (log += part));
  child.stderr.on("data", (part) => (log += part));
  const server: RunningServer = {
    origin,
    log: () => log,
    process: child,
    stop: async () => {
      if (child.exitCode !== null || child.signalCode !== null) return;
      const ended = new Promise((done) => child.once("exit", done));
      child.kill("SIGTERM");
      const stuck = setTimeout(() => child.kill("SIGKILL"), 10_000);
      await ended;
      clearTimeout(stuck);
    },
  };
  running.push(server);
  for (let tries = 0; tries < 150; tries += 1) {
    if (child.exitCode !== null) break;
    const answered = await fetch(`${origin}/api/auth/csrf`).catch(() => null);
    if (answered?.ok) return server;
    await pause(200);
  }
  await server.stop();
  throw new Error(`The server did not answer.\n${log}`);
}

afterAll(async () => {
  for (const server of running) await server.stop();
});

/** A browser's side of one session: its cookies and this site's Origin, and nothing else. */
export class Browser {
  readonly cookies = new Map<string, string>();
  constructor(readonly origin: string) {}

  async fetch(
    path: string,
    init: RequestInit & { headers?: Record<string, string> } = {},
  ): Promise<Response> {
    const headers: Record<string, string> = { ...init.headers };
    const cookie = [...this.cookies].map(([name, value]) => `${name}=${value}`).join("; ");
    if (cookie) headers.cookie ??= cookie;
    if (init.method && init.method !== "GET" && init.method !== "HEAD") headers.origin ??= this.origin;
    const answer = await fetch(new URL(path, this.origin), { redirect: "manual", ...init, headers });
    for (const line of answer.headers.getSetCookie()) {
      const [pair = "", ...attributes] = line.split(";");
      const at = pair.indexOf("=");
      const [name, value] = [pair.slice(0, at), pair.slice(at + 1)];
      const gone = attributes.some((attribute) =>
        /^\s*(max-age=0|expires=Thu, 01 Jan 1970)/i.test(attribute),
      );
      if (gone || value === "") this.cookies.delete(name);
      else this.cookies.set(name, value);
    }
    return answer;
  }

  json(
    path: string,
    method: string,
    body: unknown = {},
    headers: Record<string, string> = {},
  ): Promise<Response> {
    return this.fetch(path, {
      method,
      body: JSON.stringify(body),
      headers: { "content-type": "application/json", ...headers },
    });
  }

  /** Signs in as the page does; answers with the response. */
  signIn(email: string, password: string): Promise<Response> {
    return this.fetch("/api/auth/callback/credentials", {
      method: "POST",
      body: new URLSearchParams({ email, password, json: "true" }).toString(),
      headers: { "content-type": "application/x-www-form-urlencoded" },
    });
  }
}

/** A browser in which somebody is signed in; fails when the sign-in is refused. */
export async function signedInBrowser(origin: string, email: string, password: string): Promise<Browser> {
  const browser = new Browser(origin);
  const answer = await browser.signIn(email, password);
  if (!answer.ok) throw new Error(`${email} could not sign in: ${answer.status} ${await answer.text()}`);
  return browser;
}
