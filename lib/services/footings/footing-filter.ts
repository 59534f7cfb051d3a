import { type SQL, sql } from "drizzle-orm";
import type { z } from "zod";
import type { selectFootingsInput } from "@/lib/contracts/footings";

/** The condition that a filter puts on the names of `footingSources`. */
export function filterFootings(filter: z.output<typeof selectFootingsInput>): SQL {
  const conditions: SQL[] = [sql`true`];
  if (filter.zoneId) conditions.push(sql`v.zone_id = ${filter.zoneId}`);
  if (filter.groundUnitId) conditions.push(sql`v.ground_unit_id = ${filter.groundUnitId}`);
  if (filter.valueId) conditions.push(sql`f.value_id = ${filter.valueId}`);
  if (filter.linked)
    conditions.push(filter.linked === "yes" ? sql`f.value_id is not null` : sql`f.value_id is null`);
  if (filter.standing === "unchecked") conditions.push(sql`f.latest_check_id is null`);
  else if (filter.standing) conditions.push(sql`s.standing = ${filter.standing}`);
  if (filter.verdict) conditions.push(sql`k.verdict = ${filter.verdict}`);
  if (filter.stage) conditions.push(sql`f.stage = ${filter.stage}`);
  if (filter.ownerId) conditions.push(sql`f.owner_id = ${filter.ownerId}`);
  if (filter.utilisationFrom !== undefined) conditions.push(sql`k.utilisation >= ${filter.utilisationFrom}`);
  if (filter.utilisationTo !== undefined) conditions.push(sql`k.utilisation <= ${filter.utilisationTo}`);
  const words = filter.search?.trim().toLowerCase();
  if (words) conditions.push(sql`strpos(lower(f.mark || ' ' || f.grid_reference), ${words}) > 0`);
  return sql.join(conditions, sql` and `);
}
