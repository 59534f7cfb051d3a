import { sql } from "drizzle-orm";
import type { PlanFooting, PlanHole, PlanPage } from "@/lib/contracts/plan";
import { assertMay, type Context, inProject } from "../context";

/** What the plan draws beside the zones: every placed hole and every footing with its latest verdict and standing. */
export async function readPlan(context: Context): Promise<PlanPage> {
  assertMay(context, "project:read");
  return inProject(context, async (tx) => {
    const holes = await tx.execute<PlanHole>(sql`
      select h.id, h.name, r.kind, r.status, r.easting_m as "easting_m", r.northing_m as "northing_m",
        r.ground_level_m as "groundLevel_m"
      from hole h join hole_revision r on r.project_id = h.project_id and r.id = h.current_revision_id
      where h.project_id = ${context.projectId} and r.easting_m is not null and r.northing_m is not null`);
    const footings = await tx.execute<PlanFooting>(sql`
      select f.id, f.mark, r.easting_m as "easting_m", r.northing_m as "northing_m",
        r.orientation_deg as "orientation_deg", r.breadth_m as "breadth_m", r.length_m as "length_m",
        f.stage, c.verdict, c.utilisation, s.standing, f.value_id is not null as linked
      from footing f
      join footing_revision r on r.project_id = f.project_id and r.id = f.current_revision_id
      left join footing_check c on c.project_id = f.project_id and c.id = f.latest_check_id
      left join check_standing s on s.project_id = f.project_id and s.check_id = f.latest_check_id
      where f.project_id = ${context.projectId}`);
    const project = await tx.execute<{ site_plan: PlanPage["sitePlan"] }>(
      sql`select site_plan from project where id = ${context.projectId}`,
    );
    return { holes: holes.rows, footings: footings.rows, sitePlan: project.rows[0]?.site_plan ?? null };
  });
}
