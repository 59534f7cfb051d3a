import { columnsFor, type GroupColumns, plainNumber } from "./columns";
import type { AgsGroup, AgsRow } from "./file-model";
import type { FindingList } from "./finding-list";
import type { GroundHole, GroundSpt, SptIncrement } from "./ground-model";
import { isKnownHole } from "./ground-strata";
import { fullDrive_mm, readSptReport, type SptReport, seatingDrive_mm } from "./spt-report";

const places = [1, 2, 3, 4, 5, 6] as const;

/** The standard penetration tests of the ISPT group. N, refusal and the words of the log stay three things. */
export function sptsOf(
  groups: readonly AgsGroup[],
  holes: ReadonlyMap<string, GroundHole>,
  findings: FindingList,
): GroundSpt[] {
  const spts: GroundSpt[] = [];
  for (const columns of columnsFor(groups, "ISPT", findings)) {
    const rows = columns.rows();
    const meaning = meaningOfPenetration(columns, rows);
    for (const row of rows) {
      const hole = columns.text(row, "LOCA_ID");
      if (isKnownHole(columns, row, hole, holes)) spts.push(readSpt(columns, row, hole, meaning, holes));
    }
  }
  return spts;
}

function readSpt(
  columns: GroupColumns,
  row: AgsRow,
  hole: string,
  meaning: PenetrationMeaning,
  holes: ReadonlyMap<string, GroundHole>,
): GroundSpt {
  const text = (heading: string) => columns.text(row, heading);
  const depth_m = columns.number(row, "ISPT_TOP", "m");
  if (depth_m === null) columns.report("error", row.line, "ISPT_TOP", `A test in ${hole} has no depth.`);
  const finalDepth_m = holes.get(hole)?.finalDepth_m ?? null;
  if (depth_m !== null && finalDepth_m !== null && depth_m > finalDepth_m + 0.005) {
    const message = `The test of ${hole} at ${depth_m.toFixed(2)} m lies below the final depth ${finalDepth_m.toFixed(2)} m.`;
    columns.report("warning", row.line, "ISPT_TOP", message);
  }
  const rock = text("ISPT_ROCK").toUpperCase();
  return {
    group: "ISPT",
    line: row.line,
    hole,
    depth_m,
    kind: text("ISPT_TYPE"),
    ...drivesOf(columns, row, meaning),
    energyRatio_percent: columns.number(row, "ISPT_ERAT", "%"),
    n60: columns.number(row, "ISPT_N60", null),
    selfWeightPenetration_mm: columns.number(row, "ISPT_SWP", "mm"),
    reportText: columns.verbatim(row, "ISPT_REP"),
    casing_m: columns.number(row, "ISPT_CAS", "m"),
    water: columns.textOrNumber(row, "ISPT_WAT", "m"),
    inRock: rock === "Y" ? true : rock === "N" ? false : null,
    hammer: text("ISPT_HAM"),
    remarks: columns.verbatim(row, "ISPT_REM"),
  };
}

type Drives = Pick<
  GroundSpt,
  | "blowCount"
  | "refusal"
  | "mainBlows"
  | "mainPenetration_mm"
  | "seatingBlows"
  | "seatingPenetration_mm"
  | "increments"
>;

function drivesOf(columns: GroupColumns, row: AgsRow, meaning: PenetrationMeaning): Drives {
  const stated = columns.count(row, "ISPT_NVAL");
  const main = columns.count(row, "ISPT_MAIN");
  const seating = columns.count(row, "ISPT_SEAT");
  const report = readSptReport(columns.text(row, "ISPT_REP"));
  const increments = incrementsOf(columns, row);
  const mainBlows = main ?? report?.mainBlows ?? sumOfBlows(increments.slice(2)) ?? stated;
  const driven_mm = mainPenetrationOf(columns, row, report, increments, meaning);
  const refusal =
    driven_mm === null ? (report?.refusal ?? false) || meaning.isUnclear(row) : driven_mm < fullDrive_mm;
  const blowCount = refusal ? null : (stated ?? report?.blowCount ?? (driven_mm === null ? null : mainBlows));
  checkAgreement(columns, row, { stated, mainBlows, report, refusal });
  return {
    blowCount,
    refusal,
    mainBlows,
    mainPenetration_mm: driven_mm,
    seatingBlows: seating ?? report?.seatingBlows ?? sumOfBlows(increments.slice(0, 2)),
    seatingPenetration_mm: report?.seatingPenetration_mm ?? sumOfPenetration(increments.slice(0, 2)),
    increments: increments.length > 0 ? increments : (report?.increments ?? []),
  };
}

