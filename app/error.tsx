"use client";

import { PublicSheet } from "@/components/account/public-sheet";
import { Button } from "@/components/ui/button";

/** What a page shows when it could not be made: no detail, the number under which the log knows more, and another try. */
export default function ErrorPage({
  error,
  reset,
}: {
  error: Error & { digest?: string };
  reset: () => void;
}) {
  return (
    <PublicSheet title="This page could not be made">
      <p className="mt-4">Something is wrong on our side. Nothing was changed.</p>
      {error.digest && <p className="mt-2 text-sm text-ink-2">Number in the log: {error.digest}</p>}
      <Button kind="main" onClick={reset} className="mt-5">
        Try again
      </Button>
    </PublicSheet>
  );
}
