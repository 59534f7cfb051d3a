import {
  geometryFields,
  type ImportChange,
  type ImportRow,
  levelsIssue,
  mark as markField,
} from "@/lib/contracts/footings";
import type { FootingId, FootingRevisionId } from "@/lib/contracts/ids";
import type { CsvFinding, CsvReading, FootingRow } from "@/lib/exchange/csv/model";

export type Geometry = {
  easting_m: number;
  northing_m: number;
  orientation_deg: number;
  breadth_m: number;
  length_m: number;
  thickness_m: number;
  groundLevel_m: number;
  foundingLevel_m: number;
  loadHeight_m: number;
  concreteUnitWeight_kNm3: number;
  backfillUnitWeight_kNm3: number;
};

/** A footing as the register has it before an import. */
export type Registered = {
  id: FootingId;
  mark: string;
  revisionId: FootingRevisionId;
  number: number;
  geometry: Geometry;
  hasCheck: boolean;
};

export type PlannedFooting = ImportRow & { note: string; before: Registered | null; geometry: Geometry };
export type FootingPlan = {
  rows: PlannedFooting[];
  findings: CsvFinding[];
  inError: number;
  missing: string[];
};

/** Label, unit and least difference that counts of each field, in the order they are shown. */
const fields: Record<keyof Geometry, [label: string, unit: string]> = {
  easting_m: ["easting", "m"],
  northing_m: ["northing", "m"],
  orientation_deg: ["orientation", "°"],
  breadth_m: ["breadth", "m"],
  length_m: ["length", "m"],
  thickness_m: ["thickness", "m"],
  groundLevel_m: ["ground level", "m"],
  foundingLevel_m: ["founding level", "m"],
  loadHeight_m: ["load height", "m"],
  concreteUnitWeight_kNm3: ["concrete", "kN/m³"],
  backfillUnitWeight_kNm3: ["backfill", "kN/m³"],
};
export const geometryNames = Object.keys(fields) as (keyof Geometry)[];

/**
 * What a read file of footings would do to the register: new by mark, changed with before and after, unchanged, in
 * error. A cell left empty keeps what is registered; a new footing needs its size, place and levels.
 */
export function planFootingImport(
  reading: CsvReading<FootingRow>,
  register: { footings: readonly Registered[]; zones: readonly string[]; groundUnits: readonly string[] },
): FootingPlan {
  const byMark = new Map(register.footings.map((footing) => [footing.mark, footing]));
  const byLetters = new Map(register.footings.map((footing) => [footing.mark.toLowerCase(), footing]));
  const zones = new Set(register.zones.map((name) => name.toLowerCase()));
  const units = new Set(register.groundUnits.map((name) => name.toLowerCase()));
  const findings: CsvFinding[] = [...reading.findings];
  const rows: PlannedFooting[] = [];
  const seen = new Map<string, number>();
  for (const row of reading.rows) {
    const problems: CsvFinding[] = [];
    const refuse = (column: string | null, message: string) =>
      problems.push({ row: row.row, column, severity: "error", message });
    const named = markField.safeParse(row.mark);
    const mark = named.success ? named.data : row.mark;
    if (!named.success) refuse("mark", named.error.issues[0]?.message ?? "This mark cannot be used.");
    const first = seen.get(mark.toLowerCase());
    if (first !== undefined) refuse("mark", `${mark} stands in row ${first} already; a mark is given once.`);
    else seen.set(mark.toLowerCase(), row.row);
    const before = byMark.get(mark) ?? null;
    const alike = byLetters.get(mark.toLowerCase());
    if (!before && alike)
      refuse("mark", `The register has ${alike.mark}; write it the same way, or give another mark.`);
    if (row.zone && !zones.has(row.zone.toLowerCase())) refuse("zone", `There is no zone named ${row.zone}.`);
    if (row.groundUnit && !units.has(row.groundUnit.toLowerCase()))
      refuse("ground unit", `There is no ground unit ${row.groundUnit}.`);
    const geometry = merged(row, before, refuse);
    if (problems.length > 0 || !geometry) {
      findings.push(...problems);
      continue;
    }
    const changes = before ? differences(before.geometry, geometry) : [];
    rows.push({
      row: row.row,
      mark,
      what: !before ? "new" : changes.length > 0 ? "changed" : "unchanged",
      changes,
      note: row.description,
      before,
      geometry,
    });
  }
  const missing = register.footings
    .filter(({ mark }) => !seen.has(mark.toLowerCase()))
    .map(({ mark }) => mark);
  return { rows, findings, inError: reading.rowCount - rows.length, missing };
}

/** The footing as it would be, or null where something is missing or out of range. */
function merged(
  row: FootingRow,
  before: Registered | null,
  refuse: (column: string, message: string) => void,
): Geometry | null {
  const groundLevel_m = row.groundLevel_m ?? before?.geometry.groundLevel_m ?? null;
  const fromDepth =
    row.foundingDepth_m !== null && groundLevel_m !== null
      ? rounded(groundLevel_m - row.foundingDepth_m)
      : null;
  const thickness_m = row.thickness_m ?? before?.geometry.thickness_m ?? null;
  // Loads of a new footing are taken to act at the top of the pad where the file does not say.
  const given: Record<keyof Geometry, number | null> = {
    easting_m: row.easting_m ?? before?.geometry.easting_m ?? null,
    northing_m: row.northing_m ?? before?.geometry.northing_m ?? null,
    orientation_deg: row.orientation_deg ?? before?.geometry.orientation_deg ?? 0,
    breadth_m: row.breadth_m ?? before?.geometry.breadth_m ?? null,
    length_m: row.length_m ?? before?.geometry.length_m ?? null,
    thickness_m,
    groundLevel_m,
    foundingLevel_m: row.foundingLevel_m ?? fromDepth ?? before?.geometry.foundingLevel_m ?? null,
    loadHeight_m: row.loadHeight_m ?? before?.geometry.loadHeight_m ?? thickness_m,
    concreteUnitWeight_kNm3: row.concreteUnitWeight_kNm3 ?? before?.geometry.concreteUnitWeight_kNm3 ?? 24,
    backfillUnitWeight_kNm3: row.backfillUnitWeight_kNm3 ?? before?.geometry.backfillUnitWeight_kNm3 ?? 18,
  };
  let sound = true;
  for (const name of geometryNames) {
    const value = given[name];
    const [label] = fields[name];
    if (value === null) {
      sound = false;
      // A load height is missing only where the thickness is, and then the thickness is what to say.
      if (name !== "loadHeight_m") refuse(label, `A new footing needs its ${label}.`);
      continue;
    }
    const read = geometryFields[name].safeParse(value);
    if (read.success) continue;
    sound = false;
    refuse(label, read.error.issues[0]?.message ?? "This number cannot be used.");
  }
  if (!sound) return null;
  const geometry = given as Geometry;
  const levels = levelsIssue(geometry);
  if (levels === null) return geometry;
  refuse("founding level", levels);
  return null;
}

/** A level found by taking a depth from a level carries no more digits than the two had. */
const rounded = (level_m: number): number => Math.round(level_m * 1e6) / 1e6;

function differences(before: Geometry, after: Geometry): ImportChange[] {
  return (
    geometryNames
      // A level worked out from a depth differs in its last binary digit from the one typed; nobody changed it.
      .filter((name) => Math.abs(before[name] - after[name]) > 1e-9)
      .map((name) => {
        const [field, unit] = fields[name];
        return { field, unit, before: shown(before[name]), after: shown(after[name]) };
      })
  );
}

const shown = (figure: number): string => String(Number(figure.toPrecision(12)));
