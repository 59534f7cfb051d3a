import { sql } from "drizzle-orm";
import type { ZoneRow } from "@/lib/contracts/zones";
import { assertMay, type Context, inProject } from "../context";

/** Every zone with its boundary, the units it speaks for and the values that the register holds in it. */
export async function listZones(context: Context): Promise<{ zones: ZoneRow[] }> {
  assertMay(context, "project:read");
  return inProject(context, async (tx) => {
    const found = await tx.execute<ZoneRow>(sql`
      select z.id, z.revision, z.name, r.id as "revisionId", r.number, r.ring_m as "ring_m", r.boundary,
        coalesce((select json_agg(g.ground_unit_id) from zone_ground_unit g
          where g.project_id = z.project_id and g.zone_id = z.id), '[]') as "groundUnitIds",
        coalesce((select json_agg(json_build_object('id', v.id, 'reference', v.reference, 'groundUnit', u.code,
            'code', b.code, 'netAllowable_kPa', b.net_allowable_kpa) order by u.position, u.code)
          from bearing_value v
          join ground_unit u on u.project_id = v.project_id and u.id = v.ground_unit_id
          left join bearing_value_revision b on b.project_id = v.project_id and b.id = v.current_revision_id
          where v.project_id = z.project_id and v.zone_id = z.id), '[]') as values
      from zone z
      join zone_revision r on r.project_id = z.project_id and r.id = z.current_revision_id
      where z.project_id = ${context.projectId} order by z.name`);
    return { zones: found.rows };
  });
}
