import { ensureBuild } from "./local/build.mjs";
import { passes, standingChecks } from "./local/checks.mjs";
import { checkNode } from "./local/packages.mjs";
import { install, withPlace } from "./local/prepare.mjs";
import { running } from "./local/processes.mjs";
import { step } from "./local/say.mjs";
import { endServices, ensureServices } from "./local/services.mjs";
import { startTestServer } from "./local/test-server.mjs";
import { conclude, runVitest } from "./local/vitest.mjs";

/*
 * npm test: everything. Sets up what npm start does and Chromium, makes the standing checks, builds, serves the build
 * against a database of its own, runs every test, and ends what it has started. The last line holds the counts; each
 * check beside the tests counts as one.
 */
async function main() {
  checkNode();
  console.log("Holdground: setting up the tests");
  await install({ browser: true });
  const { started } = await ensureServices("test", { step: withPlace });
  const counts = { passed: 0, failed: 0, skipped: 0 };
  const count = (passed) => {
    counts[passed ? "passed" : "failed"] += 1;
    return passed;
  };

  for (const check of standingChecks) count(await passes(check));
  const built = count(await holds("Production build", () => ensureBuild()));
  let server;
  const served =
    built &&
    count(
      await holds("Production server", async () => {
        server = await startTestServer({ step });
      }),
    );
  const leave = async () => {
    await server?.stop();
    await endServices(
      started.filter((name) => name !== "postgres" || !(running("app") || running("app-dev"))),
    );
  };
  for (const signal of ["SIGINT", "SIGTERM", "SIGHUP"])
    process.once(signal, () => leave().finally(() => process.exit(1)));
  try {
    // Without a server every browser test would fail for the one reason that is counted already.
    const projects = served ? [] : ["pure", "components", "database"].flatMap((name) => ["--project", name]);
    const tests = await runVitest(
      projects,
      server ? { HOLDGROUND_TEST_SERVER: JSON.stringify(server.env) } : {},
    );
    for (const kind of Object.keys(counts)) counts[kind] += tests[kind];
  } finally {
    await leave();
  }
  conclude(counts);
}

async function holds(title, act) {
  try {
    await step(title, act);
    return true;
  } catch (error) {
    console.log(`${error.message}\n  FAILED  ${title}`);
    return false;
  }
}

await main().catch((error) => {
  console.error(`\n${error.message}`);
  conclude({ passed: 0, failed: 1, skipped: 0 });
  process.exit();
});
