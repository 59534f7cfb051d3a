import { oneAtATime } from "./local/lock.mjs";
import { end } from "./local/processes.mjs";
import { giveUp } from "./local/say.mjs";
import { endServices, serviceNames } from "./local/services.mjs";

/* npm stop: ends what this checkout has started, and nothing else. Data stay. */
async function main() {
  const ended = [];
  for (const name of ["app", "app-dev", "app-test"]) if (await end(name)) ended.push(name);
  ended.push(...(await oneAtATime("services", () => endServices(serviceNames))));
  console.log(ended.length > 0 ? `Ended: ${ended.join(", ")}.` : "Nothing of this checkout was running.");
}

await main().catch(giveUp);
