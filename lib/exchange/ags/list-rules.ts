import { cellReader } from "./dictionary";
import type { AgsGroup } from "./file-model";
import { columnsOf, type RuleContext, shown } from "./rule-context";

/** Rules 13 to 18: one project, one transmittal, and every unit, code and type that is used is listed. */
export function checkLists(context: RuleContext): void {
  checkOneRow(context, "PROJ", "13");
  checkOneRow(context, "TRAN", "14");
  checkUnits(context);
  checkCodes(context);
  checkTypes(context);
  checkDeclarations(context);
}

function checkOneRow({ groups, findings }: RuleContext, name: string, rule: string): void {
  const group = groups.get(name);
  if (!group) {
    findings.add(rule, "error", { group: name }, `The group ${name} is missing; every file has one.`);
    return;
  }
  const second = group.rows[1];
  if (!second) return;
  const message = `The group ${name} has ${group.rows.length} rows where one is asked for.`;
  findings.add(rule, "error", { line: second.line, group: name }, message);
}

interface Use {
  readonly line: number | null;
  readonly heading: string;
  readonly group: string;
}

function checkUnits(context: RuleContext): void {
  const used = new Map<string, Use>();
  for (const group of context.groups.values()) {
    for (const { name, unit } of group.headings) {
      if (unit !== "" && !used.has(unit))
        used.set(unit, { line: group.unitLine, heading: name, group: group.name });
    }
    gather(group, "PU", used);
  }
  report(context, { rule: "15", list: "UNIT", heading: "UNIT_UNIT", what: "unit" }, used);
}

function checkTypes(context: RuleContext): void {
  const used = new Map<string, Use>();
  for (const group of context.groups.values()) {
    for (const { name, type } of group.headings) {
      if (type !== "" && !used.has(type))
        used.set(type, { line: group.typeLine, heading: name, group: group.name });
    }
    gather(group, "PT", used);
  }
  report(context, { rule: "17", list: "TYPE", heading: "TYPE_TYPE", what: "data type" }, used);
}

/** Adds the texts of all columns of one type, each with the row it is first used in. */
function gather(group: AgsGroup, type: string, used: Map<string, Use>): void {
  for (const [column, heading] of group.headings.entries()) {
    if (heading.type !== type) continue;
    for (const { cells, line } of group.rows) {
      const text = cells[column] ?? "";
      if (text !== "" && !used.has(text)) used.set(text, { line, heading: heading.name, group: group.name });
    }
  }
}

function report(
  { groups, findings }: RuleContext,
  { rule, list, heading, what }: { rule: string; list: string; heading: string; what: string },
  used: ReadonlyMap<string, Use>,
): void {
  const group = groups.get(list);
  if (!group) {
    findings.add(
      rule,
      "error",
      { group: list },
      `The group ${list} is missing; it lists every ${what} that is used.`,
    );
    return;
  }
  const column = columnsOf(group).get(heading);
  const listed = new Set(column === undefined ? [] : group.rows.map(({ cells }) => cells[column] ?? ""));
  for (const [text, use] of used) {
    if (listed.has(text)) continue;
    const message = `The ${what} ${shown(text)}, used for ${use.heading} in ${use.group}, is not listed in ${list}.`;
    findings.add(rule, "error", { line: use.line, group: list, heading }, message);
  }
}

function checkCodes({ groups, findings, concatenator }: RuleContext): void {
  const abbreviations = groups.get("ABBR");
  const listed = new Set<string>();
  if (abbreviations) {
    const cell = cellReader(abbreviations);
    for (const { cells } of abbreviations.rows) {
      listed.add(`${cell(cells, "ABBR_HDNG")}\u0001${cell(cells, "ABBR_CODE")}`);
    }
  }
  let missingGroupReported = false;
  for (const group of groups.values()) {
    for (const [column, { name, type }] of group.headings.entries()) {
      if (type !== "PA") continue;
      const seen = new Set<string>();
      for (const { cells, line } of group.rows) {
        const text = cells[column] ?? "";
        if (text === "" || seen.has(text)) continue;
        seen.add(text);
        for (const part of concatenator === "" ? [text] : text.split(concatenator)) {
          const code = part.trim();
          if (code === "" || (code !== text && seen.has(code)) || listed.has(`${name}\u0001${code}`))
            continue;
          seen.add(code);
          const at = { line, group: group.name, heading: name };
          if (abbreviations) {
            findings.add("16", "error", at, `The code ${shown(code)} of ${name} is not listed in ABBR.`);
          } else if (!missingGroupReported) {
            missingGroupReported = true;
            findings.add("16", "error", at, "The group ABBR is missing, though the file uses codes.");
          }
        }
      }
    }
  }
}

function checkDeclarations({ groups, findings }: RuleContext): void {
  const dict = groups.get("DICT");
  if (!dict) return;
  const cell = cellReader(dict);
  for (const { cells, line } of dict.rows) {
    const at = { line, group: "DICT" };
    const kind = cell(cells, "DICT_TYPE");
    if (kind !== "GROUP" && kind !== "HEADING") {
      if (kind !== "")
        findings.add("18", "error", at, `DICT_TYPE is ${shown(kind)}; it is GROUP or HEADING.`);
      continue;
    }
    if (kind === "GROUP") continue;
    for (const name of ["DICT_HDNG", "DICT_STAT", "DICT_DTYP"]) {
      if (cell(cells, name) !== "") continue;
      findings.add("18", "warning", { ...at, heading: name }, `A heading is declared without its ${name}.`);
    }
  }
}
