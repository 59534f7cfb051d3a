import { columnsFor, type GroupColumns, plainNumber } from "./columns";
import type { AgsGroup, AgsRow } from "./file-model";
import type { FindingList } from "./finding-list";
import { degreesOf, isoDay } from "./ground-dates";
import type { GroundHole, PlanPoint } from "./ground-model";
import { shown } from "./rule-context";

const statuses = new Set(["PROPOSED", "DRAFT", "PRELIM", "FINAL", "HISTORIC"]);

/** The exploratory holes of the LOCA group, with what HDPH says of the logger and HORN of the inclination. */
export function holesOf(
  groups: readonly AgsGroup[],
  concatenator: string,
  findings: FindingList,
): GroundHole[] {
  const loggers = loggersOf(groups, findings);
  const inclined = inclinedHoles(groups, findings);
  const holes: GroundHole[] = [];
  for (const columns of columnsFor(groups, "LOCA", findings)) {
    const levels = new LevelReader(columns);
    for (const row of columns.rows()) {
      const name = columns.text(row, "LOCA_ID");
      if (name === "") {
        columns.report("error", row.line, "LOCA_ID", "The hole has no name and was left out.");
        continue;
      }
      holes.push(readHole(columns, row, name, { levels, concatenator, loggers, inclined }));
    }
    levels.report();
  }
  return withoutRepeated(holes, findings);
}

interface Beside {
  readonly levels: LevelReader;
  readonly concatenator: string;
  readonly loggers: ReadonlyMap<string, string>;
  readonly inclined: ReadonlySet<string>;
}

function readHole(columns: GroupColumns, row: AgsRow, name: string, beside: Beside): GroundHole {
  const text = (heading: string) => columns.text(row, heading);
  const kind = text("LOCA_TYPE");
  const status = text("LOCA_STAT");
  const finalDepth_m = columns.number(row, "LOCA_FDEP", "m");
  if (finalDepth_m !== null && finalDepth_m < 0) {
    columns.report("error", row.line, "LOCA_FDEP", `The final depth of ${name} is negative.`);
  }
  const { concatenator, levels, loggers, inclined } = beside;
  return {
    group: "LOCA",
    line: row.line,
    name,
    kind,
    kindCodes:
      kind === ""
        ? []
        : concatenator === ""
          ? [kind]
          : kind.split(concatenator).filter((code) => code !== ""),
    status: statuses.has(status.toUpperCase()) ? status.toUpperCase() : status,
    national: pointOf(columns, row, "LOCA_NATE", "LOCA_NATN", name),
    nationalGrid: text("LOCA_GREF"),
    local: pointOf(columns, row, "LOCA_LOCX", "LOCA_LOCY", name),
    localGrid: text("LOCA_LREF"),
    groundLevel_m: levels.read(row),
    groundLevelText: text("LOCA_GL"),
    localLevel_m: columns.number(row, "LOCA_LOCZ", "m"),
    verticalDatum: text("LOCA_NATD"),
    localDatum: text("LOCA_DATM"),
    finalDepth_m: finalDepth_m !== null && finalDepth_m < 0 ? null : finalDepth_m,
    startDate: dateOf(columns, row, "LOCA_STAR"),
    endDate: dateOf(columns, row, "LOCA_ENDD"),
    startText: text("LOCA_STAR"),
    endText: text("LOCA_ENDD"),
    latitude_deg: angleOf(columns, row, "LOCA_LAT", 90),
    longitude_deg: angleOf(columns, row, "LOCA_LON", 180),
    purpose: text("LOCA_PURP"),
    termination: text("LOCA_TERM"),
    originalName: text("LOCA_ORID"),
    loggedBy: loggers.get(name) ?? "",
    remarks: columns.verbatim(row, "LOCA_REM"),
    inclined: inclined.has(name),
  };
}

/** Ground levels: empty, "Null" and an unbelieved 0 are all "not stated", each kind reported once for the file. */
class LevelReader {
  private readonly unstated = new Map<string, number[]>();
  private count = 0;

  constructor(private readonly columns: GroupColumns) {}

