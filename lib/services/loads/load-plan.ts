import type { LoadBasis } from "@/lib/contracts/footing-words";
import {
  type ImportChange,
  type ImportRow,
  type LoadCombination,
  loadCombinations,
  mark as markField,
} from "@/lib/contracts/footings";
import type { FootingId, LoadSetId } from "@/lib/contracts/ids";
import type { CsvFinding, CsvReading, LoadRow } from "@/lib/exchange/csv/model";

/** A footing's loads as the register has them before an import. */
export type LoadsRegistered = {
  id: FootingId;
  mark: string;
  loadSetId: LoadSetId | null;
  number: number;
  loadBasis: string | null;
  combinations: LoadCombination[];
  hasCheck: boolean;
};

export type PlannedLoads = ImportRow & { before: LoadsRegistered; combinations: LoadCombination[] };
export type LoadPlan = { rows: PlannedLoads[]; findings: CsvFinding[]; inError: number; missing: string[] };

/**
 * What a read file of loads would do: every footing that it names gets the combinations of the file as its whole next
 * set. A mark that the register does not have is refused row by row, and a basis other than the one chosen too.
 */
export function planLoadImport(
  reading: CsvReading<LoadRow>,
  register: readonly LoadsRegistered[],
  loadBasis: LoadBasis,
): LoadPlan {
  const byMark = new Map(register.map((footing) => [footing.mark, footing]));
  const findings: CsvFinding[] = [...reading.findings];
  const byFooting = new Map<string, { before: LoadsRegistered; rows: LoadRow[] }>();
  let unusable = reading.rowCount - reading.rows.length;
  for (const row of reading.rows) {
    const named = markField.safeParse(row.mark);
    const before = byMark.get(named.success ? named.data : row.mark);
    const problem = !before
      ? { column: "mark", message: `The register has no footing ${row.mark}.` }
      : otherBasis(row, loadBasis);
    if (problem || !before) {
      findings.push({
        row: row.row,
        severity: "error",
        column: problem?.column ?? null,
        message: problem?.message ?? "",
      });
      unusable += 1;
      continue;
    }
    const group = byFooting.get(before.mark) ?? { before, rows: [] };
    group.rows.push(row);
    byFooting.set(before.mark, group);
  }
  const rows: PlannedLoads[] = [];
  for (const { before, rows: own } of byFooting.values()) {
    const read = loadCombinations.safeParse(own.map(combinationOf));
    if (!read.success) {
      for (const issue of read.error.issues) {
        const [index, column] = issue.path;
        const row = typeof index === "number" ? own[index] : own[0];
        findings.push({
          row: row?.row ?? null,
          column: typeof column === "string" ? column : null,
          severity: "error",
          message: issue.message,
        });
      }
      unusable += own.length;
      continue;
    }
    const changes = differences(before, read.data, loadBasis);
    rows.push({
      row: own[0]?.row ?? 0,
      mark: before.mark,
      what: before.loadSetId === null ? "new" : changes.length > 0 ? "changed" : "unchanged",
      changes,
      before,
      combinations: read.data,
    });
  }
  const missing = register.filter(({ mark }) => !byFooting.has(mark)).map(({ mark }) => mark);
  return { rows, findings, inError: unusable, missing };
}

const combinationOf = (row: LoadRow): LoadCombination => ({
  name: row.combination,
  duration: row.duration,
  vertical_kN: row.vertical_kN,
  momentB_kNm: row.momentB_kNm,
  momentL_kNm: row.momentL_kNm,
  horizontalB_kN: row.horizontalB_kN,
  horizontalL_kN: row.horizontalL_kN,
});

/** Factored loads must not go in as service loads, nor the other way round: a row that says so is refused. */
function otherBasis(row: LoadRow, chosen: LoadBasis): { column: string; message: string } | null {
  const said = row.loadBasis.trim().toLowerCase();
  if (said === "") return null;
  const factored = /^(ultimate|uls|factored|design|lrfd)/.test(said);
  const service = /^(service|sls|characteristic|working|asd|unfactored)/.test(said);
  const clash = (factored && chosen !== "design-factored") || (service && chosen === "design-factored");
  return clash
    ? {
        column: "load basis",
        message: `The row says ${row.loadBasis}; the file was said to hold ${chosen === "design-factored" ? "design (factored)" : "characteristic (service)"} loads.`,
      }
    : null;
}

/** Combinations that come, go or change, each as one line. */
function differences(
  before: LoadsRegistered,
  after: LoadCombination[],
  loadBasis: LoadBasis,
): ImportChange[] {
  const changes: ImportChange[] = [];
  if (before.loadSetId !== null && before.loadBasis !== loadBasis)
    changes.push({ field: "load basis", unit: "", before: before.loadBasis ?? "", after: loadBasis });
  const old = new Map(before.combinations.map((combination) => [combination.name, combination]));
  for (const combination of after) {
    const was = old.get(combination.name);
    old.delete(combination.name);
    const [wasText, isText] = [was ? lineOf(was) : "", lineOf(combination)];
    if (wasText !== isText)
      changes.push({ field: combination.name, unit: "kN, kNm", before: wasText, after: isText });
  }
  for (const gone of old.values())
    changes.push({ field: gone.name, unit: "kN, kNm", before: lineOf(gone), after: "" });
  return changes;
}

const lineOf = (load: LoadCombination): string =>
  `${load.duration}: N ${load.vertical_kN}, MB ${load.momentB_kNm}, ML ${load.momentL_kNm}, HB ${load.horizontalB_kN}, HL ${load.horizontalL_kN}`;
