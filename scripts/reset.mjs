import { rmSync } from "node:fs";
import { join } from "node:path";
import { ensureDemo, migrate } from "./local/demo.mjs";
import { local } from "./local/folders.mjs";
import { givenEnvironment } from "./local/given.mjs";
import { checkNode } from "./local/packages.mjs";
import { ensureDatabase, onServer } from "./local/postgres.mjs";
import { install } from "./local/prepare.mjs";
import { end, running } from "./local/processes.mjs";
import { giveUp, step } from "./local/say.mjs";
import { ensureServices, externalParts } from "./local/services.mjs";
import { emptyBucket } from "./local/store.mjs";

/* npm run reset: the demonstration as on the first day, in the private database and store of this checkout. */
async function main() {
  checkNode();
  const external = externalParts(givenEnvironment());
  if (external.database || external.store)
    throw new Error("DATABASE_URL or S3_ENDPOINT is set: only what npm start has made here is ever reset.");
  console.log("Holdground: rebuilding the demonstration");
  await install();
  for (const name of ["app", "app-dev"])
    if (running(name))
      await step(
        "The running register",
        () => end(name),
        () => "ended; start it again afterwards",
      );
  const { env } = await ensureServices("demo", { step });
  const server = env.DATABASE_ADMIN_URL.replace(/\/holdground$/, "");
  await step("Database", async () => {
    await onServer(`${server}/postgres`, (client) => client.query("drop database holdground with (force)"));
    await ensureDatabase(server, "holdground");
    rmSync(join(local, "demo.json"), { force: true });
    return "empty";
  });
  await step("Bucket", async () => `${await emptyBucket(asStore(env))} objects removed`);
  await step("Migrations", () => migrate(env));
  await step("Demonstration project", () => ensureDemo(env));
}

const asStore = (env) => ({
  endpoint: env.S3_ENDPOINT,
  region: env.S3_REGION,
  accessKey: env.S3_ACCESS_KEY,
  secretKey: env.S3_SECRET_KEY,
  bucket: env.S3_BUCKET,
});

await main().catch(giveUp);
