/**
 * Recomputes the audit chain of every project and names the first link that does not hold. Ends with 1 when one is
 * broken. The heads it prints are worth keeping outside the database: a trail cut short at its end shows by them alone.
 */
import "./local/environment";
import { closeClient } from "@/db/client";
import { inEachProject, verifyProject } from "@/lib/services/record/audit-chain";

const results = await inEachProject(async (tx, project) => ({
  project,
  ...(await verifyProject(tx, project.id)),
}));
await closeClient();
for (const { project, end, broken } of results)
  console.log(
    broken
      ? `${project.number}: BROKEN: ${broken.what}`
      : `${project.number}: ${end.seq} events, unbroken, head ${end.hash}`,
  );
if (results.length === 0) console.log("There is no project yet.");
process.exitCode = results.some(({ broken }) => broken) ? 1 : 0;
