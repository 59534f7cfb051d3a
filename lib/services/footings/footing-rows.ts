import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { FootingItem } from "@/lib/contracts/footings";
import type { FootingId } from "@/lib/contracts/ids";
import type { Context } from "../context";

/** What filters and orders stand on, but for the standing: `f` with its size, its value and its last check. */
export const footingsAlone = sql`
  footing f
  join footing_revision g on g.project_id = f.project_id and g.id = f.current_revision_id
  left join bearing_value v on v.project_id = f.project_id and v.id = f.value_id
  left join footing_check k on k.project_id = f.project_id and k.id = f.latest_check_id`;

/** The same with the standing `s` of the last check. */
export const footingSources = sql`${footingsAlone}
  left join check_standing s on s.project_id = f.project_id and s.check_id = f.latest_check_id`;

/** Footings as lists show them, in the order of the ids given; those of other projects are left out. */
export async function selectFootings(
  tx: Transaction,
  context: Context,
  ids: readonly FootingId[],
): Promise<FootingItem[]> {
  if (ids.length === 0) return [];
  const { rows } = await tx.execute<FootingItem>(sql`
    select f.id, f.revision, f.mark, f.grid_reference as "gridReference",
      case when o.id is not null then json_build_object('id', o.id, 'name', o.name) end as owner, f.stage,
      g.easting_m, g.northing_m, g.orientation_deg, g.breadth_m, g.length_m, g.thickness_m,
      g.ground_level_m as "groundLevel_m", g.founding_level_m as "foundingLevel_m",
      coalesce(jsonb_array_length(l.combinations), 0) as combinations,
      case when v.id is not null then json_build_object('id', v.id, 'reference', v.reference,
        'zone', json_build_object('id', z.id, 'name', z.name),
        'groundUnit', json_build_object('id', u.id, 'code', u.code, 'name', u.name),
        'current', case when r.id is not null then json_build_object('id', r.id, 'code', r.code,
          'netAllowable_kPa', r.net_allowable_kpa, 'basis', r.basis, 'purpose', r.purpose) end) end as value,
      case when k.id is not null then json_build_object('id', k.id, 'verdict', k.verdict,
        'utilisation', k.utilisation, 'requiredNet_kPa', k.required_net_kpa, 'standing', s.standing,
        'reasons', s.reasons, 'currentNumber', coalesce(r.number, b.number), 'code', b.code,
        'netAllowable_kPa', k.net_allowable_kpa) end as "check"
    from ${footingSources}
    left join load_set l on l.project_id = f.project_id and l.id = f.current_load_set_id
    left join zone z on z.project_id = v.project_id and z.id = v.zone_id
    left join ground_unit u on u.project_id = v.project_id and u.id = v.ground_unit_id
    left join bearing_value_revision r on r.project_id = v.project_id and r.id = v.current_revision_id
    left join bearing_value_revision b on b.project_id = k.project_id and b.id = k.value_revision_id
    left join person o on o.id = f.owner_id
    where f.project_id = ${context.projectId} and f.id = any(${sql.param([...ids])}::uuid[])`);
  const byId = new Map(rows.map((row) => [row.id, row]));
  return ids.flatMap((id) => byId.get(id) ?? []);
}
