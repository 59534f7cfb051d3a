import { columnsFor } from "./columns";
import type { AgsFile, AgsGroup } from "./file-model";
import { FindingList } from "./finding-list";
import { isoDay } from "./ground-dates";
import { holesOf } from "./ground-holes";
import type {
  Ground,
  GroundAbbreviation,
  GroundHole,
  GroundIdentity,
  GroundProject,
  GroundTransmittal,
  PlanBox,
  PlanPoint,
} from "./ground-model";
import { sptsOf } from "./ground-spt";
import { strataOf } from "./ground-strata";
import { strikesOf } from "./ground-water";
import { sortFindings } from "./group-builder";

/** Groups that have rows of their own in the register; all others are kept as they came. */
const modelled = new Set(["PROJ", "TRAN", "ABBR", "TYPE", "UNIT", "LOCA", "GEOL", "ISPT", "WSTG", "WSTD"]);

/**
 * Turns the groups of a read file into rows of the register: project, transmittal, holes, strata, penetration tests
 * and water strikes, lengths in metres, each with its line. Says what it left out and what it doubts. Never throws.
 */
export function groundFromAgs(file: AgsFile): Ground {
  const findings = new FindingList();
  const { groups } = file;
  const project = projectOf(groups, findings);
  const { transmittal, concatenator } = transmittalOf(groups, findings);
  const holes = holesOf(groups, concatenator, findings);
  const byName = new Map(holes.map((hole) => [hole.name, hole]));
  return {
    project,
    transmittal,
    abbreviations: abbreviationsOf(groups, findings),
    holes,
    strata: strataOf(groups, byName, findings),
    spts: sptsOf(groups, byName, findings),
    strikes: strikesOf(groups, byName, findings),
    identity: identityOf(project, transmittal, holes),
    otherGroups: groups.filter(({ name }) => !modelled.has(name)),
    findings: sortFindings(findings.list()),
  };
}

function projectOf(groups: readonly AgsGroup[], findings: FindingList): GroundProject | null {
  const [columns] = columnsFor(groups, "PROJ", findings);
  const row = columns?.rows()[0];
  if (!columns || !row) return null;
  const text = (heading: string) => columns.text(row, heading);
  return {
    group: "PROJ",
    line: row.line,
    projectId: text("PROJ_ID"),
    name: text("PROJ_NAME"),
    location: text("PROJ_LOC"),
    client: text("PROJ_CLNT"),
    contractor: text("PROJ_CONT"),
    engineer: text("PROJ_ENG"),
    memo: text("PROJ_MEMO"),
  };
}

/** Of several transmittal rows the latest by date counts, and the last of those that are equal. */
function transmittalOf(
  groups: readonly AgsGroup[],
  findings: FindingList,
): { transmittal: GroundTransmittal | null; concatenator: string } {
  let latest: GroundTransmittal | null = null;
  let concatenator = "+";
  let count = 0;
  for (const columns of columnsFor(groups, "TRAN", findings)) {
    for (const row of columns.rows()) {
      const text = (heading: string) => columns.text(row, heading);
      count += 1;
      const isoDate = isoDay(text("TRAN_DATE"));
      if (latest !== null && (isoDate ?? "") < (latest.isoDate ?? "")) continue;
      if (columns.has("TRAN_RCON")) concatenator = text("TRAN_RCON");
      latest = {
        group: "TRAN",
        line: row.line,
        issueNumber: text("TRAN_ISNO"),
        date: text("TRAN_DATE"),
        isoDate,
        producer: text("TRAN_PROD"),
        status: text("TRAN_STAT"),
        description: text("TRAN_DESC"),
        edition: text("TRAN_AGS"),
        recipient: text("TRAN_RECV"),
        remarks: text("TRAN_REM"),
      };
    }
  }
  if (latest !== null && count > 1) {
    const message = `The file has ${count} transmittal rows; the latest, issue ${latest.issueNumber || "without number"}, is used.`;
    findings.add("ground", "warning", { group: "TRAN", line: latest.line }, message);
  }
  return { transmittal: latest, concatenator };
}

function abbreviationsOf(groups: readonly AgsGroup[], findings: FindingList): GroundAbbreviation[] {
  return columnsFor(groups, "ABBR", findings).flatMap((columns) =>
    columns.rows().map((row) => ({
      group: "ABBR",
      line: row.line,
      heading: columns.text(row, "ABBR_HDNG"),
      code: columns.text(row, "ABBR_CODE"),
      description: columns.text(row, "ABBR_DESC"),
    })),
  );
}

function identityOf(
  project: GroundProject | null,
  transmittal: GroundTransmittal | null,
  holes: readonly GroundHole[],
): GroundIdentity {
  const statuses = new Map<string, number>();
  for (const { status } of holes) statuses.set(status, (statuses.get(status) ?? 0) + 1);
  return {
    projectId: project?.projectId ?? "",
    projectName: project?.name ?? "",
    issueNumber: transmittal?.issueNumber ?? "",
    issueDate: transmittal?.date ?? "",
    dataStatus: transmittal?.status ?? "",
    producer: transmittal?.producer ?? "",
    holeCount: holes.length,
    holeNames: holes.map(({ name }) => name),
    nationalBox: boxOf(holes.map(({ national }) => national)),
    localBox: boxOf(holes.map(({ local }) => local)),
    holeStatuses: Object.fromEntries(statuses),
    nationalGrids: distinct(holes.map(({ nationalGrid }) => nationalGrid)),
    verticalDatums: distinct(holes.map(({ verticalDatum }) => verticalDatum)),
  };
}

function boxOf(points: readonly (PlanPoint | null)[]): PlanBox | null {
  const given = points.filter((point) => point !== null);
  const first = given[0];
  if (!first) return null;
  let { easting_m: minEasting_m, northing_m: minNorthing_m } = first;
  let { easting_m: maxEasting_m, northing_m: maxNorthing_m } = first;
  for (const { easting_m, northing_m } of given) {
    minEasting_m = Math.min(minEasting_m, easting_m);
    minNorthing_m = Math.min(minNorthing_m, northing_m);
    maxEasting_m = Math.max(maxEasting_m, easting_m);
    maxNorthing_m = Math.max(maxNorthing_m, northing_m);
  }
  return { minEasting_m, minNorthing_m, maxEasting_m, maxNorthing_m };
}

function distinct(texts: readonly string[]): string[] {
  return [...new Set(texts.filter((text) => text !== ""))];
}
