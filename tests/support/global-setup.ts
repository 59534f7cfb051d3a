import type { TestProject } from "vitest/node";
import { givenEnvironment } from "@/scripts/local/given.mjs";
import { ensureServices, type ServiceEnvironment } from "@/scripts/local/services.mjs";
import {
  clearLeftovers,
  databaseUrls,
  dropDatabases,
  makeDatabase,
  runName,
} from "@/scripts/local/test-databases.mjs";
import { migrateDatabase } from "@/scripts/migrate";

declare module "vitest" {
  export interface ProvidedContext {
    /** Variables for the process under test: store, mail, secrets, and where databases are made. */
    environment: ServiceEnvironment & { NEXTAUTH_URL: string; APP_ORIGIN: string };
    /** The migrated database that every test file gets a copy of. */
    template: string;
    /** Which services this checkout has made itself; the others were named by the environment. */
    own: { database: boolean; store: boolean };
  }
}

/** Sees that the local services run, and makes this run's one migrated template database. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const { env } = await ensureServices("test");
  const run = runName();
  await clearLeftovers(env.DATABASE_ADMIN_URL);
  const template = `${run}_template`;
  await makeDatabase(env.DATABASE_ADMIN_URL, template, env.DATABASE_OWNER_URL);
  const urls = databaseUrls(env, template);
  await migrateDatabase(urls.ownerUrl, urls.appUrl);

  const origin = "http://127.0.0.1:3400";
  project.provide("environment", { ...env, NEXTAUTH_URL: origin, APP_ORIGIN: origin });
  project.provide("template", template);
  const given = givenEnvironment();
  project.provide("own", { database: !given.DATABASE_URL, store: !given.S3_ENDPOINT });
  return () => dropDatabases(env.DATABASE_ADMIN_URL, run);
}
