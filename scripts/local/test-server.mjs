import { startApp } from "./app.mjs";
import { builtFrom, sourcesHash } from "./build.mjs";
import { migrate, plantDemo } from "./demo.mjs";
import { end } from "./processes.mjs";
import { chooseOrigin, ensureServices } from "./services.mjs";
import { clearLeftovers, databaseUrls, dropDatabases, makeDatabase, runName } from "./test-databases.mjs";

/**
 * Serves the production build to browser tests: a database of its own with the demonstration project, the tests' store
 * and mail sink. Answers with the environment that it runs in, and with how to take it all away again.
 */
export async function startTestServer({ step = (_title, act) => act() } = {}) {
  if (builtFrom() !== sourcesHash())
    throw new Error(
      "Browser tests run on the production build, and there is none of these sources: npm test makes it.",
    );
  await end("app-test");
  const { port, origin } = await chooseOrigin("test");
  const services = await ensureServices("test", { origin });
  const run = `${runName()}_browser`;
  const name = `${run}_demo`;
  const { DATABASE_ADMIN_URL: admin, DATABASE_OWNER_URL: owner } = services.env;
  await clearLeftovers(admin);
  await makeDatabase(admin, name, owner);
  const urls = databaseUrls(services.env, name);
  const env = {
    ...services.env,
    DATABASE_URL: urls.appUrl,
    DATABASE_OWNER_URL: urls.ownerUrl,
    DATABASE_ADMIN_URL: urls.superuserUrl,
    APP_ORIGIN: origin,
    NEXTAUTH_URL: origin,
  };
  const stop = async () => {
    await end("app-test");
    await dropDatabases(admin, run);
  };
  try {
    await migrate(env);
    await step("Demonstration project for the browser tests", () => plantDemo(env));
    await step("The register on its production build", () =>
      startApp({ name: "app-test", port, env }).then(() => origin),
    );
  } catch (error) {
    await stop();
    throw error;
  }
  return { env: { ...env, HOLDGROUND_TEST_ORIGIN: origin }, started: services.started, stop };
}