function mainPenetrationOf(
  columns: GroupColumns,
  row: AgsRow,
  report: SptReport | null,
  increments: readonly SptIncrement[],
  meaning: PenetrationMeaning,
): number | null {
  if (report?.mainPenetration_mm != null) return report.mainPenetration_mm;
  const summed = sumOfPenetration(increments.slice(2));
  if (summed !== null) return summed;
  return meaning.mainDrive(columns, row);
}

/** The six increments as given; trailing ones that are empty or driven 0 mm are left off. */
function incrementsOf(columns: GroupColumns, row: AgsRow): SptIncrement[] {
  const all = places.map((place) => ({
    blows: columns.count(row, `ISPT_INC${place}`),
    penetration_mm: columns.number(row, `ISPT_PEN${place}`, "mm"),
  }));
  while (all.length > 0) {
    const last = all.at(-1);
    const empty = !last?.blows && !last?.penetration_mm;
    if (!empty || (last?.penetration_mm === null && last.blows === 0)) break;
    all.pop();
  }
  return all;
}

function sumOfBlows(increments: readonly SptIncrement[]): number | null {
  const given = increments.flatMap(({ blows }) => blows ?? []);
  return given.length === 0 ? null : given.reduce((sum, blows) => sum + blows, 0);
}

function sumOfPenetration(increments: readonly SptIncrement[]): number | null {
  const given = increments.flatMap(({ penetration_mm }) => penetration_mm ?? []);
  return given.length === 0 ? null : given.reduce((sum, penetration) => sum + penetration, 0);
}

function checkAgreement(
  columns: GroupColumns,
  row: AgsRow,
  {
    stated,
    mainBlows,
    report,
    refusal,
  }: {
    stated: number | null;
    mainBlows: number | null;
    report: SptReport | null;
    refusal: boolean;
  },
): void {
  const inWords = report?.mainBlows ?? null;
  if (inWords !== null && mainBlows !== null && inWords !== mainBlows) {
    const message = `The words of the test give ${inWords} blows of the main drive, the figures ${mainBlows}.`;
    columns.report("warning", row.line, "ISPT_REP", message);
  }
  if (refusal || stated === null || mainBlows === null || stated === mainBlows) return;
  columns.report(
    "warning",
    row.line,
    "ISPT_NVAL",
    `N is ${stated}, but the main drive took ${mainBlows} blows.`,
  );
}

/**
 * What ISPT_NPEN means in one file. By the dictionary it is the whole penetration, seating included; many files give
 * the main drive alone. Rows whose penetration is known from elsewhere, or too small for a seating drive, decide.
 */
interface PenetrationMeaning {
  mainDrive(columns: GroupColumns, row: AgsRow): number | null;
  /** True where a short drive is sure but its length is not. */
  isUnclear(row: AgsRow): boolean;
}

function meaningOfPenetration(columns: GroupColumns, rows: readonly AgsRow[]): PenetrationMeaning {
  let whole = 0;
  let mainOnly = 0;
  for (const row of rows) {
    const given = plainNumber(columns.text(row, "ISPT_NPEN"));
    if (given === null) continue;
    const report = readSptReport(columns.text(row, "ISPT_REP"));
    if (report?.mainPenetration_mm != null) {
      const seating = report.seatingPenetration_mm ?? seatingDrive_mm;
      if (Math.abs(given - report.mainPenetration_mm - seating) <= 1) whole += 1;
      else if (Math.abs(given - report.mainPenetration_mm) <= 1) mainOnly += 1;
    } else if (given >= fullDrive_mm + seatingDrive_mm) whole += 1;
    else if (given > 0 && given <= seatingDrive_mm && columns.text(row, "ISPT_SEAT") === "") mainOnly += 1;
  }
  const reading =
    whole > 0 && mainOnly === 0 ? "whole" : mainOnly > 0 && whole === 0 ? "main drive" : "unclear";
  const unclear = new Set<number>();
  let said = false;
  return {
    mainDrive(from, row) {
      const given = from.number(row, "ISPT_NPEN", "mm");
      if (given === null || given <= 0) return null;
      if (given >= fullDrive_mm + seatingDrive_mm) return fullDrive_mm;
      if (reading === "main drive") {
        if (!said) {
          said = true;
          const message =
            "ISPT_NPEN is read as the main drive alone: some tests have less than a seating drive.";
          from.report("note", row.line, "ISPT_NPEN", message);
        }
        return Math.min(given, fullDrive_mm);
      }
      if (reading === "whole") return given > seatingDrive_mm ? given - seatingDrive_mm : 0;
      if (given === fullDrive_mm) return fullDrive_mm;
      unclear.add(row.line);
      const message = `Whether the ${given} mm of this test include the seating drive is not clear; it is kept as a refusal.`;
      from.report("warning", row.line, "ISPT_NPEN", message);
      return null;
    },
    isUnclear: (row) => unclear.has(row.line),
  };
}
