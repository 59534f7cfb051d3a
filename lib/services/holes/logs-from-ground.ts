import { randomUUID } from "node:crypto";
import type { HoleId, HoleRevisionId } from "@/lib/contracts/ids";
import type { Ground, GroundHole } from "@/lib/exchange/ags/ground-model";
import { type SiteGrid, toSite } from "@/lib/geometry/site-grid";
import type { Log } from "./keep-logs";

/** What of a log counts as the same: everything that the file says of it, nothing of how it came. */
export function fingerprintOf(log: Pick<Log, "row" | "strata" | "spts" | "strikes">): string {
  const { data_issue_id, source_line, source_revision_id, source_page, reason, ...row } = log.row;
  const bare = <Row extends { source_line: number | null }>({ source_line, ...rest }: Row) => rest;
  return JSON.stringify(
    sorted([
      row,
      log.strata.map(({ id, ground_unit_id, ...rest }) => bare(rest)),
      log.spts.map(bare),
      log.strikes.map(bare),
    ]),
  );
}

/** Names in one order, since the database keeps those of jsonb in another. */
function sorted(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(sorted);
  if (value === null || typeof value !== "object") return value;
  const entries = Object.entries(value).sort(([one], [other]) => (one < other ? -1 : 1));
  return Object.fromEntries(entries.map(([name, part]) => [name, sorted(part)]));
}

/** Brings every hole of an AGS file into the form that is kept, with coordinates on the site grid. */
export function logsFromGround(
  ground: Ground,
  grid: SiteGrid,
  dataIssueId: string,
): (Log & { name: string })[] {
  const strata = byHole(ground.strata);
  const spts = byHole(ground.spts);
  const strikes = byHole(ground.strikes);
  return ground.holes.map((hole) => {
    const [easting_m, northing_m] = onSite(hole, grid);
    return {
      name: hole.name,
      holeId: randomUUID() as HoleId,
      revisionId: randomUUID() as HoleRevisionId,
      number: 1,
      newName: hole.name,
      row: {
        kind: hole.kind,
        status: hole.status,
        easting_m,
        northing_m,
        given_easting_m: hole.local?.easting_m ?? hole.national?.easting_m ?? null,
        given_northing_m: hole.local?.northing_m ?? hole.national?.northing_m ?? null,
        given_grid: hole.local ? hole.localGrid : hole.nationalGrid,
        ground_level_m: hole.groundLevel_m ?? hole.localLevel_m,
        given_datum: hole.verticalDatum || hole.localDatum,
        final_depth_m: hole.finalDepth_m,
        started_on: hole.startDate ?? hole.startText,
        ended_on: hole.endDate ?? hole.endText,
        termination: hole.termination,
        remarks: hole.remarks,
        logged_by: hole.loggedBy,
        data_issue_id: dataIssueId,
        source_line: hole.line,
        source_revision_id: null,
        source_page: null,
        reason: "",
      },
      strata: (strata.get(hole.name) ?? [])
        .filter((row) => row.top_m !== null)
        .sort((one, other) => (one.top_m ?? 0) - (other.top_m ?? 0))
        .map((row) => ({
          id: randomUUID(),
          top_m: row.top_m as number,
          base_m: row.base_m,
          description: row.description,
          legend_code: row.legendCode,
          geology_code: row.geologyCode,
          soil: row.reading.soil,
          made_ground: row.reading.madeGround,
          source_line: row.line,
          ground_unit_id: null,
        })),
      spts: (spts.get(hole.name) ?? [])
        .filter((row) => row.depth_m !== null)
        .map((row) => ({
          depth_m: row.depth_m as number,
          kind: row.kind,
          blow_count: row.blowCount,
          refusal: row.refusal,
          main_blows: row.mainBlows,
          main_penetration_mm: row.mainPenetration_mm,
          seating_blows: row.seatingBlows,
          increments: row.increments,
          energy_ratio_percent: row.energyRatio_percent,
          report_text: row.reportText,
          water_text: row.water.text,
          casing_m: row.casing_m,
          source_line: row.line,
        })),
      strikes: (strikes.get(hole.name) ?? [])
        .filter((row) => row.depth_m !== null)
        .map((row) => ({
          depth_m: row.depth_m as number,
          at: row.at,
          casing_m: row.casing_m,
          sealed_m: row.sealed_m,
          rises: row.rises.map((rise) => ({
            minutes: rise.minutes ?? 0,
            depth_m: rise.depth.number,
            text: rise.depth.text,
          })),
          remarks: row.remarks,
          source_line: row.line,
        })),
    };
  });
}

/** Local coordinates are the site's own; national ones are brought to it. Neither: no place on plan. */
function onSite(hole: GroundHole, grid: SiteGrid): [number | null, number | null] {
  if (hole.local) return [hole.local.easting_m, hole.local.northing_m];
  if (!hole.national) return [null, null];
  const [easting_m, northing_m] = toSite(grid, [hole.national.easting_m, hole.national.northing_m]);
  return [easting_m, northing_m];
}

function byHole<Row extends { hole: string }>(rows: readonly Row[]): Map<string, Row[]> {
  const found = new Map<string, Row[]>();
  for (const row of rows) {
    const list = found.get(row.hole);
    if (list) list.push(row);
    else found.set(row.hole, [row]);
  }
  return found;
}
