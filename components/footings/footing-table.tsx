"use client";

import { useVirtualizer } from "@tanstack/react-virtual";
import { useEffect, useRef, useState } from "react";
import type { FootingItem } from "@/lib/contracts/footings";
import { FootingRow, footingColumns } from "./footing-row";

type Props = {
  projectId: string;
  items: FootingItem[];
  total: number;
  chosen: ReadonlySet<string>;
  onChosen: (chosen: Set<string>) => void;
  busy: boolean;
  /** Reads the next page, when there is one. */
  onEnd: (() => void) | null;
};

const ROW_px = 32;
/** Rows of the first paint, before the height of the window is known. */
const FIRST = 40;

/** The schedule of footings: only the rows in view are in the page, however long it is. */
export function FootingTable({ projectId, items, total, chosen, onChosen, busy, onEnd }: Props) {
  const scroller = useRef<HTMLDivElement>(null);
  const lastChosen = useRef<number | null>(null);
  const [measured, setMeasured] = useState(false);
  useEffect(() => setMeasured(true), []);
  const rows = useVirtualizer({
    count: items.length,
    getScrollElement: () => scroller.current,
    estimateSize: () => ROW_px,
    overscan: 12,
  });
  const shown = measured
    ? rows.getVirtualItems()
    : items.slice(0, FIRST).map((_, index) => ({ index, start: 0, end: 0 }));
  const last = shown.at(-1)?.index ?? 0;
  useEffect(() => {
    if (measured && onEnd && last >= items.length - 20) onEnd();
  }, [measured, last, items.length, onEnd]);
  const above_px = measured ? (rows.getVirtualItems()[0]?.start ?? 0) : 0;
  const below_px = measured ? rows.getTotalSize() - (rows.getVirtualItems().at(-1)?.end ?? 0) : 0;

  const choose = (index: number, on: boolean, range: boolean) => {
    const next = new Set(chosen);
    const from = range && lastChosen.current !== null ? lastChosen.current : index;
    for (let at = Math.min(from, index); at <= Math.max(from, index); at += 1) {
      const id = items[at]?.id;
      if (id && on) next.add(id);
      else if (id) next.delete(id);
    }
    lastChosen.current = index;
    onChosen(next);
  };
  const allShown = items.length > 0 && items.every(({ id }) => chosen.has(id));

  return (
    <section
      ref={scroller}
      // biome-ignore lint/a11y/noNoninteractiveTabindex: a region that scrolls must be reachable by keyboard.
      tabIndex={0}
      aria-label="Schedule of footings"
      className="mt-3 max-h-[62vh] overflow-auto border border-rule bg-sheet"
    >
      <table className="w-full border-separate border-spacing-0" aria-rowcount={total + 1} aria-busy={busy}>
        <thead className="sticky top-0 z-10 bg-sheet">
          <tr className="h-8" aria-rowindex={1}>
            <th scope="col" className="border-b border-rule pr-2 pl-1 text-left">
              <input
                type="checkbox"
                className="m-1 size-4"
                aria-label="Choose all that are shown"
                checked={allShown}
                onChange={(event) =>
                  onChosen(event.target.checked ? new Set(items.map(({ id }) => id)) : new Set())
                }
              />
            </th>
            {footingColumns.map(({ head, unit, numeric }) => (
              <th
                key={head}
                scope="col"
                className={`border-b border-rule pr-3 font-normal whitespace-nowrap text-ink-2 ${numeric ? "text-right" : "text-left"}`}
              >
                {head}
                {unit && ` (${unit})`}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {above_px > 0 && <Spacer height_px={above_px} />}
          {shown.map(({ index }) => {
            const item = items[index];
            return (
              item && (
                <FootingRow
                  key={item.id}
                  projectId={projectId}
                  item={item}
                  index={index}
                  chosen={chosen.has(item.id)}
                  onChoose={(on, range) => choose(index, on, range)}
                />
              )
            );
          })}
          {below_px > 0 && <Spacer height_px={below_px} />}
        </tbody>
      </table>
    </section>
  );
}

/** Stands for the rows that are out of view. Drawn in the browser only, after the first paint. */
function Spacer({ height_px }: { height_px: number }) {
  return (
    <tr>
      <td colSpan={footingColumns.length + 1} style={{ height: height_px }} />
    </tr>
  );
}
