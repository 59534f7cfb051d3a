"use client";

import { defaultRangeExtractor, useVirtualizer } from "@tanstack/react-virtual";
import { type ReactNode, useEffect, useMemo, useRef, useState } from "react";
import { type Column, HeadCell, SkeletonRows } from "./data-table-parts";
import { DataRow, Gap } from "./data-table-row";
import { type Sort, sortRows } from "./sort-rows";
import { usePrinting } from "./use-printing";
import { useRowKeys } from "./use-row-keys";

export type { Column } from "./data-table-parts";
export type { Sort } from "./sort-rows";

/** Above this many rows only those in view are in the page. */
const WHOLE = 200;
const ROW_PX = 32;

type Props<Row> = {
  /** What the table lists; its caption, read aloud. */
  label: string;
  columns: readonly Column<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string;
  /** Names a row aloud, such as "Footing F12". Needed where rows can be chosen. */
  rowLabel?: (row: Row) => string;
  /** With `onSort` the page orders the rows (on the server); without it the table does, by each column's `sortBy`. */
  sort?: Sort | null;
  onSort?: (sort: Sort) => void;
  chosen?: ReadonlySet<string>;
  onChosen?: (chosen: Set<string>) => void;
  /** How many rows there are in all, when not all have been read. */
  total?: number;
  /** Asked for when the end of what has been read comes near. */
  onEnd?: () => void;
  loading?: boolean;
  /** Stands in place of the rows when they could not be read. */
  error?: ReactNode;
  /** Stands in place of the rows when there is none. */
  empty?: ReactNode;
  /** `page` scrolls within the window's height under its head; `whole` is as high as its rows. */
  height?: "page" | "whole";
  /** Rows to mark, such as the one that is open beside the table. */
  current?: string;
  className?: string;
};

/**
 * Dense rows of 32 px under a head that stays. Rows are ordered by pressing a head, chosen with their boxes (Shift for a
 * range, Ctrl+A for all), walked with the arrow keys. Long tables keep only the rows in view in the page and print whole.
 */
