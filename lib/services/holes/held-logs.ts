import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { HoleId, HoleRevisionId } from "@/lib/contracts/ids";
import type { Context } from "../context";
import type { Log } from "./keep-logs";
import { fingerprintOf } from "./logs-from-ground";

export type HeldLog = {
  id: HoleId;
  name: string;
  number: number;
  revisionId: HoleRevisionId;
  easting_m: number | null;
  northing_m: number | null;
  fingerprint: string;
};

/** Every hole that the project holds with the fingerprint of its current log, to compare a file with. One query. */
export async function heldLogs(tx: Transaction, context: Context): Promise<Map<string, HeldLog>> {
  const found = await tx.execute<{
    id: HoleId;
    name: string;
    number: number;
    revision_id: HoleRevisionId;
    row: Log["row"];
    strata: Log["strata"] | null;
    spts: Log["spts"] | null;
    strikes: Log["strikes"] | null;
  }>(sql`
    with s as (
      select hole_revision_id, json_agg(json_build_object('top_m', top_m, 'base_m', base_m, 'description', description,
        'legend_code', legend_code, 'geology_code', geology_code, 'soil', soil, 'made_ground', made_ground)
        order by ordinal) as list from stratum where project_id = ${context.projectId} group by 1
    ), n as (
      select hole_revision_id, json_agg(json_build_object('depth_m', depth_m, 'kind', kind, 'blow_count', blow_count,
        'refusal', refusal, 'main_blows', main_blows, 'main_penetration_mm', main_penetration_mm,
        'seating_blows', seating_blows, 'increments', increments, 'energy_ratio_percent', energy_ratio_percent,
        'report_text', report_text, 'water_text', water_text, 'casing_m', casing_m) order by ordinal) as list
      from spt where project_id = ${context.projectId} group by 1
    ), w as (
      select hole_revision_id, json_agg(json_build_object('depth_m', depth_m, 'at', at, 'casing_m', casing_m,
        'sealed_m', sealed_m, 'rises', rises, 'remarks', remarks) order by ordinal) as list
      from water_strike where project_id = ${context.projectId} group by 1
    )
    select c.hole_id as id, c.name, c.number, h.current_revision_id as revision_id,
      json_build_object('kind', c.kind, 'status', c.status, 'easting_m', c.easting_m, 'northing_m', c.northing_m,
        'given_easting_m', c.given_easting_m, 'given_northing_m', c.given_northing_m, 'given_grid', c.given_grid,
        'ground_level_m', c.ground_level_m, 'given_datum', c.given_datum, 'final_depth_m', c.final_depth_m,
        'started_on', c.started_on, 'ended_on', c.ended_on, 'termination', c.termination, 'remarks', c.remarks,
        'logged_by', c.logged_by) as row,
      s.list as strata, n.list as spts, w.list as strikes
    from hole h
    join lateral (select h.name, r.* from hole_revision r
      where r.project_id = h.project_id and r.id = h.current_revision_id) c on true
    left join s on s.hole_revision_id = h.current_revision_id
    left join n on n.hole_revision_id = h.current_revision_id
    left join w on w.hole_revision_id = h.current_revision_id
    where h.project_id = ${context.projectId}`);
  return new Map(
    found.rows.map((held) => [
      held.name,
      {
        id: held.id,
        name: held.name,
        number: held.number,
        revisionId: held.revision_id,
        easting_m: held.row.easting_m,
        northing_m: held.row.northing_m,
        fingerprint: fingerprintOf({
          row: held.row,
          strata: held.strata ?? [],
          spts: held.spts ?? [],
          strikes: held.strikes ?? [],
        }),
      },
    ]),
  );
}
