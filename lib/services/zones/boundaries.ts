import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { GroundUnitId, ZoneId } from "@/lib/contracts/ids";
import { ringsOverlap } from "@/lib/geometry/overlap";
import { readRing } from "@/lib/geometry/ring-check";
import type { Context } from "../context";
import { Invalid } from "../errors";

/** A boundary as it may be kept: simple, with an area, anticlockwise. Refused with what is wrong and where. */
export function boundaryOf(points: [number, number][]): [number, number][] {
  const read = readRing(points);
  if ("problem" in read) throw new Invalid(read.problem, { ring_m: read.problem });
  return read.ring.map(([easting_m, northing_m]) => [easting_m, northing_m]);
}

/**
 * Refuses a boundary that overlaps another zone's where both speak for the same ground unit. Locks the project's zones
 * against each other, so that two drawn at once cannot both pass.
 */
export async function refuseOverlap(
  tx: Transaction,
  context: Context,
  drawn: { zoneId: ZoneId | null; ring: [number, number][]; groundUnitIds: GroundUnitId[] },
): Promise<void> {
  await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${`zones ${context.projectId}`}, 0))`);
  const others = await tx.execute<{ name: string; ring: [number, number][]; units: string[] }>(sql`
    select z.name, r.ring_m as ring, array_agg(u.code order by u.position, u.code) as units
    from zone z
    join zone_revision r on r.project_id = z.project_id and r.id = z.current_revision_id
    join zone_ground_unit g on g.project_id = z.project_id and g.zone_id = z.id
    join ground_unit u on u.project_id = g.project_id and u.id = g.ground_unit_id
    where z.project_id = ${context.projectId} and z.id is distinct from ${drawn.zoneId}::uuid
      and g.ground_unit_id = any(${sql.param(drawn.groundUnitIds)}::uuid[])
    group by z.name, r.ring_m order by z.name`);
  const hit = others.rows.find((other) => ringsOverlap(drawn.ring, other.ring));
  if (!hit) return;
  const sentence = `The boundary overlaps ${hit.name}, which speaks for the same ground unit (${hit.units.join(", ")}). One place can have one value only.`;
  throw new Invalid(sentence, { ring_m: sentence });
}
