"use client";

import { type ReactNode, useEffect, useId, useRef } from "react";

type Props = { title: string; onClose: () => void; children: ReactNode };

/** A sheet laid over the page until it is answered or closed; Escape closes it, focus goes back to where it was. */
export function Dialog({ title, onClose, children }: Props) {
  const dialog = useRef<HTMLDialogElement>(null);
  const heading = useId();
  useEffect(() => {
    const element = dialog.current;
    if (element && !element.open) element.showModal();
  }, []);
  return (
    <dialog
      ref={dialog}
      aria-labelledby={heading}
      onClose={onClose}
      className="m-auto max-h-[90vh] w-[min(64rem,94vw)] overflow-auto border border-rule bg-sheet p-6 text-ink backdrop:bg-ink/40"
    >
      <div className="flex items-baseline justify-between gap-6">
        <h2 id={heading} className="text-lg">
          {title}
        </h2>
        <button type="button" className="underline" onClick={() => dialog.current?.close()}>
          Close
        </button>
      </div>
      {children}
    </dialog>
  );
}
