"use client";

import { useQueryClient } from "@tanstack/react-query";
import { useDeferredValue, useState } from "react";
import { Notice } from "@/components/account/notice";
import { type ConsequenceFilter, useChange } from "@/lib/client/use-changes";
import type { ChangeDetail } from "@/lib/contracts/changes";
import { AnswerForm } from "./answer-form";
import { ChangeHead } from "./change-list";
import { CloseForm } from "./close-form";
import { ConsequenceTable } from "./consequence-table";

type Props = {
  projectId: string;
  changeId: string;
  initial: ChangeDetail;
  mayAccept: boolean;
  mayRefer: boolean;
  mayClose: boolean;
};

/** One change: what it did to each footing, before and after, and the answers to it. */
export function ChangeSheet({ projectId, changeId, initial, mayAccept, mayRefer, mayClose }: Props) {
  const [filter, setFilter] = useState<ConsequenceFilter>({});
  const [chosen, setChosen] = useState<ReadonlySet<string>>(new Set());
  const search = useDeferredValue(filter.search);
  const { data, error, isFetching, hasNextPage, fetchNextPage } = useChange(
    projectId,
    changeId,
    { ...filter, search },
    initial,
  );
  const queries = useQueryClient();
  const change = data?.pages[0]?.change ?? initial.change;
  const items = data?.pages.flatMap((page) => page.items) ?? [];
  const matching = data?.pages[0]?.matching ?? 0;
  const answers = !change.closed && (mayAccept || mayRefer);
  const toggle = (id: string, on: boolean) => {
    const next = new Set(chosen);
    if (on) next.add(id);
    else next.delete(id);
    setChosen(next);
  };
  const readAgain = async () => {
    setChosen(new Set());
    await queries.invalidateQueries({ queryKey: ["project", projectId] });
  };
  const box = "mt-1 block border border-rule bg-sheet px-2 py-1.5";

  return (
    <>
      <h1 className="text-xl">Revision and its consequences</h1>
      <div className="mt-3">
        <ChangeHead change={change} projectId={projectId} />
      </div>
      {change.openPoured > 0 && (
        <p className="mt-3 max-w-prose border-l-4 border-fails pl-3">
          Poured footings are touched. Do not load them further before an engineer has looked; what is done
          about them is an engineering decision.
        </p>
      )}
      <search className="mt-6 flex flex-wrap items-end gap-4">
        <label className="block text-sm">
          Outcome
          <select
            className={box}
            value={filter.outcome ?? ""}
            onChange={(event) =>
              setFilter({
                ...filter,
                outcome: (event.target.value || undefined) as ConsequenceFilter["outcome"],
              })
            }
          >
            <option value="">any</option>
            {["now fails", "still fails", "outside conditions", "recovers", "holds"].map((outcome) => (
              <option key={outcome}>{outcome}</option>
            ))}
          </select>
        </label>
        <label className="block text-sm">
          Answer
          <select
            className={box}
            value={filter.state ?? ""}
            onChange={(event) =>
              setFilter({ ...filter, state: (event.target.value || undefined) as ConsequenceFilter["state"] })
            }
          >
            <option value="">with or without</option>
            <option value="open">without an answer</option>
            <option value="answered">answered</option>
          </select>
        </label>
        <label className="block text-sm">
          On site
          <select
            className={box}
            value={filter.poured ?? ""}
            onChange={(event) =>
              setFilter({
                ...filter,
                poured: (event.target.value || undefined) as ConsequenceFilter["poured"],
              })
            }
          >
            <option value="">any stage</option>
            <option value="yes">poured</option>
            <option value="no">not poured</option>
          </select>
        </label>
        <label className="block text-sm">
          Mark
          <input
            type="search"
            maxLength={100}
            className={box}
            value={filter.search ?? ""}
            onChange={(event) => setFilter({ ...filter, search: event.target.value || undefined })}
          />
        </label>
        <p role="status" className="py-1.5 text-sm text-ink-2">
          {matching.toLocaleString("en-GB")} {matching === 1 ? "footing" : "footings"}
        </p>
      </search>
      {error && <Notice kind="refused">{error.message}</Notice>}
      <ConsequenceTable
        items={items}
        projectId={projectId}
        busy={isFetching}
        chosen={answers ? chosen : null}
        onChoose={toggle}
      />
      {hasNextPage && (
        <button
          type="button"
          aria-disabled={isFetching}
          className="mt-3 border border-rule px-3 py-1.5"
          onClick={() => void fetchNextPage()}
        >
          {isFetching
            ? "One moment …"
            : `More footings (${(matching - items.length).toLocaleString("en-GB")})`}
        </button>
      )}
      {answers && (
        <AnswerForm
          projectId={projectId}
          changeId={changeId}
          chosen={[...chosen]}
          mayAccept={mayAccept}
          mayRefer={mayRefer}
          onDone={readAgain}
        />
      )}
      {mayClose && !change.closed && (
        <CloseForm projectId={projectId} changeId={changeId} open={change.open} onDone={readAgain} />
      )}
    </>
  );
}
