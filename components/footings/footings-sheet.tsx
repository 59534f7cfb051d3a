"use client";

import Link from "next/link";
import { usePathname, useRouter, useSearchParams } from "next/navigation";
import { useCallback, useMemo, useState } from "react";
import { ButtonLink } from "@/components/ui/button";
import { Empty } from "@/components/ui/empty";
import { Notice } from "@/components/ui/notice";
import { useRunChecks } from "@/lib/client/use-checks";
import { allFootingIds, type FootingFilter, useFootings } from "@/lib/client/use-footings";
import type { RunChecksAnswer } from "@/lib/contracts/checks";
import type { FootingChoices, FootingList } from "@/lib/contracts/footings";
import { CheckAnswer } from "./check-answer";
import { CountsLine } from "./counts-line";
import { FilterBar } from "./filter-bar";
import { FootingTable } from "./footing-table";
import { ImportDialog } from "./import-dialog";
import { LinkDialog } from "./link-dialog";

type Props = {
  projectId: string;
  first: FootingList;
  firstFilter: FootingFilter;
  choices: FootingChoices;
  may: { write: boolean; link: boolean; check: boolean };
};

/** The schedule of footings: narrowed by the address, chosen singly or all, linked, checked and imported. */
export function FootingsSheet({ projectId, first, firstFilter, choices, may }: Props) {
  const router = useRouter();
  const here = usePathname();
  const address = useSearchParams().toString();
  const filter = useMemo<FootingFilter>(() => Object.fromEntries(new URLSearchParams(address)), [address]);
  const isFirst = address === new URLSearchParams(firstFilter).toString();
  const list = useFootings(projectId, filter, isFirst ? first : undefined);
  const runChecks = useRunChecks(projectId);
  const [chosen, setChosen] = useState<Set<string>>(new Set());
  const [dialog, setDialog] = useState<"import" | "link" | null>(null);
  const [said, setSaid] = useState("");
  const [problem, setProblem] = useState("");
  const [busy, setBusy] = useState(false);
  const [answer, setAnswer] = useState<RunChecksAnswer | null>(null);

  const items = useMemo(() => list.data?.pages.flatMap((page) => page.items) ?? [], [list.data]);
  const counts = list.data?.pages[0]?.counts ?? null;
  const total = counts?.total ?? items.length;
  const chosenIds = useMemo(() => [...chosen], [chosen]);
  const { fetchNextPage } = list;
  const readOn = useCallback(() => void fetchNextPage(), [fetchNextPage]);

  const onFilter = (next: FootingFilter) => {
    setChosen(new Set());
    router.replace(`${here}?${new URLSearchParams(next)}`, { scroll: false });
  };
  const chooseAll = async () => {
    setBusy(true);
    const { sort: _, descending: __, ...conditions } = filter;
    const all = await allFootingIds(projectId, conditions).catch((error: Error) => error);
    setBusy(false);
    if (all instanceof Error) setProblem(all.message);
    else setChosen(new Set(all.footingIds));
  };
  const check = async (which: { footingIds: readonly string[] } | { all: true }) => {
    if (busy) return;
    setBusy(true);
    setSaid("");
    setProblem("");
    const ran = await runChecks(which);
    setBusy(false);
    setAnswer(ran.done ? ran.body : null);
    if (!ran.done) setProblem(ran.refused.detail);
  };
  const done = (sentence: string) => {
    setDialog(null);
    setAnswer(null);
    setSaid(sentence);
  };
  const button = "border border-field px-3 py-1.5 aria-disabled:opacity-60";
  const empty = items.length === 0 && !list.isFetching && !list.isError;

  return (
    <div className="p-6">
      <div className="flex flex-wrap items-baseline gap-x-6 gap-y-2">
        <h1 className="text-xl">Footings</h1>
        {may.write && (
          <>
            <Link href={`/projects/${projectId}/footings/new`} className="underline">
              New footing
            </Link>
            <button type="button" className="underline" onClick={() => setDialog("import")}>
              Import from CSV
            </button>
          </>
        )}
        {may.check && total > 0 && (
          <button
            type="button"
            className="underline"
            aria-disabled={busy}
            onClick={() => void check({ all: true })}
          >
            Check all that are linked
          </button>
        )}
      </div>
      {counts && <CountsLine counts={counts} />}
      <FilterBar filter={filter} choices={choices} counts={counts} onChange={onFilter} />
      {said && (
        <Notice kind="done" className="mt-3">
          {said}
        </Notice>
      )}
      {problem && (
        <Notice kind="refused" className="mt-3">
          {problem}
        </Notice>
      )}
      {list.isError && (
        <Notice kind="refused" className="mt-3">
          {list.error.message}{" "}
          <button type="button" className="underline" onClick={() => void list.refetch()}>
            Try again
          </button>
        </Notice>
      )}
      {answer && <CheckAnswer projectId={projectId} answer={answer} />}
      <div className="mt-3 flex min-h-10 flex-wrap items-center gap-3" aria-live="polite">
        {busy && <span role="status">One moment …</span>}
        {chosen.size > 0 && (
          <>
            <span className="tabular-nums">{chosen.size.toLocaleString("en-GB")} chosen</span>
            {may.link && (
              <button type="button" className={button} aria-disabled={busy} onClick={() => setDialog("link")}>
                Link to a value
              </button>
            )}
            {may.check && (
              <button
                type="button"
                className={button}
                aria-disabled={busy}
                onClick={() => void check({ footingIds: chosenIds })}
              >
                Check
              </button>
            )}
            <button type="button" className="underline" onClick={() => setChosen(new Set())}>
              Choose none
            </button>
          </>
        )}
        {chosen.size > 0 && chosen.size < total && chosen.size >= items.length && (
          <button type="button" className="underline" onClick={() => void chooseAll()}>
            Choose all {total.toLocaleString("en-GB")} that match
          </button>
        )}
      </div>
      {empty ? (
        <NoFooting projectId={projectId} narrowed={Object.keys(filter).length > 0} mayWrite={may.write} />
      ) : (
        <FootingTable
          projectId={projectId}
          items={items}
          total={total}
          chosen={chosen}
          onChosen={setChosen}
          busy={list.isFetching}
          onEnd={list.hasNextPage && !list.isFetching ? readOn : null}
        />
      )}
      {dialog === "import" && (
        <ImportDialog projectId={projectId} onDone={done} onClose={() => setDialog(null)} />
      )}
      {dialog === "link" && (
        <LinkDialog
          projectId={projectId}
          footingIds={chosenIds}
          values={choices.values}
          onDone={done}
          onClose={() => setDialog(null)}
        />
      )}
    </div>
  );
}

function NoFooting({
  projectId,
  narrowed,
  mayWrite,
}: {
  projectId: string;
  narrowed: boolean;
  mayWrite: boolean;
}) {
  if (narrowed) return <Empty title="No footing matches." className="mt-4" />;
  if (!mayWrite)
    return (
      <Empty title="There is no footing yet." className="mt-4">
        The structural engineer registers them.
      </Empty>
    );
  return (
    <Empty
      title="There is no footing yet."
      className="mt-4"
      action={
        <ButtonLink href={`/projects/${projectId}/footings/new`}>Register the first footing</ButtonLink>
      }
    >
      Import the schedule from CSV, or register the first footing. Then link the footings to the bearing
      values of their zones, and check them.
    </Empty>
  );
}
