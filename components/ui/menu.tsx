"use client";

import Link from "next/link";
import { type ReactNode, useEffect, useRef, useState } from "react";

/** One thing to do; with `href` it leads elsewhere. */
export type MenuItem = { label: ReactNode; key: string } & (
  | { href: string; onChoose?: undefined }
  | { href?: undefined; onChoose: () => void }
);

type Props = { label: ReactNode; items: readonly MenuItem[]; className?: string };

const item =
  "block min-h-8 w-full px-3 py-1.5 text-left whitespace-nowrap hover:bg-paper focus-visible:-outline-offset-2";

/**
 * Things that are done seldom, behind one word. The browser's own disclosure, walked with Tab; Escape, a choice or a
 * press elsewhere folds it, and Escape gives the focus back to its word.
 */
export function Menu({ label, items, className = "" }: Props) {
  const fold = useRef<HTMLDetailsElement>(null);
  const list = useRef<HTMLUListElement>(null);
  const [side, setSide] = useState<"left-0" | "right-0">("left-0");
  const close = () => {
    if (fold.current) fold.current.open = false;
  };
  useEffect(() => {
    const onPress = (event: PointerEvent) => {
      if (fold.current && !fold.current.contains(event.target as Node)) fold.current.open = false;
    };
    document.addEventListener("pointerdown", onPress);
    return () => document.removeEventListener("pointerdown", onPress);
  }, []);

  return (
    <details
      ref={fold}
      data-screen-only
      className={`relative inline-block ${className}`}
      onToggle={() => {
        const left = fold.current?.getBoundingClientRect().left ?? 0;
        // It hangs from the side of its word on which all of it is within the window.
        setSide(left + (list.current?.offsetWidth ?? 0) > window.innerWidth - 8 ? "right-0" : "left-0");
      }}
      onKeyDown={(event) => {
        if (event.key !== "Escape" || !fold.current?.open) return;
        event.stopPropagation();
        close();
        fold.current.querySelector("summary")?.focus();
      }}
      onBlur={(event) => {
        const to = event.relatedTarget;
        if (to instanceof Node && !event.currentTarget.contains(to)) close();
      }}
    >
      <summary className="inline-flex min-h-8 list-none items-center gap-2 border border-field bg-sheet px-3 py-1.5 hover:border-ink [&::-webkit-details-marker]:hidden">
        {label}
        <svg width="12" height="12" viewBox="0 0 12 12" aria-hidden="true">
          <path d="M2 4l4 4 4-4" fill="none" stroke="currentColor" strokeWidth="1.5" />
        </svg>
      </summary>
      <ul ref={list} className={`absolute ${side} z-30 mt-1 min-w-full border border-frame bg-sheet py-1`}>
        {items.map(({ key, label: words, href, onChoose }) => (
          <li key={key}>
            {href === undefined ? (
              <button
                type="button"
                className={item}
                onClick={() => {
                  // Folded first, so that a dialog that opens gives the focus back to something that is still shown.
                  fold.current?.querySelector("summary")?.focus();
                  close();
                  onChoose();
                }}
              >
                {words}
              </button>
            ) : (
              <Link href={href} className={item} onClick={close}>
                {words}
              </Link>
            )}
          </li>
        ))}
      </ul>
    </details>
  );
}
