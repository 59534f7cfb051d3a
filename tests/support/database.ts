import { afterAll, inject } from "vitest";
import { closeClient } from "@/db/client";
import { copyDatabase, databaseUrls, dropDatabase } from "@/scripts/local/test-databases.mjs";

export type FreshDatabase = {
  name: string;
  /** As the application: role holdground_app, held by row security and the append-only rules. */
  appUrl: string;
  /** As the owner of the tables: still held by row security, which is forced. */
  ownerUrl: string;
  /** As the superuser of the private cluster: sees and may do everything. With an outside server, the owner again. */
  superuserUrl: string;
};

const made: string[] = [];

/**
 * A database of its own for this test file, copied from the run's migrated template and dropped after the file. From
 * then on DATABASE_URL names it, so that `client()` of db/client.ts and every verb work in it. Asked for twice, it
 * makes two; DATABASE_URL names the last.
 */
export async function freshDatabase(): Promise<FreshDatabase> {
  const environment = inject("environment");
  const name = await copyDatabase(
    environment.DATABASE_ADMIN_URL,
    inject("template"),
    environment.DATABASE_OWNER_URL,
  );
  made.push(name);
  const urls = databaseUrls(environment, name);
  process.env.DATABASE_URL = urls.appUrl;
  process.env.DATABASE_OWNER_URL = urls.ownerUrl;
  return { name, ...urls };
}

// Registered when the file loads this module, so that it holds wherever in the file the database is asked for.
afterAll(async () => {
  await closeClient();
  for (const name of made) await dropDatabase(inject("environment").DATABASE_ADMIN_URL, name);
});
