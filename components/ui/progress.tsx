"use client";

import { useId } from "react";
import { Button } from "./button";

type Props = {
  /** What is being done: "Uploading GIR-2031.pdf". */
  label: string;
  /** How much is done and of how much; null while it cannot be known. */
  done: number | null;
  total?: number;
  /** How far it is in words, such as "12 of 40 MB"; percent without it. */
  words?: string;
  onCancel?: () => void;
};

/** How far long work is, with the way to stop it. */
export function Progress({ label, done, total = 100, words, onCancel }: Props) {
  const id = useId();
  const percent = done === null || total <= 0 ? null : Math.min(100, Math.floor((done / total) * 100));
  return (
    <div className="flex flex-wrap items-center gap-x-4 gap-y-1">
      <label htmlFor={id} className="min-w-0 basis-full break-words">
        {label}
      </label>
      <progress
        id={id}
        max={100}
        value={percent ?? undefined}
        className="h-2 min-w-40 flex-1 appearance-none border border-field bg-sheet [&::-moz-progress-bar]:bg-action [&::-webkit-progress-bar]:bg-sheet [&::-webkit-progress-value]:bg-action"
      />
      <span className="min-w-12 text-right text-ink-2">
        {words ?? (percent === null ? "" : `${percent} %`)}
      </span>
      {onCancel && <Button onClick={onCancel}>Cancel</Button>}
    </div>
  );
}
