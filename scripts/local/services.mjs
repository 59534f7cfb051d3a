import { readLocal, secret, writeLocal } from "./folders.mjs";
import { givenEnvironment } from "./given.mjs";
import { oneAtATime } from "./lock.mjs";
import { ensureMailSink } from "./mail.mjs";
import { ensureDatabase, ensurePostgres, stopPostgres } from "./postgres.mjs";
import { end, freePort } from "./processes.mjs";
import { ensureBucket, ensureStore } from "./store.mjs";

/** What each use of a checkout has of its own. Both share the private database server. */
const uses = {
  demo: { database: "holdground", store: "s3", bucket: "holdground", mail: "mail" },
  // Test runs make their own databases, as many as they need.
  test: { database: undefined, store: "s3-test", bucket: "holdground-test", mail: "mail-test" },
};

/**
 * Sees that database, store and mail are there for one use of this checkout ("demo" or "test"). Answers with the
 * environment that the application needs and with the names of what had to be started. What the environment names
 * itself (DATABASE_URL with DATABASE_OWNER_URL, S3_*, SMTP_URL) is used as it is: nothing is started for that part.
 */
export async function ensureServices(use, { given = givenEnvironment(), origin, step = quietly } = {}) {
  return oneAtATime("services", async () => {
    const started = [];
    const env = {
      ...(await step("Database", () => databaseEnv(use, given, started))),
      ...(await step("Store", () => storeEnv(use, given, origin, started))),
      ...(await step("Mail", () => mailEnv(use, given, started))),
      MAIL_FROM: given.MAIL_FROM ?? "Holdground <register@holdground.example>",
      NEXTAUTH_SECRET: given.NEXTAUTH_SECRET ?? secret("nextauth"),
    };
    return { env, started };
  });
}

const quietly = (_title, act) => act();

/** Which parts the environment names itself. Half a part is refused: the other half would be a guess. */
export function externalParts(given) {
  const store = ["S3_ENDPOINT", "S3_REGION", "S3_ACCESS_KEY", "S3_SECRET_KEY", "S3_BUCKET"];
  const missing = store.filter((name) => !given[name]);
  if (given.S3_ENDPOINT && missing.length > 0)
    throw new Error(`S3_ENDPOINT is set, so ${missing.join(", ")} must be set too.`);
  if (given.DATABASE_URL && !given.DATABASE_OWNER_URL)
    throw new Error(
      "DATABASE_URL is set, so DATABASE_OWNER_URL must be set too: only the owner of the tables may migrate them.",
    );
  return {
    database: Boolean(given.DATABASE_URL),
    store: Boolean(given.S3_ENDPOINT),
    mail: Boolean(given.SMTP_URL),
  };
}

async function databaseEnv(use, given, started) {
  if (externalParts(given).database)
    return {
      DATABASE_URL: given.DATABASE_URL,
      DATABASE_OWNER_URL: given.DATABASE_OWNER_URL,
      DATABASE_ADMIN_URL: given.DATABASE_OWNER_URL,
    };
  const server = await ensurePostgres();
  if (server.started) started.push("postgres");
  const name = uses[use].database ?? "postgres";
  if (uses[use].database) await ensureDatabase(server.superuser, name);
  return {
    DATABASE_URL: `${server.app}/${name}`,
    DATABASE_OWNER_URL: `${server.owner}/${name}`,
    DATABASE_ADMIN_URL: `${server.superuser}/${name}`,
  };
}

async function storeEnv(use, given, origin, started) {
  let store;
  if (externalParts(given).store) {
    store = {
      endpoint: given.S3_ENDPOINT,
      region: given.S3_REGION,
      accessKey: given.S3_ACCESS_KEY,
      secretKey: given.S3_SECRET_KEY,
      bucket: use === "demo" ? given.S3_BUCKET : `${given.S3_BUCKET}-test`,
    };
    await ensureBucket(store);
  } else {
    store = await ensureStore({
      name: uses[use].store,
      bucket: uses[use].bucket,
      origin: origin ?? usualOrigin(use),
    });
    if (store.started) started.push(uses[use].store);
  }
  return {
    S3_ENDPOINT: store.endpoint,
    S3_REGION: store.region,
    S3_ACCESS_KEY: store.accessKey,
    S3_SECRET_KEY: store.secretKey,
    S3_BUCKET: store.bucket,
  };
}

async function mailEnv(use, given, started) {
  // Tests write to people who do not exist: their mail never goes to a real server.
  if (use === "demo" && externalParts(given).mail) return { SMTP_URL: given.SMTP_URL };
  const sink = await ensureMailSink(uses[use].mail);
  if (sink.started) started.push(uses[use].mail);
  return { SMTP_URL: sink.url, MAIL_SINK_URL: sink.page };
}

/** Ends the services of these names, if they are ours and run. Answers with those that were ended. */
export async function endServices(names) {
  const ended = [];
  for (const name of names) if (name === "postgres" ? stopPostgres() : await end(name)) ended.push(name);
  return ended;
}

/** Every service that any use may have started, the database last: others write to it until they end. */
export const serviceNames = [...Object.values(uses).flatMap(({ store, mail }) => [store, mail]), "postgres"];

const firstPort = { demo: 3000, dev: 3100, test: 3400 };

/** The address that a use is served at when its first port is free. */
const usualOrigin = (use) => `http://127.0.0.1:${firstPort[use]}`;

/** The address to serve at: the port it had last time if that is free, or else the first free one from the usual. */
export async function chooseOrigin(use, given = givenEnvironment()) {
  const file = `${use}-port.json`;
  const wanted = use !== "test" && given.PORT ? Number(given.PORT) : undefined;
  const last = readLocal(file)?.port;
  const port = await freePort(wanted ?? last ?? firstPort[use]);
  if (port !== last) writeLocal(file, { port });
  return { port, origin: `http://127.0.0.1:${port}` };
}
