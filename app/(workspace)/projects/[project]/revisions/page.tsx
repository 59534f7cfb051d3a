import type { Metadata } from "next";
import { ChangeList } from "@/components/revisions/change-list";
import { pageContext } from "@/lib/http/page";
import { listChanges } from "@/lib/services/changes/list-changes";

export const metadata: Metadata = { title: "Revisions · Holdground" };

/** What changed under the checks of the project, and what is still unanswered. */
export default async function RevisionsPage({ params }: { params: Promise<{ project: string }> }) {
  const context = await pageContext((await params).project);
  const changes = await listChanges(context, {});
  return (
    <div className="p-6">
      <h1 className="text-xl">Revisions</h1>
      <p className="mt-2 max-w-prose text-ink-2">
        A footing that rested on what has changed is not approved until an engineer has looked at it again,
        even where the new figures still pass.
      </p>
      <ChangeList projectId={context.projectId} initial={changes} />
    </div>
  );
}
