"use client";

import { useRouter } from "next/navigation";
import { useEffect, useSyncExternalStore } from "react";
import { sheets } from "./sheets";

const STORED = "holdground.digit-keys";
const heard = new Set<() => void>();

const subscribe = (onChange: () => void) => {
  heard.add(onChange);
  window.addEventListener("storage", onChange);
  return () => {
    heard.delete(onChange);
    window.removeEventListener("storage", onChange);
  };
};

// A browser that keeps nothing for sites throws here; the keys then work until the page is left.
let kept: string | null = null;
const read = (): boolean => {
  try {
    return (window.localStorage.getItem(STORED) ?? kept) !== "off";
  } catch {
    return kept !== "off";
  }
};
const store = (on: boolean): void => {
  kept = on ? "on" : "off";
  try {
    window.localStorage.setItem(STORED, kept);
  } catch {
    // Said above.
  }
  for (const onChange of heard) onChange();
};

/**
 * The digit keys go to the sheet of their number. Not while something is typed or answered, and not for those who turned
 * them off: a single key must not act against somebody who speaks to the machine (WCAG 2.1.4).
 */
export function useDigitKeys(projectId: string): { on: boolean; turn: (on: boolean) => void } {
  const router = useRouter();
  const on = useSyncExternalStore(subscribe, read, () => true);
  useEffect(() => {
    if (!on) return;
    const onKeyDown = (event: KeyboardEvent) => {
      const sheet = sheets.find(({ number }) => String(number) === event.key);
      if (!sheet || event.repeat || event.defaultPrevented || isTaken(event)) return;
      event.preventDefault();
      router.push(`/projects/${projectId}/${sheet.path}`);
    };
    document.addEventListener("keydown", onKeyDown);
    return () => document.removeEventListener("keydown", onKeyDown);
  }, [on, projectId, router]);
  return { on, turn: store };
}

/** True when the key belongs to something else: another shortcut, a field, a menu, an open dialog. */
function isTaken(event: KeyboardEvent): boolean {
  if (event.ctrlKey || event.metaKey || event.altKey) return true;
  if (document.querySelector("dialog[open]")) return true;
  const target = event.target instanceof Element ? event.target : null;
  return Boolean(
    target?.closest(
      "input:not([type=checkbox], [type=radio]), textarea, select, [contenteditable]:not([contenteditable=false]), [role=textbox], [role=spinbutton]",
    ),
  );
}
