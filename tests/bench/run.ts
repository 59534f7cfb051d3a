import { ensureServices } from "@/scripts/local/services.mjs";
import { databaseUrls, dropDatabases, makeDatabase, runName } from "@/scripts/local/test-databases.mjs";
import { migrateDatabase } from "@/scripts/migrate";
import { report } from "./measure";

/*
 * npm run bench [kernel] [register] [upload] [--large]: ratios to bare operations, both sides in this process,
 * alternating. Times are printed, never asserted. The database is one of its own and is dropped afterwards.
 */
const asked = process.argv.slice(2);
const wants = (name: string) =>
  asked.filter((word) => !word.startsWith("--")).length === 0 || asked.includes(name);

if (wants("kernel")) {
  const { kernel } = await import("./kernel");
  console.log(report(await kernel()));
}
if (wants("register") || wants("upload")) {
  const { env } = await ensureServices("test");
  const run = runName();
  const name = `${run}_bench`;
  await makeDatabase(env.DATABASE_ADMIN_URL, name, env.DATABASE_OWNER_URL);
  const urls = databaseUrls(env, name);
  await migrateDatabase(urls.ownerUrl, urls.appUrl);
  const origin = "http://127.0.0.1:3400";
  Object.assign(process.env, env, {
    DATABASE_URL: urls.appUrl,
    DATABASE_OWNER_URL: urls.superuserUrl,
    NEXTAUTH_URL: origin,
    APP_ORIGIN: origin,
  });
  const { closeClient } = await import("@/db/client");
  try {
    if (wants("register")) {
      const { register } = await import("./register");
      console.log(report(await register(asked.includes("--large"))));
    }
    if (wants("upload")) {
      const { upload } = await import("./upload");
      console.log(report(await upload()));
    }
  } finally {
    await closeClient();
    await dropDatabases(env.DATABASE_ADMIN_URL, run);
  }
}
