import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { ChangeSheet } from "@/components/revisions/change-sheet";
import { may } from "@/lib/access/policy";
import { pageContext } from "@/lib/http/page";
import { readChange } from "@/lib/services/changes/read-change";
import { NotFound } from "@/lib/services/errors";

export const metadata: Metadata = { title: "Revision · Holdground" };

type Params = { params: Promise<{ project: string; change: string }> };

/** One change and what it did to each footing. */
export default async function ChangePage({ params }: Params) {
  const { project, change } = await params;
  const context = await pageContext(project);
  if (!/^[0-9a-f-]{36}$/i.test(change)) notFound();
  const detail = await readChange(context, { changeId: change }).catch((error) => {
    if (error instanceof NotFound) notFound();
    throw error;
  });
  return (
    <div className="p-6">
      <ChangeSheet
        projectId={context.projectId}
        changeId={detail.change.id}
        initial={detail}
        mayAccept={may(context.roles, "consequence:accept")}
        mayRefer={may(context.roles, "consequence:answer")}
        mayClose={may(context.roles, "change:close")}
      />
    </div>
  );
}
