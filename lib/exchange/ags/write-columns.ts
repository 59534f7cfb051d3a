import type {
  WrittenFile,
  WrittenHole,
  WrittenInstallation,
  WrittenReading,
  WrittenSample,
  WrittenSpt,
  WrittenStratum,
  WrittenStrike,
} from "./write-model";

/** What one item is made of. */
export type Item = string | number | null | undefined;
/** Heading and the item of one row under it. */
export type Column<Row> = readonly [heading: string, item: (row: Row) => Item];

export const holeColumns: readonly Column<WrittenHole>[] = [
  ["LOCA_ID", (hole) => hole.name],
  ["LOCA_TYPE", (hole) => hole.kind],
  ["LOCA_STAT", (hole) => hole.status],
  ["LOCA_NATE", (hole) => hole.easting_m],
  ["LOCA_NATN", (hole) => hole.northing_m],
  ["LOCA_GREF", (hole) => hole.nationalGrid],
  ["LOCA_GL", (hole) => hole.groundLevel_m],
  ["LOCA_REM", (hole) => hole.remarks],
  ["LOCA_FDEP", (hole) => hole.finalDepth_m],
  ["LOCA_STAR", (hole) => hole.startDate],
  ["LOCA_PURP", (hole) => hole.purpose],
  ["LOCA_TERM", (hole) => hole.termination],
  ["LOCA_ENDD", (hole) => hole.endDate],
  ["LOCA_LOCX", (hole) => hole.localEasting_m],
  ["LOCA_LOCY", (hole) => hole.localNorthing_m],
  ["LOCA_LOCZ", (hole) => hole.localLevel_m],
  ["LOCA_LREF", (hole) => hole.localGrid],
  ["LOCA_DATM", (hole) => hole.localDatum],
  ["LOCA_NATD", (hole) => hole.verticalDatum],
  ["LOCA_ORID", (hole) => hole.originalName],
];

export const stratumColumns: readonly Column<WrittenStratum>[] = [
  ["LOCA_ID", (stratum) => stratum.hole],
  ["GEOL_TOP", (stratum) => stratum.top_m],
  ["GEOL_BASE", (stratum) => stratum.base_m],
  ["GEOL_DESC", (stratum) => stratum.description],
  ["GEOL_LEG", (stratum) => stratum.legendCode],
  ["GEOL_GEOL", (stratum) => stratum.geologyCode],
  ["GEOL_GEO2", (stratum) => stratum.secondGeologyCode],
  ["GEOL_STAT", (stratum) => stratum.reference],
  ["GEOL_BGS", (stratum) => stratum.lexiconCode],
  ["GEOL_FORM", (stratum) => stratum.formation],
  ["GEOL_REM", (stratum) => stratum.remarks],
];

const sixPlaces = [0, 1, 2, 3, 4, 5] as const;

export const sptColumns: readonly Column<WrittenSpt>[] = [
  ["LOCA_ID", (spt) => spt.hole],
  ["ISPT_TOP", (spt) => spt.depth_m],
  ["ISPT_SEAT", (spt) => spt.seatingBlows],
  ["ISPT_MAIN", (spt) => spt.mainBlows],
  ["ISPT_NPEN", wholePenetration],
  ["ISPT_NVAL", (spt) => (spt.refusal ? null : spt.blowCount)],
  ["ISPT_REP", reportOf],
  ["ISPT_CAS", (spt) => spt.casing_m],
  ["ISPT_WAT", (spt) => spt.waterText],
  ["ISPT_TYPE", (spt) => spt.kind],
  ["ISPT_HAM", (spt) => spt.hammer],
  ["ISPT_ERAT", (spt) => spt.energyRatio_percent],
  ["ISPT_SWP", (spt) => spt.selfWeightPenetration_mm],
  ...sixPlaces.map(
    (place): Column<WrittenSpt> => [`ISPT_INC${place + 1}`, (spt) => spt.increments?.[place]?.blows],
  ),
  ...sixPlaces.map(
    (place): Column<WrittenSpt> => [`ISPT_PEN${place + 1}`, (spt) => spt.increments?.[place]?.penetration_mm],
  ),
  ["ISPT_ROCK", (spt) => (spt.inRock == null ? "" : spt.inRock ? "Y" : "N")],
  ["ISPT_REM", (spt) => spt.remarks],
];

