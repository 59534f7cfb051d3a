"use client";

import { type InfiniteData, keepPreviousData, useInfiniteQuery } from "@tanstack/react-query";
import type { ChangeDetail, ChangeList, ListChangesInput, ReadChangeInput } from "@/lib/contracts/changes";
import { fetchJson } from "./fetch-json";

const asked = (filter: Record<string, unknown>, more: Record<string, unknown>): string =>
  new URLSearchParams(
    Object.entries({ ...filter, ...more }).flatMap(([name, value]) =>
      value === undefined || value === null || value === "" ? [] : [[name, String(value)]],
    ),
  ).toString();

/** Changes that a filter leaves, newest first, page by page. */
export function useChanges(projectId: string, filter: Pick<ListChangesInput, "state">, initial?: ChangeList) {
  return useInfiniteQuery({
    queryKey: ["project", projectId, "changes", filter.state ?? ""],
    queryFn: ({ pageParam, signal }) =>
      fetchJson<ChangeList>(
        `/api/projects/${projectId}/changes?${asked(filter, { before: pageParam })}`,
        signal,
      ),
    initialPageParam: null as number | null,
    getNextPageParam: (last) => last.next,
    initialData: initial && !filter.state ? firstPage<ChangeList, number | null>(initial) : undefined,
    placeholderData: keepPreviousData,
  });
}

export type ConsequenceFilter = Pick<ReadChangeInput, "outcome" | "state" | "poured" | "search">;

/** One change with its consequences, page by page. */
export function useChange(
  projectId: string,
  changeId: string,
  filter: ConsequenceFilter,
  initial?: ChangeDetail,
) {
  const query = asked(filter, {});
  return useInfiniteQuery({
    queryKey: ["project", projectId, "change", changeId, query],
    queryFn: ({ pageParam, signal }) =>
      fetchJson<ChangeDetail>(
        `/api/projects/${projectId}/changes/${changeId}?${asked(filter, { after: pageParam })}`,
        signal,
      ),
    initialPageParam: null as string | null,
    getNextPageParam: (last) => last.next,
    initialData: initial && query === "" ? firstPage<ChangeDetail, string | null>(initial) : undefined,
    placeholderData: keepPreviousData,
  });
}

const firstPage = <Page, Param>(page: Page): InfiniteData<Page, Param | null> => ({
  pages: [page],
  pageParams: [null],
});