export function DataTable<Row>(props: Props<Row>) {
  const { label, columns, rows, rowKey, rowLabel, chosen, onChosen, total, onEnd, loading = false } = props;
  const { error, empty, height = "page", current, className = "" } = props;
  const [ownSort, setOwnSort] = useState<Sort | null>(props.sort ?? null);
  const sort = props.onSort ? (props.sort ?? null) : ownSort;
  const by = props.onSort ? undefined : columns.find(({ id }) => id === sort?.column)?.sortBy;
  const descending = sort?.descending ?? false;
  const ordered = useMemo(() => (by ? sortRows(rows, by, descending) : rows), [rows, by, descending]);

  const scroller = useRef<HTMLElement>(null);
  const body = useRef<HTMLTableSectionElement>(null);
  const after = useRef<HTMLSpanElement>(null);
  const printing = usePrinting();
  const few = ordered.length > WHOLE && !printing;
  const activeRef = useRef(0);
  const virtual = useVirtualizer({
    count: few ? ordered.length : 0,
    getScrollElement: () => scroller.current,
    estimateSize: () => ROW_PX,
    overscan: 16,
    initialRect: { width: 1000, height: 640 },
    scrollPaddingStart: 56,
    // The row with the focus stays in the page, or the focus would be lost when it is scrolled away.
    rangeExtractor: (range) =>
      [...new Set([...defaultRangeExtractor(range), activeRef.current])].sort((one, other) => one - other),
  });

  // The row chosen last is kept by its key: it may stand elsewhere once the rows are ordered anew.
  const last = useRef<string | null>(null);
  const chooseBetween = (from: number, to: number, on = true) => {
    const next = new Set(chosen);
    for (const row of ordered.slice(Math.min(from, to), Math.max(from, to) + 1))
      if (on) next.add(rowKey(row));
      else next.delete(rowKey(row));
    const end = ordered[to];
    last.current = end === undefined ? null : rowKey(end);
    onChosen?.(next);
  };
  const choose = (index: number, on: boolean, range: boolean) => {
    const from = range ? ordered.findIndex((row) => rowKey(row) === last.current) : index;
    chooseBetween(from < 0 ? index : from, index, on);
  };
  const chooseAll = () => onChosen?.(new Set(ordered.map(rowKey)));
  const scrollTo = (index: number) => {
    // A row that is in the page scrolls into view by itself when it gets the focus.
    if (few) virtual.scrollToIndex(index);
  };
  const walk = useRowKeys({
    body,
    count: ordered.length,
    scrollTo,
    ...(onChosen ? { choose: chooseBetween, chooseAll } : {}),
  });
  activeRef.current = walk.active;

  const shown = few
    ? virtual.getVirtualItems().map(({ index, start, end }) => ({ index, start, end }))
    : ordered.map((_, index) => ({ index, start: index * ROW_PX, end: (index + 1) * ROW_PX }));
  const lastShown = shown.at(-1)?.index ?? 0;
  useEffect(() => {
    if (onEnd && ordered.length > 0 && lastShown > ordered.length - 40) onEnd();
  }, [onEnd, lastShown, ordered.length]);

  // A short table on a phone is as high as its rows: a region that scrolls within one that scrolls traps the thumb.
  const bounded = few
    ? "max-h-[max(20rem,calc(100dvh-15rem))]"
    : height === "page"
      ? "md:max-h-[max(20rem,calc(100dvh-15rem))]"
      : "";
  const width = columns.length + (onChosen ? 1 : 0);
  const allChosen = ordered.length > 0 && ordered.every((row) => chosen?.has(rowKey(row)));
  const instead = error ?? (ordered.length === 0 && !loading ? empty : undefined);

  return (
    <div className={`relative ${className}`}>
      {ordered.length > 20 && (
        <button
          type="button"
          onClick={() => after.current?.focus()}
          className="sr-only focus-visible:not-sr-only focus-visible:mb-2 focus-visible:inline-block focus-visible:border focus-visible:border-action focus-visible:px-3 focus-visible:py-1"
        >
          Past the table
        </button>
      )}
      <section
        ref={scroller}
        aria-label={label}
        // biome-ignore lint/a11y/noNoninteractiveTabindex: a region that scrolls must be reachable by keyboard.
        tabIndex={0}
        className={`scroll-pt-14 overflow-auto border border-rule bg-sheet print:max-h-none print:overflow-visible ${bounded}`}
      >
        <table
          className={`w-full border-separate border-spacing-0 ${few ? "table-fixed min-w-max" : ""}`}
          aria-rowcount={few || total !== undefined ? (total ?? ordered.length) + 1 : undefined}
          aria-busy={loading || undefined}
        >
          <caption className="sr-only">{label}</caption>
          <colgroup>
            {onChosen && <col width={36} className="print:hidden" />}
            {columns.map(({ id, width_px }) => (
              <col key={id} width={width_px} />
            ))}
          </colgroup>
          <thead className="sticky top-0 z-10">
            <tr aria-rowindex={few ? 1 : undefined}>
              {onChosen && (
                <th
                  scope="col"
                  className="border-b border-frame bg-sheet px-2.5 py-1.5 text-left align-bottom print:hidden"
                >
                  <input
                    type="checkbox"
                    aria-label={`Choose all ${ordered.length.toLocaleString("en-GB")} shown`}
                    checked={allChosen}
                    ref={(box) => {
                      if (box) box.indeterminate = !allChosen && (chosen?.size ?? 0) > 0;
                    }}
                    onChange={(event) => (event.target.checked ? chooseAll() : onChosen(new Set()))}
                    className="block size-4"
                  />
                </th>
              )}
              {columns.map((column) => (
                <HeadCell key={column.id} column={column} sort={sort} onSort={props.onSort ?? setOwnSort} />
              ))}
            </tr>
          </thead>
          <tbody ref={body} onKeyDown={walk.onKeyDown}>
            {instead === undefined && ordered.length === 0 && loading && (
              <SkeletonRows count={8} columns={width} />
            )}
            {instead === undefined &&
              shown.flatMap(({ index, start, end }, at) => {
                const row = ordered[index];
                if (row === undefined) return [];
                const key = rowKey(row);
                const gap_px = few ? start - (shown[at - 1]?.end ?? 0) : 0;
                return [
                  gap_px > 0 && <Gap key={`gap before ${key}`} height_px={gap_px} columns={width} />,
                  <DataRow
                    key={key}
                    index={index}
                    row={row}
                    columns={columns}
                    firm={few}
                    isCurrent={current === key}
                    isChosen={chosen?.has(key) ?? false}
                    isActive={index === walk.active}
                    label={rowLabel?.(row) ?? `row ${index + 1}`}
                    onFocus={() => walk.setActive(index)}
                    onChoose={onChosen && ((on, range) => choose(index, on, range))}
                  />,
                  few && at === shown.length - 1 && end < virtual.getTotalSize() && (
                    <Gap key="gap at the end" height_px={virtual.getTotalSize() - end} columns={width} />
                  ),
                ];
              })}
          </tbody>
        </table>
        {instead !== undefined && <div className="p-5">{instead}</div>}
      </section>
      <span ref={after} tabIndex={-1} className="sr-only">
        End of {label}
      </span>
    </div>
  );
}
