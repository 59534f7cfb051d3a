"use client";

import { type Column, DataTable } from "@/components/ui/data-table";
import type { GroundFinding } from "@/lib/contracts/ground";

const columns: Column<GroundFinding & { key: string }>[] = [
  {
    id: "severity",
    head: "Weight",
    kind: "words",
    sortBy: (row) => row.severity,
    cell: (row) => row.severity,
  },
  {
    id: "rule",
    head: "Rule",
    kind: "words",
    namesRow: true,
    sortBy: (row) => row.rule,
    cell: (row) => row.rule,
  },
  {
    id: "line",
    head: "Line",
    kind: "figure",
    sortBy: (row) => row.line ?? 0,
    cell: (row) => row.line ?? "—",
  },
  { id: "group", head: "Group", kind: "words", sortBy: (row) => row.group, cell: (row) => row.group },
  { id: "heading", head: "Heading", kind: "words", sortBy: (row) => row.heading, cell: (row) => row.heading },
  { id: "message", head: "Finding", kind: "words", wraps: true, cell: (row) => row.message },
];

/** What was found in a file: which rule, on which line, of what weight. */
export function FindingsTable(props: { findings: GroundFinding[]; counts: Record<string, number> }) {
  const { findings, counts } = props;
  const all = Object.values(counts).reduce((sum, count) => sum + count, 0);
  if (all === 0) return <p className="mt-3">No finding: the file keeps the rules of the format.</p>;
  const summary = ["error", "warning", "note"]
    .filter((severity) => counts[severity])
    .map((severity) => `${counts[severity]} ${severity}${counts[severity] === 1 ? "" : "s"}`)
    .join(", ");
  return (
    <section aria-label="Findings" className="mt-3 max-h-80 overflow-auto">
      <p className="font-semibold">
        {summary}
        {all > findings.length && `; the first ${findings.length} are listed`}
      </p>
      <DataTable
        label="Findings"
        columns={columns}
        rows={findings.map((finding, at) => ({ ...finding, key: String(at) }))}
        rowKey={(row) => row.key}
        height="whole"
      />
    </section>
  );
}
