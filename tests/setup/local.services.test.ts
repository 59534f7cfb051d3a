import { readFileSync, statSync } from "node:fs";
import { PutObjectCommand, S3Client } from "@aws-sdk/client-s3";
import { getSignedUrl } from "@aws-sdk/s3-request-presigner";
import { createTransport } from "nodemailer";
import { describe, expect, inject, it } from "vitest";
import { local, readLocal } from "@/scripts/local/folders.mjs";
import { onServer } from "@/scripts/local/postgres.mjs";
import { ensureServices } from "@/scripts/local/services.mjs";
import {
  clearLeftovers,
  dropDatabase,
  dropDatabases,
  makeDatabase,
  runName,
} from "@/scripts/local/test-databases.mjs";

const environment = inject("environment");
const own = inject("own");
if (!own.store) console.info("S3_ENDPOINT is given: what is true of the store made here is not looked at.");

function client(secretAccessKey = environment.S3_SECRET_KEY): S3Client {
  return new S3Client({
    endpoint: environment.S3_ENDPOINT,
    region: environment.S3_REGION,
    forcePathStyle: true,
    credentials: { accessKeyId: environment.S3_ACCESS_KEY, secretAccessKey },
    requestChecksumCalculation: "WHEN_REQUIRED",
    responseChecksumValidation: "WHEN_REQUIRED",
    maxAttempts: 1,
  });
}

const put = (key: string, body: string) =>
  new PutObjectCommand({ Bucket: environment.S3_BUCKET, Key: key, Body: body, ContentType: "text/plain" });

describe.runIf(own.store)("the store of the tests", () => {
  it("takes an object from who holds the secret, and refuses who does not", async () => {
    await expect(client().send(put("setup/right", "kept"))).resolves.toBeDefined();
    await expect(client("guessed").send(put("setup/wrong", "kept"))).rejects.toMatchObject({
      $metadata: { httpStatusCode: 403 },
    });
  });

  it("holds a browser to the signed type, and shows nothing to a stranger", async () => {
    const command = new PutObjectCommand({
      Bucket: environment.S3_BUCKET,
      Key: "setup/signed",
      ContentType: "application/pdf",
    });
    const url = await getSignedUrl(client(), command, { signableHeaders: new Set(["host", "content-type"]) });
    const send = (type: string) =>
      fetch(url, { method: "PUT", body: "x", headers: { "content-type": type } });
    expect((await send("text/html")).status).toBe(403);
    expect((await send("application/pdf")).status).toBe(200);
    const bare = await fetch(`${environment.S3_ENDPOINT}/${environment.S3_BUCKET}/setup/signed`);
    expect(bare.status).toBeGreaterThanOrEqual(400);
  });

  it("lets pages of the register's address upload, and those of no other", async () => {
    const url = await getSignedUrl(
      client(),
      new PutObjectCommand({ Bucket: environment.S3_BUCKET, Key: "setup/page", ContentType: "text/plain" }),
    );
    const ask = (origin: string) =>
      fetch(url, { method: "OPTIONS", headers: { origin, "access-control-request-method": "PUT" } });
    const upload = (origin: string) =>
      fetch(url, { method: "PUT", body: "x", headers: { origin, "content-type": "text/plain" } });
    const allows = (answer: Response) => answer.headers.get("access-control-allow-origin");

    expect(allows(await ask(environment.APP_ORIGIN))).toBe(environment.APP_ORIGIN);
    expect(allows(await upload(environment.APP_ORIGIN))).toBe(environment.APP_ORIGIN);
    expect(allows(await ask("http://evil.example"))).toBeNull();
    expect(allows(await upload("http://evil.example"))).toBeNull();
  });
});

describe("the mail sink", () => {
  const page = new URL(environment.MAIL_SINK_URL ?? "http://127.0.0.1:1/");
  const to = `person-${process.pid}@site.example`;

  it("keeps what it is given, readable for tests and as a page, with markup shown as text", async () => {
    const text = 'Open <script>alert("x")</script> https://register.example/a?b=1 für Zone Ä';
    await createTransport(environment.SMTP_URL).sendMail({
      from: "r@site.example",
      to,
      subject: "Kept <b>",
      text,
    });
    const [message] = await (await fetch(new URL(`messages?to=${to}`, page))).json();
    expect(message).toMatchObject({ subject: "Kept <b>", envelope: { from: "r@site.example", to: [to] } });
    expect(message.text.trim()).toBe(text);
    const shown = await (await fetch(new URL(`?to=${to}`, page))).text();
    expect(shown).not.toContain("<script>");
    expect(shown).toContain('href="https://register.example/a?b=1"');
  });

  it("answers nobody who came by another name for this machine", async () => {
    const { request } = await import("node:http");
    const status = await new Promise((answer) => {
      const options = {
        host: "127.0.0.1",
        port: page.port,
        path: "/messages",
        headers: { host: "evil.example" },
      };
      request(options, (response) => answer(response.resume().statusCode)).end();
    });
    expect(status).toBe(403);
  });
});

describe.runIf(own.store && own.database)("what is kept of the services", () => {
  it("lets nobody but its owner read the passwords", () => {
    expect(statSync(`${local}/secrets.json`).mode & 0o777).toBe(0o600);
  });

  it("puts no password where other accounts could list it", () => {
    const record = readLocal("run/s3-test.json") as { pid?: number } | undefined;
    expect(record?.pid).toBeDefined();
    const command = readFileSync(`/proc/${record?.pid}/cmdline`, "utf8");
    expect(command).toContain("s3.py");
    expect(command).not.toContain(environment.S3_SECRET_KEY);
  });

  it("is found running and left as it is when it is asked for again", async () => {
    const again = await ensureServices("test", { given: {} });
    expect(again.env.S3_ENDPOINT).toBe(environment.S3_ENDPOINT);
    expect(again.started).toEqual([]);
  });

  it("never drops a database that no test run here has made", async () => {
    await expect(dropDatabase(environment.DATABASE_ADMIN_URL, "holdground")).rejects.toThrow(/it stays/);
  });
});

describe("databases that a killed test run has left", () => {
  it("are dropped by the next run, and those of a running one stay", async () => {
    const { DATABASE_ADMIN_URL: admin, DATABASE_OWNER_URL: owner } = environment;
    // No process has this number: Linux gives none above 4,194,304.
    const left = `${runName().replace(/_\d+_\d+$/, "")}_4194305_1_left`;
    const live = `${runName()}_live`;
    await makeDatabase(admin, left, owner);
    await makeDatabase(admin, live, owner);
    await clearLeftovers(admin);
    const { rows } = await onServer(admin, (client) =>
      client.query("select datname from pg_database where datname = any($1)", [[left, live]]),
    );
    expect(rows).toEqual([{ datname: live }]);
    await dropDatabases(admin, runName());
  });
});

describe("services named by the environment", () => {
  it("are refused in halves", async () => {
    await expect(ensureServices("demo", { given: { DATABASE_URL: "postgresql://a@b/c" } })).rejects.toThrow(
      "DATABASE_OWNER_URL must be set too",
    );
    const given = { S3_ENDPOINT: "https://store.example", S3_BUCKET: "x" };
    await expect(ensureServices("demo", { given })).rejects.toThrow(
      "S3_REGION, S3_ACCESS_KEY, S3_SECRET_KEY must be set",
    );
  });
});
