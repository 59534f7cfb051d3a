"use client";

import { useQuery } from "@tanstack/react-query";
import type { PlanPage } from "@/lib/contracts/plan";
import type { ZoneRow } from "@/lib/contracts/zones";
import { fetchJson } from "./fetch-json";

/** Holes and footings as the plan draws them. */
export function usePlan(projectId: string) {
  return useQuery({
    queryKey: ["project", projectId, "plan"],
    queryFn: ({ signal }) => fetchJson<PlanPage>(`/api/projects/${projectId}/plan`, signal),
  });
}

/** Every zone with its boundary and its values. */
export function useZones(projectId: string) {
  return useQuery({
    queryKey: ["project", projectId, "zones"],
    queryFn: ({ signal }) => fetchJson<{ zones: ZoneRow[] }>(`/api/projects/${projectId}/zones`, signal),
  });
}
