/** How grave a finding is: an error breaks a numbered rule, a warning wants a look, a note is for the record. */
export type AgsSeverity = "error" | "warning" | "note";

/** One finding about an AGS file: which numbered rule, where, and our own sentence about it. */
export interface AgsFinding {
  /** "1" to "20" with their letters, "file" for what stops or explains reading, "ground" for engineering sanity. */
  readonly rule: string;
  /** Line in the file, counted from 1; null when the finding is about the whole file or a group that is absent. */
  readonly line: number | null;
  readonly group: string | null;
  readonly heading: string | null;
  readonly severity: AgsSeverity;
  readonly message: string;
}

/** The editions whose facts the register knows. "4", "4.0" and "4.0.3" read as 4.0.4, "4.1" as 4.1.1. */
export type AgsEdition = "4.0.4" | "4.1.1" | "4.2";

/** How the bytes were turned into text. */
export type AgsEncoding = "ascii" | "utf-8" | "utf-8-bom" | "windows-1252";

/** One column of a group as the file declares it. */
export interface AgsHeading {
  readonly name: string;
  readonly unit: string;
  readonly type: string;
}

/** One DATA row: its first line in the file and one text per heading, verbatim. */
export interface AgsRow {
  readonly line: number;
  /** Exactly as many cells as the group has headings. */
  readonly cells: readonly string[];
  /** Set when the row had another number of items than its heading row, so that its columns cannot be trusted. */
  readonly found?: number;
}

/** One group of a file. */
export interface AgsGroup {
  readonly name: string;
  /** Line of the GROUP row. */
  readonly line: number;
  readonly headings: readonly AgsHeading[];
  readonly rows: readonly AgsRow[];
  /** Lines of the header rows; null where the row is missing. */
  readonly headingLine: number | null;
  readonly unitLine: number | null;
  readonly typeLine: number | null;
}

/** What the bytes turned out to be. Groups can be read from "ags4" alone. */
export type AgsFileKind = "ags4" | "ags3" | "empty" | "no-groups" | "binary" | "zip" | "utf-16" | "too-large";

/** What reading an AGS file gives: everything that could be read, and what was wrong with the shape of it. */
export interface AgsFile {
  readonly kind: AgsFileKind;
  /** The edition whose facts are used to judge the file. */
  readonly edition: AgsEdition;
  /** TRAN_AGS as written; null when the file does not say. */
  readonly statedEdition: string | null;
  readonly encoding: AgsEncoding;
  readonly lineEnds: "crlf" | "lf" | "mixed" | "none";
  readonly lineCount: number;
  /** Why nothing (more) could be read, in one sentence; null when the whole file was read. */
  readonly stopped: string | null;
  readonly groups: readonly AgsGroup[];
  /** Findings about bytes, rows and header rows: rules 1 to 6 and "file". */
  readonly findings: readonly AgsFinding[];
  /** Findings of reading per severity and per rule, counting also those left out of a very long list. */
  readonly counts: Readonly<Record<AgsSeverity, number>>;
  readonly countsByRule: Readonly<Record<string, number>>;
}

/** The whole report on one file. */
export interface AgsReport {
  readonly edition: AgsEdition;
  readonly statedEdition: string | null;
  readonly stopped: string | null;
  /** Reading and rule findings together, in file order; those without a line come last. */
  readonly findings: readonly AgsFinding[];
  readonly counts: Readonly<Record<AgsSeverity, number>>;
  /** Findings per rule, counting also those left out of a very long list. */
  readonly countsByRule: Readonly<Record<string, number>>;
}
