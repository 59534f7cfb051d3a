import { sql } from "drizzle-orm";
import { client } from "@/db/client";
import type { ProjectRow } from "@/lib/contracts/projects";
import { signedIn, type Visitor } from "../accounts/visitor";
import { enter } from "../context";

/** The projects that the signed-in person is a member of, with the roles held in each. */
export async function myProjects(visitor: Visitor): Promise<{ projects: ProjectRow[] }> {
  const person = signedIn(visitor);
  return client().database.transaction(async (tx) => {
    await enter(tx, "", person.id);
    const { rows } = await tx.execute<ProjectRow>(sql`
      select j.id, j.number, j.title, j.client, array_agg(m.role order by m.role) as roles
      from project j join membership m on m.project_id = j.id and m.person_id = ${person.id}
      group by j.id, j.number, j.title, j.client order by j.number`);
    return { projects: rows };
  });
}
