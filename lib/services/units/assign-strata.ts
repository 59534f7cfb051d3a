import { sql } from "drizzle-orm";
import { assignStrataInput } from "@/lib/contracts/ground";
import { audit } from "../audit";
import { assertMay, type Context, inProject } from "../context";
import { NotFound } from "../errors";
import { parse } from "../parse";

/** Assigns strata of current logs to a ground unit, one by one or by what they match; null takes an assignment away. */
export async function assignStrata(context: Context, given: unknown): Promise<{ assigned: number }> {
  assertMay(context, "unit:write");
  const { groundUnitId, stratumIds, matching } = parse(assignStrataInput, given);
  const { projectId } = context;
  return inProject(context, async (tx) => {
    if (groundUnitId !== null) {
      const unit = await tx.execute(
        sql`select 1 from ground_unit where project_id = ${projectId} and id = ${groundUnitId}`,
      );
      if (unit.rowCount === 0) throw new NotFound("There is no such ground unit in this project.");
    }
    const wanted = stratumIds
      ? sql`s.id = any(${sql.param(stratumIds)}::uuid[])`
      : sql`(${matching?.description ?? ""} = '' or position(lower(${matching?.description ?? ""}) in lower(s.description)) > 0)
        and (${matching?.geologyCode ?? ""} = '' or s.geology_code = ${matching?.geologyCode ?? ""})
        and (${matching?.legendCode ?? ""} = '' or s.legend_code = ${matching?.legendCode ?? ""})
        and (not ${matching?.onlyUnassigned ?? true}::boolean or not exists (select from stratum_assignment a
          where a.project_id = s.project_id and a.stratum_id = s.id))`;
    const strata = sql`select s.id from hole h
      join stratum s on s.project_id = h.project_id and s.hole_revision_id = h.current_revision_id
      where h.project_id = ${projectId} and ${wanted}`;
    const done =
      groundUnitId === null
        ? await tx.execute(
            sql`delete from stratum_assignment where project_id = ${projectId} and stratum_id in (${strata})`,
          )
        : await tx.execute(sql`
            insert into stratum_assignment (project_id, stratum_id, ground_unit_id, assigned_by)
            select ${projectId}::uuid, w.id, ${groundUnitId}::uuid, ${context.person.id}::uuid from (${strata}) w
            on conflict (project_id, stratum_id)
            do update set ground_unit_id = excluded.ground_unit_id, assigned_by = excluded.assigned_by, assigned_at = now()`);
    const assigned = done.rowCount ?? 0;
    if (stratumIds && assigned === 0)
      throw new NotFound("None of these strata belongs to a current log of this project.");
    await audit(tx, context, {
      verb: "unit:assign",
      subject: groundUnitId === null ? "unit/none" : `unit/${groundUnitId}`,
      detail: { assigned, ...(stratumIds ? { stratumIds: stratumIds.slice(0, 200) } : { matching }) },
    });
    return { assigned };
  });
}
