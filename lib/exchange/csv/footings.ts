import { type Field, findColumns, RowReader } from "./columns";
import type { CsvFinding, CsvReading, FootingRow } from "./model";
import { readCsvTable } from "./read";

type FootingField = Exclude<keyof FootingRow, "row">;

const fields: Readonly<Record<FootingField, Field>> = {
  mark: {
    label: "the mark",
    quantity: null,
    names: [
      "mark",
      "footing",
      "footing mark",
      "footing id",
      "pad",
      "pad mark",
      "id",
      "reference",
      "ref",
      "name",
    ],
  },
  description: {
    label: "the description",
    quantity: null,
    names: ["description", "note", "notes", "remark", "remarks", "comment"],
  },
  easting_m: {
    label: "the easting",
    quantity: "length",
    names: ["easting", "east", "x", "e", "x coordinate"],
  },
  northing_m: {
    label: "the northing",
    quantity: "length",
    names: ["northing", "north", "y", "n", "y coordinate"],
  },
  breadth_m: {
    label: "the breadth",
    quantity: "length",
    names: ["breadth", "b", "width", "footing breadth", "pad breadth"],
  },
  length_m: {
    label: "the length",
    quantity: "length",
    names: ["length", "l", "footing length", "pad length"],
  },
  thickness_m: {
    label: "the thickness",
    quantity: "length",
    names: ["thickness", "t", "h", "pad thickness", "footing thickness", "pad depth"],
  },
  groundLevel_m: {
    label: "the ground level",
    quantity: "length",
    names: ["ground level", "gl", "existing ground level", "ground", "ground lvl"],
  },
  foundingLevel_m: {
    label: "the founding level",
    quantity: "length",
    names: [
      "founding level",
      "formation level",
      "level of founding",
      "foundation level",
      "underside level",
      "founding lvl",
      "fl",
    ],
  },
  foundingDepth_m: {
    label: "the founding depth",
    quantity: "length",
    names: ["founding depth", "depth of founding", "foundation depth", "depth below ground"],
  },
  orientation_deg: {
    label: "the orientation",
    quantity: "angle",
    names: ["orientation", "rotation", "angle", "direction"],
  },
  loadHeight_m: {
    label: "the load height",
    quantity: "length",
    names: ["load height", "height of load", "height of load above base"],
  },
  concreteUnitWeight_kNm3: {
    label: "the concrete unit weight",
    quantity: "unit weight",
    names: ["concrete unit weight", "unit weight of concrete", "concrete weight"],
  },
  backfillUnitWeight_kNm3: {
    label: "the backfill unit weight",
    quantity: "unit weight",
    names: ["backfill unit weight", "unit weight of backfill", "backfill weight", "fill unit weight"],
  },
  zone: { label: "the zone", quantity: null, names: ["zone", "zone name"] },
  groundUnit: {
    label: "the ground unit",
    quantity: null,
    names: ["ground unit", "unit", "bearing stratum", "stratum"],
  },
};

/**
 * Reads a schedule of footings from CSV: one row a footing, lengths in metres unless the heading or a row of units
 * says otherwise. A row with an error is reported and left out. Never throws.
 */
export function readFootingsCsv(content: Uint8Array | string): CsvReading<FootingRow> {
  const table = readCsvTable(content);
  if (table.refused !== null) return refusal(table.refused, table.findings);
  const columns = findColumns(table, fields);
  const findings: CsvFinding[] = [...table.findings, ...columns.findings];
  const missing = missingColumns((name) => columns.place.has(name));
  const refused = columns.refused ?? missing;
  if (refused !== null) {
    if (columns.refused === null)
      findings.push({ row: null, column: null, severity: "error", message: refused });
    return { rows: [], findings, rowCount: table.rowCount, columns: columns.headings, refused };
  }

  const rows: FootingRow[] = [];
  const firstRow = new Map<string, number>();
  for (const { row, cells } of table.rows) {
    const reader = new RowReader(table, columns, row, cells);
    const footing = readFooting(reader);
    const letters = footing.mark.toLowerCase();
    const before = firstRow.get(letters);
    if (footing.mark === "") reader.refuse("mark", "The footing has no mark.");
    else if (before !== undefined) reader.refuse("mark", `${footing.mark} stands in row ${before} already.`);
    else firstRow.set(letters, row);
    findings.push(...reader.findings);
    if (!reader.refused) rows.push(footing);
  }
  return { rows, findings, rowCount: table.rowCount, columns: columns.headings, refused: null };
}

function readFooting(reader: RowReader<FootingField>): FootingRow {
  const foundingLevel_m = reader.number("foundingLevel_m");
  const foundingDepth_m = reader.number("foundingDepth_m");
  const groundLevel_m = reader.number("groundLevel_m");
  if (foundingDepth_m !== null && foundingDepth_m < 0) {
    reader.refuse("foundingDepth_m", "The founding depth is below ground and cannot be negative.");
  }
  const all = groundLevel_m !== null && foundingLevel_m !== null && foundingDepth_m !== null;
  if (all && Math.abs(groundLevel_m - foundingDepth_m - foundingLevel_m) > 0.005) {
    const found = (groundLevel_m - foundingDepth_m).toFixed(2);
    reader.refuse(
      "foundingLevel_m",
      `Ground level less founding depth is ${found} m, not ${foundingLevel_m} m.`,
    );
  }
  return {
    row: reader.row,
    mark: reader.text("mark"),
    description: reader.text("description"),
    easting_m: reader.number("easting_m"),
    northing_m: reader.number("northing_m"),
    breadth_m: reader.size("breadth_m", "breadth"),
    length_m: reader.size("length_m", "length"),
    thickness_m: reader.size("thickness_m", "thickness"),
    groundLevel_m,
    foundingLevel_m,
    foundingDepth_m,
    orientation_deg: reader.number("orientation_deg"),
    loadHeight_m: reader.number("loadHeight_m"),
    concreteUnitWeight_kNm3: reader.size("concreteUnitWeight_kNm3", "unit weight of concrete"),
    backfillUnitWeight_kNm3: reader.size("backfillUnitWeight_kNm3", "unit weight of the backfill"),
    zone: reader.text("zone"),
    groundUnit: reader.text("groundUnit"),
  };
}

function missingColumns(has: (name: FootingField) => boolean): string | null {
  if (!has("mark")) return 'No column holds the marks of the footings. Head it "mark".';
  const others = (Object.keys(fields) as FootingField[]).some((name) => name !== "mark" && has(name));
  return others ? null : "No column beside the mark is known: there is nothing to read of the footings.";
}

function refusal(refused: string, findings: readonly CsvFinding[]): CsvReading<FootingRow> {
  return { rows: [], findings, rowCount: 0, columns: {}, refused };
}
