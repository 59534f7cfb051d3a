import { type CsvError, parse } from "csv-parse/browser/esm/sync";
import { type ByteKind, decodeText, kindOfBytes, type TextEncodingFound } from "../text/decode";
import type { CsvFinding, CsvTable } from "./model";
import { type DecimalMark, decimalMarkIn } from "./number";
import { isUnitRow } from "./units";

/** A table larger than this is refused; a schedule of ten thousand footings has about one megabyte. */
export const largestTable_bytes = 64 * 1024 * 1024;

const refusals: Readonly<Record<Exclude<ByteKind, "text">, string>> = {
  empty: "The file is empty.",
  zip: "This is a ZIP archive or a workbook, not a CSV file. Save the sheet as CSV.",
  "utf-16": "The file is saved as UTF-16 text. Save it again as CSV in UTF-8.",
  binary: "This is not a text file, so it cannot be read as CSV.",
  "too-large": "The file is too large to be read in one piece.",
};

type Delimiter = CsvTable["delimiter"];
interface Line {
  readonly row: number;
  readonly cells: readonly string[];
}

/**
 * Reads a table from the bytes or the text of a CSV file: finds the delimiter, the decimal mark and a row of units,
 * keeps the line of each row. Never throws; what cannot be read is refused with one sentence.
 */
export function readCsvTable(content: Uint8Array | string): CsvTable {
  const { text, encoding, kind } = textOf(content);
  if (kind !== "text") return refusedTable(refusals[kind], encoding);

  const findings: CsvFinding[] = [];
  if (text.includes("\u0000")) {
    return refusedTable("The file has zero characters in it, so it is not a CSV text file.", encoding);
  }
  const stated = /^"?sep=([,;\t])"?\r?(\n|$)/i.exec(text)?.[1] as Delimiter | undefined;
  const delimiter = stated ?? delimiterOf(text);
  const lines = split(text, delimiter, encoding);
  if ("refused" in lines) return lines;
  const filled = (stated ? lines.slice(1) : lines).filter(({ cells }) => cells.some((cell) => cell !== ""));
  const [head, ...rest] = filled;
  if (!head) return refusedTable("The file has no row with anything in it.", encoding);

  const headings = withoutEmptyEnd(head.cells);
  const unitsGiven = rest[0] !== undefined && isUnitRow(rest[0].cells);
  const body = unitsGiven ? rest.slice(1) : rest;
  const { mark, findings: markFindings } = decimalMarkOf(body, headings, delimiter);
  findings.push(...markFindings);
  const rows = body.flatMap((line) => fitted(line, headings, findings));
  return {
    delimiter,
    decimalMark: mark,
    encoding,
    headings,
    units: unitsGiven ? (rest[0]?.cells.slice(0, headings.length) ?? null) : null,
    rows,
    rowCount: body.length,
    findings,
    refused: null,
  };
}

function textOf(content: Uint8Array | string): { text: string; encoding: TextEncodingFound; kind: ByteKind } {
  if (typeof content !== "string") {
    const kind = kindOfBytes(content, largestTable_bytes);
    return kind === "text" ? { ...decodeText(content), kind } : { text: "", encoding: "ascii", kind };
  }
  const start = new TextEncoder().encode(content.slice(0, 65536));
  const kind = content.length > largestTable_bytes ? "too-large" : kindOfBytes(start, largestTable_bytes);
  const marked = content.startsWith("\ufeff");
  return { text: marked ? content.slice(1) : content, encoding: marked ? "utf-8-bom" : "utf-8", kind };
}

function refusedTable(refused: string, encoding: TextEncodingFound): CsvTable {
  const findings: CsvFinding[] = [{ row: null, column: null, severity: "error", message: refused }];
  const shape = { delimiter: ",", decimalMark: ".", units: null } as const;
  return { ...shape, encoding, headings: [], rows: [], rowCount: 0, findings, refused };
}

