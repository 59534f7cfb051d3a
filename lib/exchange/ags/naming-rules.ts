import { editionsWithGroup, type GroupFacts } from "./dictionary";
import type { AgsGroup } from "./file-model";
import type { RuleContext } from "./rule-context";

/** Rules 2, 2c, 7, 9 and 19: groups with data, names that are known, well formed and in order. */
export function checkNames(context: RuleContext): void {
  const seen = new Map<string, number>();
  for (const group of context.file.groups) {
    const before = seen.get(group.name);
    if (before !== undefined) {
      const message = `The group ${group.name} stands a second time; it began on line ${before} already.`;
      context.findings.add("2c", "error", { line: group.line, group: group.name }, message);
    } else seen.set(group.name, group.line);
    checkGroup(context, group);
  }
}

function checkGroup(context: RuleContext, group: AgsGroup): void {
  const { findings } = context;
  const at = { line: group.line, group: group.name };
  if (group.rows.length === 0) findings.add("2", "error", at, `The group ${group.name} has no DATA row.`);
  if (!/^[A-Z0-9]{4}$/.test(group.name)) {
    findings.add("19", "error", at, `The group name "${group.name}" is not four capitals or digits.`);
  }
  checkHeadingNames(context, group);
  const facts = context.dictionary.get(group.name);
  if (facts) checkHeadings(context, group, facts);
  else reportUnknownGroup(context, group);
}

function reportUnknownGroup({ file, findings }: RuleContext, group: AgsGroup): void {
  const at = { line: group.line, group: group.name };
  const editions = editionsWithGroup(group.name);
  if (editions.length > 0) {
    const message = `The group ${group.name} is in edition ${editions.join(" and ")}, not in ${file.edition}, and DICT does not declare it.`;
    findings.add("9", "warning", at, message);
  } else if (file.edition === "4.2") {
    const message = `The group ${group.name} is not declared in DICT and is not among the groups of 4.2 that are known here.`;
    findings.add("9", "warning", at, message);
  } else {
    const message = `The group ${group.name} is neither in the dictionary of ${file.edition} nor declared in DICT.`;
    findings.add("9", "error", at, message);
  }
}

function checkHeadingNames({ dictionary, findings, file }: RuleContext, group: AgsGroup): void {
  const elsewhere = new Set<string>();
  for (const facts of dictionary.values()) {
    if (facts.name !== group.name) for (const { name } of facts.headings) elsewhere.add(name);
  }
  for (const other of file.groups) {
    if (other.name !== group.name) for (const { name } of other.headings) elsewhere.add(name);
  }
  for (const { name } of group.headings) {
    const at = { line: group.headingLine, group: group.name, heading: name };
    if (!/^[A-Z0-9_]{1,9}$/.test(name)) {
      const message = `The heading "${name}" is not at most nine capitals, digits and underscores.`;
      findings.add("19a", "error", at, message);
    }
    const tail = name.startsWith(`${group.name}_`) ? name.slice(group.name.length + 1) : null;
    if ((tail === null || !/^.{1,4}$/.test(tail)) && !elsewhere.has(name)) {
      const message = `The heading ${name} is neither ${group.name}_ with up to four characters nor a heading of another group.`;
      findings.add("19b", "warning", at, message);
    }
  }
}

function checkHeadings({ file, findings }: RuleContext, group: AgsGroup, facts: GroupFacts): void {
  const order = new Map(facts.headings.map(({ name }, place) => [name, place]));
  let last = -1;
  let misplaced: string | null = null;
  let unknown: string | null = null;
  for (const { name } of group.headings) {
    const place = order.get(name);
    if (place === undefined) {
      unknown ??= name;
      const message = `The heading ${name} is neither in the dictionary of ${file.edition} for ${group.name} nor declared in DICT.`;
      findings.add("9", "error", { line: group.headingLine, group: group.name, heading: name }, message);
      continue;
    }
    if (place < last) misplaced ??= name;
    last = Math.max(last, place);
  }
  const at = { line: group.headingLine, group: group.name };
  if (misplaced !== null) {
    const message = `The headings are not in the order of the dictionary: ${misplaced} comes too late.`;
    findings.add("7", "warning", { ...at, heading: misplaced }, message);
  } else if (unknown !== null) {
    const message = `The place of ${unknown} cannot be checked, because neither the dictionary nor DICT has it.`;
    findings.add("7", "warning", { ...at, heading: unknown }, message);
  }
}
