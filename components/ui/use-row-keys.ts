"use client";

import { type KeyboardEvent, type RefObject, useCallback, useEffect, useRef, useState } from "react";

type Given = {
  body: RefObject<HTMLElement | null>;
  count: number;
  scrollTo: (index: number) => void;
  /** Chooses the rows from one to another, both included. */
  choose?: (from: number, to: number) => void;
  chooseAll?: () => void;
};

const REACHABLE = "a[href],button,input,select,textarea,[tabindex]";

/**
 * Moves the focus through the rows of a table: arrows up and down, Page Up and Down, Home and End. With Shift the rows
 * passed are chosen; Ctrl+A chooses all. `active` is the row whose box takes part in the Tab order.
 */
export function useRowKeys({ body, count, scrollTo, choose, chooseAll }: Given) {
  const [active, setActive] = useState(0);
  const wanted = useRef<{ index: number; column: number } | null>(null);
  const frame = useRef(0);
  useEffect(() => () => cancelAnimationFrame(frame.current), []);

  // A row far away is drawn only after the table has scrolled: look again for a few frames.
  const focusWanted = useCallback(
    (tries: number) => {
      const to = wanted.current;
      if (!to) return;
      const row = body.current?.querySelector(`[data-row="${to.index}"]`);
      const inColumn = row?.children[to.column]?.querySelector<HTMLElement>(REACHABLE);
      const target = inColumn ?? row?.querySelector<HTMLElement>(REACHABLE);
      if (target) {
        wanted.current = null;
        target.focus();
      } else if (tries > 0) {
        frame.current = requestAnimationFrame(() => focusWanted(tries - 1));
      }
    },
    [body],
  );

  const onKeyDown = (event: KeyboardEvent<HTMLElement>) => {
    const from = placeOf(event.target as HTMLElement);
    if (!from || event.altKey) return;
    if (event.key === "a" && (event.ctrlKey || event.metaKey) && chooseAll) {
      event.preventDefault();
      return chooseAll();
    }
    const to = targetRow(event, from.index, count);
    if (to === null) return;
    event.preventDefault();
    if (event.shiftKey && choose) choose(from.index, to);
    setActive(to);
    scrollTo(to);
    wanted.current = { index: to, column: from.column };
    focusWanted(12);
  };

  return { active: Math.min(active, Math.max(0, count - 1)), setActive, onKeyDown };
}

/** Row and column of what has the focus; null where the arrows belong to the control itself. */
function placeOf(target: HTMLElement): { index: number; column: number } | null {
  const typed = target.matches("select, textarea, input:not([type=checkbox])");
  const row = target.closest<HTMLElement>("[data-row]");
  if (typed || !row) return null;
  const column = [...row.children].findIndex((cell) => cell.contains(target));
  return { index: Number(row.dataset.row), column };
}

function targetRow(event: KeyboardEvent, index: number, count: number): number | null {
  const last = count - 1;
  switch (event.key) {
    case "ArrowDown":
      return Math.min(last, index + 1);
    case "ArrowUp":
      return Math.max(0, index - 1);
    case "PageDown":
      return Math.min(last, index + 15);
    case "PageUp":
      return Math.max(0, index - 15);
    case "Home":
      return 0;
    case "End":
      return last;
    default:
      return null;
  }
}
