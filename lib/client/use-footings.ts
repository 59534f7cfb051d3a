"use client";

import { keepPreviousData, useInfiniteQuery, useQuery, useQueryClient } from "@tanstack/react-query";
import type { FootingDetail, FootingList, LinkSuggestion } from "@/lib/contracts/footings";
import { fetchJson } from "./fetch-json";
import { type Answer, send } from "./send";

/** A filter of the list, as it stands in the address: names and words of `listFootingsInput`. */
export type FootingFilter = Record<string, string>;

const base = (projectId: string) => `/api/projects/${projectId}/footings`;

/** The pages of the footings that a filter selects, the first counted. The page before stays while the next is read. */
export function useFootings(projectId: string, filter: FootingFilter, initial?: FootingList) {
  return useInfiniteQuery({
    queryKey: ["project", projectId, "footings", filter],
    queryFn: ({ pageParam, signal }) => {
      const query = new URLSearchParams(filter);
      if (pageParam) query.set("after", pageParam);
      return fetchJson<FootingList>(`${base(projectId)}?${query}`, signal);
    },
    initialPageParam: "",
    getNextPageParam: (last: FootingList) => last.next,
    initialData: initial && { pages: [initial], pageParams: [""] },
    placeholderData: keepPreviousData,
  });
}

/** One footing with its history. */
export function useFooting(projectId: string, footingId: string, initial?: FootingDetail) {
  return useQuery({
    queryKey: ["project", projectId, "footing", footingId],
    queryFn: ({ signal }) => fetchJson<FootingDetail>(`${base(projectId)}/${footingId}`, signal),
    initialData: initial,
  });
}

/** The ids of all that a filter selects, read when they are wanted. */
export const allFootingIds = (projectId: string, filter: FootingFilter): Promise<{ footingIds: string[] }> =>
  fetchJson(`${base(projectId)}/ids?${new URLSearchParams(filter)}`);

/** The values proposed for footings from their zones. */
export const suggestions = (
  projectId: string,
  footingIds: readonly string[],
): Promise<Answer<{ suggestions: LinkSuggestion[] }>> =>
  send(`${base(projectId)}/links/suggest`, "POST", { footingIds });

/** Sends a change of footings and has everything that shows footings, values or changes read again. */
export function useFootingChange(projectId: string) {
  const queries = useQueryClient();
  return async <Body>(
    path: string,
    method: "POST" | "PUT",
    body: Record<string, unknown>,
    revision?: number,
  ): Promise<Answer<Body>> => {
    const answer = await send<Body>(`/api/projects/${projectId}/${path}`, method, body, revision);
    if (answer.done) await queries.invalidateQueries({ queryKey: ["project", projectId] });
    return answer;
  };
}
