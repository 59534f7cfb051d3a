import type { ReactNode } from "react";

type Props = {
  /** What is inside, for whoever comes to it by keyboard. */ label: string;
  className?: string;
  children: ReactNode;
};

/** Holds what may be wider than the page, such as a table on a phone; it can be reached and scrolled by keyboard. */
export function ScrollAcross({ label, className = "", children }: Props) {
  return (
    // biome-ignore lint/a11y/noNoninteractiveTabindex: a region that scrolls has to be reachable by keyboard (WCAG 2.1.1)
    <section tabIndex={0} aria-label={label} className={`overflow-x-auto ${className}`}>
      {children}
    </section>
  );
}
