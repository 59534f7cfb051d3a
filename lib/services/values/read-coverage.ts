import { type SQL, sql } from "drizzle-orm";
import type { Coverage } from "@/lib/contracts/values";
import { pointInRing } from "@/lib/geometry/point-in-ring";
import { assertMay, type Context, inProject } from "../context";

/** How many of a gap's members are named; the total is always exact. */
const NAMED = 100;

/** Where ground and footings do not meet: footings without a value, values without a footing, zones without a hole, units without a value. */
export async function readCoverage(context: Context): Promise<Coverage> {
  assertMay(context, "project:read");
  return inProject(context, async (tx) => {
    const project = context.projectId;
    const gap = async <Item extends { id: string }>(
      query: SQL,
    ): Promise<{ total: number; first: Item[] }> => {
      const rows = await tx.execute<Item & { total: number }>(
        sql`select *, (count(*) over ())::int as total from (${query}) as gap limit ${NAMED}`,
      );
      return {
        total: rows.rows[0]?.total ?? 0,
        first: rows.rows.map(({ total: _, ...item }) => item as unknown as Item),
      };
    };
    const footingsWithoutValue = await gap<Coverage["footingsWithoutValue"]["first"][number]>(sql`
      select f.id, f.mark from footing f
      left join bearing_value v on v.project_id = f.project_id and v.id = f.value_id
      where f.project_id = ${project} and v.current_revision_id is null order by f.mark`);
    const valuesWithoutFooting = await gap<Coverage["valuesWithoutFooting"]["first"][number]>(sql`
      select v.id, v.reference from bearing_value v where v.project_id = ${project}
        and not exists (select from footing f where f.project_id = v.project_id and f.value_id = v.id)
      order by v.reference`);
    const unitsWithoutValue = await gap<Coverage["unitsWithoutValue"]["first"][number]>(sql`
      select u.id, u.code, u.name from ground_unit u where u.project_id = ${project}
        and not exists (select from bearing_value v where v.project_id = u.project_id and v.ground_unit_id = u.id
          and v.current_revision_id is not null)
      order by u.position, u.code`);
    const footingsOnUnconfirmed = await gap<Coverage["footingsOnUnconfirmed"]["first"][number]>(sql`
      select f.id, f.mark from footing f
      join bearing_value v on v.project_id = f.project_id and v.id = f.value_id
      join bearing_value_revision r on r.project_id = v.project_id and r.id = v.current_revision_id
      where f.project_id = ${project} and r.basis <> 'recommended' order by f.mark`);
    const zones = await tx.execute<{
      id: Coverage["zonesWithoutHole"]["first"][number]["id"];
      name: string;
      ring: [number, number][];
    }>(sql`
      select z.id, z.name, r.ring_m as ring from zone z
      join zone_revision r on r.project_id = z.project_id and r.id = z.current_revision_id
      where z.project_id = ${project} order by z.name`);
    const holes = await tx.execute<{ easting_m: number; northing_m: number }>(sql`
      select r.easting_m, r.northing_m from hole h
      join hole_revision r on r.project_id = h.project_id and r.id = h.current_revision_id
      where h.project_id = ${project} and r.easting_m is not null and r.northing_m is not null`);
    const bare = zones.rows.filter(
      ({ ring }) => !holes.rows.some((hole) => pointInRing([hole.easting_m, hole.northing_m], ring)),
    );
    const zonesWithoutHole = {
      total: bare.length,
      first: bare.slice(0, NAMED).map(({ id, name }) => ({ id, name })),
    };
    return {
      footingsWithoutValue,
      valuesWithoutFooting,
      zonesWithoutHole,
      unitsWithoutValue,
      footingsOnUnconfirmed,
    };
  });
}
