import { sql } from "drizzle-orm";
import type { HoleRow } from "@/lib/contracts/ground";
import { assertMay, type Context, inProject } from "../context";

/** Every hole with the facts of its current log and counts of what hangs on it, in the order that people count. */
export async function listHoles(context: Context): Promise<{ holes: HoleRow[] }> {
  assertMay(context, "project:read");
  return inProject(context, async (tx) => {
    const found = await tx.execute<HoleRow>(sql`
      with strata as (
        select s.hole_revision_id, count(*)::int as strata, count(*) filter (where a.stratum_id is null)::int as unassigned
        from hole h
        join stratum s on s.project_id = h.project_id and s.hole_revision_id = h.current_revision_id
        left join stratum_assignment a on a.project_id = s.project_id and a.stratum_id = s.id
        where h.project_id = ${context.projectId} group by 1
      ), tests as (
        select hole_revision_id, count(*)::int as spts from spt where project_id = ${context.projectId} group by 1
      ), water as (
        select hole_revision_id, count(*)::int as strikes from water_strike where project_id = ${context.projectId} group by 1
      )
      select h.id, h.revision, h.name, r.id as "revisionId", r.number, r.kind, r.status, r.easting_m as "easting_m",
        r.northing_m as "northing_m", r.ground_level_m as "groundLevel_m", r.final_depth_m as "finalDepth_m",
        coalesce(strata.strata, 0) as strata, coalesce(strata.unassigned, 0) as unassigned,
        coalesce(tests.spts, 0) as spts, coalesce(water.strikes, 0) as strikes
      from hole h
      join hole_revision r on r.project_id = h.project_id and r.id = h.current_revision_id
      left join strata on strata.hole_revision_id = r.id
      left join tests on tests.hole_revision_id = r.id
      left join water on water.hole_revision_id = r.id
      where h.project_id = ${context.projectId}`);
    const order = new Intl.Collator("en", { numeric: true });
    return { holes: found.rows.sort((one, other) => order.compare(one.name, other.name)) };
  });
}
