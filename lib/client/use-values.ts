"use client";

import { keepPreviousData, useQuery } from "@tanstack/react-query";
import type { RevisionPreview } from "@/lib/contracts/changes";
import type { Coverage, ListValuesInput, ValueDetail, ValueList } from "@/lib/contracts/values";
import { fetchJson } from "./fetch-json";

const pathOf = (projectId: string) => `/api/projects/${projectId}/values`;

/** The values that a filter leaves; the first page comes with the sheet. */
export function useValues(projectId: string, filter: ListValuesInput, initial?: ValueList) {
  const asked = new URLSearchParams(
    Object.entries(filter).filter((entry): entry is [string, string] => Boolean(entry[1])),
  );
  return useQuery({
    queryKey: ["project", projectId, "values", asked.toString()],
    queryFn: ({ signal }) => fetchJson<ValueList>(`${pathOf(projectId)}?${asked}`, signal),
    initialData: asked.size === 0 ? initial : undefined,
    placeholderData: keepPreviousData,
  });
}

/** One value with draft and revisions. */
export function useValue(projectId: string, valueId: string, initial?: ValueDetail) {
  return useQuery({
    queryKey: ["project", projectId, "value", valueId],
    queryFn: ({ signal }) => fetchJson<ValueDetail>(`${pathOf(projectId)}/${valueId}`, signal),
    initialData: initial,
  });
}

/** What the saved draft, or a pressure to try, would do to the linked footings. */
export function usePreview(
  projectId: string,
  valueId: string,
  draftRevision: number,
  trial_kPa: number | null,
) {
  const asked = trial_kPa === null ? "" : `?netAllowable_kPa=${trial_kPa}`;
  return useQuery({
    queryKey: ["project", projectId, "value", valueId, "preview", draftRevision, trial_kPa],
    queryFn: ({ signal }) =>
      fetchJson<RevisionPreview>(`${pathOf(projectId)}/${valueId}/preview${asked}`, signal),
    placeholderData: keepPreviousData,
  });
}

/** Where ground and footings do not meet. */
export function useCoverage(projectId: string, initial?: Coverage) {
  return useQuery({
    queryKey: ["project", projectId, "values", "coverage"],
    queryFn: ({ signal }) => fetchJson<Coverage>(`${pathOf(projectId)}/coverage`, signal),
    initialData: initial,
  });
}
