import { Notice } from "@/components/ui/notice";
import type { ImportPreview } from "@/lib/contracts/footings";

/** What a file would do: errors first, each with its row, then what changes and what is new. */
export function ImportPreviewTables({ preview }: { preview: ImportPreview }) {
  const { refused, counts, findings, findingCount, rows, missing, rowCount } = preview;
  if (refused !== null)
    return (
      <>
        <Notice kind="refused" className="mt-3">
          {refused}
        </Notice>
        <Findings findings={findings} count={findingCount} />
      </>
    );
  const changed = rows.filter(({ what }) => what === "changed");
  const added = rows.filter(({ what }) => what === "new");
  return (
    <section aria-label="Preview" className="mt-4">
      <p className="font-semibold">Nothing is written yet.</p>
      <ul className="flex flex-wrap gap-x-5 tabular-nums">
        <li>{rowCount} rows read</li>
        <li>{counts.new} new</li>
        <li>{counts.changed} changed</li>
        <li>{counts.unchanged} unchanged</li>
        <li className={counts.inError > 0 ? "font-semibold" : ""}>{counts.inError} rows in error</li>
        <li>{counts.missing} in the register but not in the file</li>
      </ul>
      <Findings findings={findings} count={findingCount} />
      {changed.length > 0 && (
        <Part title={`Changed (${counts.changed})`} heads={["Row", "Mark", "What", "Before", "After"]}>
          {changed.flatMap(({ row, mark, changes }) =>
            changes.map(({ field, unit, before, after }, index) => (
              <tr key={`${mark} ${field}`} className="border-t border-rule">
                <td className="px-2 py-0.5 tabular-nums">{index === 0 ? row : ""}</td>
                <th scope="row" className="px-2 py-0.5 text-left font-normal">
                  {mark}
                </th>
                <td className="px-2 py-0.5">
                  {field}
                  {unit && ` (${unit})`}
                </td>
                <td className="px-2 py-0.5 tabular-nums">{before || "none"}</td>
                <td className="px-2 py-0.5 tabular-nums">{after || "none"}</td>
              </tr>
            )),
          )}
        </Part>
      )}
      {added.length > 0 && (
        <details className="mt-3" open={added.length <= 20}>
          <summary>New ({counts.new})</summary>
          <p className="max-h-40 overflow-auto">{added.map(({ mark }) => mark).join(", ")}</p>
        </details>
      )}
      {missing.length > 0 && (
        <details className="mt-3">
          <summary>In the register but not in the file ({counts.missing}): they stay as they are</summary>
          <p className="max-h-40 overflow-auto">{missing.join(", ")}</p>
        </details>
      )}
    </section>
  );
}

function Findings({ findings, count }: { findings: ImportPreview["findings"]; count: number }) {
  if (findings.length === 0) return null;
  return (
    <Part title={`Findings (${count})`} heads={["", "Row", "Column", "What"]}>
      {findings.map(({ row, column, severity, message }) => (
        <tr key={`${row} ${column} ${message}`} className="border-t border-rule align-top">
          <td className={`px-2 py-0.5 ${severity === "error" ? "font-semibold text-fails-text" : ""}`}>
            {severity}
          </td>
          <td className="px-2 py-0.5 text-right tabular-nums">{row ?? ""}</td>
          <td className="px-2 py-0.5">{column ?? ""}</td>
          <td className="px-2 py-0.5">{message}</td>
        </tr>
      ))}
    </Part>
  );
}

function Part({
  title,
  heads,
  children,
}: {
  title: string;
  heads: readonly string[];
  children: React.ReactNode;
}) {
  return (
    <section aria-label={title} className="mt-3">
      <h3 className="font-semibold">{title}</h3>
      <div className="mt-1 max-h-72 overflow-auto border border-rule">
        <table className="w-full">
          <thead className="sticky top-0 bg-sheet text-left text-ink-2">
            <tr>
              {heads.map((head) => (
                <th key={head} scope="col" className="px-2 py-1 font-normal">
                  {head || <span className="sr-only">Kind</span>}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>{children}</tbody>
        </table>
      </div>
    </section>
  );
}
