"use client";

import { type ReactNode, useEffect, useId, useLayoutEffect, useRef } from "react";

type Props = {
  title: string;
  open: boolean;
  /** Asked for by Escape, by the button, or by the page. Answer by setting `open` to false. */
  onClose: () => void;
  /** While true the dialog stays: something is being stored, or typed words would be lost. */
  held?: boolean;
  /** `narrow` for a question, `wide` for a table. */
  width?: "narrow" | "normal" | "wide";
  /** Buttons at the foot, the main one last. */
  actions?: ReactNode;
  children: ReactNode;
};

const widths = {
  narrow: "w-[min(28rem,94vw)]",
  normal: "w-[min(44rem,94vw)]",
  wide: "w-[min(72rem,96vw)]",
};

/**
 * A sheet laid over the page until it is answered or closed. The browser's own dialog: it keeps the focus inside, gives it
 * back afterwards, and closes with Escape.
 */
export function Dialog({ title, open, onClose, held = false, width = "normal", actions, children }: Props) {
  const dialog = useRef<HTMLDialogElement>(null);
  const heading = useId();
  useEffect(() => {
    const element = dialog.current;
    if (!element) return;
    if (open && !element.open) element.showModal();
    if (!open && element.open) element.close();
  }, [open]);
  // A page may take an open dialog away whole. Closed while it is still in the page, it gives the focus back.
  useLayoutEffect(() => {
    const element = dialog.current;
    return () => {
      if (element?.open) element.close();
    };
  }, []);

  return (
    <dialog
      ref={dialog}
      aria-labelledby={heading}
      onCancel={(event) => {
        event.preventDefault();
        if (!held) onClose();
      }}
      onClose={(event) => {
        if (!open || event.currentTarget.open) return;
        // A browser lets nobody be locked in: pressed often enough, Escape closes what asked to stay.
        if (held) event.currentTarget.showModal();
        else onClose();
      }}
      className={`m-auto max-h-[92dvh] ${widths[width]} flex-col border border-frame bg-sheet text-ink backdrop:bg-[#1b2326]/50 open:flex`}
    >
      {open && (
        <>
          <header className="flex items-baseline justify-between gap-6 border-b border-rule px-5 py-3">
            <h2 id={heading} className="text-lg">
              {title}
            </h2>
            <button
              type="button"
              className="underline aria-disabled:opacity-60"
              aria-disabled={held || undefined}
              onClick={() => !held && onClose()}
            >
              Close
            </button>
          </header>
          <div className="min-h-0 overflow-auto px-5 py-4">{children}</div>
          {actions && (
            <footer className="flex flex-wrap justify-end gap-3 border-t border-rule px-5 py-3">
              {actions}
            </footer>
          )}
        </>
      )}
    </dialog>
  );
}
