"use client";

import { useEffect, useState, useSyncExternalStore } from "react";

/** What was said last, with a number of its own so that the same words can be said twice. */
type Said = { number: number; words: string } | null;

const SHOWN_MS = 8_000;
const heard = new Set<() => void>();
let said: Said = null;
let count = 0;

const say = (next: Said): void => {
  said = next;
  for (const onChange of heard) onChange();
};

/** Says in passing that something was done. What went wrong, or asks for an answer, belongs in a `Notice` in its place. */
export function tell(words: string): void {
  count += 1;
  say({ number: count, words });
}

const subscribe = (onChange: () => void) => {
  heard.add(onChange);
  return () => heard.delete(onChange);
};

/**
 * The place where it is said, once in a page. It is there before anything is said, or nothing would be read aloud; the
 * words go after eight seconds, not while the pointer or the focus rests on them. They lie above the title block, where
 * they cover no button of the sheet.
 */
export function Toasts() {
  const now = useSyncExternalStore(
    subscribe,
    () => said,
    () => null,
  );
  const [rests, setRests] = useState(false);
  useEffect(() => {
    if (!now || rests) return;
    const timer = setTimeout(() => say(null), SHOWN_MS);
    return () => clearTimeout(timer);
  }, [now, rests]);
  const close = () => {
    setRests(false);
    say(null);
  };

  return (
    // biome-ignore lint/a11y/noStaticElementInteractions: it does nothing; it only notices that somebody is still reading.
    <div
      data-screen-only
      onPointerEnter={() => setRests(true)}
      onPointerLeave={() => setRests(false)}
      onFocus={() => setRests(true)}
      onBlur={() => setRests(false)}
      className="fixed right-4 bottom-14 z-30 max-w-[min(26rem,calc(100vw-2rem))] md:right-6 md:bottom-28"
    >
      <div
        className={
          now
            ? "flex items-start gap-4 border border-frame border-l-4 border-l-passes bg-sheet px-3 py-2"
            : ""
        }
      >
        <p role="status">{now && <span key={now.number}>{now.words}</span>}</p>
        {now && (
          <button type="button" className="underline" onClick={close}>
            Close
          </button>
        )}
      </div>
    </div>
  );
}
