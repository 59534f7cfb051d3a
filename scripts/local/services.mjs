import { readLocal, secret, writeLocal } from "./folders.mjs";
import { oneAtATime } from "./lock.mjs";
import { ensureMailSink } from "./mail.mjs";
import { ensureDatabase, ensurePostgres } from "./postgres.mjs";
import { freePort } from "./processes.mjs";
import { ensureBucket, ensureStore } from "./store.mjs";

/**
 * Sees that database, store and mail are there for one use of this checkout ("demo" or "test") and answers with the
 * environment the application needs, and with what was made newly. What the environment already names (DATABASE_URL
 * with DATABASE_OWNER_URL, S3_*, SMTP_URL) is used as it is: nothing local is started for that part.
 */
export async function ensureServices(use, { given = process.env, origin } = {}) {
  return oneAtATime("services", async () => {
    const made = [];
    const env = {
      ...(await databaseEnv(use, given, made)),
      ...(await storeEnv(use, given, origin, made)),
      ...(await mailEnv(use, given)),
      MAIL_FROM: given.MAIL_FROM ?? "Holdground <register@holdground.example>",
      NEXTAUTH_SECRET: given.NEXTAUTH_SECRET ?? secret("nextauth"),
    };
    return { env, made };
  });
}

/** Which parts the given environment names itself. Half a part is refused: it would be filled by guessing. */
export function externalParts(given = process.env) {
  const store = ["S3_ENDPOINT", "S3_REGION", "S3_ACCESS_KEY", "S3_SECRET_KEY", "S3_BUCKET"];
  const missing = store.filter((name) => !given[name]);
  if (given.S3_ENDPOINT && missing.length > 0)
    throw new Error(`S3_ENDPOINT is set, so ${missing.join(", ")} must be set too.`);
  if (given.DATABASE_URL && !given.DATABASE_OWNER_URL)
    throw new Error(
      "DATABASE_URL is set, so DATABASE_OWNER_URL must be set too: the migrations need the tables' owner.",
    );
  return {
    database: Boolean(given.DATABASE_URL),
    store: Boolean(given.S3_ENDPOINT),
    mail: Boolean(given.SMTP_URL),
  };
}

async function databaseEnv(use, given, made) {
  if (externalParts(given).database)
    return {
      DATABASE_URL: given.DATABASE_URL,
      DATABASE_OWNER_URL: given.DATABASE_OWNER_URL,
      DATABASE_ADMIN_URL: given.DATABASE_OWNER_URL,
    };
  const server = await ensurePostgres();
  // Test runs make their own databases, as many as they need; the demonstration has one.
  const name = use === "demo" ? "holdground" : "postgres";
  if (use === "demo" && (await ensureDatabase(server.superuser, name))) made.push("database");
  return {
    DATABASE_URL: `${server.app}/${name}`,
    DATABASE_OWNER_URL: `${server.owner}/${name}`,
    DATABASE_ADMIN_URL: `${server.superuser}/${name}`,
  };
}

async function storeEnv(use, given, origin, made) {
  const external = externalParts(given).store;
  const bucket = use === "demo" ? "holdground" : "holdground-test";
  const store = external
    ? {
        endpoint: given.S3_ENDPOINT,
        region: given.S3_REGION,
        accessKey: given.S3_ACCESS_KEY,
        secretKey: given.S3_SECRET_KEY,
        bucket: use === "demo" ? given.S3_BUCKET : `${given.S3_BUCKET}-test`,
      }
    : await ensureStore({ name: use === "demo" ? "s3" : "s3-test", bucket, origin });
  if (external ? await ensureBucket(store) : store.made) made.push("bucket");
  return {
    S3_ENDPOINT: store.endpoint,
    S3_REGION: store.region,
    S3_ACCESS_KEY: store.accessKey,
    S3_SECRET_KEY: store.secretKey,
    S3_BUCKET: store.bucket,
  };
}

async function mailEnv(use, given) {
  if (externalParts(given).mail) return { SMTP_URL: given.SMTP_URL };
  const sink = await ensureMailSink(use === "demo" ? "mail" : "mail-test");
  return { SMTP_URL: sink.url, MAIL_SINK_URL: sink.page };
}

/** The address the application is served at: the port it had last time, or else the first free one from PORT or 3000. */
export async function chooseOrigin(use, given = process.env) {
  const name = `${use}-port.json`;
  const first = use === "demo" ? Number(given.PORT ?? 3000) : 3400;
  const last = readLocal(name)?.port;
  const port = await freePort(given.PORT && use === "demo" ? first : (last ?? first));
  if (port !== last) writeLocal(name, { port });
  return { port, origin: `http://127.0.0.1:${port}` };
}
