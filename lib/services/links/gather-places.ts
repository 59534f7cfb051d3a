import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { FootingId } from "@/lib/contracts/ids";
import type { Context } from "../context";
import type { PlacedFooting, ZoneWithValues } from "./suggest";

/** One statement: where the footings are, by mark. */
export async function gatherPlaces(
  tx: Transaction,
  context: Context,
  footingIds: readonly FootingId[],
): Promise<PlacedFooting[]> {
  const { rows } = await tx.execute<PlacedFooting>(sql`
    select f.id, f.mark, f.value_id as "valueId", g.easting_m, g.northing_m, g.orientation_deg, g.breadth_m, g.length_m,
      g.founding_level_m as "foundingLevel_m"
    from footing f join footing_revision g on g.project_id = f.project_id and g.id = f.current_revision_id
    where f.project_id = ${context.projectId} and f.id = any(${sql.param([...footingIds])}::uuid[])
    order by f.mark collate natural_order`);
  return rows;
}

/** One statement: every zone as drawn now, with its values and what is in force of each. */
export async function gatherZones(tx: Transaction, context: Context): Promise<ZoneWithValues[]> {
  const { rows } = await tx.execute<ZoneWithValues>(sql`
    select z.id, z.name, b.ring_m,
      coalesce((select json_agg(json_build_object('id', v.id, 'reference', v.reference, 'groundUnitId', u.id,
          'groundUnit', 'Unit ' || u.code || ', ' || u.name, 'code', r.code,
          'netAllowable_kPa', r.net_allowable_kpa, 'highestFoundingLevel_m', r.highest_founding_level_m,
          'lowestFoundingLevel_m', r.lowest_founding_level_m) order by v.reference)
        from bearing_value v
        join ground_unit u on u.project_id = v.project_id and u.id = v.ground_unit_id
        left join bearing_value_revision r on r.project_id = v.project_id and r.id = v.current_revision_id
        where v.project_id = z.project_id and v.zone_id = z.id), '[]'::json) as values
    from zone z join zone_revision b on b.project_id = z.project_id and b.id = z.current_revision_id
    where z.project_id = ${context.projectId} order by z.name`);
  return rows;
}
