import { isServed, serve } from "./local/app.mjs";
import { ensureBuild, sourcesHash } from "./local/build.mjs";
import { readLocal } from "./local/folders.mjs";
import { checkNode } from "./local/packages.mjs";
import { prepare, tell } from "./local/prepare.mjs";
import { end, running } from "./local/processes.mjs";
import { giveUp, step } from "./local/say.mjs";

/*
 * npm start: from a fresh clone to a served register with a demonstration project. What is there already is used
 * again. Only Node's own modules are loaded before npm ci has run.
 */
async function main() {
  checkNode();
  console.log("Holdground: setting up");
  const before = running("app");
  if (before) {
    if (before.sources === sourcesHash() && (await isServed(before.port))) {
      console.log("  It runs already, made of these very sources.");
      return tell(readLocal("env.json"), before.demo);
    }
    await step(
      "The register of an earlier start",
      () => end("app"),
      () => "ended",
    );
  }
  const { env, port, demo } = await prepare("demo");
  const sources = sourcesHash();
  await step("Build", () => ensureBuild());
  const started = () => tell(env, demo);
  process.exitCode = await serve({
    name: "app",
    command: "start",
    port,
    env,
    facts: { sources, demo },
    started,
  });
}

await main().catch(giveUp);