/** ISPT_NPEN is the whole penetration, seating included: written only where both parts are known. */
function wholePenetration({ mainPenetration_mm, seatingPenetration_mm }: WrittenSpt): number | null {
  if (mainPenetration_mm == null || seatingPenetration_mm == null) return null;
  return mainPenetration_mm + seatingPenetration_mm;
}

/** A refusal without words of its own is written as "50 for 85 mm", so that nobody reads it as an N of 50. */
function reportOf({ reportText = "", refusal, mainBlows, mainPenetration_mm }: WrittenSpt): string {
  if (reportText !== "" || !refusal || mainBlows == null || mainPenetration_mm == null) return reportText;
  return `${mainBlows} for ${mainPenetration_mm}mm`;
}

export const strikeColumns: readonly Column<WrittenStrike>[] = [
  ["LOCA_ID", (strike) => strike.hole],
  ["WSTG_DPTH", (strike) => strike.depth_m],
  ["WSTG_DTIM", (strike) => strike.at],
  ["WSTG_SEAL", (strike) => strike.sealed_m],
  ["WSTG_CAS", (strike) => strike.casing_m],
  ["WSTG_REM", (strike) => strike.remarks],
];

/** A rise with the strike that it belongs to. */
export interface WrittenRise {
  readonly hole: string;
  readonly strikeDepth_m: number | null;
  readonly minutes: number | null;
  readonly depth_m: number | null;
  readonly remarks?: string;
}

export const riseColumns: readonly Column<WrittenRise>[] = [
  ["LOCA_ID", (rise) => rise.hole],
  ["WSTG_DPTH", (rise) => rise.strikeDepth_m],
  ["WSTD_NMIN", (rise) => rise.minutes],
  ["WSTD_POST", (rise) => rise.depth_m],
  ["WSTD_REM", (rise) => rise.remarks],
];

export const sampleColumns: readonly Column<WrittenSample>[] = [
  ["LOCA_ID", (sample) => sample.hole],
  ["SAMP_TOP", (sample) => sample.top_m],
  ["SAMP_REF", (sample) => sample.reference],
  ["SAMP_TYPE", (sample) => sample.kind],
  ["SAMP_ID", (sample) => sample.sampleId],
  ["SAMP_BASE", (sample) => sample.base_m],
  ["SAMP_DTIM", (sample) => sample.takenAt],
  ["SAMP_REM", (sample) => sample.remarks],
  ["SAMP_DESC", (sample) => sample.description],
];

export const installationColumns: readonly Column<WrittenInstallation>[] = [
  ["LOCA_ID", (point) => point.hole],
  ["MONG_ID", (point) => point.name],
  ["MONG_DIS", (point) => point.depth_m],
  ["MONG_DATE", (point) => point.date],
  ["MONG_TYPE", (point) => point.kind],
  ["MONG_DETL", (point) => point.details],
  ["MONG_TRZ", (point) => point.responseTop_m],
  ["MONG_BRZ", (point) => point.responseBase_m],
  ["MONG_REM", (point) => point.remarks],
];

export const readingColumns: readonly Column<WrittenReading>[] = [
  ["LOCA_ID", (reading) => reading.hole],
  ["MONG_ID", (reading) => reading.installation],
  ["MONG_DIS", (reading) => reading.depth_m],
  ["MOND_DTIM", (reading) => reading.at],
  ["MOND_TYPE", (reading) => reading.kind],
  ["MOND_REF", (reading) => reading.reference],
  ["MOND_INST", (reading) => reading.instrument],
  ["MOND_RDNG", (reading) => reading.value],
  ["MOND_UNIT", (reading) => reading.unit],
  ["MOND_METH", (reading) => reading.method],
  ["MOND_REM", (reading) => reading.remarks],
];

export const fileColumns: readonly Column<WrittenFile>[] = [
  ["FILE_FSET", (file) => file.set],
  ["FILE_NAME", (file) => file.name],
  ["FILE_DESC", (file) => file.description],
  ["FILE_TYPE", (file) => file.format],
  ["FILE_DOCT", (file) => file.kind],
  ["FILE_DATE", (file) => file.date],
  ["FILE_REM", (file) => file.remarks],
];
