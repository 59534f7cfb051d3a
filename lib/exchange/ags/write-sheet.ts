import { judgeFor, withFigures } from "./data-types";
import type { AgsHeading } from "./file-model";
import type { FindingList } from "./finding-list";
import { plainText, type WrittenCharacters } from "./plain-text";
import { shown } from "./rule-context";
import type { Item } from "./write-columns";

/** A group on its way into a file: headings with what the dictionary says, and rows of items not yet formatted. */
export interface Sheet {
  readonly name: string;
  readonly headings: readonly AgsHeading[];
  readonly rows: readonly (readonly Item[])[];
}

/** A group as it stands in the file. */
export interface WrittenGroup {
  readonly name: string;
  readonly headings: readonly AgsHeading[];
  readonly rows: readonly (readonly string[])[];
}

/** Numbers keep what they have up to the micrometre; a column gets as many places as its longest number needs. */
const mostPlaces = 6;
const patterns = ["yyyy-mm-ddThh:mm:ss", "yyyy-mm-ddThh:mm", "yyyy-mm-dd"] as const;

/**
 * Formats the items of all groups. A heading has one number of decimals in the whole file, so that the keys of child
 * rows are the same texts as those of their parents.
 */
export function formatSheets(
  sheets: readonly Sheet[],
  characters: WrittenCharacters,
  findings: FindingList,
): WrittenGroup[] {
  const places = decimalsByHeading(sheets);
  const units = dateUnitsByHeading(sheets);
  return sheets.map((sheet) => {
    const headings = sheet.headings.map((heading) => {
      const decimals = places.get(heading.name);
      const unit = units.get(heading.name) ?? heading.unit;
      return { ...heading, unit, type: decimals === undefined ? heading.type : `${decimals}DP` };
    });
    const rows = sheet.rows.map((items) =>
      headings.map((heading, column) => format(items[column], heading, { sheet, characters, findings })),
    );
    return { name: sheet.name, headings, rows };
  });
}

function decimalsByHeading(sheets: readonly Sheet[]): Map<string, number> {
  const places = new Map<string, number>();
  for (const { headings, rows } of sheets) {
    for (const [column, { name, type }] of headings.entries()) {
      const least = Number(/^(\d+)DP$/.exec(type)?.[1] ?? Number.NaN);
      if (Number.isNaN(least)) continue;
      let most = Math.max(places.get(name) ?? 0, least);
      for (const items of rows) {
        const item = items[column];
        if (typeof item === "number") most = Math.max(most, decimalsOf(item));
      }
      places.set(name, most);
    }
  }
  return places;
}

function decimalsOf(value: number): number {
  if (!Number.isFinite(value) || Number.isInteger(value)) return 0;
  const text = value.toFixed(mostPlaces).replace(/0+$/, "");
  return text.length - text.indexOf(".") - 1;
}

/** The pattern of a date column: the longest that all of its items have, so that no time of day is made up. */
function dateUnitsByHeading(sheets: readonly Sheet[]): Map<string, string> {
  const units = new Map<string, string>();
  for (const { headings, rows } of sheets) {
    for (const [column, { name, type }] of headings.entries()) {
      if (type !== "DT") continue;
      const filled = rows.map((items) => String(items[column] ?? "")).filter((text) => text !== "");
      const shortest = Math.min(...filled.map((text) => patternLength(text)));
      const fitting = patterns.find((pattern) => pattern.length <= shortest);
      if (filled.length > 0) units.set(name, fitting ?? "yyyy-mm-dd");
    }
  }
  return units;
}

function patternLength(text: string): number {
  const length = /^\d{4}-\d\d-\d\d(T\d\d:\d\d(:\d\d)?)?/.exec(text)?.[0].length;
  return length ?? patterns[0].length;
}

interface Setting {
  readonly sheet: Sheet;
  readonly characters: WrittenCharacters;
  readonly findings: FindingList;
}

function format(item: Item, heading: AgsHeading, { sheet, characters, findings }: Setting): string {
  if (item === null || item === undefined || item === "") return "";
  const add = (message: string) =>
    findings.add("ground", "warning", { group: sheet.name, heading: heading.name }, message);
  if (typeof item === "number") return formatNumber(item, heading.type, add);
  if (heading.type === "DT") return formatDate(item, heading.unit, add);
  const { text, lost } = plainText(item, characters);
  if (lost > 0) add(`${shown(item)} has ${lost} characters that the format cannot carry; they became "?".`);
  return heading.type === "ID" || heading.type.startsWith("P") ? text.trim() : text;
}

function formatNumber(value: number, type: string, add: (message: string) => void): string {
  if (!Number.isFinite(value)) {
    add("A number that is not finite was left empty.");
    return "";
  }
  if (Math.abs(value) >= 1e15) {
    add(`${value} is too large to be written and was left empty.`);
    return "";
  }
  const [, digits = "", kind = ""] = /^(\d+)(DP|SF|SCI)$/.exec(type) ?? [];
  const written =
    kind === "DP"
      ? value.toFixed(Number(digits))
      : kind === "SF"
        ? withFigures(value, Number(digits))
        : kind === "SCI"
          ? value.toExponential(Number(digits)).replace("e+", "e")
          : String(value);
  const close = Math.abs(Number(written) - value) <= Math.abs(value) * 1e-12;
  if (!close) add(`${value} was rounded to ${written}.`);
  return /^-0(\.0+)?$/.test(written) ? written.slice(1) : written;
}

function formatDate(text: string, unit: string, add: (message: string) => void): string {
  const cut = text.trim().slice(0, unit.length);
  const judge = judgeFor("DT", unit);
  if (typeof judge === "function" && judge(cut) === null) {
    if (cut.length < text.trim().length)
      add(`${shown(text)} was written as ${cut}, like the other dates of its column.`);
    return cut;
  }
  add(`${shown(text)} is not a date that the format can carry and was left empty.`);
  return "";
}

/** The text of a file: every item in quotes, quotes doubled, CR LF, a blank line between groups. */
export function renderGroups(groups: readonly WrittenGroup[]): string {
  const lines: string[] = [];
  for (const { name, headings, rows } of groups) {
    if (lines.length > 0) lines.push("");
    lines.push(row("GROUP", [name]));
    lines.push(
      row(
        "HEADING",
        headings.map((heading) => heading.name),
      ),
    );
    lines.push(
      row(
        "UNIT",
        headings.map(({ unit }) => unit),
      ),
    );
    lines.push(
      row(
        "TYPE",
        headings.map(({ type }) => type),
      ),
    );
    for (const items of rows) lines.push(row("DATA", items));
  }
  return lines.map((line) => `${line}\r\n`).join("");
}

function row(descriptor: string, items: readonly string[]): string {
  return [descriptor, ...items].map((item) => `"${item.replaceAll('"', '""')}"`).join(",");
}
