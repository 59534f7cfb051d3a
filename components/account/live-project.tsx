"use client";

import type { ReactNode } from "react";
import { QueryProvider } from "@/lib/client/query-provider";
import { useLiveChanges } from "@/lib/client/use-live-changes";

/** What the sheets of one project share in the browser: one cache, and an ear for changes. */
export function LiveProject({ projectId, children }: { projectId: string; children: ReactNode }) {
  return (
    <QueryProvider>
      <Listener projectId={projectId} />
      {children}
    </QueryProvider>
  );
}

function Listener({ projectId }: { projectId: string }) {
  useLiveChanges(projectId);
  return null;
}
