import type { CsvFinding, CsvTable } from "./model";
import { readNumber } from "./number";
import { isUnit, keptUnit, type Quantity, toKeptUnit, unitFactor } from "./units";

/** One field that a table may carry: what it is called in words, and the headings taken for it. */
export interface Field {
  readonly label: string;
  /** Null for text. */
  readonly quantity: Quantity | null;
  /** Lower case words, as a heading reads once its unit and punctuation are gone. */
  readonly names: readonly string[];
}

/** Where the fields of a table stand, and how their numbers come to the kept unit. */
export interface Columns<Name extends string> {
  readonly place: ReadonlyMap<
    Name,
    { readonly index: number; readonly heading: string; readonly factor: number }
  >;
  readonly headings: Readonly<Record<string, string>>;
  readonly findings: readonly CsvFinding[];
  /** Why the table cannot be used: two columns for one field, or a unit that is not known. */
  readonly refused: string | null;
}

/** Finds the column of each field by its heading; says which headings are not used. */
export function findColumns<Name extends string>(
  table: CsvTable,
  fields: Readonly<Record<Name, Field>>,
): Columns<Name> {
  const byName = new Map<string, Name>();
  for (const name of Object.keys(fields) as Name[]) {
    for (const word of fields[name].names) byName.set(word, name);
  }
  const place = new Map<Name, { index: number; heading: string; factor: number }>();
  const findings: CsvFinding[] = [];
  let refused: string | null = null;
  const refuse = (column: string, message: string) => {
    refused ??= message;
    findings.push({ row: null, column, severity: "error", message });
  };
  for (const [index, heading] of table.headings.entries()) {
    if (heading === "") continue;
    const { words, unit: ownUnit } = readHeading(heading);
    const name = byName.get(words);
    if (name === undefined) {
      const message = `The column "${shortened(heading)}" is not used.`;
      findings.push({ row: null, column: heading, severity: "note", message });
      continue;
    }
    const taken = place.get(name);
    if (taken) {
      refuse(
        heading,
        `Both "${taken.heading}" and "${heading}" read as ${fields[name].label}; keep one of them.`,
      );
      continue;
    }
    const { quantity } = fields[name];
    const unit = ownUnit || unitBelow(table, index);
    const factor = quantity === null || unit === "" ? 1 : unitFactor(unit, quantity);
    if (factor === null) {
      const wanted = quantity === null ? "" : keptUnit[quantity];
      refuse(
        heading,
        `The unit ${unit} of "${heading}" is not known for ${fields[name].label}; give it in ${wanted}.`,
      );
      continue;
    }
    if (quantity !== null && factor !== 1) {
      const message = `"${heading}" is read in ${unit} and kept in ${keptUnit[quantity]}.`;
      findings.push({ row: null, column: heading, severity: "note", message });
    }
    place.set(name, { index, heading, factor });
  }
  const headings = Object.fromEntries([...place].map(([name, { heading }]) => [name, heading]));
  return { place, headings, findings, refused };
}

/** Reads the cells of one row by field, and gathers its findings. */
export class RowReader<Name extends string> {
  readonly findings: CsvFinding[] = [];

  constructor(
    private readonly table: CsvTable,
    private readonly columns: Columns<Name>,
    readonly row: number,
    private readonly cells: readonly string[],
  ) {}

  /** True when a finding of this row is an error, so that the row must not be used. */
  get refused(): boolean {
    return this.findings.some(({ severity }) => severity === "error");
  }

  /** The text of a field; "" where the table has no such column. */
  text(name: Name): string {
    const column = this.columns.place.get(name);
    return column ? (this.cells[column.index] ?? "") : "";
  }

  /** The number of a field in its kept unit; null where it is empty, absent or refused. */
  number(name: Name): number | null {
    const column = this.columns.place.get(name);
    if (!column) return null;
    const reading = readNumber(this.cells[column.index] ?? "", this.table.decimalMark);
    if (reading.kind === "empty") return null;
    if (reading.kind === "number") return toKeptUnit(reading.value, column.factor);
    this.refuse(name, reading.message);
    return null;
  }

  /** A size: a number above zero, or null. */
  size(name: Name, label: string): number | null {
    const value = this.number(name);
    if (value !== null && value <= 0) {
      this.refuse(name, `The ${label} must be above 0.`);
      return null;
    }
    return value;
  }

  /** Adds an error about a field of this row. */
  refuse(name: Name | null, message: string): void {
    this.add("error", name, message);
  }

  /** Adds a warning about a field of this row. */
  warn(name: Name, message: string): void {
    this.add("warning", name, message);
  }

  private add(severity: CsvFinding["severity"], name: Name | null, message: string): void {
    const column = name === null ? null : (this.columns.place.get(name)?.heading ?? name);
    this.findings.push({ row: this.row, column, severity, message });
  }
}

/** Takes a heading apart: "Breadth (m)", "breadth_m", "groundLevel_m", "Breadth [mm]", "Breadth, m". */
export function readHeading(heading: string): { words: string; unit: string } {
  const [, name = "", inner = ""] = /^(.*?)[\s_]*[([]\s*([^)\]]*)\s*[)\]]\s*$/.exec(heading) ?? [];
  if (isUnit(inner)) return { words: wordsOf(name), unit: inner };
  const [, before = "", between = "", unit = ""] =
    /^(.+?)(_|,\s*|\s+in\s+|\s*\/\s*|\s+)([^\s_,]+)$/.exec(heading) ?? [];
  // After a mere blank, N and "in" are words ("Axial N"), not newton and inch.
  const word = between.trim() === "" && /^(n|in)$/i.test(unit);
  if (isUnit(unit) && !word) return { words: wordsOf(before), unit };
  return { words: wordsOf(heading), unit: "" };
}

function wordsOf(text: string): string {
  return text
    .replace(/([a-z])([A-Z])/g, "$1 $2")
    .toLowerCase()
    .replace(/[^\p{L}\p{Nd}]+/gu, " ")
    .trim();
}

function unitBelow(table: CsvTable, index: number): string {
  const unit = (table.units?.[index] ?? "").replace(/^[[(]\s*|\s*[\])]$/g, "");
  return /^([-–—]|units?|text)?$/i.test(unit) ? "" : unit;
}

function shortened(heading: string): string {
  return heading.length > 60 ? `${heading.slice(0, 60)}…` : heading;
}
