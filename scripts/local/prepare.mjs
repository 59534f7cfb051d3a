import { accountLines, ensureDemo, migrate } from "./demo.mjs";
import { writeLocal } from "./folders.mjs";
import { givenEnvironment } from "./given.mjs";
import { ensureModules, ensurePackages } from "./packages.mjs";
import { step } from "./say.mjs";
import { chooseOrigin, ensureServices, externalParts } from "./services.mjs";

/** Installs what is missing. Two installers that touch nothing of each other's run side by side. */
export async function install({ browser = false } = {}) {
  const external = externalParts(givenEnvironment());
  const wanted = { database: !external.database, store: !external.store, browser };
  const both = await Promise.allSettled([
    step("Debian packages", () => ensurePackages(wanted)),
    step("Node modules", () => ensureModules()),
  ]);
  const failed = both.find(({ status }) => status === "rejected");
  if (failed) throw failed.reason;
}

/** Everything that the register needs before it is served: services, migrations, demonstration. */
export async function prepare(use) {
  await install();
  const given = givenEnvironment();
  const { port, origin } = await chooseOrigin(use, given);
  const shown = given.APP_ORIGIN ?? given.NEXTAUTH_URL ?? origin;
  const services = await ensureServices("demo", { given, origin: new URL(shown).origin, step: withPlace });
  const env = { ...services.env, APP_ORIGIN: shown, NEXTAUTH_URL: given.NEXTAUTH_URL ?? shown };
  writeLocal("env.json", env);
  await step("Migrations", () => migrate(env));
  const foreign = externalParts(given).database && !given.HOLDGROUND_DEMO;
  await step("Demonstration project", () =>
    foreign ? "left out of a database given from outside; HOLDGROUND_DEMO=1 puts it in" : ensureDemo(env),
  );
  return { env, port, demo: !foreign };
}

/** A step whose outcome is a piece of environment: its first variable says where the service is, without passwords. */
export function withPlace(title, act) {
  return step(title, act, (env) => new URL(Object.values(env)[0]).host);
}

/** Says where the register is served, where its mail goes, and who may sign in. */
export function tell(env, demo) {
  console.log(`\nHoldground is served at ${env.APP_ORIGIN}`);
  if (env.MAIL_SINK_URL) console.log(`Its mail is kept and shown at ${env.MAIL_SINK_URL}`);
  const lines = demo ? accountLines() : [];
  if (lines.length > 0) console.log(`Accounts of the demonstration:\n${lines.join("\n")}`);
  console.log("Ctrl-C ends the register; npm stop also ends the database, the store and the mail sink.\n");
}
