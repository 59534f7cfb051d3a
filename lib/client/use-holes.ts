"use client";

import { useQuery } from "@tanstack/react-query";
import type { HolePage, HoleRow, StratumRow, UnitRow } from "@/lib/contracts/ground";
import { fetchJson } from "./fetch-json";

/** Every hole with the facts of its current log. */
export function useHoles(projectId: string, initial?: { holes: HoleRow[] }) {
  return useQuery({
    queryKey: ["project", projectId, "holes"],
    queryFn: ({ signal }) => fetchJson<{ holes: HoleRow[] }>(`/api/projects/${projectId}/holes`, signal),
    initialData: initial,
  });
}

/** One hole with its log. */
export function useHole(projectId: string, holeId: string, initial?: HolePage) {
  return useQuery({
    queryKey: ["project", projectId, "hole", holeId],
    queryFn: ({ signal }) => fetchJson<HolePage>(`/api/projects/${projectId}/holes/${holeId}`, signal),
    initialData: initial,
  });
}

/** The ground units from the surface down. */
export function useUnits(projectId: string, initial?: { units: UnitRow[] }) {
  return useQuery({
    queryKey: ["project", projectId, "units"],
    queryFn: ({ signal }) => fetchJson<{ units: UnitRow[] }>(`/api/projects/${projectId}/units`, signal),
    initialData: initial,
  });
}

/** Every stratum of the current logs. */
export function useStrata(projectId: string) {
  return useQuery({
    queryKey: ["project", projectId, "strata"],
    queryFn: ({ signal }) => fetchJson<{ strata: StratumRow[] }>(`/api/projects/${projectId}/strata`, signal),
  });
}
