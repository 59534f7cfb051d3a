import { sql } from "drizzle-orm";
import { client } from "@/db/client";
import type { Role } from "@/lib/access/policy";
import type { PersonId, ProjectId } from "@/lib/contracts/ids";

/** The roles that a person holds in a project now; empty for a stranger. Read at every request. */
export async function rolesInProject(personId: PersonId, projectId: ProjectId): Promise<Role[]> {
  return client().database.transaction(async (tx) => {
    await tx.execute(sql`select set_config('app.person_id', ${personId}, true)`);
    const rows = await tx.execute<{ role: Role }>(
      sql`select role from membership where project_id = ${projectId} and person_id = ${personId} order by role`,
    );
    return rows.rows.map((row) => row.role);
  });
}
