import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { HoleId, HoleRevisionId } from "@/lib/contracts/ids";
import type { Context } from "../context";

/** One revision of one log with all that hangs on it, ready to be kept. Ids are made by the caller. */
export type Log = {
  holeId: HoleId;
  revisionId: HoleRevisionId;
  number: number;
  /** Set when the hole itself is new. */
  newName: string | null;
  row: {
    kind: string;
    status: string;
    easting_m: number | null;
    northing_m: number | null;
    given_easting_m: number | null;
    given_northing_m: number | null;
    given_grid: string;
    ground_level_m: number | null;
    given_datum: string;
    final_depth_m: number | null;
    started_on: string;
    ended_on: string;
    termination: string;
    remarks: string;
    logged_by: string;
    data_issue_id: string | null;
    source_line: number | null;
    source_revision_id: string | null;
    source_page: number | null;
    reason: string;
  };
  strata: {
    id: string;
    top_m: number;
    base_m: number | null;
    description: string;
    legend_code: string;
    geology_code: string;
    soil: string;
    made_ground: boolean;
    source_line: number | null;
    ground_unit_id: string | null;
  }[];
  spts: {
    depth_m: number;
    kind: string;
    blow_count: number | null;
    refusal: boolean;
    main_blows: number | null;
    main_penetration_mm: number | null;
    seating_blows: number | null;
    increments: unknown;
    energy_ratio_percent: number | null;
    report_text: string;
    water_text: string;
    casing_m: number | null;
    source_line: number | null;
  }[];
  strikes: {
    depth_m: number;
    at: string;
    casing_m: number | null;
    sealed_m: number | null;
    rises: unknown;
    remarks: string;
    source_line: number | null;
  }[];
};

/** Keeps any number of logs in seven statements: holes, revisions, strata, assignments, tests, water, pointers. */
export async function keepLogs(tx: Transaction, context: Context, logs: Log[]): Promise<void> {
  const { projectId } = context;
  const fresh = logs.filter((log) => log.newName !== null);
  if (fresh.length > 0)
    await tx.execute(sql`
      insert into hole (project_id, id, name)
      select ${projectId}::uuid, x.id, x.name
      from unnest(${sql.param(fresh.map((log) => log.holeId))}::uuid[], ${sql.param(fresh.map((log) => log.newName))}::text[])
        as x(id, name)`);
  await tx.execute(sql`
    insert into hole_revision (project_id, id, hole_id, number, kind, status, easting_m, northing_m, given_easting_m,
      given_northing_m, given_grid, ground_level_m, given_datum, final_depth_m, started_on, ended_on, termination,
      remarks, logged_by, data_issue_id, source_line, source_revision_id, source_page, reason, recorded_by)
    select ${projectId}::uuid, id, hole_id, number, kind, status, easting_m, northing_m, given_easting_m,
      given_northing_m, given_grid, ground_level_m, given_datum, final_depth_m, started_on, ended_on, termination,
      remarks, logged_by, data_issue_id, source_line, source_revision_id, source_page, reason, ${context.person.id}::uuid
    from jsonb_to_recordset(${rows(logs.map((log) => ({ id: log.revisionId, hole_id: log.holeId, number: log.number, ...log.row })))}::jsonb)
      as x(id uuid, hole_id uuid, number int, kind text, status text, easting_m float8, northing_m float8,
        given_easting_m float8, given_northing_m float8, given_grid text, ground_level_m float8, given_datum text,
        final_depth_m float8, started_on text, ended_on text, termination text, remarks text, logged_by text,
        data_issue_id uuid, source_line int, source_revision_id uuid, source_page int, reason text)`);
  const strata = logs.flatMap((log) =>
    log.strata.map((row, ordinal) => ({ hole_revision_id: log.revisionId, ordinal: ordinal + 1, ...row })),
  );
  if (strata.length > 0)
    await tx.execute(sql`
      insert into stratum (project_id, id, hole_revision_id, ordinal, top_m, base_m, description, legend_code,
        geology_code, soil, made_ground, source_line)
      select ${projectId}::uuid, id, hole_revision_id, ordinal, top_m, base_m, description, legend_code, geology_code,
        soil, made_ground, source_line
      from jsonb_to_recordset(${rows(strata)}::jsonb) as x(id uuid, hole_revision_id uuid, ordinal int, top_m float8,
        base_m float8, description text, legend_code text, geology_code text, soil text, made_ground boolean,
        source_line int)`);
  const assigned = strata.filter((row) => row.ground_unit_id !== null);
  if (assigned.length > 0)
    await tx.execute(sql`
      insert into stratum_assignment (project_id, stratum_id, ground_unit_id, assigned_by)
      select ${projectId}::uuid, x.stratum, x.unit, ${context.person.id}::uuid
      from unnest(${sql.param(assigned.map((row) => row.id))}::uuid[],
        ${sql.param(assigned.map((row) => row.ground_unit_id))}::uuid[]) as x(stratum, unit)`);
  const spts = logs.flatMap((log) =>
    log.spts.map((row, ordinal) => ({ hole_revision_id: log.revisionId, ordinal: ordinal + 1, ...row })),
  );
  if (spts.length > 0)
    await tx.execute(sql`
      insert into spt (project_id, hole_revision_id, ordinal, depth_m, kind, blow_count, refusal, main_blows,
        main_penetration_mm, seating_blows, increments, energy_ratio_percent, report_text, water_text, casing_m, source_line)
      select ${projectId}::uuid, hole_revision_id, ordinal, depth_m, kind, blow_count, refusal, main_blows,
        main_penetration_mm, seating_blows, increments, energy_ratio_percent, report_text, water_text, casing_m, source_line
      from jsonb_to_recordset(${rows(spts)}::jsonb) as x(hole_revision_id uuid, ordinal int, depth_m float8, kind text,
        blow_count int, refusal boolean, main_blows int, main_penetration_mm float8, seating_blows int,
        increments jsonb, energy_ratio_percent float8, report_text text, water_text text, casing_m float8, source_line int)`);
  const strikes = logs.flatMap((log) =>
    log.strikes.map((row, ordinal) => ({ hole_revision_id: log.revisionId, ordinal: ordinal + 1, ...row })),
  );
  if (strikes.length > 0)
    await tx.execute(sql`
      insert into water_strike (project_id, hole_revision_id, ordinal, depth_m, at, casing_m, sealed_m, rises, remarks, source_line)
      select ${projectId}::uuid, hole_revision_id, ordinal, depth_m, at, casing_m, sealed_m, rises, remarks, source_line
      from jsonb_to_recordset(${rows(strikes)}::jsonb) as x(hole_revision_id uuid, ordinal int, depth_m float8, at text,
        casing_m float8, sealed_m float8, rises jsonb, remarks text, source_line int)`);
  await tx.execute(sql`
    update hole set current_revision_id = x.revision_id,
      revision = hole.revision + case when hole.current_revision_id is null then 0 else 1 end
    from unnest(${sql.param(logs.map((log) => log.holeId))}::uuid[],
      ${sql.param(logs.map((log) => log.revisionId))}::uuid[]) as x(hole_id, revision_id)
    where hole.project_id = ${projectId} and hole.id = x.hole_id`);
}

const rows = (list: unknown[]) => sql.param(JSON.stringify(list));
