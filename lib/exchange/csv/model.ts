/** One finding about a cell, a row or the whole table, written for the person who sent the file. */
export interface CsvFinding {
  /** Line of the file, counted from 1; null for the file as a whole. */
  readonly row: number | null;
  /** Heading as written in the file, or its column letter; null for the row as a whole. */
  readonly column: string | null;
  readonly severity: "error" | "warning" | "note";
  readonly message: string;
}

/** A table as text: headings, rows with their line, and what was found about the shape. */
export interface CsvTable {
  readonly delimiter: "," | ";" | "\t";
  readonly decimalMark: "." | ",";
  readonly encoding: "ascii" | "utf-8" | "utf-8-bom" | "windows-1252";
  readonly headings: readonly string[];
  /** Cells of a row of units under the headings; null when there is none. */
  readonly units: readonly string[] | null;
  readonly rows: readonly { readonly row: number; readonly cells: readonly string[] }[];
  /** Number of rows below the headings and units, with those left out for having another number of cells. */
  readonly rowCount: number;
  readonly findings: readonly CsvFinding[];
  /** Why the file could not be read at all; null when it could. */
  readonly refused: string | null;
}

/** One footing row. Only `mark` is sure to be there; a null was empty in the file. */
export interface FootingRow {
  readonly row: number;
  readonly mark: string;
  readonly description: string;
  readonly easting_m: number | null;
  readonly northing_m: number | null;
  readonly breadth_m: number | null;
  readonly length_m: number | null;
  readonly thickness_m: number | null;
  readonly groundLevel_m: number | null;
  readonly foundingLevel_m: number | null;
  /** Depth of founding below ground level where the file gives that instead of a level. */
  readonly foundingDepth_m: number | null;
  /** Anticlockwise from the easting axis to the breadth axis of the pad. */
  readonly orientation_deg: number | null;
  readonly loadHeight_m: number | null;
  readonly concreteUnitWeight_kNm3: number | null;
  readonly backfillUnitWeight_kNm3: number | null;
  readonly zone: string;
  readonly groundUnit: string;
}

/** How long a combination acts; chooses eccentricity limits and duration factors. */
export type LoadDuration = "permanent" | "transient" | "accidental";

/** One load combination on one footing, at the column base; vertical down is positive. */
export interface LoadRow {
  readonly row: number;
  readonly mark: string;
  readonly combination: string;
  readonly duration: LoadDuration;
  /** "service", "ultimate" or as written; "" when not stated. */
  readonly loadBasis: string;
  readonly vertical_kN: number;
  readonly momentB_kNm: number;
  readonly momentL_kNm: number;
  readonly horizontalB_kN: number;
  readonly horizontalL_kN: number;
}

/** Rows that may be imported, and findings; a row with an error is not among the rows. */
export interface CsvReading<Row> {
  readonly rows: readonly Row[];
  readonly findings: readonly CsvFinding[];
  /** Number of data rows in the file, whether read or refused. */
  readonly rowCount: number;
  /** Which heading of the file was taken for which field. */
  readonly columns: Readonly<Record<string, string>>;
  readonly refused: string | null;
}
