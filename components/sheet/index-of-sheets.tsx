"use client";

import Link from "next/link";
import { usePathname } from "next/navigation";
import { useState } from "react";
import { sheetAt, sheets } from "./sheets";
import { useDigitKeys } from "./use-digit-keys";

/** The index along the left edge: the sheets by number. On a phone it folds to one line at the top. */
export function IndexOfSheets({ projectId }: { projectId: string }) {
  const here = sheetAt(usePathname());
  const [open, setOpen] = useState(false);
  const { on, turn } = useDigitKeys(projectId);

  return (
    <nav
      aria-label="Index of sheets"
      onKeyDown={(event) => {
        if (event.key === "Escape") setOpen(false);
      }}
      className="z-20 flex shrink-0 flex-col max-md:sticky max-md:top-0 max-md:border-b max-md:border-frame max-md:bg-paper md:sticky md:top-2.5 md:h-[calc(100dvh-1.25rem)] md:w-44 md:overflow-y-auto"
    >
      <div className="flex items-center justify-between gap-4 px-3 md:px-2">
        <Link href="/projects" className="py-2.5 font-semibold tracking-wide">
          Holdground
        </Link>
        <button
          type="button"
          aria-expanded={open}
          aria-controls="index-of-sheets"
          onClick={() => setOpen(!open)}
          className="flex min-h-11 items-center gap-2 md:hidden"
        >
          {here ? `${here.number} ${here.name}` : "Sheets"}
          <svg width="12" height="12" viewBox="0 0 12 12" aria-hidden="true">
            <path
              d={open ? "M2 8l4-4 4 4" : "M2 4l4 4 4-4"}
              fill="none"
              stroke="currentColor"
              strokeWidth="1.5"
            />
          </svg>
        </button>
      </div>
      <ol
        id="index-of-sheets"
        className={`${open ? "block" : "max-md:hidden"} max-md:absolute max-md:inset-x-0 max-md:top-full max-md:border-b max-md:border-frame max-md:bg-paper max-md:pb-2 md:mt-3`}
      >
        {sheets.map((sheet) => {
          const isHere = sheet === here;
          return (
            <li key={sheet.path}>
              <Link
                href={`/projects/${projectId}/${sheet.path}`}
                aria-current={isHere ? "page" : undefined}
                onClick={() => setOpen(false)}
                className={`relative flex min-h-11 items-center gap-3 border-l-[3px] px-2.5 md:min-h-9 ${isHere ? "border-action font-semibold md:bg-sheet" : "border-transparent hover:border-rule hover:bg-sheet"}`}
              >
                <span
                  className={`inline-flex size-5 shrink-0 items-center justify-center border text-xs ${isHere ? "border-ink" : "border-field text-ink-2"}`}
                >
                  {sheet.number}
                </span>
                {sheet.name}
              </Link>
            </li>
          );
        })}
      </ol>
      <label className="mt-auto hidden items-start gap-2 px-2.5 py-2 text-xs text-ink-2 md:flex">
        <input
          type="checkbox"
          checked={on}
          onChange={(event) => turn(event.target.checked)}
          className="mt-0.5 size-3.5 shrink-0"
        />
        Digit keys go to the sheets
      </label>
    </nav>
  );
}
