import type { ReactNode } from "react";

export type NoticeKind = "done" | "refused" | "attention" | "note";

const kinds: Record<NoticeKind, { edge: string; role: "status" | "alert" | "note" }> = {
  done: { edge: "border-passes", role: "status" },
  refused: { edge: "border-fails", role: "alert" },
  attention: { edge: "border-affected", role: "note" },
  note: { edge: "border-rule", role: "note" },
};

type Props = {
  /** `done` and `refused` are read aloud when they appear; `attention` and `note` are read in their place. */
  kind?: NoticeKind;
  title?: string;
  /** What can be done about it. */
  action?: ReactNode;
  children?: ReactNode;
  className?: string;
};

/** A sentence that stands out by its edge, not by a coloured ground. */
export function Notice({ kind = "note", title, action, children, className = "" }: Props) {
  const { edge, role } = kinds[kind];
  return (
    <div role={role} className={`border-l-4 py-1 pl-3 ${edge} ${className}`}>
      {title && <p className="font-semibold">{title}</p>}
      {children}
      {action && <div className="mt-2">{action}</div>}
    </div>
  );
}
