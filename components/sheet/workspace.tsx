import type { ReactNode } from "react";
import { Toasts } from "@/components/ui/toast";
import { IndexOfSheets } from "./index-of-sheets";
import { TitleBlock, type TitleBlockFacts } from "./title-block";

type Props = { projectId: string; facts: TitleBlockFacts; children: ReactNode };

/** The frame that every sheet of a project lies in: index at the left, the sheet, title block at its lower right. */
export function Workspace({ projectId, facts, children }: Props) {
  return (
    <div className="workspace flex min-h-dvh flex-col md:flex-row md:p-2.5">
      <a
        href="#sheet"
        className="sr-only focus-visible:not-sr-only focus-visible:fixed focus-visible:top-3 focus-visible:left-3 focus-visible:z-50 focus-visible:border focus-visible:border-action focus-visible:bg-sheet focus-visible:px-3 focus-visible:py-2"
      >
        To the sheet
      </a>
      <IndexOfSheets projectId={projectId} />
      <Toasts />
      <div className="workspace-sheet flex min-w-0 flex-1 flex-col border-frame bg-sheet md:border-x md:border-t">
        <main id="sheet" tabIndex={-1} className="min-w-0 flex-1 outline-none">
          {children}
        </main>
        <div className="title-block-place" aria-hidden="true" />
        <TitleBlock facts={facts} />
      </div>
    </div>
  );
}
