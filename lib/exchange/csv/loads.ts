import { type Field, findColumns, RowReader } from "./columns";
import type { CsvFinding, CsvReading, LoadDuration, LoadRow } from "./model";
import { readCsvTable } from "./read";

type LoadField = Exclude<keyof LoadRow, "row">;

const fields: Readonly<Record<LoadField, Field>> = {
  mark: {
    label: "the mark",
    quantity: null,
    names: ["mark", "footing", "footing mark", "footing id", "pad", "pad mark", "id", "reference", "ref"],
  },
  combination: {
    label: "the combination",
    quantity: null,
    names: ["combination", "load combination", "combo", "case", "load case", "lc", "combination name"],
  },
  duration: {
    label: "the duration",
    quantity: null,
    names: ["duration", "load duration", "situation", "design situation"],
  },
  loadBasis: { label: "the load basis", quantity: null, names: ["load basis", "basis", "limit state"] },
  vertical_kN: {
    label: "the vertical load",
    quantity: "force",
    names: ["vertical", "n", "v", "p", "fz", "vertical load", "axial", "axial load", "vertical force"],
  },
  momentB_kNm: {
    label: "the moment along B",
    quantity: "moment",
    names: ["moment b", "mb", "m b", "moment along b"],
  },
  momentL_kNm: {
    label: "the moment along L",
    quantity: "moment",
    names: ["moment l", "ml", "m l", "moment along l"],
  },
  horizontalB_kN: {
    label: "the horizontal load along B",
    quantity: "force",
    names: ["horizontal b", "hb", "h b", "horizontal load b", "horizontal along b", "shear b"],
  },
  horizontalL_kN: {
    label: "the horizontal load along L",
    quantity: "force",
    names: ["horizontal l", "hl", "h l", "horizontal load l", "horizontal along l", "shear l"],
  },
};

const sideLoads = ["momentB_kNm", "momentL_kNm", "horizontalB_kN", "horizontalL_kN"] as const;
type SideLoad = (typeof sideLoads)[number];

const durations: ReadonlyMap<string, LoadDuration> = new Map([
  ["permanent", "permanent"],
  ["persistent", "permanent"],
  ["sustained", "permanent"],
  ["long term", "permanent"],
  ["transient", "transient"],
  ["variable", "transient"],
  ["short term", "transient"],
  ["temporary", "transient"],
  ["accidental", "accidental"],
  ["exceptional", "accidental"],
]);

/**
 * Reads load combinations in long form from CSV: one row for each combination on each footing, in kN and kNm unless
 * the heading or a row of units says otherwise. A row with an error is reported and left out. Never throws.
 */
export function readLoadsCsv(content: Uint8Array | string): CsvReading<LoadRow> {
  const table = readCsvTable(content);
  if (table.refused !== null) {
    return { rows: [], findings: table.findings, rowCount: 0, columns: {}, refused: table.refused };
  }
  const columns = findColumns(table, fields);
  const has = (name: LoadField) => columns.place.has(name);
  const findings: CsvFinding[] = [...table.findings, ...columns.findings];
  const refused = columns.refused ?? missingColumn(has);
  if (refused !== null) {
    if (columns.refused === null)
      findings.push({ row: null, column: null, severity: "error", message: refused });
    return { rows: [], findings, rowCount: table.rowCount, columns: columns.headings, refused };
  }
  for (const name of sideLoads) {
    if (has(name)) continue;
    const message = `No column holds ${fields[name].label}: it is taken as 0 in every row.`;
    findings.push({ row: null, column: null, severity: "warning", message });
  }

  const rows: LoadRow[] = [];
  const firstRow = new Map<string, number>();
  for (const { row, cells } of table.rows) {
    const reader = new RowReader(table, columns, row, cells);
    const load = readLoad(reader, has);
    if (load) refuseRepeated(reader, load, firstRow);
    findings.push(...reader.findings);
    if (load && !reader.refused) rows.push(load);
  }
  return { rows, findings, rowCount: table.rowCount, columns: columns.headings, refused: null };
}

function readLoad(reader: RowReader<LoadField>, has: (name: LoadField) => boolean): LoadRow | null {
  const mark = reader.text("mark");
  const combination = reader.text("combination");
  if (mark === "") reader.refuse("mark", "The row names no footing.");
  if (combination === "") reader.refuse("combination", "The combination has no name.");
  const duration = readDuration(reader);
  const before = reader.findings.length;
  const vertical_kN = reader.number("vertical_kN");
  if (vertical_kN === null && reader.findings.length === before) {
    reader.refuse("vertical_kN", "The vertical load is missing; write 0 where there is none.");
  }
  const side = (name: SideLoad): number => {
    const value = reader.number(name);
    if (value !== null || !has(name)) return value ?? 0;
    if (reader.text(name) === "")
      reader.warn(name, `${sentence(fields[name].label)} is empty and is read as 0.`);
    return 0;
  };
  const [momentB_kNm, momentL_kNm] = [side("momentB_kNm"), side("momentL_kNm")];
  const [horizontalB_kN, horizontalL_kN] = [side("horizontalB_kN"), side("horizontalL_kN")];
  if (duration === null || vertical_kN === null) return null;
  const loadBasis = reader.text("loadBasis");
  const loads = { vertical_kN, momentB_kNm, momentL_kNm, horizontalB_kN, horizontalL_kN };
  return { row: reader.row, mark, combination, duration, loadBasis, ...loads };
}

function readDuration(reader: RowReader<LoadField>): LoadDuration | null {
  const written = reader.text("duration");
  const duration = durations.get(
    written
      .toLowerCase()
      .replace(/[^a-z]+/g, " ")
      .trim(),
  );
  if (duration) return duration;
  const said =
    written === "" ? "The duration is missing" : `"${written.slice(0, 40)}" is no duration that is known`;
  reader.refuse("duration", `${said}; write permanent, transient or accidental.`);
  return null;
}

function refuseRepeated(reader: RowReader<LoadField>, load: LoadRow, firstRow: Map<string, number>): void {
  if (load.mark === "" || load.combination === "") return;
  const key = JSON.stringify([load.mark.toLowerCase(), load.combination.toLowerCase()]);
  const before = firstRow.get(key);
  if (before === undefined) firstRow.set(key, load.row);
  else reader.refuse("combination", `${load.combination} on ${load.mark} stands in row ${before} already.`);
}

function missingColumn(has: (name: LoadField) => boolean): string | null {
  if (!has("mark")) return 'No column names the footings. Head it "mark".';
  if (!has("combination")) return 'No column names the load combinations. Head it "combination".';
  if (!has("duration")) {
    return 'No column says how long a combination acts. Head it "duration": permanent, transient or accidental.';
  }
  return has("vertical_kN") ? null : 'No column holds the vertical loads. Head it "vertical_kN".';
}

function sentence(label: string): string {
  return label.charAt(0).toUpperCase() + label.slice(1);
}
