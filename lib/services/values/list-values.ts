import { sql } from "drizzle-orm";
import {
  type ListValuesInput,
  listValuesInput,
  type ValueItem,
  type ValueList,
} from "@/lib/contracts/values";
import { assertMay, type Context, inProject } from "../context";
import { parse } from "../parse";

/** The most values shown at once; a site has tens. The total says when there are more. */
const LIMIT = 500;

/** The project's values by reference, each with what is in force and how many footings rest on it, poured or not. */
export async function listValues(context: Context, given: ListValuesInput): Promise<ValueList> {
  assertMay(context, "project:read");
  const { zoneId, groundUnitId, state, search } = parse(listValuesInput, given);
  const conditions = [
    zoneId && sql`zone_id = ${zoneId}`,
    groundUnitId && sql`ground_unit_id = ${groundUnitId}`,
    state && sql`state = ${state}`,
    search?.trim() &&
      sql`strpos(lower(concat_ws(' ', reference, zone->>'name', "groundUnit"->>'code', "groundUnit"->>'name')),
        ${search.trim().toLowerCase()}) > 0`,
  ].filter((condition) => condition !== undefined && condition !== "");
  const where =
    conditions.length === 0 ? sql`true` : sql.join(conditions as ReturnType<typeof sql>[], sql` and `);

  return inProject(context, async (tx) => {
    const rows = await tx.execute<ValueItem & { total: number }>(sql`
      with listed as (
        select v.id, v.reference, v.zone_id, v.ground_unit_id,
          json_build_object('id', z.id, 'name', z.name) as zone,
          json_build_object('id', u.id, 'code', u.code, 'name', u.name, 'soil', u.soil) as "groundUnit",
          d.value_id is not null as "hasDraft",
          case when v.current_revision_id is not null then 'issued'
            when newest.state is not null then newest.state
            when d.value_id is not null then 'draft' else 'empty' end as state,
          case when c.id is not null then json_build_object('code', c.code, 'netAllowable_kPa', c.net_allowable_kpa,
            'basis', c.basis, 'purpose', c.purpose, 'issuedAt', i.issued_at, 'confirmBy', c.confirm_by,
            'confirmWho', c.confirm_who) end as current,
          json_build_object('notPoured', coalesce(n.not_poured, 0), 'poured', coalesce(n.poured, 0),
            'onEarlierRevision', coalesce(n.earlier, 0)) as footings
        from bearing_value v
        join zone z on z.project_id = v.project_id and z.id = v.zone_id
        join ground_unit u on u.project_id = v.project_id and u.id = v.ground_unit_id
        left join bearing_value_draft d on d.project_id = v.project_id and d.value_id = v.id
        left join bearing_value_revision c on c.project_id = v.project_id and c.id = v.current_revision_id
        left join revision_issue i on i.project_id = v.project_id and i.value_revision_id = v.current_revision_id
        left join lateral (select s.state from bearing_value_revision_state s
          where s.project_id = v.project_id and s.value_id = v.id order by s.number desc limit 1) newest on true
        left join (
          select f.value_id, count(*) filter (where f.stage <> 'poured') as not_poured,
            count(*) filter (where f.stage = 'poured') as poured,
            count(*) filter (where k.value_revision_id is distinct from w.current_revision_id and k.id is not null) as earlier
          from footing f
          join bearing_value w on w.project_id = f.project_id and w.id = f.value_id
          left join footing_check k on k.project_id = f.project_id and k.id = f.latest_check_id
          where f.project_id = ${context.projectId}
          group by f.value_id) n on n.value_id = v.id
        where v.project_id = ${context.projectId})
      select id, reference, zone, "groundUnit", state, "hasDraft", current, footings, (count(*) over ())::int as total
      from listed where ${where}
      order by regexp_replace(reference, '\\d+', '', 'g'),
        coalesce(nullif(left(regexp_replace(reference, '\\D', '', 'g'), 12), ''), '0')::bigint, reference
      limit ${LIMIT}`);
    const items = rows.rows.map(({ total: _, ...item }) => item);
    return { items, total: rows.rows[0]?.total ?? 0 };
  });
}
