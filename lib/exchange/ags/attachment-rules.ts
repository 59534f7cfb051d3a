import { cellReader } from "./dictionary";
import { columnsOf, type RuleContext, shown } from "./rule-context";

/**
 * Rule 20: every file set that a row names is declared in FILE, and every declared file came along. `attached` holds
 * the delivered paths as `<FILE_FSET>/<FILE_NAME>`; null when the data file came alone, so that nothing can be said.
 */
export function checkAttachments(
  { groups, findings }: RuleContext,
  attached: ReadonlySet<string> | null,
): void {
  const declared = groups.get("FILE");
  const sets = new Set<string>();
  if (declared) {
    const cell = cellReader(declared);
    let unseen = 0;
    for (const { cells, line } of declared.rows) {
      const set = cell(cells, "FILE_FSET");
      const name = cell(cells, "FILE_NAME");
      if (set === "") continue;
      sets.add(set);
      if (attached === null) unseen += 1;
      else if (!attached.has(`${set}/${name}`)) {
        const message = `The file ${shown(name)} of set ${shown(set)} was not delivered with the data.`;
        findings.add("20", "error", { line, group: "FILE", heading: "FILE_NAME" }, message);
      }
    }
    if (unseen > 0) {
      const message = `The data file came alone: whether its ${unseen} declared files exist was not checked.`;
      findings.add("20", "note", { line: declared.line, group: "FILE" }, message);
    }
  }
  for (const group of groups.values()) {
    const column = columnsOf(group).get("FILE_FSET");
    if (column === undefined || group.name === "FILE") continue;
    const reported = new Set<string>();
    for (const { cells, line } of group.rows) {
      const set = (cells[column] ?? "").trim();
      if (set === "" || sets.has(set) || reported.has(set)) continue;
      reported.add(set);
      const message = `The file set ${shown(set)} is not declared in FILE.`;
      findings.add("20", "error", { line, group: group.name, heading: "FILE_FSET" }, message);
    }
  }
}
