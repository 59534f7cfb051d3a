"use client";

import Link from "next/link";
import { useState } from "react";
import { Notice } from "@/components/account/notice";
import { useChanges } from "@/lib/client/use-changes";
import type { ChangeItem, ChangeList as Changes, ListChangesInput } from "@/lib/contracts/changes";
import { OutcomeCountsLine } from "./outcome-counts";

type State = NonNullable<ListChangesInput["state"]>;
const states: [State | "", string][] = [
  ["", "all"],
  ["open", "with footings that have no answer"],
  ["answered", "answered, not closed"],
  ["closed", "closed"],
];

/** What changed under the checks, newest first: what it did, and how much of it nobody has answered yet. */
export function ChangeList({ projectId, initial }: { projectId: string; initial: Changes }) {
  const [state, setState] = useState<State | "">("");
  const { data, error, isFetching, hasNextPage, fetchNextPage } = useChanges(
    projectId,
    { state: state || undefined },
    initial,
  );
  const items = data?.pages.flatMap((page) => page.items) ?? [];
  if (state === "" && data && items.length === 0)
    return (
      <p className="mt-6 max-w-prose">
        Nothing has changed yet. When a value is issued or withdrawn, or a report, log, zone, load or
        criterion changes, it stands here with what it did to each footing.
      </p>
    );
  return (
    <section aria-label="Changes" aria-busy={isFetching}>
      <label className="mt-4 block text-sm">
        Show
        <select
          value={state}
          onChange={(event) => setState(event.target.value as State | "")}
          className="mt-1 block border border-rule bg-sheet px-2 py-1.5"
        >
          {states.map(([value, title]) => (
            <option key={value} value={value}>
              {title}
            </option>
          ))}
        </select>
      </label>
      {error && <Notice kind="refused">{error.message}</Notice>}
      {data && items.length === 0 && <p className="mt-4 text-ink-2">No change is in this state.</p>}
      <ol className="mt-4">
        {items.map((item) => (
          <li key={item.id} className="border-t border-rule py-3">
            <ChangeHead change={item} projectId={projectId} link />
          </li>
        ))}
      </ol>
      {hasNextPage && (
        <button
          type="button"
          aria-disabled={isFetching}
          className="mt-2 border border-rule px-3 py-1.5"
          onClick={() => void fetchNextPage()}
        >
          {isFetching ? "One moment …" : "Earlier changes"}
        </button>
      )}
    </section>
  );
}

/** Title, reason, who and when, outcomes and what is open of one change. */
export function ChangeHead({
  change,
  projectId,
  link,
}: {
  change: ChangeItem;
  projectId: string;
  link?: boolean;
}) {
  return (
    <>
      <p className={link ? "text-base" : "text-lg"}>
        {link ? (
          <Link
            className="inline-block min-h-6 leading-6 underline"
            href={`/projects/${projectId}/revisions/${change.id}`}
          >
            {change.title}
          </Link>
        ) : (
          change.title
        )}
      </p>
      <p className="mt-1 max-w-prose">{change.reason}</p>
      <p className="text-sm text-ink-2">
        {change.madeBy.name},{" "}
        <span className="tabular-nums">{change.madeAt.slice(0, 16).replace("T", " ")} UTC</span>
      </p>
      <div className="mt-1 text-sm">
        <OutcomeCountsLine counts={change.counts} />
      </div>
      <p className="mt-1 text-sm">{standing(change)}</p>
    </>
  );
}

function standing(change: ChangeItem): string {
  if (change.closed) {
    const note = change.closed.note && `: ${change.closed.note}`;
    return `Closed by ${change.closed.name} on ${change.closed.at.slice(0, 10)}${note}`;
  }
  if (change.total === 0) return "It touched no footing.";
  if (change.open === 0) return `All ${change.total} answered. The project lead can close it.`;
  const poured = change.openPoured > 0 ? `, ${change.openPoured} of them poured` : "";
  return `${change.open} of ${change.total} without an answer${poured}.`;
}
