import type { Metadata } from "next";
import { DocumentList } from "@/components/documents/document-list";
import { may } from "@/lib/access/policy";
import { pageContext } from "@/lib/http/page";
import { listDocuments } from "@/lib/services/documents/list-documents";

export const metadata: Metadata = { title: "Documents · Holdground" };

/** The project's documents and where new ones come in. */
export default async function DocumentsPage({ params }: { params: Promise<{ project: string }> }) {
  const context = await pageContext((await params).project);
  return (
    <div className="p-6">
      <DocumentList
        projectId={context.projectId}
        initial={await listDocuments(context)}
        mayWrite={may(context.roles, "document:write")}
      />
    </div>
  );
}
