/** Asks the database for everything that must hold in every project; prints what does not. Ends with 1 when something is broken. */
import "./local/environment";
import { closeClient } from "@/db/client";
import { inEachProject } from "@/lib/services/record/audit-chain";
import { brokenIn, INVARIANT_COUNT } from "@/lib/services/record/invariants";

const results = await inEachProject(async (tx, project) => ({
  project,
  broken: await brokenIn(tx, project.id),
}));
await closeClient();
let count = 0;
for (const { project, broken } of results) {
  for (const { id, sentence, what } of broken) {
    count += 1;
    console.log(`${project.number}: ${id} does not hold: ${sentence}`);
    for (const thing of what.slice(0, 20)) console.log(`    ${thing}`);
    if (what.length > 20) console.log(`    and ${what.length - 20} more`);
  }
}
console.log(
  count === 0
    ? `${INVARIANT_COUNT} invariants hold in ${results.length} projects.`
    : `${count} invariants do not hold.`,
);
process.exitCode = count === 0 ? 0 : 1;
