import type { ReactNode } from "react";

type Props = {
  /** What is not there: "There is no footing yet." */
  title: string;
  /** What to do first, and why. */
  children?: ReactNode;
  /** The button that does it. */
  action?: ReactNode;
  className?: string;
};

/** An honest empty place: what is missing, what to do first, and the button for it. */
export function Empty({ title, children, action, className = "" }: Props) {
  return (
    <div className={`max-w-prose border border-dashed border-field px-5 py-4 ${className}`}>
      <p className="font-semibold">{title}</p>
      {children && <div className="mt-1 text-ink-2">{children}</div>}
      {action && <div className="mt-3 flex flex-wrap gap-3">{action}</div>}
    </div>
  );
}
