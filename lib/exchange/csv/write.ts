/** What a cell may hold. A null is written as nothing. */
export type CsvCell = string | number | boolean | null;

/** How a CSV file is written. */
export interface CsvWriting {
  readonly delimiter?: "," | ";" | "\t";
  /** A byte order mark makes spreadsheets read the file as UTF-8. */
  readonly byteOrderMark?: boolean;
}

const formulaStart = /^\s*[=+\-@\uff1d\uff0b\uff0d\uff20]|^[\t\r\n]/u;
const numeric = /^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?$/;

/**
 * Writes rows as CSV with CR LF. A text that a spreadsheet would run as a formula (=, +, - or @ at its start, behind
 * blanks or not, or a tab or line break) gets an apostrophe before it, unless it is a plain number. Throws a
 * RangeError for a number that is not finite.
 */
export function writeCsv(rows: Iterable<readonly CsvCell[]>, options: CsvWriting = {}): string {
  const { delimiter = ",", byteOrderMark = false } = options;
  const lines: string[] = [];
  for (const row of rows) lines.push(row.map((cell) => writeCell(cell, delimiter)).join(delimiter));
  return `${byteOrderMark ? "\ufeff" : ""}${lines.map((line) => `${line}\r\n`).join("")}`;
}

/** A text as it may stand in a cell of a spreadsheet: never run as a formula. */
export function neutralised(text: string): string {
  return formulaStart.test(text) && !numeric.test(text.trim()) ? `'${text}` : text;
}

function writeCell(cell: CsvCell, delimiter: string): string {
  if (cell === null) return "";
  if (typeof cell === "number") {
    if (!Number.isFinite(cell)) throw new RangeError("A number that is not finite cannot be written to CSV.");
    return String(cell);
  }
  const text = typeof cell === "boolean" ? (cell ? "yes" : "no") : neutralised(cell);
  const quoted = text.includes(delimiter) || /["\r\n,;\t]/.test(text) || text !== text.trim();
  return quoted ? `"${text.replaceAll('"', '""')}"` : text;
}
