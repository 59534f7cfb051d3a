"use client";

import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { PageHead } from "@/components/ui/page-head";

/** What lies in the frame of a project when a sheet could not be made; index and title block stay. */
export default function SheetError({
  error,
  reset,
}: {
  error: Error & { digest?: string };
  reset: () => void;
}) {
  return (
    <div className="p-6">
      <PageHead title="This sheet could not be made" />
      <Notice
        kind="refused"
        action={
          <Button kind="main" onClick={reset}>
            Try again
          </Button>
        }
      >
        <p>Something is wrong on our side. Nothing was changed.</p>
        {error.digest && <p className="mt-1 text-sm text-ink-2">Number in the log: {error.digest}</p>}
      </Notice>
    </div>
  );
}
