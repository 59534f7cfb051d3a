import { randomUUID } from "node:crypto";
import type { z } from "zod";
import type { createHoleInput } from "@/lib/contracts/ground";
import type { HoleRevisionId } from "@/lib/contracts/ids";
import { readPrincipalSoil } from "@/lib/exchange/ags/principal-soil";
import { Invalid } from "../errors";
import type { Log } from "./keep-logs";

export type TypedLog = Omit<z.output<typeof createHoleInput>, "name">;

/** Brings a typed log into the form that is kept. Strata must follow each other and end within the hole. */
export function logFromForm(
  typed: TypedLog,
  of: Pick<Log, "holeId" | "number" | "newName">,
  reason: string,
): Log {
  const fields: Record<string, string> = {};
  typed.strata.forEach((stratum, at) => {
    const above = typed.strata[at - 1];
    if (above && Math.abs(stratum.top_m - above.base_m) > 1e-6)
      fields[`strata.${at}.top_m`] =
        stratum.top_m < above.base_m
          ? `This stratum overlaps the one above, which ends at ${above.base_m} m.`
          : `There is a gap: the stratum above ends at ${above.base_m} m.`;
    if (stratum.base_m > typed.finalDepth_m + 1e-6)
      fields[`strata.${at}.base_m`] = `This lies below the final depth, ${typed.finalDepth_m} m.`;
  });
  typed.spts.forEach((spt, at) => {
    if (spt.depth_m > typed.finalDepth_m + 1e-6)
      fields[`spts.${at}.depth_m`] = `This lies below the final depth, ${typed.finalDepth_m} m.`;
    if (spt.refusal && (spt.mainBlows === null || spt.mainPenetration_mm === null))
      fields[`spts.${at}.mainBlows`] = "A refusal is blows for a penetration: give both.";
  });
  typed.strikes.forEach((strike, at) => {
    if (strike.depth_m > typed.finalDepth_m + 1e-6)
      fields[`strikes.${at}.depth_m`] = `This lies below the final depth, ${typed.finalDepth_m} m.`;
  });
  if (Object.keys(fields).length > 0) throw new Invalid("The log does not hang together yet.", fields);
  return {
    ...of,
    revisionId: randomUUID() as HoleRevisionId,
    row: {
      kind: typed.kind,
      status: typed.status,
      easting_m: typed.easting_m,
      northing_m: typed.northing_m,
      given_easting_m: null,
      given_northing_m: null,
      given_grid: "",
      ground_level_m: typed.groundLevel_m,
      given_datum: "",
      final_depth_m: typed.finalDepth_m,
      started_on: typed.startedOn,
      ended_on: typed.endedOn,
      termination: "",
      remarks: typed.remarks,
      logged_by: typed.loggedBy,
      data_issue_id: null,
      source_line: null,
      source_revision_id: typed.sourceRevisionId,
      source_page: typed.sourcePage,
      reason,
    },
    strata: typed.strata.map((stratum) => {
      const reading = readPrincipalSoil(stratum.legendCode, stratum.description);
      return {
        id: randomUUID(),
        top_m: stratum.top_m,
        base_m: stratum.base_m,
        description: stratum.description,
        legend_code: stratum.legendCode,
        geology_code: stratum.geologyCode,
        soil: reading.soil,
        made_ground: reading.madeGround,
        source_line: null,
        ground_unit_id: stratum.groundUnitId,
      };
    }),
    spts: typed.spts.map((spt) => ({
      depth_m: spt.depth_m,
      kind: "",
      blow_count: spt.refusal ? null : spt.blowCount,
      refusal: spt.refusal,
      main_blows: spt.mainBlows,
      main_penetration_mm: spt.mainPenetration_mm,
      seating_blows: null,
      increments: [],
      energy_ratio_percent: null,
      report_text: spt.reportText,
      water_text: "",
      casing_m: null,
      source_line: null,
    })),
    strikes: typed.strikes.map((strike) => ({
      depth_m: strike.depth_m,
      at: "",
      casing_m: null,
      sealed_m: null,
      rises: [],
      remarks: strike.remarks,
      source_line: null,
    })),
  };
}
