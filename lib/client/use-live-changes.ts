"use client";

import { useQueryClient } from "@tanstack/react-query";
import { useEffect } from "react";

/**
 * Reads everything on the screen again when somebody changes what checks rest on, and after a break in the connection,
 * because what happened meanwhile was not heard. Hangs up when the page is left.
 */
export function useLiveChanges(projectId: string): void {
  const queries = useQueryClient();
  useEffect(() => {
    const readAgain = () => void queries.invalidateQueries();
    const source = new EventSource(`/api/projects/${projectId}/events`);
    let openedBefore = false;
    source.addEventListener("open", () => {
      if (openedBefore) readAgain();
      openedBefore = true;
    });
    source.addEventListener("change", readAgain);
    source.addEventListener("reread", readAgain);
    // Refused for good: the session or the membership has ended. Reading again shows it where the person looks.
    source.addEventListener("error", () => source.readyState === EventSource.CLOSED && readAgain());
    return () => source.close();
  }, [projectId, queries]);
}
