import type { AgsGroup, AgsRow } from "./file-model";
import type { FindingList } from "./finding-list";
import { columnsOf, shown } from "./rule-context";

type Unit = "m" | "mm" | "min" | "%";

// 1 ft = 0.3048 m and 1 in = 25.4 mm exactly (international yard, 1959).
const factors: Readonly<Record<Unit, Readonly<Record<string, number>>>> = {
  m: { m: 1, mm: 1 / 1000, cm: 1 / 100, km: 1000, ft: 0.3048, in: 0.0254 },
  mm: { mm: 1, cm: 10, m: 1000, in: 25.4, ft: 304.8 },
  min: { min: 1, s: 1 / 60, hr: 60, h: 60 },
  "%": { "%": 1 },
};
const divisors: Readonly<Record<string, number>> = { "m mm": 1000, "m cm": 100, "min s": 60 };
const number = /^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?$/;

/** A number written in plain digits, or null: words, blanks and numbers that are not finite are no numbers. */
export function plainNumber(text: string): number | null {
  if (!number.test(text)) return null;
  const value = Number(text);
  if (!Number.isFinite(value)) return null;
  return value === 0 ? 0 : value;
}

/**
 * Reads the items of one group by heading, as texts and as numbers in the unit asked for. Rows whose columns cannot
 * be trusted are left out with a finding; a column in a unit that is not known gives no numbers, never wrong ones.
 */
export class GroupColumns {
  private readonly columns: ReadonlyMap<string, number>;
  private readonly scales = new Map<string, ((value: number) => number) | null>();

  constructor(
    readonly group: AgsGroup,
    private readonly findings: FindingList,
  ) {
    this.columns = columnsOf(group);
  }

  /** True when the group has the heading. */
  has(heading: string): boolean {
    return this.columns.has(heading);
  }

  /** The rows that can be trusted; says which were left out. */
  rows(): readonly AgsRow[] {
    if (this.group.rows.every(({ found }) => found === undefined)) return this.group.rows;
    return this.group.rows.filter(({ line, found }) => {
      if (found === undefined) return true;
      const wanted = this.group.headings.length;
      const message = `The row has ${found} items under ${wanted} headings, so that its values cannot be told apart; it was left out.`;
      this.report("error", line, null, message);
      return false;
    });
  }

  /** An item as written, without blanks around it. */
  text(row: AgsRow, heading: string): string {
    return this.verbatim(row, heading).trim();
  }

  /** An item exactly as written. */
  verbatim(row: AgsRow, heading: string): string {
    const column = this.columns.get(heading);
    return column === undefined ? "" : (row.cells[column] ?? "");
  }

  /** A number in the unit asked for. Null for an empty item, and with a finding for one that is no number. */
  number(row: AgsRow, heading: string, unit: Unit | null): number | null {
    const text = this.text(row, heading);
    if (text === "") return null;
    const value = plainNumber(text);
    if (value === null) {
      this.report("warning", row.line, heading, `${shown(text)} is not a number and was not taken as one.`);
      return null;
    }
    return unit === null ? value : this.scaled(value, heading, unit);
  }

  /** A number that must be whole and not negative, such as blows; null with a finding otherwise. */
  count(row: AgsRow, heading: string): number | null {
    const value = this.number(row, heading, null);
    if (value === null || (Number.isInteger(value) && value >= 0 && value < 100000)) return value;
    this.report(
      "warning",
      row.line,
      heading,
      `${shown(this.text(row, heading))} is not a count and was not taken.`,
    );
    return null;
  }

  /** A reading that may be a word: "Dry" has no number and is no fault. */
  textOrNumber(row: AgsRow, heading: string, unit: Unit): { text: string; number: number | null } {
    const text = this.text(row, heading);
    const value = plainNumber(text);
    return { text, number: value === null ? null : this.scaled(value, heading, unit) };
  }

  /** Adds a finding about this group. */
  report(
    severity: "error" | "warning" | "note",
    line: number | null,
    heading: string | null,
    message: string,
  ): void {
    this.findings.add("ground", severity, { line, group: this.group.name, heading }, message);
  }

  private scaled(value: number, heading: string, unit: Unit): number | null {
    let scale = this.scales.get(heading);
    if (scale === undefined) {
      scale = this.scaleOf(heading, unit);
      this.scales.set(heading, scale);
    }
    return scale === null ? null : scale(value);
  }

  private scaleOf(heading: string, unit: Unit): ((value: number) => number) | null {
    const stated = this.group.headings[this.columns.get(heading) ?? -1]?.unit ?? "";
    if (stated === unit) return (value) => value;
    const line = this.group.unitLine;
    if (stated === "") {
      this.report("warning", line, heading, `${heading} has no unit; it is taken to be in ${unit}.`);
      return (value) => value;
    }
    const known = factors[unit];
    const factor = Object.hasOwn(known, stated) ? known[stated] : undefined;
    if (factor === undefined) {
      this.report(
        "error",
        line,
        heading,
        `${heading} is in ${shown(stated)}, which is not known; its values were not taken.`,
      );
      return null;
    }
    this.report("note", line, heading, `${heading} is in ${stated} and was brought to ${unit}.`);
    const divisor = divisors[`${unit} ${stated}`];
    return divisor === undefined ? (value) => value * factor : (value) => value / divisor;
  }
}

/** The groups of one name, each with its columns: normally one, two where a file repeats the group. */
export function columnsFor(groups: readonly AgsGroup[], name: string, findings: FindingList): GroupColumns[] {
  return groups.filter((group) => group.name === name).map((group) => new GroupColumns(group, findings));
}
