"use client";

import type { ReactNode } from "react";
import type { Sort, SortValue } from "./sort-rows";

/** One column: its head and unit once, and what each row shows in it. */
export type Column<Row> = {
  id: string;
  head: ReactNode;
  /** Stands under the head: `kPa`, `m OD`. The cells then hold figures alone. */
  unit?: string;
  cell: (row: Row) => ReactNode;
  /** `figure` is right-aligned; give all cells of a column the same number of decimals and they align on the point. */
  kind?: "words" | "figure";
  /** The cell names its row, as a footing's mark does; read aloud with every other cell of the row. */
  namesRow?: boolean;
  /** What the table orders by when this head is pressed. */
  sortBy?: (row: Row) => SortValue;
  /** The head can be pressed although the ordering is done elsewhere, on the server. */
  sortable?: boolean;
  width_px?: number;
  /** May take several lines; only in tables that are short enough to be in the page whole. */
  wraps?: boolean;
};

/** The space left and right of what stands in a cell. */
export const edge = "px-2.5";

/** The head of one column, a button where the rows can be ordered by it. */
export function HeadCell<Row>({
  column,
  sort,
  onSort,
}: {
  column: Column<Row>;
  sort: Sort | null;
  onSort: (sort: Sort) => void;
}) {
  const sorts = column.sortable || column.sortBy !== undefined;
  const ordered = sort?.column === column.id ? (sort.descending ? "descending" : "ascending") : undefined;
  const figure = column.kind === "figure";
  const words = (
    <>
      <span className="block">{column.head}</span>{" "}
      {column.unit && <span className="block text-sm text-ink-2">{column.unit}</span>}
    </>
  );
  return (
    <th
      scope="col"
      aria-sort={ordered ?? (sorts ? "none" : undefined)}
      className={`border-b border-frame bg-sheet ${edge} py-1.5 align-bottom whitespace-nowrap ${figure ? "text-right" : "text-left"}`}
    >
      {sorts ? (
        <button
          type="button"
          onClick={() => onSort({ column: column.id, descending: ordered === "ascending" })}
          className={`inline-flex items-start gap-1 hover:text-action ${figure ? "flex-row-reverse text-right" : "text-left"}`}
        >
          <span>{words}</span>
          <SortMark ordered={ordered} />
        </button>
      ) : (
        words
      )}
    </th>
  );
}

function SortMark({ ordered }: { ordered: "ascending" | "descending" | undefined }) {
  return (
    <svg width="9" height="20" viewBox="0 0 9 20" aria-hidden="true" className="shrink-0 print:hidden">
      {ordered === "ascending" && <path d="M4.5 6.5L8.5 13.5H0.5Z" fill="currentColor" />}
      {ordered === "descending" && <path d="M4.5 13.5L0.5 6.5H8.5Z" fill="currentColor" />}
      {!ordered && <path d="M1.5 8L4.5 5L7.5 8M1.5 12L4.5 15L7.5 12" fill="none" stroke="var(--ink-2)" />}
    </svg>
  );
}

/** Rows that keep the place of those being read. */
export function SkeletonRows({ count, columns }: { count: number; columns: number }) {
  return Array.from({ length: count }, (_, at) => `skeleton-${at}`).map((key, at) => (
    <tr key={key} className="h-8">
      {Array.from({ length: columns }, (_, column) => `${key}-${column}`).map((cell, column) => (
        <td key={cell} className={`border-b border-rule ${edge}`}>
          <span className={`breathes block h-2.5 bg-rule ${(at + column) % 3 === 0 ? "w-3/5" : "w-4/5"}`} />
        </td>
      ))}
    </tr>
  ));
}
