"use client";

import { type KeyboardEvent, type ReactNode, useId, useRef } from "react";

/** One leaf behind a tab; `count` stands beside its words. */
export type Tab = { id: string; label: string; count?: number; content: ReactNode };

type Props = {
  /** What the tabs divide, read aloud. */
  label: string;
  tabs: readonly Tab[];
  chosen: string;
  onChoose: (id: string) => void;
};

/** Leaves behind tabs. Arrow keys, Home and End move along them; only the chosen leaf is in the page. */
export function Tabs({ label, tabs, chosen, onChoose }: Props) {
  const id = useId();
  const row = useRef<HTMLDivElement>(null);
  const at = Math.max(
    0,
    tabs.findIndex((tab) => tab.id === chosen),
  );
  const shown = tabs[at];

  const onKeyDown = (event: KeyboardEvent) => {
    const to = next(event.key, at, tabs.length);
    const tab = to === null ? undefined : tabs[to];
    if (!tab) return;
    event.preventDefault();
    onChoose(tab.id);
    row.current?.querySelectorAll<HTMLElement>("[role=tab]")[to ?? 0]?.focus();
  };

  return (
    <div>
      <div
        ref={row}
        role="tablist"
        aria-label={label}
        className="flex gap-1 overflow-x-auto border-b border-rule"
      >
        {tabs.map((tab) => {
          const isShown = tab === shown;
          return (
            <button
              key={tab.id}
              id={`${id}-${tab.id}-tab`}
              type="button"
              role="tab"
              aria-selected={isShown}
              aria-controls={isShown ? `${id}-leaf` : undefined}
              tabIndex={isShown ? 0 : -1}
              onKeyDown={onKeyDown}
              onClick={() => onChoose(tab.id)}
              className={`-mb-px min-h-8 border px-3 py-1.5 whitespace-nowrap outline-offset-[-2px] ${isShown ? "border-rule border-b-sheet bg-sheet font-semibold" : "border-transparent text-ink-2 hover:text-ink"}`}
            >
              {tab.label}
              {tab.count !== undefined && (
                <span className="ml-1.5 font-normal text-ink-2">{tab.count.toLocaleString("en-GB")}</span>
              )}
            </button>
          );
        })}
      </div>
      {shown && (
        <div id={`${id}-leaf`} role="tabpanel" aria-labelledby={`${id}-${shown.id}-tab`} className="pt-4">
          {shown.content}
        </div>
      )}
    </div>
  );
}

function next(key: string, at: number, count: number): number | null {
  if (key === "ArrowRight") return (at + 1) % count;
  if (key === "ArrowLeft") return (at - 1 + count) % count;
  if (key === "Home") return 0;
  if (key === "End") return count - 1;
  return null;
}
