/**
 * Computes every stored check of every project again from its snapshot and compares digit for digit. Ends with 1 when a
 * check made with this engine comes out otherwise; what an engine change has altered is reported and left as it is.
 */
import "./local/environment";
import { closeClient } from "@/db/client";
import { ENGINE_VERSION } from "@/lib/check/version";
import { replayProject } from "@/lib/services/checks/replay-project";
import { inEachProject } from "@/lib/services/record/audit-chain";

const results = await inEachProject(async (tx, project) => ({
  project,
  told: await replayProject(tx, project.id),
}));
await closeClient();
let broken = 0;
for (const { project, told } of results) {
  broken += told.broken;
  console.log(
    `${project.number}: ${told.checks} checks, ${told.broken} differ with engine ${ENGINE_VERSION}, ${told.altered} altered by an engine change`,
  );
  for (const { mark, seq, engineVersion, differences } of told.named) {
    console.log(`    ${mark}, check ${seq}, engine ${engineVersion}:`);
    for (const { at, stored, now } of differences.slice(0, 5))
      console.log(`        ${at}: stored ${JSON.stringify(stored)}, now ${JSON.stringify(now)}`);
    if (differences.length > 5) console.log(`        and ${differences.length - 5} more`);
  }
}
if (results.length === 0) console.log("There is no project yet.");
process.exitCode = broken > 0 ? 1 : 0;
