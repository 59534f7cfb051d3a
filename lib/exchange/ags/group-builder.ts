import type { AgsFinding, AgsGroup, AgsRow } from "./file-model";
import type { FindingList } from "./finding-list";
import type { Descriptor } from "./row-scanner";

/** Builds one group from its rows and reports header rows that are missing, misplaced or of another width. */
export class GroupBuilder {
  private headings: string[] | null = null;
  private units: readonly string[] = [];
  private types: readonly string[] = [];
  private headingLine: number | null = null;
  private unitLine: number | null = null;
  private typeLine: number | null = null;
  private firstDataLine: number | null = null;
  private readonly rows: AgsRow[] = [];

  constructor(
    readonly name: string,
    private readonly line: number,
    private readonly findings: FindingList,
  ) {}

  /** Number of headings; 0 before the HEADING row. */
  get width(): number {
    return this.headings?.length ?? 0;
  }

  /** Takes one row below the GROUP row. */
  add(descriptor: Descriptor, items: readonly string[], line: number): void {
    if (descriptor === "HEADING") this.addHeading(items, line);
    else if (descriptor === "UNIT") this.addUnit(items, line);
    else if (descriptor === "TYPE") this.addType(items, line);
    else this.addData(items, line);
  }

  /** The group as read, after a look at the order of its header rows. */
  finish(): AgsGroup {
    this.reportHeaderOrder();
    const names = this.headings ?? [];
    return {
      name: this.name,
      line: this.line,
      headings: names.map((name, place) => ({
        name,
        unit: (this.units[place] ?? "").trim(),
        type: (this.types[place] ?? "").trim(),
      })),
      rows: this.rows,
      headingLine: this.headingLine,
      unitLine: this.unitLine,
      typeLine: this.typeLine,
    };
  }

  private addHeading(items: readonly string[], line: number): void {
    if (this.headings) {
      this.report("2b", line, "The group has a second HEADING row, which was passed over.");
      return;
    }
    const names = items.map((item) => item.trim());
    while (names.length > 0 && names.at(-1) === "") names.pop();
    if (names.length < items.length) {
      this.report(
        "4",
        line,
        `The HEADING row ends in ${items.length - names.length} empty items, which were left off.`,
      );
    }
    this.headings = names;
    this.headingLine = line;
    const seen = new Set<string>();
    for (const [place, name] of names.entries()) {
      if (name !== items[place])
        this.report("19a", line, `Blanks around the heading "${name}" were taken off.`, name);
      if (seen.has(name)) this.report("2c", line, `The heading ${name} stands twice in this group.`, name);
      seen.add(name);
    }
  }

  private addUnit(items: readonly string[], line: number): void {
    if (this.unitLine !== null) {
      this.report("2b", line, "The group has a second UNIT row, which was passed over.");
      return;
    }
    this.unitLine = line;
    this.units = this.fitted(items, line, "UNIT").cells;
  }

  private addType(items: readonly string[], line: number): void {
    if (this.typeLine !== null) {
      this.report("2b", line, "The group has a second TYPE row, which was passed over.");
      return;
    }
    this.typeLine = line;
    this.types = this.fitted(items, line, "TYPE").cells;
  }

  private addData(items: readonly string[], line: number): void {
    this.firstDataLine ??= line;
    if (!this.headings) {
      this.report("2b", line, "The row stands before the HEADING row and was not read.");
      return;
    }
    const { cells, shifted } = this.fitted(items, line, "DATA");
    this.rows.push(shifted ? { line, cells, found: items.length } : { line, cells });
  }

  private fitted(
    items: readonly string[],
    line: number,
    what: Descriptor,
  ): { cells: readonly string[]; shifted: boolean } {
    const { headings } = this;
    if (!headings) return { cells: items, shifted: false };
    const expected = headings.length;
    if (items.length === expected) return { cells: items, shifted: false };
    const fillUp = items.length > expected && items.slice(expected).every((item) => item === "");
    const detail = fillUp ? " The items beyond are empty and were left off." : "";
    this.report(
      "4",
      line,
      `The ${what} row has ${items.length} items where the headings ask for ${expected}.${detail}`,
    );
    const cells = items.slice(0, expected);
    while (cells.length < expected) cells.push("");
    return { cells, shifted: !fillUp };
  }

  private reportHeaderOrder(): void {
    const { headingLine, unitLine, typeLine, firstDataLine, line } = this;
    if (headingLine === null) this.report("2b", line, `The group ${this.name} has no HEADING row.`);
    if (unitLine === null) this.report("2b", line, `The group ${this.name} has no UNIT row.`);
    if (typeLine === null) this.report("2b", line, `The group ${this.name} has no TYPE row.`);
    if (unitLine !== null && typeLine !== null && typeLine < unitLine) {
      this.report("2b", typeLine, "The TYPE row stands above the UNIT row; it belongs below it.");
      this.report(
        "2b",
        unitLine,
        "The UNIT row stands below the TYPE row; it belongs directly below the headings.",
      );
    } else {
      for (const [what, at] of [
        ["UNIT", unitLine],
        ["TYPE", typeLine],
      ] as const) {
        if (at === null) continue;
        if (headingLine !== null && at < headingLine)
          this.report("2b", at, `The ${what} row stands above the headings.`);
        if (firstDataLine !== null && at > firstDataLine)
          this.report("2b", at, `The ${what} row stands below data rows.`);
      }
    }
  }

  private report(rule: string, line: number, message: string, heading: string | null = null): void {
    this.findings.add(rule, "error", { line, group: this.name, heading }, message);
  }
}

/** Findings in file order; those about the file as a whole come last, and equal lines keep their order. */
export function sortFindings(findings: readonly AgsFinding[]): AgsFinding[] {
  return [...findings].sort(
    (a, b) => (a.line ?? Number.MAX_SAFE_INTEGER) - (b.line ?? Number.MAX_SAFE_INTEGER),
  );
}
