"use client";

import { type Column, edge } from "./data-table-parts";

type Props<Row> = {
  index: number;
  row: Row;
  columns: readonly Column<Row>[];
  /** The table keeps only the rows in view: heights and widths must not depend on what stands in them. */
  firm: boolean;
  isCurrent: boolean;
  isChosen: boolean;
  /** Its box takes part in the Tab order; those of the other rows are reached with the arrows. */
  isActive: boolean;
  label: string;
  onFocus: () => void;
  onChoose?: (on: boolean, range: boolean) => void;
};

/** One row of a table, with its box where rows can be chosen. */
export function DataRow<Row>(props: Props<Row>) {
  const { index, row, columns, firm, isCurrent, isChosen, isActive, label, onFocus, onChoose } = props;
  return (
    <tr
      data-row={index}
      aria-rowindex={firm ? index + 2 : undefined}
      aria-current={isCurrent || undefined}
      data-chosen={isChosen || undefined}
      onFocus={onFocus}
      className="h-8 hover:bg-paper aria-[current]:bg-chosen data-chosen:bg-chosen"
    >
      {onChoose && (
        <td className={`border-b border-rule ${edge} print:hidden`}>
          <input
            type="checkbox"
            aria-label={`Choose ${label}`}
            checked={isChosen}
            tabIndex={isActive ? 0 : -1}
            onChange={(event) =>
              onChoose(event.target.checked, (event.nativeEvent as MouseEvent).shiftKey === true)
            }
            className="block size-4"
          />
        </td>
      )}
      {columns.map((column) => (
        <BodyCell key={column.id} column={column} row={row} firm={firm} />
      ))}
    </tr>
  );
}

/** One cell of a row. */
function BodyCell<Row>({ column, row, firm }: { column: Column<Row>; row: Row; firm: boolean }) {
  const look = `border-b border-rule ${edge} ${column.kind === "figure" ? "text-right" : "text-left"} ${
    column.wraps && !firm ? "py-1.5" : `whitespace-nowrap ${firm ? "overflow-hidden text-ellipsis" : ""}`
  }`;
  return column.namesRow ? (
    <th scope="row" className={look}>
      {column.cell(row)}
    </th>
  ) : (
    <td className={look}>{column.cell(row)}</td>
  );
}

/** Stands for rows out of view. Its height is an attribute, since the page's policy allows no style in its markup. */
export function Gap({ height_px, columns }: { height_px: number; columns: number }) {
  return (
    <tr>
      <td colSpan={columns} height={height_px} className="p-0" />
    </tr>
  );
}
