import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { FootingId, FootingRevisionId } from "@/lib/contracts/ids";
import type { Context } from "../context";
import type { Geometry, Registered } from "./import-plan";

type Row = {
  id: FootingId;
  mark: string;
  revisionId: FootingRevisionId;
  number: number;
  hasCheck: boolean;
} & Geometry;

/** Two statements: every footing as registered, and the names of zones and ground units that a file may speak of. */
export async function gatherRegister(
  tx: Transaction,
  context: Context,
): Promise<{ footings: Registered[]; zones: string[]; groundUnits: string[] }> {
  const { rows } = await tx.execute<Row>(sql`
    select f.id, f.mark, f.current_revision_id as "revisionId", g.number, f.latest_check_id is not null as "hasCheck",
      g.easting_m, g.northing_m, g.orientation_deg, g.breadth_m, g.length_m, g.thickness_m,
      g.ground_level_m as "groundLevel_m", g.founding_level_m as "foundingLevel_m", g.load_height_m as "loadHeight_m",
      g.concrete_unit_weight_knm3 as "concreteUnitWeight_kNm3", g.backfill_unit_weight_knm3 as "backfillUnitWeight_kNm3"
    from footing f join footing_revision g on g.project_id = f.project_id and g.id = f.current_revision_id
    where f.project_id = ${context.projectId} order by f.mark collate natural_order`);
  const names = await tx.execute<{ zones: string[]; groundUnits: string[] }>(sql`
    select array(select name from zone where project_id = ${context.projectId}) as zones,
      array(select code from ground_unit where project_id = ${context.projectId}
        union select name from ground_unit where project_id = ${context.projectId}) as "groundUnits"`);
  const footings = rows.map(({ id, mark, revisionId, number, hasCheck, ...geometry }) => ({
    id,
    mark,
    revisionId,
    number,
    hasCheck,
    geometry,
  }));
  return { footings, zones: names.rows[0]?.zones ?? [], groundUnits: names.rows[0]?.groundUnits ?? [] };
}

/**
 * Lets one import or preview of a project's register go at a time, and holds its footings still until commit, so that
 * what was shown is what is written.
 */
export async function holdRegister(tx: Transaction, context: Context): Promise<void> {
  await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${`import ${context.projectId}`}, 0))`);
  await tx.execute(sql`
    select count(*) from (select id from footing where project_id = ${context.projectId} order by id for no key update) held`);
}
