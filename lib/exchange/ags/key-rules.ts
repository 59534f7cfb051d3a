import type { GroupFacts } from "./dictionary";
import type { AgsGroup } from "./file-model";
import { columnsOf, keyOf, type RuleContext, shownKey } from "./rule-context";

/** Rules 10a, 10b and 10c: keys are there and unique, required items are filled, child rows have their parent. */
export function checkKeys(context: RuleContext): void {
  const parentsReported = new Set<string>();
  for (const group of context.groups.values()) {
    const facts = context.dictionary.get(group.name);
    if (!facts) continue;
    checkKeyHeadings(context, group, facts);
    checkRequired(context, group, facts);
    checkParent(context, group, facts, parentsReported);
  }
}

function checkKeyHeadings({ findings }: RuleContext, group: AgsGroup, facts: GroupFacts): void {
  const columns = columnsOf(group);
  const keys = facts.headings.filter(({ key }) => key);
  for (const { name } of keys) {
    if (columns.has(name)) continue;
    const message = `The key heading ${name} is missing from the group.`;
    findings.add(
      "10a",
      "error",
      { line: group.headingLine ?? group.line, group: group.name, heading: name },
      message,
    );
  }
  const places = keys.flatMap(({ name }) => columns.get(name) ?? []);
  if (places.length === 0) return;
  const firstLine = new Map<string, number>();
  const repeated = new Set<string>();
  for (const { cells, line } of group.rows) {
    const key = keyOf(cells, places);
    const before = firstLine.get(key);
    if (before === undefined) {
      firstLine.set(key, line);
      continue;
    }
    const at = { group: group.name };
    if (!repeated.has(key)) {
      repeated.add(key);
      const message = `The key ${shownKey(key)} stands in this row and again in line ${line}.`;
      findings.add("10a", "error", { ...at, line: before }, message);
    }
    const message = `The key ${shownKey(key)} stands in line ${before} already.`;
    findings.add("10a", "error", { ...at, line }, message);
  }
}

function checkRequired({ findings }: RuleContext, group: AgsGroup, facts: GroupFacts): void {
  const columns = columnsOf(group);
  for (const { name, required } of facts.headings) {
    if (!required) continue;
    const column = columns.get(name);
    const at = { group: group.name, heading: name };
    if (column === undefined) {
      const message = `The required heading ${name} is missing from the group.`;
      findings.add("10b", "error", { ...at, line: group.headingLine ?? group.line }, message);
      continue;
    }
    for (const { cells, line } of group.rows) {
      if ((cells[column] ?? "").trim() !== "") continue;
      findings.add("10b", "error", { ...at, line }, `The required item ${name} is empty.`);
    }
  }
}

function checkParent(context: RuleContext, group: AgsGroup, facts: GroupFacts, reported: Set<string>): void {
  const { dictionary, groups, findings } = context;
  // A project has one PROJ row (rule 13), and its children carry no key of it.
  if (facts.parent === "" || facts.parent === "PROJ" || group.rows.length === 0) return;
  const at = { line: group.line, group: group.name };
  const parentFacts = dictionary.get(facts.parent);
  const parent = groups.get(facts.parent);
  if (!parentFacts) {
    findings.add("10c", "error", at, `The parent group ${facts.parent} is not in the dictionary.`);
    return;
  }
  const keys = parentFacts.headings.filter(({ key }) => key).map(({ name }) => name);
  if (keys.length === 0) {
    if (parent && !reported.has(parent.name)) {
      reported.add(parent.name);
      const message = `The group ${parent.name} has a child group but no key heading to tie it by.`;
      findings.add("10c", "error", { line: parent.line, group: parent.name }, message);
    }
    findings.add("10c", "error", at, `Its rows cannot be tied to ${facts.parent}, which has no key heading.`);
    return;
  }
  if (!parent) {
    const own = columnsOf(group);
    const places = keys.flatMap((name) => own.get(name) ?? []);
    if (!group.rows.some(({ cells }) => tied(cells, places))) return;
    findings.add("10c", "error", at, `The parent group ${facts.parent} is missing from the file.`);
    return;
  }
  checkOrphans(context, group, parent, keys);
}

function checkOrphans(
  { findings }: RuleContext,
  group: AgsGroup,
  parent: AgsGroup,
  keys: readonly string[],
): void {
  const own = columnsOf(group);
  const theirs = columnsOf(parent);
  const shared = keys.filter((name) => own.has(name) && theirs.has(name));
  const ownPlaces = shared.map((name) => own.get(name) ?? 0);
  const theirPlaces = shared.map((name) => theirs.get(name) ?? 0);
  const known = new Set(parent.rows.map(({ cells }) => keyOf(cells, theirPlaces)));
  let orphans = 0;
  for (const { cells, line } of group.rows) {
    // A row with no key of its parent at all stands alone, as a sample known by its own id may.
    if (!tied(cells, ownPlaces)) continue;
    const key = keyOf(cells, ownPlaces);
    if (known.has(key)) continue;
    orphans += 1;
    const message = `No row of ${parent.name} has the key ${shownKey(key)}.`;
    findings.add("10c", "error", { line, group: group.name }, message);
  }
  if (orphans === 0) return;
  for (const name of shared) {
    const type = group.headings[own.get(name) ?? 0]?.type;
    const parentType = parent.headings[theirs.get(name) ?? 0]?.type;
    if (type === parentType) continue;
    const message = `${name} has type ${type} here and ${parentType} in ${parent.name}, so that keys differ as texts.`;
    findings.add("10c", "error", { line: group.typeLine, group: group.name, heading: name }, message);
  }
}

function tied(cells: readonly string[], places: readonly number[]): boolean {
  return places.some((place) => (cells[place] ?? "") !== "");
}
