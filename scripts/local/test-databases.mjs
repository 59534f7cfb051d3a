import { createHash, randomBytes } from "node:crypto";
import { hostname } from "node:os";
import { root } from "./folders.mjs";
import { onServer } from "./postgres.mjs";
import { startTicks } from "./processes.mjs";

/** Marks the databases of this checkout on this machine: only such a one is ever dropped. */
const mark = `holdground_test_${createHash("sha256").update(`${hostname()} ${root}`).digest("hex").slice(0, 8)}`;

/** What the names of this process's databases begin with; its pid and start tell later whether it still runs. */
export const runName = () => `${mark}_${process.pid}_${startTicks(process.pid)}`;

/** Makes an empty database that belongs to the role of the owner's URL. */
export async function makeDatabase(adminUrl, name, ownerUrl) {
  await onServer(adminUrl, (client) =>
    client.query(`create database ${name} owner ${role(client, ownerUrl)}`),
  );
}

/** Copies a template and answers with the copy's name, which begins with the run that the template belongs to. */
export async function copyDatabase(adminUrl, template, ownerUrl) {
  const name = `${template.replace(/_template$/, "")}_${randomBytes(5).toString("hex")}`;
  await onServer(adminUrl, (client) =>
    client.query(`create database ${name} template ${template} owner ${role(client, ownerUrl)}`),
  );
  return name;
}

/** Drops one database of this checkout, with whoever is still connected to it. */
export async function dropDatabase(adminUrl, name) {
  if (!name.startsWith(`${mark}_`)) throw new Error(`${name} was not made by a test run here: it stays.`);
  await onServer(adminUrl, (client) => client.query(`drop database if exists ${name} with (force)`));
}

/** Drops all databases of one run. */
export async function dropDatabases(adminUrl, run) {
  for (const name of await ours(adminUrl)) if (name.startsWith(`${run}_`)) await dropDatabase(adminUrl, name);
}

/** Drops what runs have left behind that were ended before they could tidy up. */
export async function clearLeftovers(adminUrl) {
  for (const name of await ours(adminUrl)) {
    const [pid, ticks] = name.slice(mark.length + 1).split("_");
    if (startTicks(Number(pid)) !== ticks) await dropDatabase(adminUrl, name);
  }
}

/** The three ways into one database: as the application, as the owner, as the superuser. */
export function databaseUrls(environment, name) {
  const into = (url) => Object.assign(new URL(url), { pathname: `/${name}` }).href;
  return {
    appUrl: into(environment.DATABASE_URL),
    ownerUrl: into(environment.DATABASE_OWNER_URL),
    superuserUrl: into(environment.DATABASE_ADMIN_URL),
  };
}

async function ours(adminUrl) {
  return onServer(adminUrl, async (client) => {
    const found = await client.query("select datname from pg_database where starts_with(datname, $1)", [
      `${mark}_`,
    ]);
    return found.rows.map((row) => row.datname);
  });
}

const role = (client, url) => client.escapeIdentifier(decodeURIComponent(new URL(url).username));
