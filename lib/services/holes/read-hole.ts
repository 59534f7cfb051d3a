import { sql } from "drizzle-orm";
import {
  type HolePage,
  readHoleInput,
  type SptRow,
  type StratumRow,
  type StrikeRow,
} from "@/lib/contracts/ground";
import { assertMay, type Context, inProject } from "../context";
import { NotFound } from "../errors";
import { parse } from "../parse";

/** One hole: its current log with strata, tests and water, where it came from, and the history of its revisions. */
export async function readHole(context: Context, given: unknown): Promise<HolePage> {
  assertMay(context, "project:read");
  const { holeId } = parse(readHoleInput, given);
  const here = sql`h.project_id = ${context.projectId} and h.id = ${holeId}`;
  const moment = (column: string) =>
    sql.raw(`to_char(${column} at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS"Z"')`);
  return inProject(context, async (tx) => {
    const [hole] = (
      await tx.execute<
        Omit<
          HolePage,
          "strataRows" | "sptRows" | "strikeRows" | "revisions" | "strata" | "unassigned" | "spts" | "strikes"
        >
      >(sql`
      select h.id, h.revision, h.name, r.id as "revisionId", r.number, r.kind, r.status, r.easting_m as "easting_m",
        r.northing_m as "northing_m", r.ground_level_m as "groundLevel_m", r.final_depth_m as "finalDepth_m",
        r.given_easting_m as "givenEasting_m", r.given_northing_m as "givenNorthing_m", r.given_grid as "givenGrid",
        r.given_datum as "givenDatum", r.started_on as "startedOn", r.ended_on as "endedOn", r.termination,
        r.logged_by as "loggedBy", r.remarks, r.reason, p.name as "recordedBy", ${moment("r.recorded_at")} as "recordedAt",
        case when d.id is null then null else json_build_object('documentId', d.id, 'documentRevisionId', x.id,
          'reference', d.reference, 'code', x.code, 'page', r.source_page) end as source,
        case when i.id is null then null else json_build_object('fileName', i.file_name, 'issueNumber', i.issue_number,
          'dataStatus', i.data_status, 'line', r.source_line) end as "dataIssue"
      from hole h
      join hole_revision r on r.project_id = h.project_id and r.id = h.current_revision_id
      join person p on p.id = r.recorded_by
      left join data_issue i on i.project_id = r.project_id and i.id = r.data_issue_id
      left join document_revision x on x.project_id = r.project_id
        and x.id = coalesce(r.source_revision_id, i.document_revision_id)
      left join document d on d.project_id = x.project_id and d.id = x.document_id
      where ${here}`)
    ).rows;
    if (!hole) throw new NotFound("There is no such hole in this project.");
    const strata = await tx.execute<StratumRow>(sql`
      select s.id, h.id as "holeId", h.name as hole, s.top_m as "top_m", s.base_m as "base_m", s.description,
        s.legend_code as "legendCode", s.geology_code as "geologyCode", s.soil, s.made_ground as "madeGround",
        u.id as "groundUnitId", u.code as "groundUnit"
      from hole h join stratum s on s.project_id = h.project_id and s.hole_revision_id = h.current_revision_id
      left join stratum_assignment a on a.project_id = s.project_id and a.stratum_id = s.id
      left join ground_unit u on u.project_id = a.project_id and u.id = a.ground_unit_id
      where ${here} order by s.ordinal`);
    const spts = await tx.execute<SptRow>(sql`
      select s.depth_m as "depth_m", s.kind, s.blow_count as "blowCount", s.refusal, s.main_blows as "mainBlows",
        s.main_penetration_mm as "mainPenetration_mm", s.report_text as "reportText", s.water_text as "waterText"
      from hole h join spt s on s.project_id = h.project_id and s.hole_revision_id = h.current_revision_id
      where ${here} order by s.depth_m`);
    const strikes = await tx.execute<StrikeRow>(sql`
      select s.depth_m as "depth_m", s.at, s.remarks, s.rises
      from hole h join water_strike s on s.project_id = h.project_id and s.hole_revision_id = h.current_revision_id
      where ${here} order by s.depth_m`);
    const revisions = await tx.execute<HolePage["revisions"][number]>(sql`
      select r.id, r.number, r.reason, p.name as "recordedBy", ${moment("r.recorded_at")} as "recordedAt"
      from hole h join hole_revision r on r.project_id = h.project_id and r.hole_id = h.id
      join person p on p.id = r.recorded_by where ${here} order by r.number desc`);
    return {
      ...hole,
      strata: strata.rows.length,
      unassigned: strata.rows.filter((row) => row.groundUnitId === null).length,
      spts: spts.rows.length,
      strikes: strikes.rows.length,
      strataRows: strata.rows,
      sptRows: spts.rows,
      strikeRows: strikes.rows,
      revisions: revisions.rows,
    };
  });
}
