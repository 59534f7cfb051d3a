import { sql } from "drizzle-orm";
import type { UnitRow } from "@/lib/contracts/ground";
import { assertMay, type Context, inProject } from "../context";

/** The project's ground units from the surface down, with how many strata of current logs belong to each. */
export async function listUnits(context: Context): Promise<{ units: UnitRow[] }> {
  assertMay(context, "project:read");
  return inProject(context, async (tx) => {
    const found = await tx.execute<UnitRow>(sql`
      select u.id, u.revision, u.code, u.name, u.description, u.soil, u.position, coalesce(n.strata, 0)::int as strata
      from ground_unit u
      left join (
        select a.ground_unit_id, count(*) as strata
        from hole h
        join stratum s on s.project_id = h.project_id and s.hole_revision_id = h.current_revision_id
        join stratum_assignment a on a.project_id = s.project_id and a.stratum_id = s.id
        where h.project_id = ${context.projectId} group by a.ground_unit_id
      ) n on n.ground_unit_id = u.id
      where u.project_id = ${context.projectId} order by u.position, u.code`);
    return { units: found.rows };
  });
}
