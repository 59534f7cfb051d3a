import { serve } from "./local/app.mjs";
import { checkNode } from "./local/packages.mjs";
import { prepare, tell } from "./local/prepare.mjs";
import { end, running } from "./local/processes.mjs";
import { giveUp, step } from "./local/say.mjs";

/* npm run dev: the same services and demonstration project as npm start, served with reload. */
async function main() {
  checkNode();
  console.log("Holdground: setting up for development");
  if (running("app-dev"))
    await step(
      "The server of an earlier run",
      () => end("app-dev"),
      () => "ended",
    );
  const { env, port, demo } = await prepare("dev");
  process.exitCode = await serve({
    name: "app-dev",
    command: "dev",
    port,
    env,
    started: () => tell(env, demo),
  });
}

await main().catch(giveUp);
