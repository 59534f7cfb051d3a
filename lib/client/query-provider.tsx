"use client";

import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { type ReactNode, useState } from "react";
import { Problem } from "./fetch-json";

/** One cache for what the browser has read, kept in memory alone: it is gone when the page is closed. */
export function QueryProvider({ children }: { children: ReactNode }) {
  const [queries] = useState(
    () =>
      new QueryClient({
        defaultOptions: {
          // A refusal does not change by asking again; a lost connection or a server that is just starting may, once.
          queries: { staleTime: 10_000, retry: (failures, error) => failures < 1 && isPassing(error) },
        },
      }),
  );
  return <QueryClientProvider client={queries}>{children}</QueryClientProvider>;
}

const isPassing = (error: unknown): boolean =>
  error instanceof Problem && (error.status === 0 || error.status === 503);