  read(row: AgsRow): number | null {
    this.count += 1;
    const text = this.columns.text(row, "LOCA_GL");
    const note = (kind: string): null => {
      const lines = this.unstated.get(kind);
      if (lines) lines.push(row.line);
      else this.unstated.set(kind, [row.line]);
      return null;
    };
    if (!this.columns.has("LOCA_GL")) return note("have no ground level, because the file has no LOCA_GL");
    if (text === "") return note("have an empty ground level");
    if (/^(null|none|nil|n\/?a|unknown|-)$/i.test(text))
      return note(`have the ground level ${shown(text)}, which is no number`);
    if (plainNumber(text) === 0)
      return note(`have the ground level ${shown(text)}, which is taken as not stated`);
    return this.columns.number(row, "LOCA_GL", "m");
  }

  report(): void {
    for (const [kind, lines] of this.unstated) {
      const [line = null] = lines;
      this.columns.report("warning", line, "LOCA_GL", `${lines.length} of ${this.count} holes ${kind}.`);
    }
  }
}

function pointOf(
  columns: GroupColumns,
  row: AgsRow,
  east: string,
  north: string,
  hole: string,
): PlanPoint | null {
  const coordinate = (heading: string): number | null => {
    const text = columns.text(row, heading);
    return /^null$/i.test(text) ? null : columns.number(row, heading, "m");
  };
  const easting_m = coordinate(east);
  const northing_m = coordinate(north);
  if (easting_m === null && northing_m === null) return null;
  if (easting_m === null || northing_m === null) {
    columns.report(
      "warning",
      row.line,
      easting_m === null ? east : north,
      `${hole} has one coordinate of two.`,
    );
    return null;
  }
  if (easting_m === 0 && northing_m === 0) {
    columns.report("warning", row.line, east, `${hole} lies at 0, 0, which is taken as no position.`);
    return null;
  }
  return { easting_m, northing_m };
}

function dateOf(columns: GroupColumns, row: AgsRow, heading: string): string | null {
  const text = columns.text(row, heading);
  if (text === "") return null;
  const day = isoDay(text);
  if (day === null)
    columns.report("warning", row.line, heading, `${shown(text)} is not a date and is kept as text.`);
  return day;
}

function angleOf(columns: GroupColumns, row: AgsRow, heading: string, largest_deg: number): number | null {
  const text = columns.text(row, heading);
  if (text === "") return null;
  const angle = degreesOf(text, largest_deg);
  if (angle === null)
    columns.report("warning", row.line, heading, `${shown(text)} is not an angle that can be read.`);
  return angle;
}

function loggersOf(groups: readonly AgsGroup[], findings: FindingList): Map<string, string> {
  const names = new Map<string, Set<string>>();
  for (const columns of columnsFor(groups, "HDPH", findings)) {
    for (const row of columns.rows()) {
      const logger = columns.text(row, "HDPH_LOG");
      if (logger === "") continue;
      const hole = columns.text(row, "LOCA_ID");
      names.set(hole, (names.get(hole) ?? new Set()).add(logger));
    }
  }
  return new Map([...names].map(([hole, loggers]) => [hole, [...loggers].join(", ")]));
}

function inclinedHoles(groups: readonly AgsGroup[], findings: FindingList): Set<string> {
  const inclined = new Set<string>();
  for (const columns of columnsFor(groups, "HORN", findings)) {
    for (const row of columns.rows()) {
      const text = columns.text(row, "HORN_INCL");
      const inclination = plainNumber(text);
      // Inclination is measured from the horizontal: 90 is a vertical hole.
      if (inclination !== null && Math.abs(Math.abs(inclination) - 90) > 0.5 && inclination !== 0) {
        inclined.add(columns.text(row, "LOCA_ID"));
      }
    }
  }
  return inclined;
}

function withoutRepeated(holes: readonly GroundHole[], findings: FindingList): GroundHole[] {
  const first = new Map<string, GroundHole>();
  const places = new Map<string, GroundHole>();
  for (const hole of holes) {
    const at = { group: hole.group, line: hole.line };
    const before = first.get(hole.name);
    if (before) {
      const message = `The hole ${hole.name} stands in line ${before.line} already; this row was left out.`;
      findings.add("ground", "error", { ...at, heading: "LOCA_ID" }, message);
      continue;
    }
    first.set(hole.name, hole);
    const { national } = hole;
    if (!national) continue;
    const place = `${national.easting_m} ${national.northing_m}`;
    const neighbour = places.get(place);
    if (neighbour) {
      findings.add("ground", "note", at, `The holes ${neighbour.name} and ${hole.name} lie at one point.`);
    } else places.set(place, hole);
  }
  return [...first.values()];
}
