import { sql } from "drizzle-orm";
import type { StratumRow } from "@/lib/contracts/ground";
import { assertMay, type Context, inProject } from "../context";

/** Every stratum of the current logs with its assignment: what units are assigned from. */
export async function listStrata(context: Context): Promise<{ strata: StratumRow[] }> {
  assertMay(context, "project:read");
  return inProject(context, async (tx) => {
    const found = await tx.execute<StratumRow>(sql`
      select s.id, h.id as "holeId", h.name as hole, s.top_m as "top_m", s.base_m as "base_m", s.description,
        s.legend_code as "legendCode", s.geology_code as "geologyCode", s.soil, s.made_ground as "madeGround",
        u.id as "groundUnitId", u.code as "groundUnit"
      from hole h
      join stratum s on s.project_id = h.project_id and s.hole_revision_id = h.current_revision_id
      left join stratum_assignment a on a.project_id = s.project_id and a.stratum_id = s.id
      left join ground_unit u on u.project_id = a.project_id and u.id = a.ground_unit_id
      where h.project_id = ${context.projectId} order by h.name, s.ordinal`);
    return { strata: found.rows };
  });
}
