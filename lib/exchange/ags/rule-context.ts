import type { AgsDictionary } from "./dictionary";
import type { AgsFile, AgsGroup } from "./file-model";
import type { FindingList } from "./finding-list";

/** What every rule check works on. */
export interface RuleContext {
  readonly file: AgsFile;
  /** The groups by name; a name that stands twice has its first group here and is reported under 2c. */
  readonly groups: ReadonlyMap<string, AgsGroup>;
  readonly dictionary: AgsDictionary;
  readonly findings: FindingList;
  /** TRAN_DLIM: parts the items of one record link. "|" where the file does not say. */
  readonly delimiter: string;
  /** TRAN_RCON: joins several links or codes in one item; "" where the file leaves it empty. */
  readonly concatenator: string;
}

/** Column numbers of a group's headings; of a repeated heading the first counts. */
export function columnsOf(group: AgsGroup): Map<string, number> {
  const columns = new Map<string, number>();
  for (const [index, { name }] of group.headings.entries()) if (!columns.has(name)) columns.set(name, index);
  return columns;
}

/** A key of several texts that cannot be confused with another. */
export function keyOf(cells: readonly string[], columns: readonly number[]): string {
  let key = "";
  for (const column of columns) key += `${cells[column] ?? ""}\u0001`;
  return key;
}

/** The texts of a key as they are shown in a message. */
export function shownKey(key: string): string {
  const text = key
    .split("\u0001")
    .slice(0, -1)
    .map((part) => (part === "" ? "(empty)" : part))
    .join(", ");
  return text.length > 160 ? `${text.slice(0, 160)}…` : text;
}

/** A cell's text as it is quoted in a message. */
export function shown(text: string): string {
  const short = text.length > 60 ? `${text.slice(0, 60)}…` : text;
  return `"${short.replace(/\s+/g, " ")}"`;
}