/** The delimiter that splits the first lines most evenly; of equals, the one that makes most cells. */
function delimiterOf(text: string): Delimiter {
  const sample = text
    .slice(0, 65536)
    .split(/\r\n|\n|\r/)
    .filter((line) => line.trim() !== "")
    .slice(0, 50);
  const scored = ([";", "\t", ","] as const).map((delimiter) => {
    const counts = sample.map((line) => countOutsideQuotes(line, delimiter));
    const first = counts[0] ?? 0;
    const alike = counts.filter((count) => count === first).length;
    return { delimiter, score: first === 0 ? 0 : alike / counts.length + first / 1e4 };
  });
  scored.sort((a, b) => b.score - a.score);
  return scored[0] && scored[0].score > 0 ? scored[0].delimiter : ",";
}

function countOutsideQuotes(line: string, mark: string): number {
  let quoted = false;
  let count = 0;
  for (const character of line) {
    if (character === '"') quoted = !quoted;
    else if (character === mark && !quoted) count += 1;
  }
  return count;
}

function split(text: string, delimiter: Delimiter, encoding: TextEncodingFound): Line[] | CsvTable {
  let lastLine = 0;
  const lines: Line[] = [];
  try {
    parse(text, {
      delimiter,
      relax_column_count: true,
      relax_quotes: true,
      skip_empty_lines: true,
      record_delimiter: ["\r\n", "\n", "\r"],
      on_record: (record: string[], { lines: at }) => {
        const inside = record.reduce((sum, cell) => sum + (cell.match(/\r\n|\n|\r/g)?.length ?? 0), 0);
        lines.push({ row: at - inside, cells: record.map((cell) => cell.trim()) });
        lastLine = at;
        return null;
      },
    });
    return lines;
  } catch (error) {
    const quote = (error as CsvError).code === "CSV_QUOTE_NOT_CLOSED";
    const message = quote
      ? `A double quote is opened after line ${lastLine} and never closed, so the rows cannot be told apart.`
      : `The rows cannot be told apart after line ${lastLine}.`;
    return refusedTable(message, encoding);
  }
}

function withoutEmptyEnd(cells: readonly string[]): string[] {
  const kept = [...cells];
  while (kept.length > 0 && kept.at(-1) === "") kept.pop();
  return kept;
}

/** A row of another length has moved its cells under other headings: it is reported and left out. */
function fitted({ row, cells }: Line, headings: readonly string[], findings: CsvFinding[]): Line[] {
  const kept = cells.length > headings.length ? withoutEmptyEnd(cells) : cells;
  if (kept.length > headings.length || cells.length < headings.length) {
    const message = `The row has ${kept.length} cells under ${headings.length} headings, so it was left out.`;
    findings.push({ row, column: null, severity: "error", message });
    return [];
  }
  return [{ row, cells: headings.map((_, place) => kept[place] ?? "") }];
}

function decimalMarkOf(
  body: readonly Line[],
  headings: readonly string[],
  delimiter: Delimiter,
): { mark: DecimalMark; findings: CsvFinding[] } {
  let comma: { row: number; cell: string; column: string } | null = null;
  const counts = { ".": 0, ",": 0 };
  for (const { row, cells } of body) {
    for (const [place, cell] of cells.entries()) {
      const mark = decimalMarkIn(cell);
      if (mark === null) continue;
      counts[mark] += 1;
      if (mark === ",") comma ??= { row, cell, column: headings[place] ?? "" };
    }
  }
  // Between commas a comma inside a number may as well be a thousands mark: it is refused cell by cell.
  if (comma === null || delimiter === ",") return { mark: ".", findings: [] };
  if (counts["."] === 0) {
    const shown = comma.cell.replace(",", ".");
    const message = `Numbers are read with a decimal comma: ${comma.cell} is read as ${shown}.`;
    return { mark: ",", findings: [{ row: null, column: null, severity: "note", message }] };
  }
  const mark = counts[","] > counts["."] ? "," : ".";
  const message =
    `The file mixes decimal points (${counts["."]} cells) and decimal commas (${counts[","]} cells). ` +
    `Numbers with a ${mark === "." ? "comma" : "point"} are refused.`;
  return { mark, findings: [{ row: comma.row, column: comma.column, severity: "warning", message }] };
}
