import { sql } from "drizzle-orm";
import type { DraftChoices, NewValueChoices } from "@/lib/contracts/values";
import { assertMay, type Context, inProject } from "../context";

/** The zones with those of their ground units that have no value yet: what a new value can be for. */
export async function newValueChoices(context: Context): Promise<NewValueChoices> {
  assertMay(context, "project:read");
  return inProject(context, async (tx) => {
    const { rows } = await tx.execute<NewValueChoices["places"][number]>(sql`
      select z.id as "zoneId", z.name as zone, u.id as "groundUnitId", u.code || ' ' || u.name as "groundUnit"
      from zone_ground_unit c
      join zone z on z.project_id = c.project_id and z.id = c.zone_id
      join ground_unit u on u.project_id = c.project_id and u.id = c.ground_unit_id
      where c.project_id = ${context.projectId} and not exists (select from bearing_value v
        where v.project_id = c.project_id and v.zone_id = c.zone_id and v.ground_unit_id = c.ground_unit_id)
      order by z.name, u.position, u.code limit 1000`);
    return { places: rows };
  });
}

/** What a draft can cite: the current revision of every document, and the names of the holes. */
export async function draftChoices(context: Context): Promise<DraftChoices> {
  assertMay(context, "project:read");
  return inProject(context, async (tx) => {
    const documents = await tx.execute<DraftChoices["documents"][number]>(sql`
      select r.id as "documentRevisionId", d.reference, d.title, r.code, r.pages
      from document d
      join document_revision r on r.project_id = d.project_id and r.id = d.current_revision_id
      where d.project_id = ${context.projectId} order by d.reference limit 2000`);
    return { documents: documents.rows };
  });
}
