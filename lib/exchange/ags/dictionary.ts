import { dictionaryFacts } from "./dictionary-facts";
import type { AgsEdition, AgsFile, AgsGroup } from "./file-model";

/** What the dictionary says of one heading of one group. */
export interface HeadingFacts {
  readonly name: string;
  readonly key: boolean;
  readonly required: boolean;
  readonly deprecated: boolean;
  readonly type: string;
  readonly unit: string;
  /** True when the file itself declares the heading in its DICT group. */
  readonly user: boolean;
}

/** What the dictionary says of one group; headings stand in the order that a file keeps (rule 7). */
export interface GroupFacts {
  readonly name: string;
  /** "" when the group has no parent. */
  readonly parent: string;
  readonly headings: readonly HeadingFacts[];
  readonly user: boolean;
}

/** Group name to facts: the standard of one edition, with what a file adds in DICT. */
export type AgsDictionary = ReadonlyMap<string, GroupFacts>;

const editionLetter: Readonly<Record<AgsEdition, string>> = { "4.0.4": "a", "4.1.1": "b", "4.2": "c" };
const cache = new Map<AgsEdition, AgsDictionary>();

/**
 * Chooses the edition whose facts judge a file from what TRAN_AGS states: "4", "4.0" and "4.0.x" are read as
 * 4.0.4, "4.1" as 4.1.1, "4.2" as 4.2; anything else as 4.1.1, with `known` false.
 */
export function editionFor(stated: string | null): { edition: AgsEdition; known: boolean } {
  const text = (stated ?? "").trim();
  if (/^4(\.0(\.\d+)?)?$/.test(text)) return { edition: "4.0.4", known: true };
  if (/^4\.1(\.\d+)?$/.test(text)) return { edition: "4.1.1", known: true };
  if (/^4\.2(\.\d+)?$/.test(text)) return { edition: "4.2", known: true };
  return { edition: "4.1.1", known: false };
}

/** The standard groups and headings of one edition. */
export function standardDictionary(edition: AgsEdition): AgsDictionary {
  const known = cache.get(edition);
  if (known) return known;
  const letter = editionLetter[edition];
  const dictionary = new Map<string, GroupFacts>();
  for (const [name, [parent, editions, packed]] of Object.entries(dictionaryFacts)) {
    if (!editions.includes(letter)) continue;
    dictionary.set(name, { name, parent, headings: unpack(packed, letter), user: false });
  }
  cache.set(edition, dictionary);
  return dictionary;
}

/** The editions in which a standard group is found; empty for a name that is in none. */
export function editionsWithGroup(name: string): AgsEdition[] {
  const entry = Object.hasOwn(dictionaryFacts, name) ? dictionaryFacts[name] : undefined;
  if (!entry) return [];
  return (Object.keys(editionLetter) as AgsEdition[]).filter((edition) =>
    entry[1].includes(editionLetter[edition]),
  );
}

/** The dictionary that holds for one file: the standard of its edition and then its own DICT rows (rule 18). */
export function dictionaryOf(
  file: Pick<AgsFile, "edition" | "groups">,
  edition = file.edition,
): AgsDictionary {
  const declarations = file.groups.filter((group) => group.name === "DICT");
  const standard = standardDictionary(edition);
  if (declarations.length === 0) return standard;
  const merged = new Map(standard);
  for (const dict of declarations) addDeclared(merged, dict);
  return merged;
}

function addDeclared(merged: Map<string, GroupFacts>, dict: AgsGroup): void {
  const cell = cellReader(dict);
  for (const { cells } of dict.rows) {
    const name = cell(cells, "DICT_GRP");
    if (cell(cells, "DICT_TYPE").toUpperCase() !== "GROUP" || name === "" || merged.has(name)) continue;
    const parent = cell(cells, "DICT_PGRP");
    merged.set(name, { name, parent: parent === "-" ? "" : parent, headings: [], user: true });
  }
  const added = new Map<string, { headings: HeadingFacts[]; names: Set<string> }>();
  for (const { cells } of dict.rows) {
    const groupName = cell(cells, "DICT_GRP");
    const name = cell(cells, "DICT_HDNG");
    if (cell(cells, "DICT_TYPE").toUpperCase() !== "HEADING" || name === "") continue;
    const before = merged.get(groupName);
    if (!before) continue;
    let entry = added.get(groupName);
    if (!entry) {
      entry = { headings: [], names: new Set(before.headings.map((heading) => heading.name)) };
      added.set(groupName, entry);
    }
    if (entry.names.has(name)) continue;
    entry.names.add(name);
    const status = cell(cells, "DICT_STAT").toUpperCase();
    entry.headings.push({
      name,
      key: status.includes("KEY"),
      required: status.includes("REQUIRED"),
      deprecated: false,
      type: cell(cells, "DICT_DTYP"),
      unit: cell(cells, "DICT_UNIT"),
      user: true,
    });
  }
  for (const [groupName, { headings }] of added) {
    const before = merged.get(groupName);
    if (before) merged.set(groupName, { ...before, headings: [...before.headings, ...headings] });
  }
}

/** Reads a trimmed cell of a group by heading name; "" where the group has no such heading. */
export function cellReader(group: AgsGroup): (cells: readonly string[], heading: string) => string {
  const place = new Map(group.headings.map((heading, index) => [heading.name, index]));
  return (cells, heading) => {
    const index = place.get(heading);
    return index === undefined ? "" : (cells[index] ?? "").trim();
  };
}

function unpack(packed: string, letter: string): HeadingFacts[] {
  const headings: HeadingFacts[] = [];
  for (const entry of packed.split(";")) {
    const [name = "", status = "", type = "", unit = "", editions = ""] = entry.split("|");
    if (editions !== "" && !editions.includes(letter)) continue;
    headings.push({
      name,
      key: status.includes("K"),
      required: status.includes("R"),
      deprecated: status.includes("D"),
      type,
      unit,
      user: false,
    });
  }
  return headings;
}
