import { cellReader } from "./dictionary";
import type { AgsGroup } from "./file-model";
import { columnsOf, keyOf, type RuleContext, shown } from "./rule-context";

/** Rule 11: the marks that part record links are stated, and every link points at one row of the file. */
export function checkLinks(context: RuleContext): void {
  const { groups } = context;
  const linked = [...groups.values()].flatMap((group) =>
    group.headings.flatMap(({ type }, column) =>
      type === "RL" && isFilled(group, column) ? [{ group, column }] : [],
    ),
  );
  checkMarks(context, linked.length > 0);
  const finder = new LinkFinder(context);
  for (const { group, column } of linked) {
    const heading = group.headings[column]?.name ?? "";
    for (const { cells, line } of group.rows) {
      const text = cells[column] ?? "";
      if (text === "") continue;
      for (const link of context.concatenator === "" ? [text] : text.split(context.concatenator)) {
        const fault = finder.faultOf(link);
        if (fault === null) continue;
        const message = `The record link ${shown(link)} ${fault}.`;
        context.findings.add("11c", "error", { line, group: group.name, heading }, message);
      }
    }
  }
}

function isFilled(group: AgsGroup, column: number): boolean {
  return group.rows.some(({ cells }) => (cells[column] ?? "") !== "");
}

function checkMarks({ groups, findings }: RuleContext, hasLinks: boolean): void {
  const tran = groups.get("TRAN");
  const row = tran?.rows[0];
  if (!tran || !row) return;
  const cell = cellReader(tran);
  const hasCodes = [...groups.values()].some((group) => group.headings.some(({ type }) => type === "PA"));
  const marks = [
    { rule: "11a", heading: "TRAN_DLIM", what: "parts the items of a record link", needed: hasLinks },
    {
      rule: "11b",
      heading: "TRAN_RCON",
      what: "joins several codes or links in one item",
      needed: hasLinks || hasCodes,
    },
  ];
  for (const { rule, heading, what, needed } of marks) {
    if (cell(row.cells, heading) !== "") continue;
    const message = `${heading} is empty: the file does not say which mark ${what}.`;
    findings.add(rule, needed ? "error" : "warning", { line: row.line, group: "TRAN", heading }, message);
  }
}

/** Looks links up by group and the first few key values, with one index for each such number of values. */
class LinkFinder {
  private readonly indexes = new Map<string, Map<string, number>>();

  constructor(private readonly context: RuleContext) {}

  faultOf(link: string): string | null {
    const [name = "", ...values] = link.split(this.context.delimiter);
    const group = this.context.groups.get(name);
    if (!group) return `names the group ${shown(name)}, which the file does not have`;
    if (values.length === 0) return "gives no key of a row";
    const index = this.indexOf(group, values.length);
    if (!index) return `gives ${values.length} values, more than ${name} has keys`;
    const count = index.get(keyOf(values, [...values.keys()])) ?? 0;
    if (count === 0) return `points at no row of ${name}`;
    return count === 1 ? null : `fits ${count} rows of ${name}`;
  }

  private indexOf(group: AgsGroup, length: number): Map<string, number> | null {
    const name = `${group.name} ${length}`;
    const known = this.indexes.get(name);
    if (known) return known;
    const columns = columnsOf(group);
    const keys = (this.context.dictionary.get(group.name)?.headings ?? []).filter(({ key }) => key);
    const places = keys.slice(0, length).flatMap((heading) => columns.get(heading.name) ?? []);
    if (places.length < length) return null;
    const index = new Map<string, number>();
    for (const { cells } of group.rows) {
      const key = keyOf(cells, places);
      index.set(key, (index.get(key) ?? 0) + 1);
    }
    this.indexes.set(name, index);
    return index;
  }
}
