import { passes, standingChecks } from "./local/checks.mjs";
import { checkNode, ensureModules } from "./local/packages.mjs";
import { giveUp, step } from "./local/say.mjs";
import { conclude, runVitest } from "./local/vitest.mjs";

/* npm run verify: what can be said without a database: format, lint, types, document paths, imports, pure tests. */
async function main() {
  checkNode();
  await step("Node modules", () => ensureModules());
  const counts = { passed: 0, failed: 0, skipped: 0 };
  for (const check of standingChecks) counts[(await passes(check)) ? "passed" : "failed"] += 1;
  const tests = await runVitest(["--project", "pure", "--project", "components", "--passWithNoTests"]);
  for (const kind of Object.keys(counts)) counts[kind] += tests[kind];
  conclude(counts);
}

await main().catch(giveUp);
