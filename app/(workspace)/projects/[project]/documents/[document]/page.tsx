import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { DocumentSheet } from "@/components/documents/document-sheet";
import { may } from "@/lib/access/policy";
import { pageContext } from "@/lib/http/page";
import { readDocument } from "@/lib/services/documents/read-document";
import { Refusal } from "@/lib/services/errors";

export const metadata: Metadata = { title: "Document · Holdground" };

type Props = { params: Promise<{ project: string; document: string }> };

/** One document with its revisions and what cites them. */
export default async function DocumentPage({ params }: Props) {
  const { project, document } = await params;
  const context = await pageContext(project);
  const page = await readDocument(context, { documentId: document }).catch((error: unknown) => {
    if (error instanceof Refusal) notFound();
    throw error;
  });
  return (
    <div className="p-6">
      <DocumentSheet
        projectId={context.projectId}
        initial={page}
        mayWrite={may(context.roles, "document:write")}
      />
    </div>
  );
}
