import type { ReactNode } from "react";

/** The caution in its one wording, for screens, printed sheets and reports alike. */
export const CAUTION =
  "This register helps qualified engineers keep track; it supports, and does not replace, the judgement of a licensed engineer. Local code governs.";

/** Stands under every calculation and every printed sheet; what this sheet leaves out may follow it. */
export function Caution({ children, className = "" }: { children?: ReactNode; className?: string }) {
  return (
    <p role="note" className={`max-w-prose text-sm text-ink-2 ${className}`}>
      {CAUTION}
      {children && <> {children}</>}
    </p>
  );
}
