import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { CriteriaRow, ProjectFacts } from "@/lib/contracts/projects";
import { assertMay, type Context, inProject } from "../context";
import { NotFound } from "../errors";
import { isoMoment } from "../iso-moment";

const criteriaColumns = sql`c.number, c.sliding_factor as "slidingFactor",
  c.overturning_factor as "overturningFactor", c.uplift_factor as "upliftFactor",
  c.interface_angle_deg as "interfaceAngle_deg", c.adhesion_kpa as "adhesion_kPa",
  c.permanent_within_middle_third as "permanentWithinMiddleThird",
  c.transient_min_contact_ratio as "transientMinContactRatio",
  c.accidental_min_contact_ratio as "accidentalMinContactRatio", c.nearest_hole_limit_m as "nearestHoleLimit_m",
  c.reason, p.name as "setBy", ${isoMoment(sql`c.set_at`)} as "setAt"`;

/** The project's grid, datum, units, criteria in force and the reader's roles. */
export async function projectFacts(context: Context): Promise<ProjectFacts> {
  assertMay(context, "project:read");
  return inProject(context, (tx) => readFacts(tx, context));
}

/** The same, inside a transaction of the project. */
export async function readFacts(tx: Transaction, context: Context): Promise<ProjectFacts> {
  const { rows } = await tx.execute<Omit<ProjectFacts, "roles" | "criteria">>(sql`
    select id, number, title, client, grid_name as "gridName", epsg_code as "epsgCode",
      grid_origin_easting_m as "gridOriginEasting_m", grid_origin_northing_m as "gridOriginNorthing_m",
      grid_rotation_deg as "gridRotation_deg", grid_scale as "gridScale", datum_name as "datumName",
      structural_zero_m as "structuralZero_m", unit_system as "unitSystem", reporting_standard as "reportingStandard",
      current_criteria as "currentCriteria", revision
    from project where id = ${context.projectId}`);
  const criteria = await tx.execute<CriteriaRow>(sql`
    select ${criteriaColumns} from criteria c join project j on j.id = c.project_id and j.current_criteria = c.number
    join person p on p.id = c.set_by where c.project_id = ${context.projectId}`);
  if (!rows[0] || !criteria.rows[0]) throw new NotFound("There is no such project among yours.");
  return { ...rows[0], roles: [...context.roles], criteria: criteria.rows[0] };
}

/** Every set of criteria that the project has had, the one in force first. */
export async function listCriteria(context: Context): Promise<{ criteria: CriteriaRow[] }> {
  assertMay(context, "project:read");
  return inProject(context, async (tx) => {
    const { rows } = await tx.execute<CriteriaRow>(sql`
      select ${criteriaColumns} from criteria c join person p on p.id = c.set_by
      where c.project_id = ${context.projectId} order by c.number desc`);
    return { criteria: rows };
  });
}
