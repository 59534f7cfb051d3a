"use client";

import { useQuery } from "@tanstack/react-query";
import type { CheckDetail, RunChecksAnswer } from "@/lib/contracts/checks";
import { fetchJson } from "./fetch-json";
import { useFootingChange } from "./use-footings";

/** One stored check whole. It never changes; how it stands may. */
export function useCheck(projectId: string, checkId: string | null, initial?: CheckDetail) {
  return useQuery({
    queryKey: ["project", projectId, "check", checkId],
    queryFn: ({ signal }) => fetchJson<CheckDetail>(`/api/projects/${projectId}/checks/${checkId}`, signal),
    enabled: checkId !== null,
    initialData: initial?.id === checkId ? initial : undefined,
  });
}

/** Checks the footings named, or all that are linked; every list that shows them is read again. */
export function useRunChecks(projectId: string) {
  const change = useFootingChange(projectId);
  return (which: { footingIds: readonly string[] } | { all: true }) =>
    change<RunChecksAnswer>("checks", "POST", which as Record<string, unknown>);
}
