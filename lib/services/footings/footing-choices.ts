import { sql } from "drizzle-orm";
import type { FootingChoices } from "@/lib/contracts/footings";
import { assertMay, type Context, inProject } from "../context";

/** What footings can be narrowed to, owned by and linked to: one statement. */
export async function footingChoices(context: Context): Promise<FootingChoices> {
  assertMay(context, "project:read");
  return inProject(context, async (tx) => {
    const { rows } = await tx.execute<FootingChoices>(sql`
      select
        coalesce((select json_agg(json_build_object('id', z.id, 'name', z.name) order by z.name)
          from zone z where z.project_id = ${context.projectId}), '[]'::json) as zones,
        coalesce((select json_agg(json_build_object('id', u.id, 'code', u.code, 'name', u.name) order by u.position, u.code)
          from ground_unit u where u.project_id = ${context.projectId}), '[]'::json) as "groundUnits",
        coalesce((select json_agg(json_build_object('id', p.id, 'name', p.name) order by p.name)
          from person p where p.id in (select m.person_id from membership m
            where m.project_id = ${context.projectId} and m.role = 'structural')), '[]'::json) as owners,
        coalesce((select json_agg(json_build_object('id', v.id, 'reference', v.reference,
            'label', v.reference || ', ' || z.name || ', unit ' || u.code || ' ' || u.name || coalesce(', ' || r.code, ''))
            order by v.reference)
          from bearing_value v
          join zone z on z.project_id = v.project_id and z.id = v.zone_id
          join ground_unit u on u.project_id = v.project_id and u.id = v.ground_unit_id
          left join bearing_value_revision r on r.project_id = v.project_id and r.id = v.current_revision_id
          where v.project_id = ${context.projectId}), '[]'::json) as values`);
    const [choices] = rows;
    if (!choices) throw new Error("A list of choices without a row.");
    return choices;
  });
}
