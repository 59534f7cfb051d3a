"use client";

import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { type ReactNode, useState } from "react";
import { useLiveChanges } from "@/lib/client/use-live-changes";

/** What the sheets of one project share in the browser: one cache, kept in memory alone, and an ear for changes. */
export function LiveProject({ projectId, children }: { projectId: string; children: ReactNode }) {
  const [queries] = useState(
    () =>
      new QueryClient({
        defaultOptions: {
          // A refusal does not change by asking again; a lost connection may, once.
          queries: { staleTime: 10_000, retry: (failures, error) => failures < 1 && isUnreachable(error) },
        },
      }),
  );
  return (
    <QueryClientProvider client={queries}>
      <Listener projectId={projectId} />
      {children}
    </QueryClientProvider>
  );
}

const isUnreachable = (error: unknown): boolean =>
  (error as { refused?: { status?: number } } | null)?.refused?.status === 0;

function Listener({ projectId }: { projectId: string }) {
  useLiveChanges(projectId);
  return null;
}
