import { existsSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { quiet, tsx } from "./build.mjs";
import { readLocal, root, writeLocal } from "./folders.mjs";
import { run } from "./packages.mjs";
import { onServer } from "./postgres.mjs";

const seed = join(root, "db", "seed", "run.ts");
const accounts = join(root, "db", "seed", "accounts.json");

/** Brings the database of the environment to the newest migration. */
export async function migrate(env) {
  await run([process.execPath, tsx, join(root, "scripts", "migrate.ts")], "", {
    env: { ...process.env, ...quiet, ...env },
  }).catch((error) => {
    throw new Error(`The migrations failed:\n${error.message}`);
  });
}

/** Puts the demonstration project into the database and the bucket that the environment names. */
export async function plantDemo(env) {
  if (!existsSync(seed)) return "left out: db/seed/run.ts is not there";
  // Planting needs no address that anybody opens; the letters it queues name the usual one where none is set.
  const origin = env.APP_ORIGIN ?? env.NEXTAUTH_URL ?? process.env.APP_ORIGIN ?? "http://127.0.0.1:3000";
  const whole = { APP_ORIGIN: origin, NEXTAUTH_URL: origin, ...process.env, ...quiet, ...env };
  await run([process.execPath, tsx, seed], "", { env: whole }).catch((error) => {
    throw new Error(`The demonstration project could not be set up:\n${error.message}`);
  });
  return "planted";
}

/** The same, once for each database: the database's own number tells whether this one has it. */
export async function ensureDemo(env) {
  const id = await databaseId(env.DATABASE_ADMIN_URL);
  if (readLocal("demo.json")?.database === id) return "there already";
  const outcome = await plantDemo(env);
  if (outcome === "planted") writeLocal("demo.json", { database: id, bucket: env.S3_BUCKET });
  return outcome;
}

async function databaseId(url) {
  return onServer(url, async (client) => {
    const found = await client.query("select oid from pg_database where datname = current_database()");
    return `${new URL(url).host}/${found.rows[0].oid}`;
  });
}

/** The demonstration's accounts, as lines to print. */
export function accountLines() {
  if (!existsSync(accounts)) return [];
  const read = JSON.parse(readFileSync(accounts, "utf8"));
  const list = Array.isArray(read) ? read : read.accounts;
  const width = Math.max(...list.map(({ email }) => email.length));
  return list.map((account) => {
    const about = account.role ?? account.roles ?? account.title ?? account.name ?? "";
    return `  ${account.email.padEnd(width)}  ${account.password ?? read.password}  ${about}`;
  });
}
