import { judgeFor } from "./data-types";
import type { AgsGroup } from "./file-model";
import { type RuleContext, shown } from "./rule-context";

/** Rule 8: every item fits the type and unit of its column, and an identifier stands once in its own group. */
export function checkValues({ groups, findings }: RuleContext): void {
  for (const group of groups.values()) {
    for (const [column, { name, type, unit }] of group.headings.entries()) {
      const at = { group: group.name, heading: name };
      if (type === "ID" && name === `${group.name}_ID`)
        checkIdentifiers(group, column, name, findings.add.bind(findings));
      if (group.typeLine === null) continue;
      const judge = judgeFor(type, unit);
      if (judge === null) continue;
      if (typeof judge !== "function") {
        findings.add("8", "error", { ...at, line: group.typeLine }, `${name} ${judge.fault}.`);
        continue;
      }
      for (const { cells, line } of group.rows) {
        const text = cells[column] ?? "";
        if (text === "") continue;
        const fault = judge(text);
        if (fault !== null) findings.add("8", "error", { ...at, line }, `${shown(text)} ${fault}.`);
      }
    }
  }
}

function checkIdentifiers(
  group: AgsGroup,
  column: number,
  heading: string,
  add: RuleContext["findings"]["add"],
): void {
  const lines = new Map<string, number[]>();
  for (const { cells, line } of group.rows) {
    const text = (cells[column] ?? "").trim();
    if (text === "") continue;
    const known = lines.get(text);
    if (known) known.push(line);
    else lines.set(text, [line]);
  }
  for (const [text, at] of lines) {
    if (at.length === 1) continue;
    const message = `The identifier ${shown(text)} is given to ${at.length} rows of ${group.name}.`;
    for (const line of at) add("8", "error", { line, group: group.name, heading }, message);
  }
}
