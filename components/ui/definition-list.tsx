import type { ReactNode } from "react";

/** One fact: what it is, its unit once, and what it says. Nothing said shows as a dash. */
export type Fact = { term: ReactNode; unit?: string; value: ReactNode; key?: string };

type Props = {
  facts: readonly Fact[];
  /** Terms above their values in columns, instead of beside them. */
  stacked?: boolean;
  className?: string;
};

/** Facts with their terms, as in the margin of a drawing. */
export function DefinitionList({ facts, stacked = false, className = "" }: Props) {
  const list = stacked
    ? "grid grid-cols-[repeat(auto-fill,minmax(9rem,1fr))] gap-x-6 gap-y-3"
    : "grid grid-cols-1 sm:grid-cols-[max-content_minmax(0,1fr)] sm:gap-x-6";
  const row = stacked
    ? "min-w-0"
    : "grid grid-cols-subgrid border-b border-rule py-1.5 sm:col-span-2 last:border-b-0";
  return (
    <dl className={`${list} ${className}`}>
      {facts.map(({ key, term, unit, value }, at) => (
        <div key={key ?? (typeof term === "string" ? term : at)} className={row}>
          <dt className="text-ink-2">
            {term}
            {unit && ` (${unit})`}
          </dt>
          <dd className="min-w-0 break-words">
            {value === null || value === undefined || value === "" ? (
              <span className="text-ink-2">—</span>
            ) : (
              value
            )}
          </dd>
        </div>
      ))}
    </dl>
  );
}
