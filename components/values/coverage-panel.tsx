"use client";

import Link from "next/link";
import type { ReactNode } from "react";
import { Notice } from "@/components/account/notice";
import { useCoverage } from "@/lib/client/use-values";
import type { Coverage } from "@/lib/contracts/values";

/** Where the register is thin: each gap with its number and the first of those that are in it. */
export function CoveragePanel({ projectId, initial }: { projectId: string; initial: Coverage }) {
  const { data, error } = useCoverage(projectId, initial);
  const at = `/projects/${projectId}`;
  return (
    <section aria-labelledby="coverage-title" className="mt-10">
      <h2 id="coverage-title" className="text-lg">
        Coverage
      </h2>
      {error && <Notice kind="refused">{error.message}</Notice>}
      {data && (
        <dl className="mt-3 grid max-w-4xl grid-cols-[auto_auto_1fr] gap-x-4 gap-y-1.5 text-sm">
          <Gap title="Footings without a value in force" gap={data.footingsWithoutValue}>
            {(item) => (
              <Link className="inline-block min-h-6 min-w-6 leading-6" href={`${at}/footings/${item.id}`}>
                {item.mark}
              </Link>
            )}
          </Gap>
          <Gap title="Footings on a value that is not confirmed" gap={data.footingsOnUnconfirmed}>
            {(item) => (
              <Link className="inline-block min-h-6 min-w-6 leading-6" href={`${at}/footings/${item.id}`}>
                {item.mark}
              </Link>
            )}
          </Gap>
          <Gap title="Values that no footing is linked to" gap={data.valuesWithoutFooting}>
            {(item) => (
              <Link className="inline-block min-h-6 min-w-6 leading-6" href={`${at}/values/${item.id}`}>
                {item.reference}
              </Link>
            )}
          </Gap>
          <Gap title="Zones without an exploratory hole" gap={data.zonesWithoutHole}>
            {(item) => item.name}
          </Gap>
          <Gap title="Ground units without a value in force" gap={data.unitsWithoutValue}>
            {(item) => `${item.code} ${item.name}`}
          </Gap>
        </dl>
      )}
    </section>
  );
}

function Gap<Item extends { id: string }>({
  title,
  gap,
  children,
}: {
  title: string;
  gap: { total: number; first: Item[] };
  children: (item: Item) => ReactNode;
}) {
  return (
    <div className="contents">
      <dt>{title}</dt>
      <dd className="text-right tabular-nums">{gap.total.toLocaleString("en-GB")}</dd>
      <dd className="text-ink-2">
        {gap.total === 0 ? (
          "none"
        ) : (
          <ul className="flex flex-wrap gap-x-3 gap-y-1 [&_a]:underline">
            {gap.first.slice(0, 12).map((item) => (
              <li key={item.id}>{children(item)}</li>
            ))}
            {gap.total > 12 && <li>and {(gap.total - 12).toLocaleString("en-GB")} more</li>}
          </ul>
        )}
      </dd>
    </div>
  );
}
